import { expect, test, vi } from 'vitest';
import { distributionOf, pointOf, surfaceSpeeds, wallFriction } from '#geometry/flow/flow-point.ts';
import { prepared, started } from './prepared.ts';

// Whole flows are solved here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

const solved = (digits: string, alphaDeg: number, reynolds: number, edge: 'open' | 'closed' = 'closed') => {
  const { coupled, layer, outer } = started(prepared(digits, 160, edge), alphaDeg, { reynolds });
  expect(coupled.iterate(outer).converged).toBe(true);
  return { layer, outer, point: pointOf(layer, outer, alphaDeg, 0, 5)! };
};

test('a symmetric section at 0° has no lift and no moment, and both sides are alike', () => {
  const { point } = solved('0012', 0, 1e6);
  expect(Math.abs(point.cl)).toBeLessThan(1e-5);
  expect(Math.abs(point.cm)).toBeLessThan(1e-5);
  expect(point.upper.transition).toBeCloseTo(point.lower.transition!, 5);
  expect(point.cdFriction + point.cdPressure).toBeCloseTo(point.cd, 12);
  // Friction is most of the drag of a slender section, pressure a part of it.
  expect(point.cdFriction / point.cd).toBeGreaterThan(0.7);
  expect(point.cdPressure).toBeGreaterThan(0);
});

test('4412 at 4° and Re 1e5: a laminar bubble on the upper surface, transition inside it, attached flow behind', () => {
  const { upper, lower } = solved('4412', 4, 1e5).point;
  expect(upper.laminarSeparation).toBeGreaterThan(0.35);
  expect(upper.laminarSeparation).toBeLessThan(0.48);
  expect(upper.transition).toBeGreaterThan(upper.laminarSeparation!);
  expect(upper.reattachment).toBeGreaterThan(upper.laminarSeparation!);
  expect(upper.reattachment! - upper.transition!).toBeLessThan(0.08);
  expect(upper.turbulentSeparation).toBeNull();
  expect(lower.transition).toBeNull();
});

test('beyond the stall the turbulent layer separates well ahead of the edge', () => {
  const { upper } = solved('0012', 16, 1e6).point;
  expect(upper.turbulentSeparation).toBeGreaterThan(0.2);
  expect(upper.turbulentSeparation).toBeLessThan(0.7);
});

test('friction and shape factor tell the separated stretch alike', () => {
  const { layer, outer } = solved('4412', 4, 1e5);
  const { friction, shapeFactor, x, stagnation, turbulent, displacementThickness } = distributionOf(
    layer,
    outer,
    0,
  );
  expect(friction).toEqual(wallFriction(layer));
  for (let i = 1; i <= stagnation; i++) {
    if (turbulent[i] || x[i]! > 0.9) continue;
    expect(friction[i]! < 0).toBe(shapeFactor[i]! > 4.14);
  }
  expect(displacementThickness.every((value) => value > 0)).toBe(true);
});

test('a blunt edge leaves dead air in the wake’s displacement', () => {
  const { layer, outer } = solved('2412', 2, 1e6, 'open');
  const { wake, cp, speed } = distributionOf(layer, outer, 0);
  const own = layer.dstar[layer.panels.nodes]!;
  expect(wake.displacementThickness[0]! - own).toBeCloseTo(layer.panels.edge.gap, 12);
  cp.forEach((value, i) => expect(value).toBeCloseTo(1 - speed[i]! ** 2, 12));
  expect(surfaceSpeeds(layer)[160]).toBeCloseTo(-speed[160]!, 12);
});

test('a state that is no flow gives no point', () => {
  const { layer, outer } = solved('0012', 2, 1e6);
  layer.theta[layer.size - 1] = -0.01;
  expect(pointOf(layer, outer, 2, 0, 5)).toBeNull();
});
