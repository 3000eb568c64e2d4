import fc from 'fast-check';
import { expect, test } from 'vitest';
import { cutSheetPages } from '#geometry/pages/cut-sheet/cut-sheet-pages.ts';
import { PLAN, RIBS, SLOT, TEMPLATE, planWith, plans } from '#tests/geometry/cutting/plans.ts';
import { faultsOf, wordsOf } from '../checking.ts';
import { DETAILS, HOSTILE_NAMES, PLANS, SHEET, namedSheet, names, planned } from '../samples.ts';

/** Whole plans are worked out here; on a busy machine that takes its time, in ms. */
const PATIENCE = 20_000;

test.each(Object.entries(PLANS))(
  '%s: nothing overlaps and nothing is cut off',
  (_, of) => {
    const { plan, findings } = planned(of);
    const pages = cutSheetPages(plan, findings, SHEET, DETAILS);
    expect(pages.length).toBeGreaterThan(1);
    for (const page of pages) expect(faultsOf(page)).toEqual([]);
  },
  PATIENCE,
);

test(
  'a small panel stands on A4, others on A3',
  () => {
    const width = (name: keyof typeof PLANS) => {
      const { plan, findings } = planned(PLANS[name]);
      return new Set(cutSheetPages(plan, findings, SHEET, DETAILS).map(({ widthMm }) => widthMm));
    };
    expect([...width('small')]).toEqual([297]);
    expect([...width('tapered and swept')]).toEqual([420]);
  },
  PATIENCE,
);

test('the sheets carry views, tables, cautions and the title block', () => {
  const { plan, findings } = planned(PLANS['tapered and swept']);
  const pages = cutSheetPages(plan, findings, SHEET, DETAILS);
  const words = pages.map(({ marks }) => wordsOf(marks));
  expect(words[0]).toContain('Planform 1 : 2, washout 2°');
  expect(words[0]).toContain('Root face in the block 1 : 2');
  for (const of of ['600.0', '220.0', '160.0', '61.6', '44.8', '30.0']) expect(words[0]).toContain(of);
  for (const of of ['Cautions', 'Settings', 'Spars, tubes and hinges', 'Cut and measured'])
    expect(words[1]).toContain(of);
  expect(words[1]).toContain('Inspection, thickness of the bare core, mm');
  words.forEach((of, i) => expect(of).toContain(`${i + 1} / ${pages.length}`));
  expect(words[0]!.join(' ')).toContain('it burns skin');
});

test('errors and warnings stand on the sheet, notes do not', () => {
  const { plan, findings } = planned(PLANS.small);
  const words = cutSheetPages(plan, findings, SHEET, DETAILS).flatMap(({ marks }) => wordsOf(marks));
  const shown = findings.filter(({ severity }) => severity !== 'note');
  expect(shown.length).toBeGreaterThan(1);
  for (const { message } of shown) expect(words.join(' ')).toContain(message);
  expect(words).toContain('Warning');
  expect(words).not.toContain('Note');
});

test('a sheet that is not released says so in large type', () => {
  const { plan, findings } = planned(PLANS['by hand']);
  const [page] = cutSheetPages(plan, findings, { ...SHEET, status: 'draft' }, DETAILS);
  expect(wordsOf(page!.marks)).toContain('draft: not for cutting');
});

test(
  'as many features and ribs as a plan may have go on over several pages',
  () => {
    const features = Array.from({ length: 24 }, (_, i) => ({
      ...SLOT,
      name: `Stringer ${i + 1}`,
      rootStation: 0.1 + 0.032 * i,
      tipStation: 0.1 + 0.032 * i,
      widthMm: 1.5,
      rootDepthMm: 1,
      tipDepthMm: 1,
    }));
    const ribs = {
      ...RIBS,
      stations: { kind: 'count' as const, count: 40 },
      jigTabs: null,
      lighteningHoles: null,
    };
    const { plan, findings } = planned(planWith({ ...PLAN, features, ribs, template: TEMPLATE }));
    const pages = cutSheetPages(plan, findings, SHEET, DETAILS);
    expect(pages.length).toBeGreaterThan(2);
    for (const page of pages) expect(faultsOf(page)).toEqual([]);
    const words = pages.flatMap(({ marks }) => wordsOf(marks));
    for (const { name } of features) expect(words).toContain(name);
    expect(words).toContain('Ribs, continued');
    expect(words).toContain('40');
  },
  PATIENCE,
);

test.each(HOSTILE_NAMES)('a name as nobody should give it: %s', (name) => {
  const { plan, findings } = planned(PLANS['pair in two passes']);
  for (const page of cutSheetPages(plan, findings, namedSheet(name), { ...DETAILS, owner: name }))
    expect(faultsOf(page)).toEqual([]);
});

const extreme = (root: number, tip: number, spanMm: number, sweepMm: number, pair = false) =>
  planWith({
    panel: {
      root: { shape: PLAN.panel.root.shape, chordMm: root },
      tip: { shape: PLAN.panel.tip.shape, chordMm: tip },
      spanMm,
      sweepMm,
    },
    allowances: { upperMm: 0, lowerMm: 0 },
    features: [],
    block: { lengthMm: 75, heightMm: 64, spanMm, pair },
    machine: { towerDistanceMm: spanMm + 400 },
    template: TEMPLATE,
  });

test.each([
  ['a chord of 10 mm', extreme(10, 10, 2, 0)],
  ['a tip swept far away', extreme(60, 12, 100, -3000)],
  ['a long narrow panel', extreme(20, 40, 4000, 10)],
  ['two thin cores in a small block', extreme(60, 38, 128, 0, true)],
  ['two cores whose wires begin close together', extreme(60, 120, 156, 0, true)],
])('%s: nothing overlaps', (_, of) => {
  const { plan, findings } = planned(of);
  for (const page of cutSheetPages(plan, findings, SHEET, DETAILS)) expect(faultsOf(page)).toEqual([]);
});

test(
  'ordinary plans: nothing overlaps, and the same plan gives the same pages',
  () => {
    fc.assert(
      fc.property(plans, names, (of, name) => {
        const { plan, findings } = planned(of);
        const pages = cutSheetPages(plan, findings, namedSheet(name), DETAILS);
        for (const page of pages) expect(faultsOf(page)).toEqual([]);
        expect(cutSheetPages(plan, findings, namedSheet(name), DETAILS)).toEqual(pages);
      }),
      { numRuns: 6 },
    );
  },
  PATIENCE,
);
