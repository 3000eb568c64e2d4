import { expect, test } from 'vitest';
import { PLAN_LIMITS } from '#geometry/cutting/plan.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { PLAN, RIBS, SLOT, TEMPLATE, TUBE, section } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'core' };
const rootChord = (chordMm: number) => ({ panel: { ...PLAN.panel, root: { ...PLAN.panel.root, chordMm } } });
const tipChord = (chordMm: number) => ({ panel: { ...PLAN.panel, tip: { ...PLAN.panel.tip, chordMm } } });
const controller = (changes: object) => ({
  machine: { ...PLAN.machine, controller: { ...PLAN.machine.controller, ...changes } },
});

/** What is wrong, the change that makes it so, the field that must be named. */
const bad: [string, object, string][] = [
  ['a chord of 1 mm', rootChord(1), 'panel.root.chordMm'],
  ['a chord of 5,000 mm', tipChord(5000), 'panel.tip.chordMm'],
  ['zero span', { panel: { ...PLAN.panel, spanMm: 0 } }, 'panel.spanMm'],
  ['a span that is not a number', { panel: { ...PLAN.panel, spanMm: NaN } }, 'panel.spanMm'],
  ['a skin thicker than the section', { allowances: { upperMm: 15, lowerMm: 15 } }, 'allowances.upperMm'],
  [
    'a lower skin thicker than the section',
    { allowances: { upperMm: 14, lowerMm: 15 } },
    'allowances.lowerMm',
  ],
  [
    'a slot outside the contour',
    { features: [{ ...SLOT, rootStation: 1, tipStation: 1 }] },
    'features.0.rootStation',
  ],
  [
    'a slot outside the contour at the tip alone',
    { features: [{ ...SLOT, tipStation: 0 }] },
    'features.0.tipStation',
  ],
  ['a slot deeper than the section', { features: [{ ...SLOT, tipDepthMm: 40 }] }, 'features.0.tipDepthMm'],
  ['a tube outside the contour', { features: [{ ...TUBE, rootHeightMm: 90 }] }, 'features.0.rootStation'],
  ['a tip larger than the block', tipChord(400), 'block.lengthMm'],
  ['a tip higher than the block', { block: { ...PLAN.block, heightMm: 12 } }, 'block.heightMm'],
  ['a block shorter than the panel', { block: { ...PLAN.block, spanMm: 599 } }, 'block.spanMm'],
  [
    'towers closer than the panel',
    { machine: { ...PLAN.machine, towerDistanceMm: 300 } },
    'machine.towerDistanceMm',
  ],
  [
    'a panel beside the towers',
    { machine: { ...PLAN.machine, blockFromLeftMm: -20 } },
    'machine.blockFromLeftMm',
  ],
  ['a machine without a block', { block: null }, 'block'],
  ['a machine without a material', { material: null }, 'material'],
  ['a text for a kerf', { kerfMm: { root: '0.8', tip: 0.8 } }, 'kerfMm.root'],
  [
    'two axes of one letter',
    controller({ axes: { leftX: 'X', leftY: 'Y', rightX: 'X', rightY: 'V' } }),
    'machine.controller.axes',
  ],
  ['a header line that is no code', controller({ header: ['M3\nG28'] }), 'machine.controller.header.0'],
  [
    'a shape that its schema refuses',
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
  [
    'ribs larger than their sheet',
    { ribs: { ...RIBS, sheet: { ...RIBS.sheet, widthMm: 100, heightMm: 60 } } },
    'ribs.sheet.widthMm',
  ],
  [
    'a pin outside the template',
    { template: { ...TEMPLATE, pinStations: [0.3, 1] } },
    'template.pinStations.1',
  ],
  ['no inspection station', { inspection: { ...PLAN.inspection, stations: [] } }, 'inspection.stations'],
];

test.each(bad)('%s is an error with its field and a sentence', (_, changes, path) => {
  const { findings } = planCore({ ...PLAN, ...changes }, IDENTITY);
  const found = findings.filter((finding) => finding.severity === 'error' && finding.path === path);
  expect(found.length).toBeGreaterThan(0);
  for (const { message } of found) {
    expect(message).toMatch(/^[A-Z][^\n]*\.$/);
    expect(message).not.toMatch(/NaN|Infinity|undefined|null/);
  }
});

test('one bad value does not hide another, and the good ones go on', () => {
  const { core, findings } = planCore({ ...PLAN, ...rootChord(1), kerfMm: { root: -1, tip: 0.8 } }, IDENTITY);
  expect(core).toBeNull();
  expect(findings.map(({ path }) => path).sort()).toEqual(['kerfMm.root', 'panel.root.chordMm']);
  const beside = planCore({ ...PLAN, machine: { ...PLAN.machine, towerDistanceMm: 300 } }, IDENTITY);
  expect(beside.core).toMatchObject({ cut: null, fit: { places: [{ mirrored: false }] } });
});

test.each([[null], [undefined], [42], ['plan'], [[]], [{}]])(
  '%j instead of a plan is refused, not thrown',
  (values) => {
    const { core, findings } = planCore(values, IDENTITY);
    expect(core).toBeNull();
    expect(findings.length).toBeGreaterThan(0);
  },
);

test('chords from 10 to 4,000 mm are taken, none beside', () => {
  const { min, max } = PLAN_LIMITS.chordMm;
  expect([min, max]).toEqual([10, 4000]);
  const refused = (chordMm: number) =>
    planCore({ ...PLAN, ...rootChord(chordMm) }, IDENTITY).findings.filter(
      ({ code }) => code === 'bad-value',
    );
  for (const chordMm of [min, max]) expect(refused(chordMm)).toEqual([]);
  for (const chordMm of [min - 0.001, max + 0.001, -200, Infinity]) {
    expect(refused(chordMm)).toMatchObject([
      { path: 'panel.root.chordMm', message: 'The root chord must be between 10 and 4000 mm.' },
    ]);
  }
});

test('a tip of another shape that crosses itself is refused with its field', () => {
  const shape = { ...section('2412'), maxCamber: 0.11, maxThickness: 0.01, maxCamberPosition: 0.02 };
  const { findings } = planCore(
    { ...PLAN, panel: { ...PLAN.panel, tip: { shape, chordMm: 160 } } },
    IDENTITY,
  );
  expect(findings[0]).toMatchObject({ severity: 'error', code: 'bad-value' });
  expect(findings[0]!.path).toMatch(/^panel\.tip\.shape/);
});
