import fc from 'fast-check';
import { expect, test } from 'vitest';
import { areaOf, at, between, boxOf } from '#geometry/cutting/arrays.ts';
import { verticalCut } from '#geometry/cutting/feature-ends.ts';
import { type Feature, type Plan } from '#geometry/cutting/plan.ts';
import { type CorePlan, planCore } from '#geometry/cutting/planner.ts';
import { squareTipStation } from '#geometry/cutting/placing.ts';
import { distanceTo } from './measuring.ts';
import { PLAN, SLOT, TUBE, planWith, plans } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'core' };
const STRIP: Feature = { kind: 'strip', name: 'Web', rootStation: 0.33, tipStation: 0.33, widthMm: 3 };
const HINGE: Extract<Feature, { kind: 'hinge' }> = {
  kind: 'hinge',
  name: 'Aileron',
  hingeSurface: 'upper',
  rootStation: 0.75,
  tipStation: 0.75,
  bevelDeg: 40,
  webMm: 0.5,
};

function planned(
  features: readonly Feature[],
  changes: Parameters<typeof planWith>[0] = {},
): { core: CorePlan; plan: Plan; findings: string[] } {
  const plan = planWith({ ...changes, features: [...features] });
  const { core, findings } = planCore(plan, IDENTITY);
  return { core: core!, plan, findings: findings.map(({ code, path }) => `${code} ${path}`) };
}

test('a slot is upright, of constant width, as deep as asked at its middle, at both ends of a twisted panel', () => {
  const { core } = planned([{ ...SLOT, rootDepthMm: 3, tipDepthMm: 2 }]);
  const [feature] = core.features;
  for (const [end, depth] of [
    ['root', 3],
    ['tip', 2],
  ] as const) {
    const { outline } = feature![end];
    const box = boxOf(outline);
    expect(box.maxX - box.minX).toBeCloseTo(5, 9);
    const middle = (box.maxX + box.minX) / 2;
    expect(middle).toBeCloseTo(core.core.panel[end].toPanel({ x: 0.4, y: 0 }).x, 9);
    expect(verticalCut(core.core[end].core, middle)!.high - box.minY).toBeCloseTo(depth, 9);
    // Floor level, sides upright.
    expect(new Set(Array.from(outline.x, (x) => x.toFixed(9))).size).toBe(2);
    expect(areaOf(outline)).toBeGreaterThan(0);
  }
});

test('the wire keeps half the kerf inside the slot’s walls', () => {
  const { core } = planned([SLOT], { kerfMm: { root: 0.8, tip: 1.2 } });
  const [feature] = core.features;
  for (const [end, half] of [
    ['root', 0.4],
    ['tip', 0.6],
  ] as const) {
    const { outline, wire } = feature![end];
    const box = boxOf(outline);
    const xs = wire.map(({ x }) => x);
    expect(Math.max(...xs)).toBeCloseTo(box.maxX - half, 9);
    expect(Math.min(...xs)).toBeCloseTo(box.minX + half, 9);
    expect(Math.min(...wire.map(({ y }) => y))).toBeCloseTo(box.minY + half, 9);
  }
});

test('a slot as wide as the kerf is a slit, a narrower one a finding with its field', () => {
  expect(planned([{ ...SLOT, widthMm: 0.8 }]).findings).not.toContain(
    'narrower-than-kerf features.0.widthMm',
  );
  expect(planned([{ ...SLOT, widthMm: 0.7 }]).findings).toContain('narrower-than-kerf features.0.widthMm');
  expect(planned([{ ...TUBE, diameterMm: 0.8 }]).findings).toContain(
    'narrower-than-kerf features.0.diameterMm',
  );
});

test('a straight spar stays straight: its middle at any station is on the line between its ends', () => {
  const square = squareTipStation(PLAN.panel, 0.3);
  const { core } = planned([{ ...TUBE, rootStation: 0.3, tipStation: square }]);
  const [feature] = core.features;
  const middleX = (share: number) => {
    const box = boxOf(between(feature!.root.outline, feature!.tip.outline, share));
    return (box.minX + box.maxX) / 2;
  };
  // Square on the root face: the same x all along, although the panel sweeps and tapers.
  for (const share of [0, 0.2, 0.5, 1]) expect(middleX(share)).toBeCloseTo(66, 6);
});

