import fc from 'fast-check';
import { expect, test } from 'vitest';
import { at } from '#geometry/cutting/arrays.ts';
import { buildCore } from '#geometry/cutting/core.ts';
import { buildPanel } from '#geometry/cutting/panel.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { PART } from '#geometry/cutting/row.ts';
import { type Shape, outlineOf } from '#geometry/shapes/shape.ts';
import { distanceTo } from './measuring.ts';
import { PLAN, planWith, plans, prismOf, section } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'core' };
const coreOf = (plan: Plan) => buildCore(plan, buildPanel(plan));
const skinned = (plan: Plan, skin: number): Plan => ({
  ...plan,
  allowances: { upperMm: skin, lowerMm: skin },
});

test.each([
  [0.5, 3.514],
  [1, 7.106],
])('closed 0012 at 200 mm, skins of %f mm: the core ends %f mm ahead of the trailing edge', (skin, ahead) => {
  const { core } = coreOf(skinned(prismOf(section('0012'), 200), skin));
  for (const meeting of core!.skinsMeet) {
    expect(Math.abs(meeting.aheadMm - ahead)).toBeLessThanOrEqual(0.02);
    expect(meeting.station).toBeCloseTo(1 - meeting.aheadMm / 200, 12);
    // The straight-wedge estimate d / sin(8.27°) is shorter: the surfaces are curved.
    expect(meeting.aheadMm).toBeGreaterThan(skin / Math.sin((8.27 * Math.PI) / 180));
  }
});

test('where the skins meet, the point has the skin’s thickness to both surfaces', () => {
  const shape = section('4412');
  const { core } = coreOf(skinned(prismOf(shape, 240), 0.8));
  const { tail } = core!.root.core;
  const { upper, lower } = outlineOf(shape);
  for (const surface of [upper, lower]) {
    const points = Array.from({ length: 4001 }, (_, i) => surface.at(i / 4000));
    const line = {
      x: Float64Array.from(points, ({ x }) => 240 * x),
      y: Float64Array.from(points, ({ y }) => 240 * y),
    };
    expect(distanceTo(line, tail!.x, tail!.y, false)).toBeCloseTo(0.8, 5);
  }
});

test('behind the last equal station the rulings lead both ends to their meeting points together', () => {
  const { core } = coreOf(PLAN);
  const { root, tip, panel } = core!;
  for (const line of [root.core, tip.core]) {
    const collapsed = Array.from(line.collapsed.keys()).filter((i) => line.collapsed[i] === 1);
    expect(collapsed.length).toBeGreaterThan(0);
    for (const i of collapsed) expect([at(line.x, i), at(line.y, i)]).toEqual([line.tail!.x, line.tail!.y]);
  }
  expect(root.core.collapsed).toEqual(tip.core.collapsed);
  expect(root.path.collapsed).toEqual(tip.path.collapsed);
  // The features' stations stay equal: their pairs are where the chain has them.
  for (const end of ['root', 'tip'] as const) {
    panel.chain.station.forEach((station, i) => {
      if (station !== 0.4 || panel.chain.part[i] !== PART.upper) return;
      const by = at(core![end].path.distance, i);
      expect(at(core![end].path.x, i)).toBeCloseTo(
        at(panel.chain[end].x, i) + by * at(panel.chain[end].nx, i),
        12,
      );
    });
  }
});

test('core and path stay half the kerf apart along their common normals, tail and all', () => {
  fc.assert(
    fc.property(plans, (plan) => {
      const { core } = coreOf(plan);
      for (const end of ['root', 'tip'] as const) {
        const { core: foam, path, halfKerfMm } = core![end];
        foam.x.forEach((x, i) => {
          if (path.collapsed[i] === 1) return;
          expect(Math.hypot(at(path.x, i) - x, at(path.y, i) - at(foam.y, i))).toBeCloseTo(halfKerfMm, 9);
        });
      }
    }),
    { numRuns: 12 },
  );
});

const blunt = (trailingEdgeGap: number): Shape => ({
  kind: 'cst',
  upper: [0.17, 0.16, 0.17],
  lower: [-0.13, -0.1, -0.1],
  n1: 0.5,
  n2: 1,
  trailingEdgeGap,
});

test('a core with a face at the root and an edge at the tip: the wire goes round the edge in an arc, and the cut agrees between', () => {
  // A gap of 2.7 mm at the root is wider than both skins together, the 1.8 mm at the tip are not.
  const plan = planWith({
    panel: { root: { shape: blunt(0.0114), chordMm: 242 }, tip: { shape: blunt(0.0114), chordMm: 155 } },
    allowances: { upperMm: 1.3, lowerMm: 1.1 },
    kerfMm: { root: 0.9, tip: 1.2 },
    features: [],
  });
  const { core } = planCore(plan, IDENTITY);
  const { root, tip, panel } = core!.core;
  expect(root.core.tail).toBeNull();
  expect(tip.core.tail).not.toBeNull();
  for (let i = 0; i < panel.chain.station.length; i++) {
    if (panel.chain.part[i] !== PART.tail) continue;
    const away = Math.hypot(at(tip.path.x, i) - tip.core.tail!.x, at(tip.path.y, i) - tip.core.tail!.y);
    expect(away).toBeCloseTo(0.6, 9);
  }
  expect(core!.cut!.simulation.largestDeviationMm).toBeLessThanOrEqual(0.01);
});

test('skins thicker than the nose is round: the core’s nose is an edge, and the cut agrees between both ends', () => {
  const plan = planWith({
    panel: { root: { shape: section('0012'), chordMm: 186 }, tip: { shape: section('0009'), chordMm: 120 } },
    allowances: { upperMm: 1.5, lowerMm: 1.5 },
    kerfMm: { root: 0.9, tip: 1.4 },
    features: [],
  });
  const { core } = planCore(plan, IDENTITY);
  const { tip, panel } = core!.core;
  const nose = Array.from(panel.chain.part).indexOf(PART.nose);
  expect(tip.core.collapsed[nose]).toBe(1);
  expect(tip.path.collapsed[nose]).toBe(0);
  expect(core!.cut!.simulation.largestDeviationMm).toBeLessThanOrEqual(0.01);
});

test('skins that fill the section at one end only name that end', () => {
  const plan = planWith({
    panel: { tip: { shape: section('2412'), chordMm: 80 } },
    allowances: { upperMm: 5, lowerMm: 5 },
    features: [],
  });
  const { core, findings } = coreOf(plan);
  expect(core).toBeNull();
  expect(findings).toMatchObject([
    { severity: 'error', code: 'skin-thicker-than-section', path: 'allowances.upperMm', at: { end: 'tip' } },
  ]);
});
