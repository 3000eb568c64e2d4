import fc from 'fast-check';
import { expect, test } from 'vitest';
import { ENDS, PLAN_LIMITS } from '#geometry/cutting/plan.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { shapes } from '#tests/geometry/shapes/samples.ts';
import { crossingsByHand } from './measuring.ts';
import { PLAN, RIBS, TEMPLATE, plans, planWith } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'core' };

test('the tapered panel of the shop: notes alone, and a cut that agrees', () => {
  const { core, findings } = planCore(PLAN, IDENTITY);
  expect(findings.map(({ severity, code, at }) => [severity, code, at?.end])).toEqual([
    ['note', 'skins-meet', 'root'],
    ['note', 'skins-meet', 'tip'],
  ]);
  const [root, tip] = core!.core.skinsMeet;
  // Two skins of 1 mm, the slopes of the surfaces within 1 %: the section is 2 mm thick where they meet.
  for (const meeting of [root!, tip!]) expect(meeting.thicknessMm).toBeCloseTo(2, 1);
  expect(tip!.station).toBeLessThan(root!.station);
});

test('random plans: in step, no crossing, the simulator agrees', () => {
  fc.assert(
    fc.property(plans, (plan) => {
      const { core, findings } = planCore(plan, IDENTITY);
      expect(findings.filter(({ severity }) => severity === 'error')).toEqual([]);
      const { panel, root, tip } = core!.core;
      for (const line of [root.core, root.path, tip.core, tip.path]) {
        expect(line.x).toHaveLength(panel.chain.station.length);
        expect(line.y).toHaveLength(panel.chain.station.length);
        expect([...line.x, ...line.y].every(Number.isFinite)).toBe(true);
        expect(crossingsByHand(line)).toBe(0);
      }
      const { path, simulation } = core!.cut!;
      expect(path.left.x).toHaveLength(path.right.x.length);
      expect(simulation.deviations).toHaveLength(7);
      expect(simulation.largestDeviationMm).toBeLessThanOrEqual(0.02);
    }),
    { numRuns: 60, seed: 31 },
  );
}, 120_000);

test('the same plan gives the same program, byte for byte, and the same findings', () => {
  fc.assert(
    fc.property(plans, (plan) => {
      const [one, two] = [planCore(plan, IDENTITY), planCore(structuredClone(plan), IDENTITY)];
      expect(two.core!.cut!.program.text).toBe(one.core!.cut!.program.text);
      expect(two.findings).toEqual(one.findings);
    }),
    { numRuns: 10, seed: 32 },
  );
}, 60_000);

test('any accepted shapes and sizes end in finite numbers or findings, never in an exception', () => {
  fc.assert(
    fc.property(
      shapes,
      shapes,
      fc.double({ min: 10, max: 4000, noNaN: true }),
      fc.double({ min: 10, max: 4000, noNaN: true }),
      fc.double({ min: 0, max: 20, noNaN: true }),
      fc.double({ min: 0, max: 6, noNaN: true }),
      (root, tip, rootChord, tipChord, skin, kerf) => {
        const plan = planWith({
          panel: { root: { shape: root, chordMm: rootChord }, tip: { shape: tip, chordMm: tipChord } },
          allowances: { upperMm: skin, lowerMm: skin / 2 },
          kerfMm: { root: kerf, tip: kerf / 3 },
          ribs: RIBS,
          template: TEMPLATE,
        });
        const { core, findings } = planCore(plan, IDENTITY);
        for (const { message, path } of findings) {
          expect(message).not.toMatch(/NaN|Infinity|undefined/);
          expect(path).not.toBe('');
        }
        if (!core) return;
        for (const end of ENDS) {
          expect([...core.core[end].path.x, ...core.core[end].core.y].every(Number.isFinite)).toBe(true);
        }
        expect(core.cut?.program.text ?? '').not.toMatch(/NaN|Infinity/);
      },
    ),
    { numRuns: 40, seed: 33 },
  );
}, 120_000);

