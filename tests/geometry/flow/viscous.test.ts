import { expect, test, vi } from 'vitest';
import { type SolvedPoint } from '#geometry/flow/flow-point.ts';
import { sweepAll } from '#geometry/flow/sweep.ts';
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
  for (const cl of [0.6, -0.2, 1.15]) {
    const point = viscous.atLift(cl);
    expect(point.converged && Math.abs(point.cl - cl)).toBeLessThan(5e-4);
  }
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

/** What is known of 0012 in words (Jacobs & Sherman, NACA Report 586, 1937; Loftin & Smith, NACA TN 1945, 1949). */
test('the lower the Reynolds number, the more drag when tripped; free, it lies between one and three times that of laminar plates', () => {
  const flat = prepared('0012');
  const drags = [9e6, 3e6, 1e6, 3e5, 1e5].map(
    (reynolds) => solved(new ViscousSection(flat, { reynolds, tripUpper: 0.05, tripLower: 0.05 }), 0).cd,
  );
  drags.forEach((cd, i) => i > 0 && expect(cd).toBeGreaterThan(drags[i - 1]! * 1.1));
  const free = solved(new ViscousSection(flat, { reynolds: 2e5 }), 0).cd;
  const laminar = (2 * 1.328) / Math.sqrt(2e5);
  expect(free).toBeGreaterThan(laminar);
  expect(free).toBeLessThan(3 * laminar);
});

test('the lower the Reynolds number, the less lift there is at most', () => {
  const flat = prepared('0012');
  const highest = [6e6, 1e6, 3e5].map((reynolds) =>
    Math.max(
      ...sweepAll(flat, { reynolds }, { fromDeg: 8, toDeg: 20, stepDeg: 2 }).map((point) =>
        point.converged ? point.cl : 0,
      ),
    ),
  );
  expect(highest[0]).toBeGreaterThan(highest[1]! + 0.1);
  expect(highest[1]).toBeGreaterThan(highest[2]! + 0.1);
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
