import { expect, test } from 'vitest';
import { settingsTable } from '#geometry/pages/cut-sheet/settings-table.ts';
import { PLANS, SHEET, planned } from '../samples.ts';

const settings = (name: keyof typeof PLANS) =>
  new Map(settingsTable(planned(PLANS[name]).plan, SHEET).rows.map(([label, value]) => [label, value]));

test('what the machine is set to', () => {
  const of = settings('tapered and swept');
  expect(of.get('Kerf, root and tip')).toBe('0.8 and 0.8 mm');
  expect(of.get('Skin, upper and lower')).toBe('1 and 1 mm');
  expect(of.get('Washout, vertical offset')).toBe('2° about 25 %, 4 mm');
  expect(of.get('Material')).toBe('EPS 20, 20 kg/m³');
  expect(of.get('Block, along chord, span, high')).toBe('260 × 600 × 60 mm');
  expect(of.get('Machine')).toBe('Long bench');
  expect(of.get('Feed, limit of the material')).toBe('240, 300 mm/min');
  expect(of.get('Root face, trailing edge')).toBe('left, towards the origin');
  expect(of.get('Slower end, melts more')).toMatch(/^tip, ratio 1\.3\d$/);
});

test('only what belongs to the plan', () => {
  const ribs = settings('ribs alone');
  expect(ribs.get('Rib material')).toBe('Balsa 3 mm, 3 mm thick');
  for (const label of ['Kerf, root and tip', 'Material', 'Machine', 'Feed, limit of the material'])
    expect(ribs.has(label)).toBe(false);
  expect(settings('by hand').get('Machine')).toBe('none: cut by hand along the templates');
  expect(settings('pair in two passes').get('Cores in the block')).toBe('2');
});

test('the names of the version count before those of the plan', () => {
  const { plan } = planned(PLANS['tapered and swept']);
  const names = { ...SHEET, machineName: 'Other bench', materialName: null };
  const of = new Map(settingsTable(plan, names).rows.map(([label, value]) => [label, value]));
  expect(of.get('Machine')).toBe('Other bench');
  expect(of.get('Material')).toBe('EPS 20, 20 kg/m³');
});
