import { expect, test } from 'vitest';
import {
  SIGNATURES,
  cautionNotes,
  featureTable,
  findingNotes,
  inspectionTable,
  ribTable,
} from '#geometry/pages/cut-sheet/tables.ts';
import { PLANS, planned } from '../samples.ts';

const planOf = (name: keyof typeof PLANS) => planned(PLANS[name]).plan;

test('features by number, with their place from the nose at both ends', () => {
  const table = featureTable(planOf('tapered and swept'))!;
  expect(table.rows).toHaveLength(2);
  expect(table.rows[0]!.slice(0, 7)).toEqual([
    '1',
    'Tube',
    'Main tube',
    'lower',
    'Ø 6',
    '28 %, 61.6',
    '28 %, 44.8',
  ]);
  expect(table.rows[1]!.slice(0, 5)).toEqual(['2', 'Slot', 'Cap', 'upper', '5 × 2']);
  expect(featureTable(planOf('small'))).toBeNull();
});

test('every rib with its sheet', () => {
  const plan = planOf('ribs alone');
  const table = ribTable(plan)!;
  expect(table.rows.map(([number]) => Number(number))).toEqual(plan.ribs!.ribs.map(({ number }) => number));
  for (const row of table.rows) expect(row.at(-1)).toMatch(/^\d+(?:, turned)?$/);
  expect(ribTable(planOf('by hand'))).toBeNull();
});

test('the inspection leaves blanks beside what the caliper must show', () => {
  const plan = planOf('tapered and swept');
  const table = inspectionTable(plan);
  expect(table.byHand).toBe(true);
  table.rows.forEach((row, i) => {
    const { nominalMm, toleranceMm } = plan.inspection[i]!;
    expect(Number(row[3])).toBeCloseTo(nominalMm, 2);
    expect(Number(row[5]) - Number(row[4])).toBeCloseTo(2 * toleranceMm, 1);
    expect(row.slice(6)).toEqual(['', '']);
  });
  expect(inspectionTable(planOf('ribs alone')).title).toContain('ribs without sheeting');
  expect(SIGNATURES.rows.map(([work]) => work)).toEqual(['Cut', 'Measured']);
});

test('cautions for what is done: no wire in ribs alone, no machine by hand', () => {
  const words = (name: keyof typeof PLANS) =>
    cautionNotes(planOf(name))
      .sentences.map((of) => of.words)
      .join(' ');
  expect(words('tapered and swept')).toMatch(/Hot wire.*Fumes.*Machine.*estimates/);
  expect(words('by hand')).not.toContain('Machine:');
  expect(words('ribs alone')).not.toContain('Hot wire');
  expect(words('ribs alone')).toContain('laser or router');
});

test('errors before warnings, notes left out', () => {
  const of = (severity: 'error' | 'warning' | 'note', message: string) => ({
    severity,
    message,
    code: 'a',
    path: 'b',
  });
  const notes = findingNotes([of('warning', 'W.'), of('note', 'N.'), of('error', 'E.')])!;
  expect(notes.sentences).toEqual([
    { before: 'Error', words: 'E.' },
    { before: 'Warning', words: 'W.' },
  ]);
  expect(findingNotes([of('note', 'N.')])).toBeNull();
});
