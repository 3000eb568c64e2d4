import { expect, test } from 'vitest';
import { downloadNameOf } from '#geometry/cutting/files/names.ts';
import { NASTY_NAMES } from '../../formats/identity-example.ts';
import { PLAN, planWith } from '../plans.ts';

const nameOf = (sheetName: string, name: string, panel = PLAN.panel) =>
  downloadNameOf({ sheetName, versionNumber: 3 }, panel, name);

test.each([
  ['root.dxf', 'reed-wing_v3_root_220mm.dxf'],
  ['tip.dxf', 'reed-wing_v3_tip_160mm.dxf'],
  ['tip.dat', 'reed-wing_v3_tip_160mm.dat'],
  ['core.nc', 'reed-wing_v3_core_220-160mm.nc'],
  ['ribs-2.dxf', 'reed-wing_v3_ribs-2_220-160mm.dxf'],
  ['templates.pdf', 'reed-wing_v3_templates_220-160mm.pdf'],
  ['all.zip', 'reed-wing_v3_all_220-160mm.zip'],
])('%s is saved as %s', (name, saved) => {
  expect(nameOf('Reed wing', name)).toBe(saved);
});

test('one chord stands once, with at most three decimals; a name of which nothing is left is a sheet', () => {
  const chordMm = 215.12345;
  const panel = planWith({
    panel: { root: { ...PLAN.panel.root, chordMm }, tip: { ...PLAN.panel.tip, chordMm } },
  }).panel;
  expect(nameOf('翼', 'core.nc', panel)).toBe('sheet_v3_core_215.123mm.nc');
});

test('is short and safe on every system, whatever the sheet is called', () => {
  for (const sheetName of NASTY_NAMES)
    expect(nameOf(sheetName, 'ribs-1.dxf')).toMatch(
      /^[a-z0-9](?:[a-z0-9-]{0,38}[a-z0-9])?_v3_ribs-1_220-160mm\.dxf$/,
    );
});
