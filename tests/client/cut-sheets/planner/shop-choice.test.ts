// @vitest-environment node
import { expect, test } from 'vitest';
import { valuesOf } from '#client/cut-sheets/planner/plan-values.ts';
import { kerfWords, withRibChoice, withShopChoice } from '#client/cut-sheets/planner/shop-choice.ts';
import { expandedFoam, laser, plywood } from '#server/contracts/shop-samples.ts';
import { bench, bow, foam, kerf } from '#tests/client/shop/samples.ts';
import { idOf } from '#tests/client/support/samples.ts';
import { NEW_RIBS } from '#client/cut-sheets/planner/new-parts.ts';
import { PLAN } from './samples.ts';

const expanded = { ...foam, id: idOf(22), settings: { ...expandedFoam, blockLengthMm: 250 } };
const shop = {
  materials: [foam, expanded],
  kerfs: [
    kerf,
    { ...kerf, machineId: bow.id, kerfMm: 1.2 },
    { ...kerf, materialId: expanded.id, kerfMm: 0.95 },
  ],
};

test('the kerf of machine and foam goes to both ends', () => {
  const values = withShopChoice(valuesOf(PLAN), 'machineId', bow.id, shop);
  expect(values).toMatchObject({ machineId: bow.id, kerfMm: { root: 1.2, tip: 1.2 } });
});

test('where no kerf is known, that of the plan stays', () => {
  const values = withShopChoice(valuesOf(PLAN), 'machineId', null, shop);
  expect(values).toMatchObject({ machineId: null, kerfMm: PLAN.kerfMm });
});

test('a foam brings its height, and no block is longer than it comes', () => {
  const values = withShopChoice(valuesOf(PLAN), 'materialId', expanded.id, shop);
  expect(values).toMatchObject({
    kerfMm: { root: 0.95, tip: 0.95 },
    block: { lengthMm: 250, heightMm: 100, spanMm: 600 },
  });
});

test('without a block nothing of it is set', () => {
  const values = withShopChoice(valuesOf({ ...PLAN, block: null }), 'materialId', foam.id, shop);
  expect(values['block']).toBeNull();
});

test('a sheet for ribs is no larger than the bed of the machine', () => {
  const machine = { ...bench, id: idOf(14), settings: { ...laser, sheetWidthMm: 400 } };
  const material = { ...foam, id: idOf(23), settings: plywood };
  const values = withRibChoice(
    valuesOf({ ...PLAN, ribs: NEW_RIBS, ribMachineId: machine.id }),
    'ribMaterialId',
    material.id,
    {
      machines: [machine],
      materials: [material],
    },
  );
  expect(values['ribs']).toMatchObject({ materialThicknessMm: 2, sheet: { widthMm: 400, heightMm: 300 } });
});

test('says whether anybody measured the kerf', () => {
  expect(kerfWords(null)).toContain('test strip');
  expect(kerfWords(kerf)).toContain('must confirm');
  expect(kerfWords({ ...kerf, isDefault: false, measuredOn: '2026-03-01' })).toContain('2026-03-01');
});
