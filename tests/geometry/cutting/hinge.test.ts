import { expect, test } from 'vitest';
import { at, boxOf, polylineOf } from '#geometry/cutting/arrays.ts';
import { verticalCut } from '#geometry/cutting/feature-ends.ts';
import { type Feature } from '#geometry/cutting/plan.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { distanceTo } from './measuring.ts';
import { planWith, prismOf } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'core' };
type Hinge = Extract<Feature, { kind: 'hinge' }>;
const HINGE: Hinge = {
  kind: 'hinge',
  name: 'Aileron',
  hingeSurface: 'upper',
  rootStation: 0.75,
  tipStation: 0.75,
  bevelDeg: 40,
  webMm: 0.5,
};
const hinged = (changes: Partial<Hinge>, plan: Parameters<typeof planWith>[0] = {}) => {
  const { core, findings } = planCore(planWith({ ...plan, features: [{ ...HINGE, ...changes }] }), IDENTITY);
  return { core: core!, findings: findings.map(({ code, path }) => `${code} ${path}`) };
};

test.each(['upper', 'lower'] as const)(
  'hinge at the %s surface: its web stays, its bevel opens to the other',
  (hingeSurface) => {
    const { core } = hinged({ hingeSurface });
    const { outline, wire } = core.features[0]!.tip;
    const x = core.core.panel.tip.toPanel({ x: 0.75, y: 0 }).x;
    const cut = verticalCut(core.core.tip.core, x)!;
    const box = boxOf(outline);
    const apexY = hingeSurface === 'upper' ? box.maxY : box.minY;
    expect(Math.abs((hingeSurface === 'upper' ? cut.high : cut.low) - apexY)).toBeCloseTo(0.5, 9);
    // Half of 40° on either side of the upright; the edges lie on the other surface.
    for (let i = 0; i < 3; i++) {
      const [ex, ey] = [at(outline.x, i), at(outline.y, i)];
      if (ey === apexY) continue;
      expect(Math.abs(ex - x) / Math.abs(ey - apexY)).toBeCloseTo(Math.tan((20 * Math.PI) / 180), 9);
      expect(distanceTo(core.core.tip.core, ex, ey)).toBeLessThan(1e-9);
    }
    // The kerf of 0.8 mm just touches the web.
    expect(Math.min(...wire.map(({ y }) => Math.abs(y - apexY)))).toBeCloseTo(0.4, 9);
  },
);

test('worked by hand: a V of 60° in level foam of 20 mm, web 2 mm, kerf 1 mm', () => {
  // A 4-digit section so flat and long that its surfaces are level to 0.02 mm over the V.
  const plan = {
    ...prismOf(
      { kind: 'naca4', maxCamber: 0, maxCamberPosition: 0, maxThickness: 0.01, trailingEdge: 'open' },
      2000,
    ),
    kerfMm: { root: 1, tip: 1 },
    block: { lengthMm: 2100, heightMm: 60 },
  };
  const { core } = hinged({ bevelDeg: 60, webMm: 2, rootStation: 0.3, tipStation: 0.3 }, plan);
  const { wire, outline } = core.features[0]!.root;
  const y = 10 - 2;
  // Lines 0.5 mm inside flanks at 30° meet 0.5 / sin 30° = 1 mm below the apex.
  expect(wire[1]!.y).toBeCloseTo(y - 1, 2);
  expect(wire[2]!.y).toBeCloseTo(y - 0.5, 2);
  // 18 mm deep: the flanks end 18 tan 30° = 10.392 mm to either side.
  const box = boxOf(outline);
  expect((box.maxX - box.minX) / 2).toBeCloseTo(10.392, 1);
  // The wire comes in on the path, 0.5 mm outside the surface at −10: (18.5 − 1) tan 30° = 10.104 mm aside.
  expect(wire[0]!.x - 600).toBeCloseTo(10.104, 1);
  expect(wire[4]!.x - 600).toBeCloseTo(-10.104, 1);
});

test('the wire keeps half the kerf inside both flanks', () => {
  const { core } = hinged({}, { kerfMm: { root: 0.8, tip: 1.2 } });
  for (const [end, half] of [
    ['root', 0.4],
    ['tip', 0.6],
  ] as const) {
    const { outline, wire } = core.features[0]![end];
    for (const [a, b] of [
      [0, 1],
      [4, 3],
    ] as const) {
      for (const share of [0, 0.3, 0.7, 1]) {
        const x = wire[a]!.x + share * (wire[b]!.x - wire[a]!.x);
        const y = wire[a]!.y + share * (wire[b]!.y - wire[a]!.y);
        // Nearest flank of the V, continued beyond its mouth.
        const away = [1, 2].map((i) => {
          const [dx, dy] = [at(outline.x, i) - at(outline.x, 0), at(outline.y, i) - at(outline.y, 0)];
          return Math.abs(dx * (y - at(outline.y, 0)) - dy * (x - at(outline.x, 0))) / Math.hypot(dx, dy);
        });
        expect(Math.min(...away)).toBeCloseTo(half, 9);
      }
    }
  }
});

test('flanks are among what the simulation compares, and it agrees; flanks cut with another kerf would differ', () => {
  const { core } = hinged({});
  const { walls } = core.features[0]!.root;
  expect(walls.filter((of) => of !== null)).toHaveLength(7);
  const outline = core.features[0]!.root.outline;
  for (const wall of walls) expect(distanceTo(outline, wall!.x, wall!.y)).toBeLessThan(1e-9);
  expect(core.cut!.simulation.largestDeviationMm).toBeLessThanOrEqual(0.02);
  const wire = polylineOf(core.features[0]!.root.wire);
  for (const wall of walls) expect(distanceTo(wire, wall!.x, wall!.y, false)).toBeCloseTo(0.4, 6);
});

test.each([
  ['a plain slit', { bevelDeg: 0 }],
  ['narrower than the kerf', { bevelDeg: 3 }],
  ['as wide as may be', { bevelDeg: 90, webMm: 0 }],
  ['other stations at the tip', { tipStation: 0.8 }],
  ['at the lower surface', { hingeSurface: 'lower' as const }],
])('%s: the simulated cut agrees', (_, changes) => {
  const { core, findings } = hinged(changes);
  expect(findings.filter((of) => !of.startsWith('skins-meet'))).toEqual([]);
  expect(core.cut!.simulation.largestDeviationMm).toBeLessThanOrEqual(0.02);
});

test('a V at the root and a slit at the tip stay in step', () => {
  const { core } = hinged({ bevelDeg: 12 }, { kerfMm: { root: 0.2, tip: 2.4 } });
  const [feature] = core.features;
  expect(feature!.root.wire).toHaveLength(feature!.tip.wire.length);
  expect(feature!.root.walls).toHaveLength(feature!.tip.walls.length);
  expect(feature!.tip.walls.filter((of) => of !== null)).toHaveLength(1);
  expect(core.cut!.simulation.largestDeviationMm).toBeLessThanOrEqual(0.02);
});

test('no foam under the hinge is a finding with its field', () => {
  expect(hinged({ tipStation: 1 }).findings).toContain('outside-contour features.0.tipStation');
  expect(hinged({ webMm: 20 }).findings).toContain('outside-contour features.0.rootStation');
});
