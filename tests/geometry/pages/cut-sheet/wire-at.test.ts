import { expect, test } from 'vitest';
import { toBlock } from '#geometry/cutting/block.ts';
import { wireAt } from '#geometry/pages/cut-sheet/wire-at.ts';
import { PLANS, planned } from '../samples.ts';

const { plan } = planned(PLANS['pair in two passes']);

test.each([
  ['root', 0, 'root'],
  ['root', 1, 'tip'],
  ['tip', 0, 'tip'],
  ['tip', 1, 'root'],
] as const)('at the %s face core %i is cut along the path of its %s', (face, index, end) => {
  const path = toBlock(plan.fit!.places[index]!, plan.core[end].path);
  const wire = wireAt(plan, face, index)!;
  const points = new Set(Array.from(wire.line.x, (x, i) => `${x.toFixed(6)} ${wire.line.y[i]!.toFixed(6)}`));
  const met = Array.from(path.x, (x, i) => points.has(`${x.toFixed(6)} ${path.y[i]!.toFixed(6)}`));
  expect(met.every(Boolean)).toBe(true);
});

test('it begins and ends clear of the block, and shows its direction at least three times', () => {
  const { line, arrows } = wireAt(plan, 'root', 0)!;
  const { lengthMm } = plan.plan.block!;
  for (const x of [line.x[0]!, line.x.at(-1)!])
    expect(x).toBeCloseTo(lengthMm + plan.plan.cut.clearanceMm, 6);
  expect(arrows.length).toBeGreaterThanOrEqual(3);
  for (const i of arrows) expect(line.x[i]).toBeDefined();
});

test('no wire without a machine', () => {
  expect(wireAt(planned(PLANS['by hand']).plan, 'root', 0)).toBeNull();
});
