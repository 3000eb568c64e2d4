import { expect, test } from 'vitest';
import { denseRows, denseSteps } from '#geometry/cutting/contour-rows.ts';
import { placeSection } from '#geometry/cutting/placing.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { PART } from '#geometry/cutting/row.ts';
import { PLAN, planWith, prismOf, section } from './plans.ts';

const rowsOf = (plan: Plan) =>
  denseRows(plan, { root: placeSection(plan.panel, 'root'), tip: placeSection(plan.panel, 'tip') });
const ofPart = (plan: Plan, part: number) => rowsOf(plan).filter((row) => row.part === part);

test('the rows run from the trailing edge over the upper surface to the nose and back by the lower', () => {
  const rows = rowsOf(PLAN);
  const parts = rows.map(({ part }) => part).filter((part, i, all) => part !== all[i - 1]);
  expect(parts).toEqual([PART.tail, PART.upper, PART.nose, PART.lower, PART.tail]);
  const upper = ofPart(PLAN, PART.upper).map(({ station }) => station);
  expect(upper).toEqual([...upper].sort((a, b) => b - a));
  const lower = ofPart(PLAN, PART.lower).map(({ station }) => station);
  expect(lower).toEqual([...lower].sort((a, b) => a - b));
  expect([upper[0], lower.at(-1)]).toEqual([1, 1]);
});

test('what must stay a vertex is marked: the ends, features and the corner of a 4-digit section’s curvature', () => {
  const fixed = ofPart(PLAN, PART.upper)
    .filter((row) => row.fixed)
    .map(({ station }) => Number(station.toFixed(3)));
  // The camber of a 2412 is highest at 40 % of the mean line, where the slot stands too; the tube at 28 %.
  expect(fixed).toEqual([1, 0.4, 0.28]);
});

test('unequal skins: the thicker one meets the thinner round the nose and is whole again 20 times as far behind', () => {
  const plan = planWith({
    ...prismOf(section('0012'), 200),
    allowances: { upperMm: 0.5, lowerMm: 2 },
  });
  expect(new Set(ofPart(plan, PART.upper).map(({ root }) => root.skin))).toEqual(new Set([0.5]));
  const lower = ofPart(plan, PART.lower);
  for (const { station, root } of lower) {
    // 1.5 mm at 1 in 20: 30 mm of surface behind the first 4 %, which are about 10 mm.
    if (station < 0.035) expect(root.skin).toBeCloseTo(0.5, 9);
    if (station > 0.21) expect(root.skin).toBe(2);
    expect(root.skin).toBeGreaterThanOrEqual(0.5 - 1e-12);
  }
  const slopes = lower.slice(1).map(({ root }, i) => {
    const last = lower[i]!.root;
    return (root.skin - last.skin) / Math.hypot(root.x - last.x, root.y - last.y);
  });
  expect(Math.max(...slopes)).toBeCloseTo(1 / 20, 6);
  expect(Math.min(...slopes)).toBeGreaterThan(-1e-9);
});

test('steps grow with chord and fineness, never fewer than asked for', () => {
  const steps = (toleranceMm: number, pointsPerSurface: number) =>
    denseSteps(planWith({ cut: { toleranceMm, pointsPerSurface } }));
  expect(steps(0.001, 40).count).toBeGreaterThan(steps(0.1, 40).count);
  expect(steps(0.1, 1000).count).toBeGreaterThanOrEqual(999);
  for (const points of [10, 40, 333]) {
    const { count, longest } = steps(0.01, points);
    expect(count).toBe(longest * (points - 1));
  }
});

test('stock replaces the nose by a face at its station', () => {
  const plan = planWith({ stock: { leadingEdgeStation: 0.06, trailingEdgeStation: 0.7 } });
  const rows = rowsOf(plan);
  expect(Math.min(...rows.map(({ station }) => station))).toBe(0.06);
  expect(Math.max(...rows.map(({ station }) => station))).toBe(0.7);
  const nose = rows.filter(({ part }) => part === PART.nose);
  // Two corners and the middle of the face at least.
  expect(nose.length).toBeGreaterThanOrEqual(3);
  expect(nose.every(({ fixed }) => fixed)).toBe(true);
});
