import { expect, test } from 'vitest';
import { polylineOf } from '#geometry/cutting/arrays.ts';
import { moveSeconds } from '#geometry/cutting/feed.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { PLAN, planWith, prismOf, section } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'core' };
const line = (length: number) =>
  polylineOf([
    { x: 0, y: 0 },
    { x: length, y: 0 },
  ]);
const speeds = { feedMmMin: 200, machine: { ...PLAN.machine, maxFeedMmMin: 1000, travelFeedMmMin: 600 } };
const melt = (plan: Plan) => planCore(plan, IDENTITY).core!.cut!.melt;

test('a step of 5 mm at the faster face at 200 mm/min takes 1.5 s', () => {
  const faces = { left: line(5), right: line(3) };
  expect(moveSeconds(speeds, 'cut', faces, faces, 1)).toBeCloseTo(1.5, 12);
  expect(moveSeconds(speeds, 'cut', { left: line(3), right: line(5) }, faces, 1)).toBeCloseTo(1.5, 12);
});

test('a tower’s limit slows the cut; travel has its own feed at the faster tower', () => {
  const faces = { left: line(5), right: line(3) };
  expect(moveSeconds(speeds, 'cut', faces, { left: line(50), right: line(1) }, 1)).toBeCloseTo(3, 12);
  expect(moveSeconds(speeds, 'travel', faces, { left: line(50), right: line(1) }, 1)).toBeCloseTo(5, 12);
});

test('a prism melts evenly, a taper at its tip', () => {
  const even = melt(prismOf(section('2412'), 200));
  expect(even.ratio).toBeCloseTo(1, 9);
  const taper = melt(
    planWith({ panel: { washoutDeg: 0 }, allowances: { upperMm: 0, lowerMm: 0 }, features: [] }),
  );
  expect(taper.slowerEnd).toBe('tip');
  expect(taper.ratio).toBeCloseTo(220 / 160, 1);
});

test('strong taper and a feed above the material’s limit are findings', () => {
  const strong = planWith({ panel: { tip: { shape: section('2412'), chordMm: 60 } }, features: [] });
  expect(planCore(strong, IDENTITY).findings).toContainEqual(
    expect.objectContaining({ severity: 'warning', code: 'uneven-speed' }),
  );
  const fast = planWith({ material: { feedMmMin: 400 } });
  const findings = planCore(fast, IDENTITY).findings;
  expect(findings).toContainEqual(
    expect.objectContaining({ code: 'feed-above-limit', path: 'material.feedMmMin' }),
  );
  const lines = findings.filter(({ code }) => code === 'wire-too-fast');
  expect(lines.length).toBeGreaterThan(0);
  for (const { at } of lines) expect(at?.line).toBeGreaterThan(0);
});

test('no end of the wire stands while the skins meet at different stations', () => {
  expect(melt(PLAN).longestStandS).toBeLessThan(0.1);
});
