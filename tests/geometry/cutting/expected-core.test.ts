import { expect, test } from 'vitest';
import { polylineOf } from '#geometry/cutting/arrays.ts';
import { expectedCores, inMouth } from '#geometry/cutting/expected-core.ts';
import { type WirePlan } from '#geometry/cutting/plan.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { PLAN, planWith } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'core' };
const expectedOf = (plan: WirePlan) => {
  const core = planCore(plan, IDENTITY).core!;
  return { core, cores: expectedCores(plan, core.core, core.features, core.fit!.places) };
};

test('the core stands on the machine as it stands in the block: root left, trailing edge to the origin', () => {
  const { core, cores } = expectedOf(PLAN);
  const [place] = core.fit!.places;
  const [expected] = cores;
  core.core.root.core.x.forEach((x, i) => {
    expect(expected!.outline.left.x[i]).toBeCloseTo(60 + 260 - (place!.xMm + x), 9);
    expect(expected!.outline.left.y[i]).toBeCloseTo(20 + place!.yMm + core.core.root.core.y[i]!, 9);
  });
  expect([expected!.halfKerfLeftMm, expected!.halfKerfRightMm]).toEqual([0.4, 0.4]);
});

test('the root at the right changes the sides, kerfs and all', () => {
  const plan = planWith({ machine: { rootFace: 'right' }, kerfMm: { root: 0.8, tip: 1.2 } });
  const { core, cores } = expectedOf(plan);
  expect([cores[0]!.halfKerfLeftMm, cores[0]!.halfKerfRightMm]).toEqual([0.6, 0.4]);
  const width = (x: Float64Array) => Math.max(...x) - Math.min(...x);
  expect(width(cores[0]!.outline.right.x)).toBeCloseTo(width(core.core.root.core.x), 9);
});

test('the second core of a pair has its ends the other way round', () => {
  const { cores } = expectedOf(planWith({ block: { pair: true, heightMm: 90 } }));
  expect(cores).toHaveLength(2);
  const width = (x: Float64Array) => Math.max(...x) - Math.min(...x);
  expect(width(cores[1]!.outline.left.x)).toBeCloseTo(width(cores[0]!.outline.right.x), 9);
});

test('each feature has its mouths and the walls that both ends have', () => {
  const { core, cores } = expectedOf(PLAN);
  expect(cores[0]!.mouths).toHaveLength(2);
  const both = core.features.flatMap(({ root, tip }) =>
    root.walls.filter((wall, i) => wall !== null && tip.walls[i] !== null),
  );
  expect(cores[0]!.walls.left.x).toHaveLength(both.length);
  expect(cores[0]!.walls.right.x).toHaveLength(both.length);
});

test('inside a mouth, or within the margin of its edges', () => {
  const mouth = polylineOf([
    { x: 12, y: 0 },
    { x: 10, y: 0 },
  ]);
  expect([9.8, 9.95, 11, 12.05, 12.2].map((x) => inMouth(mouth, x, 0.1))).toEqual([
    false,
    true,
    true,
    true,
    false,
  ]);
});
