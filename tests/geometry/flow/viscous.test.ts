import { expect, test, vi } from 'vitest';
import { type SolvedPoint } from '#geometry/flow/flow-point.ts';
import { ViscousSection } from '#geometry/flow/viscous.ts';
import { prepared } from './prepared.ts';

// Whole flows are solved here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

const solved = (section: ViscousSection, alphaDeg: number): SolvedPoint => {
  const point = section.at(alphaDeg);
  if (!point.converged) throw new Error(`${alphaDeg}° did not converge`);
  return point;
};
const section = prepared('2412');

test('the answer does not depend on the way: from nothing, from below and from above', () => {
  const [cold, up, down] = [0, 1, 2].map(() => new ViscousSection(section, { reynolds: 5e5 }));
  const straight = solved(cold!, 4);
  for (const alphaDeg of [1, 2, 3]) solved(up!, alphaDeg);
  for (const alphaDeg of [7, 6, 5]) solved(down!, alphaDeg);
  for (const point of [solved(up!, 4), solved(down!, 4)]) {
    expect(Math.abs(point.cl - straight.cl)).toBeLessThan(5e-4);
    expect(Math.abs(point.cd / straight.cd - 1)).toBeLessThan(2e-3);
  }
});

test.each([
  ['4412', 2e5, 4],
  ['2412', 1e6, 6],
  ['0012', 6e6, 8],
] as const)(
  '%s at Re %d and %d°: twice the panels change cl by at most 1 and cd by at most 3 per cent',
  (digits, reynolds, alphaDeg) => {
    const [coarse, fine] = [160, 320].map((panels) => solved(new ViscousSection(prepared(digits, panels), { reynolds }), alphaDeg)); // prettier-ignore
    expect(Math.abs(coarse!.cl / fine!.cl - 1)).toBeLessThan(0.01);
    expect(Math.abs(coarse!.cd / fine!.cd - 1)).toBeLessThan(0.03);
  },
);

test('a lift coefficient as target', () => {
  const viscous = new ViscousSection(section, { reynolds: 5e5 });
  const point = viscous.atLift(0.6);
  expect(point.converged && Math.abs(point.cl - 0.6)).toBeLessThan(5e-4);
  expect(viscous.atLift(2.8).converged).toBe(false);
});

test('distribution of the last angle that converged', () => {
  const viscous = new ViscousSection(section, { reynolds: 5e5 });
  expect(viscous.distribution()).toBeNull();
  const point = solved(viscous, 3);
  expect(Math.min(...viscous.distribution()!.cp)).toBeCloseTo(point.lowestCp, 12);
  viscous.reset();
  expect(viscous.distribution()).toBeNull();
});

test('earlier trips cost drag, and so does a rougher stream', () => {
  const drag = (conditions: object) =>
    solved(new ViscousSection(section, { reynolds: 1e6, ...conditions }), 2).cd;
  const free = drag({});
  const tripped = drag({ tripUpper: 0.1, tripLower: 0.1 });
  expect(drag({ criticalN: 5 })).toBeGreaterThan(free * 1.02);
  expect(tripped).toBeGreaterThan(free * 1.3);
  expect(drag({ tripUpper: 0.02, tripLower: 0.02 })).toBeGreaterThan(tripped * 1.03);
});

test('a Mach number strengthens lift by Kármán and Tsien and leaves the layer alone', () => {
  const [low, fast] = [0, 0.3].map((mach) => solved(new ViscousSection(section, { reynolds: 1e6, mach }), 2));
  expect(fast!.cl / low!.cl).toBeGreaterThan(1.04);
  expect(fast!.cd).toBe(low!.cd);
});

test('what cannot be is said per point: angles out of range, sections without a flow', () => {
  const viscous = new ViscousSection(section, { reynolds: 5e5 });
  expect(viscous.at(45)).toEqual({ converged: false, alphaDeg: 45, iterations: 0 });
  expect(viscous.at(NaN).converged).toBe(false);
  expect(() => new ViscousSection(section, { reynolds: 0 })).toThrow(/reynolds/);
});
