// @vitest-environment node
import { expect, test } from 'vitest';
import { planCore } from '#geometry/cutting/planner.ts';
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