const bad: [string, unknown, string][] = [
  [
    'a chord of 1 mm',
    { panel: { ...PLAN.panel, root: { ...PLAN.panel.root, chordMm: 1 } } },
    'panel.root.chordMm',
  ],
  [
    'a chord of 5000 mm',
    { panel: { ...PLAN.panel, tip: { ...PLAN.panel.tip, chordMm: 5000 } } },
    'panel.tip.chordMm',
  ],
  ['no span', { panel: { ...PLAN.panel, spanMm: 0 } }, 'panel.spanMm'],
  ['a span that is not a number', { panel: { ...PLAN.panel, spanMm: NaN } }, 'panel.spanMm'],
  ['a text for a kerf', { kerfMm: { root: '0.8', tip: 0.8 } }, 'kerfMm.root'],
  ['a skin thicker than the section', { allowances: { upperMm: 15, lowerMm: 15 } }, 'allowances.upperMm'],
  [
    'a slot outside the contour',
    { features: [{ ...PLAN.features[1], rootStation: 1, tipStation: 1 }] },
    'features.0.rootStation',
  ],
  [
    'a tip larger than the block',
    { panel: { ...PLAN.panel, tip: { ...PLAN.panel.tip, chordMm: 400 } } },
    'block.lengthMm',
  ],
  [
    'towers closer than the panel',
    { machine: { ...PLAN.machine, towerDistanceMm: 300 } },
    'machine.towerDistanceMm',
  ],
  [
    'two axes of one letter',
    {
      machine: {
        ...PLAN.machine,
        controller: {
          ...PLAN.machine.controller,
          axes: { leftX: 'X', leftY: 'Y', rightX: 'X', rightY: 'V' },
        },
      },
    },
    'machine.controller.axes',
  ],
  [
    'a header line that is no code',
    { machine: { ...PLAN.machine, controller: { ...PLAN.machine.controller, header: ['M3\nG28'] } } },
    'machine.controller.header.0',
  ],
  [
    'a shape that crosses itself',
    {
      panel: {
        ...PLAN.panel,
        root: { ...PLAN.panel.root, shape: { ...PLAN.panel.root.shape, maxThickness: 9 } },
      },
    },
    'panel.root.shape.maxThickness',
  ],
  ['a field it does not know', { surprise: 1 }, 'surprise'],
  [
    'stocks that leave nothing',
    { stock: { leadingEdgeStation: 0.6, trailingEdgeStation: 0.5 } },
    'stock.trailingEdgeStation',
  ],
];

test.each(bad)('%s is an error with its field and a sentence', (_, changes, path) => {
  const { findings } = planCore({ ...PLAN, ...(changes as object) }, IDENTITY);
  const found = findings.filter((finding) => finding.severity === 'error' && finding.path === path);
  expect(found.length).toBeGreaterThan(0);
  for (const { message } of found) expect(message).toMatch(/^[A-Z][^\n]*\.$/);
});

test.each([[null], [undefined], [42], ['plan'], [[]], [{}]])(
  '%j instead of a plan is refused, not thrown',
  (values) => {
    const { core, findings } = planCore(values, IDENTITY);
    expect(core).toBeNull();
    expect(findings.length).toBeGreaterThan(0);
  },
);

test('the limits of the schema are those it states', () => {
  const { min, max } = PLAN_LIMITS.chordMm;
  const of = (chordMm: number) =>
    planCore(
      { ...PLAN, panel: { ...PLAN.panel, root: { ...PLAN.panel.root, chordMm } } },
      IDENTITY,
    ).findings.filter(({ code }) => code === 'bad-value');
  expect(of(min)).toEqual([]);
  expect(of(max)).toEqual([]);
  expect(of(min - 0.001)).toHaveLength(1);
});

test('bare foam that runs out to less than the least trailing edge is warned of', () => {
  const { findings } = planCore(planWith({ allowances: { upperMm: 0, lowerMm: 0 } }), IDENTITY);
  expect(findings.filter(({ code }) => code === 'thin-trailing-edge')).toHaveLength(2);
});

test('stock at both edges: cut square, and the simulated cut agrees', () => {
  const plan = planWith({ stock: { leadingEdgeStation: 0.05, trailingEdgeStation: 0.72 } });
  const { core, findings } = planCore(plan, IDENTITY);
  expect(findings.filter(({ severity }) => severity === 'error')).toEqual([]);
  expect(core!.cut!.simulation.largestDeviationMm).toBeLessThanOrEqual(0.02);
});

test('unequal skins are scarfed behind the nose, and the simulated cut agrees', () => {
  const { core, findings } = planCore(planWith({ allowances: { upperMm: 0.4, lowerMm: 1.2 } }), IDENTITY);
  expect(findings.filter(({ severity }) => severity === 'error')).toEqual([]);
  expect(core!.cut!.simulation.largestDeviationMm).toBeLessThanOrEqual(0.02);
});
