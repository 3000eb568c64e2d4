import { expect, test } from 'vitest';
import { at, polylineOf } from '#geometry/cutting/arrays.ts';
import { verticalCut } from '#geometry/cutting/feature-ends.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { TONGUE_MM } from '#geometry/cutting/template-tongue.ts';
import { crossingsByHand, distanceTo } from './measuring.ts';
import { TEMPLATE, planWith, prismOf, section } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'templates' };
const planned = (plan: Plan) => {
  const { core, findings } = planCore(plan, IDENTITY);
  return { templates: core!.templates, findings: findings.filter(({ path }) => path.startsWith('template')) };
};
/** Wire and kerf alike: the template is the section. */
const bare = (shape: Parameters<typeof prismOf>[0], chordMm: number) =>
  planWith({ ...prismOf(shape, chordMm), kerfMm: { root: 0.4, tip: 0.4 }, template: TEMPLATE });

test('a sharp trailing edge: a tongue of 2 mm as long as the ramp, and what stays of the foam is said', () => {
  const { templates, findings } = planned(bare(section('0012'), 200));
  for (const { outline, tongueMm, rampMm } of templates) {
    expect(tongueMm).toBeGreaterThanOrEqual(TONGUE_MM);
    // The next pair of the chain behind 2 mm.
    expect(tongueMm).toBeLessThan(TONGUE_MM + 0.6);
    for (const x of [200, 205, 200 + rampMm - 0.01]) {
      const cut = verticalCut(outline, x)!;
      expect(cut.high - cut.low).toBeCloseTo(tongueMm, 2);
      // Both edges begin at a pair of the chain, within one of each other.
      expect(Math.abs(cut.high + cut.low)).toBeLessThan(0.15);
    }
    expect(crossingsByHand(outline)).toBe(0);
  }
  // 2 y = 2 mm where the 12 % section has y/c = 0.005: between 3.4 % and 3.6 % ahead of its closed edge.
  expect(findings.map(({ code, at: place }) => [code, place?.end])).toEqual([
    ['tongue-leaves-foam', 'root'],
    ['tongue-leaves-foam', 'tip'],
  ]);
  expect(findings[0]!.at!.station).toBeGreaterThan(0.945);
  expect(findings[0]!.at!.station).toBeLessThan(0.966);
});

test('a trailing edge thicker than the tongue runs straight on, and nothing is said', () => {
  const { templates, findings } = planned(bare(section('0018', 'open'), 600));
  // 2 · 0.00189 of 600 mm.
  for (const { tongueMm } of templates) expect(tongueMm).toBeCloseTo(2 * 0.00189 * 600, 1);
  expect(findings).toEqual([]);
});

test('on a tapered panel both tongues begin at the same pair, and neither is thinner', () => {
  const plan = planWith({
    panel: { root: { shape: section('2412'), chordMm: 300 }, tip: { shape: section('0009'), chordMm: 150 } },
    features: [],
    template: TEMPLATE,
  });
  const { templates } = planned(plan);
  const [root, tip] = templates;
  expect(root!.outline.x).toHaveLength(tip!.outline.x.length);
  expect(tip!.tongueMm).toBeGreaterThanOrEqual(TONGUE_MM);
  expect(root!.tongueMm).toBeGreaterThan(2 * TONGUE_MM);
});

test('ticks stand on the tongue’s edges, in equal steps, and point into it', () => {
  const { templates } = planned(bare(section('0012'), 200));
  const { outline, ticks } = templates[0]!;
  const edge = ticks.filter(({ station }) => station > 0.97);
  expect(edge.map(({ station, surface }) => [station, surface])).toEqual([
    [1, 'upper'],
    [1, 'lower'],
  ]);
  for (const { at: place, inwards, surface } of ticks) {
    expect(distanceTo(outline, place.x, place.y)).toBeLessThan(0.01);
    const inside = { x: place.x + 0.5 * inwards.x, y: place.y + 0.5 * inwards.y };
    const cut = verticalCut(outline, inside.x)!;
    if (inside.x > 5) expect(surface === 'upper' ? inside.y < cut.high : inside.y > cut.low).toBe(true);
  }
  expect(edge[0]!.at.x).toBeCloseTo(200, 0);
});

test('a section too thin for a tongue is told to be backed up', () => {
  const { templates, findings } = planned(bare(section('0004', 'closed'), 40));
  expect(findings.filter(({ code }) => code === 'thin-ramp')).toHaveLength(2);
  for (const { outline } of templates) {
    const line = polylineOf(Array.from(outline.x, (x, i) => ({ x, y: at(outline.y, i) })));
    expect(crossingsByHand(line)).toBe(0);
  }
});