test('a tube that leans is cut as the ellipse in which the face meets it', () => {
  const { core, plan } = planned([{ ...TUBE, diameterMm: 6 }], {
    panel: { sweepMm: 300 },
    block: { lengthMm: 600 },
  });
  const { outline } = core.features[0]!.root;
  const [root, tip] = [core.core.panel.root, core.core.panel.tip].map(
    (of) => of.toPanel({ x: 0.28, y: 0 }).x,
  );
  const lean = (tip! - root!) / plan.panel.spanMm;
  const box = boxOf(outline);
  expect(lean).toBeGreaterThan(0.4);
  expect((box.maxX - box.minX) / 6).toBeCloseTo(Math.hypot(1, lean), 2);
  // A cylinder of 6 mm: each point of the ellipse is 3 mm from the axis.
  const [cx, cy] = [(box.minX + box.maxX) / 2, (box.minY + box.maxY) / 2];
  outline.x.forEach((x, i) => {
    const [dx, dy] = [x - cx, at(outline.y, i) - cy];
    const along = (dx * lean) / Math.hypot(1, lean);
    expect(Math.sqrt(dx * dx + dy * dy - along * along)).toBeCloseTo(3, 1);
  });
});

test('the tube’s wire stays half the kerf inside it', () => {
  const { core } = planned([TUBE]);
  const { outline, wire } = core.features[0]!.root;
  expect(wire[0]).toEqual(wire.at(-1));
  for (const { x, y } of wire) expect(distanceTo(outline, x, y)).toBeCloseTo(0.4, 2);
});

test('slot, strip, tube, hinge and a slot with other stations at the tip: the simulated cut agrees', () => {
  const moved = { ...SLOT, surface: 'lower' as const, rootStation: 0.55, tipStation: 0.6 };
  const { core, findings } = planned(
    [SLOT, { ...TUBE, rootStation: 0.2, tipStation: 0.2 }, STRIP, HINGE, moved],
    {
      limits: { minimumWebMm: 0.4 },
    },
  );
  expect(findings.filter((of) => !of.startsWith('skins-meet'))).toEqual([]);
  expect(core.features).toHaveLength(5);
  expect(core.cut!.simulation.largestDeviationMm).toBeLessThanOrEqual(0.02);
});

test('random panels with a tube, a slot and a hinge: what has no error cuts as planned', () => {
  let clean = 0;
  fc.assert(
    fc.property(
      plans,
      fc.double({ min: 0.2, max: 0.5, noNaN: true }),
      fc.constantFrom('upper', 'lower'),
      (plan, station, surface) => {
        const slot = {
          ...SLOT,
          surface,
          rootStation: station,
          tipStation: station,
          rootDepthMm: 2.5,
          tipDepthMm: 2.5,
        };
        const features = [{ ...TUBE, rootStation: 0.6, tipStation: 0.6, diameterMm: 5 }, slot, HINGE];
        const { core, findings } = planCore(
          { ...plan, features, limits: { ...plan.limits, minimumWebMm: 0.3 } },
          IDENTITY,
        );
        const refused = findings.filter(
          ({ severity, path }) => severity === 'error' && path.startsWith('features'),
        );
        if (refused.length > 0) return;
        clean += 1;
        expect(core!.cut!.simulation.largestDeviationMm).toBeLessThanOrEqual(0.02);
      },
    ),
    { numRuns: 16 },
  );
  expect(clean).toBeGreaterThan(7);
}, 60_000);

test('two spars that pass through one another between the ends are a finding', () => {
  const crossing = { ...TUBE, rootStation: 0.45, tipStation: 0.3 };
  expect(
    planned([{ ...SLOT, rootDepthMm: 12, tipDepthMm: 8 }, crossing], { limits: { minimumWebMm: 0.3 } })
      .findings,
  ).toContain('features-overlap features.1.rootStation');
});

test('a slot shallower than half the kerf is a finding with its field', () => {
  expect(planned([{ ...SLOT, tipDepthMm: 0.3 }]).findings).toContain(
    'shallower-than-kerf features.0.tipDepthMm',
  );
});

test('a slot behind the trailing edge, one that breaks through, and a tube outside are findings with their field', () => {
  expect(planned([{ ...SLOT, tipStation: 0.995 }]).findings).toContain(
    'outside-contour features.0.tipStation',
  );
  expect(planned([{ ...SLOT, rootDepthMm: 30 }]).findings).toContain(
    'outside-contour features.0.rootDepthMm',
  );
  expect(planned([SLOT, { ...TUBE, tipHeightMm: 20 }]).findings).toContain(
    'outside-contour features.1.tipStation',
  );
  expect(planned([{ ...TUBE, diameterMm: 22 }]).findings.some((of) => of.startsWith('outside-contour'))).toBe(
    true,
  );
  expect(planned([{ ...HINGE, tipStation: 1 }]).findings).toContain('outside-contour features.0.tipStation');
});

test('too little foam beside a feature or between two is a finding', () => {
  expect(planned([{ ...TUBE, rootHeightMm: 8.7 }]).findings).toContain('web-too-thin features.0.rootStation');
  expect(planned([SLOT, { ...SLOT, rootStation: 0.41, tipStation: 0.41 }]).findings).toContain(
    'features-overlap features.1.rootStation',
  );
});
