// @vitest-environment node
import { expect, test } from 'vitest';
import { boxOf } from '#geometry/cutting/arrays.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { NEW_RIBS } from '#client/cut-sheets/planner/new-parts.ts';
import { buffersOf, modelOf } from '#client/cut-sheets/views/plan-model.ts';
import { workOut } from '#client/cut-sheets/views/work-out.ts';
import { PLAN as FINE } from '#tests/geometry/cutting/plans.ts';

/** Coarse, so that the tests take little time. */
const PLAN = { ...FINE, cut: { ...FINE.cut, toleranceMm: 0.3, pointsPerSurface: 12 } };
const IDENTITY = { sheetName: 'Heron left', versionNumber: 1, checksum: 'draft', part: 'core' };
const { core } = planCore(PLAN, IDENTITY);
const model = modelOf(core!);

test('a model can be handed over by a worker, every buffer of it once', () => {
  const buffers = [...buffersOf(model)];
  const copy = structuredClone(modelOf(core!), {});
  expect(copy).toEqual(model);
  expect(new Set(buffers).size).toBe(buffers.length);
  expect(buffers.length).toBeGreaterThan(10);
});

test('the clock of the cut is that of the program, with its waits', () => {
  const { cut } = model;
  expect(cut!.totalSeconds).toBeCloseTo(core!.cut!.program.totalSeconds, 9);
  const waits = cut!.arrives.reduce((sum, at, i) => sum + cut!.leaves[i]! - at, 0);
  expect(waits).toBeCloseTo(PLAN.cut.warmUpS, 9);
});

test('a plan without a machine has a drawing and no cut', () => {
  const { model: byHand } = workOut({ ...PLAN, machine: null }, IDENTITY);
  expect(byHand).toMatchObject({ cut: null });
  expect(byHand!.root.core.x.length).toBeGreaterThan(20);
});

test('a plan of which nothing is left says why', () => {
  const { model: none, findings } = workOut({ ...PLAN, allowances: { upperMm: 20, lowerMm: 20 } }, IDENTITY);
  expect(none).toBeNull();
  expect(findings[0]).toMatchObject({ severity: 'error', code: 'skin-thicker-than-section' });
});

test('ribs lie on their sheet within its border, turned or not, as the packing has them', () => {
  const { sheet } = NEW_RIBS;
  const rules = { ...NEW_RIBS, sheet: { ...sheet, widthMm: 260, heightMm: 240 } };
  const { core: ribbed } = planCore({ ...PLAN, features: [], ribs: rules }, IDENTITY);
  const { ribs } = modelOf(ribbed!);
  const turned = ribbed!.ribs!.layout.places.filter((place) => place.turned);
  expect(turned.length).toBeGreaterThan(0);
  expect(turned.length).toBeLessThan(8);
  expect(ribs!.placed.map(({ number }) => number)).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
  for (const { cuts, holes } of ribs!.placed) {
    const { minX, maxX, minY, maxY } = boxOf(...cuts);
    expect(minX).toBeGreaterThanOrEqual(sheet.borderMm - 1e-9);
    expect(minY).toBeGreaterThanOrEqual(sheet.borderMm - 1e-9);
    expect(maxX).toBeLessThanOrEqual(260 - sheet.borderMm + 1e-9);
    expect(maxY).toBeLessThanOrEqual(240 - sheet.borderMm + 1e-9);
    for (const { x, y, radius } of holes) {
      expect(x - radius).toBeGreaterThan(minX);
      expect(x + radius).toBeLessThan(maxX);
      expect(y - radius).toBeGreaterThan(minY);
      expect(y + radius).toBeLessThan(maxY);
    }
  }
});
