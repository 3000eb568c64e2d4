import { expect, test } from 'vitest';
import {
  controllerSchema,
  featureSchema,
  hasFoam,
  hasWire,
  inspectionSchema,
  planSchema,
} from '#geometry/cutting/plan.ts';
import { PLAN, RIBS, SLOT, TEMPLATE, TUBE } from './plans.ts';

const paths = (values: unknown) =>
  planSchema.safeParse(values).error?.issues.map(({ path }) => path.join('.')) ?? [];

test('a plan of all parts, one of ribs alone and one cut by hand are taken as they are', () => {
  for (const plan of [
    { ...PLAN, ribs: RIBS, template: TEMPLATE },
    { ...PLAN, machine: null, block: null, material: null, ribs: RIBS },
    { ...PLAN, machine: null, template: TEMPLATE },
  ])
    expect(planSchema.parse(structuredClone(plan))).toEqual(plan);
});

test('what is there is told from what is not', () => {
  const parts = (plan: typeof PLAN) => [hasFoam(plan), hasWire(plan)];
  expect(parts(PLAN)).toEqual([true, true]);
  expect(parts({ ...PLAN, machine: null as never })).toEqual([true, false]);
  expect(parts({ ...PLAN, material: null as never })).toEqual([false, false]);
  expect(parts({ ...PLAN, block: null as never })).toEqual([false, false]);
});

test('each part must be there, null or not', () => {
  const all = { ...PLAN };
  for (const key of Object.keys(all)) {
    const without = Object.fromEntries(Object.entries(all).filter(([of]) => of !== key));
    expect(paths(without)).toEqual([key]);
  }
});

test('a feature takes the fields of its kind alone', () => {
  expect(featureSchema.safeParse({ ...SLOT, diameterMm: 3 }).success).toBe(false);
  expect(featureSchema.safeParse({ ...TUBE, widthMm: 3 }).success).toBe(false);
  expect(paths({ ...PLAN, features: Array(25).fill(SLOT) })).toEqual(['features']);
});

test('lines of the controller are words or one comment, nothing that could hide a move', () => {
  const { controller } = PLAN.machine;
  const taken = (line: string) => controllerSchema.safeParse({ ...controller, header: [line] }).success;
  for (const line of ['M3 S500', 'M3 S450 (wire on)', '(fan on)', '', 'G4 P2.5'])
    expect(taken(line)).toBe(true);
  for (const line of ['m3', 'M3; G0', 'M3\nG0 X9', '(a) G0 X9', '(a', 'M', '%'])
    expect(taken(line)).toBe(false);
});

test('inspection stations lie from 2 to 98 %, tolerances from 0.01 to 5 mm', () => {
  const taken = (changes: object) => inspectionSchema.safeParse({ ...PLAN.inspection, ...changes }).success;
  expect([
    taken({ stations: [0.02, 0.98] }),
    taken({ toleranceMm: 0.01 }),
    taken({ toleranceMm: 5 }),
  ]).toEqual([true, true, true]);
  for (const changes of [
    { stations: [0.019] },
    { stations: [0.981] },
    { toleranceMm: 0.009 },
    { toleranceMm: 5.1 },
    { measured: 'skin' },
  ])
    expect(taken(changes)).toBe(false);
});
