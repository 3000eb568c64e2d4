import { expect, test } from 'vitest';
import { checkParts } from '#geometry/cutting/parts.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { PLAN, RIBS, TEMPLATE } from './plans.ts';

const IDENTITY = { sheetName: 'Reed wing', versionNumber: 1, checksum: 'abc', part: 'core' };
const BY_HAND: Plan = { ...PLAN, machine: null, template: TEMPLATE };
const RIBS_ALONE: Plan = { ...PLAN, machine: null, block: null, material: null, ribs: RIBS };
const severe = (plan: Plan) =>
  planCore(plan, IDENTITY).findings.filter(({ severity }) => severity === 'error');
const found = (plan: Plan) => checkParts(plan).map(({ severity, path }) => `${severity} ${path}`);

test('without a machine the core is cut by hand: block, foam and templates, no path and no error', () => {
  const { core } = planCore(BY_HAND, IDENTITY);
  expect(severe(BY_HAND)).toEqual([]);
  expect(core!.cut).toBeNull();
  expect(core!.fit).toEqual(planCore(PLAN, IDENTITY).core!.fit);
  expect(core!.foam).toEqual(planCore(PLAN, IDENTITY).core!.foam);
  expect(core!.templates).toHaveLength(2);
});

test('ribs alone: no block, no foam, no cut, no word of bare foam, no error', () => {
  const bare = { ...RIBS_ALONE, allowances: { upperMm: 0, lowerMm: 0 } };
  for (const plan of [RIBS_ALONE, bare]) {
    const { core, findings } = planCore(plan, IDENTITY);
    expect(severe(plan)).toEqual([]);
    expect(core).toMatchObject({ fit: null, foam: null, cut: null });
    expect(core!.ribs!.ribs).toHaveLength(8);
    expect(findings.map(({ code }) => code)).not.toContain('thin-trailing-edge');
  }
});

test('a machine without block or material is an error with its field, and the rest is planned', () => {
  expect(found({ ...PLAN, block: null })).toEqual(['error block']);
  expect(found({ ...PLAN, material: null })).toEqual(['error material']);
  expect(found({ ...PLAN, block: null, material: null })).toEqual(['error block', 'error material']);
  const { core } = planCore({ ...PLAN, material: null }, IDENTITY);
  expect(core).toMatchObject({ foam: null, cut: null });
  expect(core!.fit!.places).toHaveLength(1);
});

test('block and material belong together; a plan of nothing is warned of', () => {
  expect(found({ ...BY_HAND, material: null })).toEqual(['error material']);
  expect(found({ ...BY_HAND, block: null })).toEqual(['error block']);
  expect(found({ ...RIBS_ALONE, ribs: null })).toEqual(['warning ribs']);
  expect(found(PLAN)).toEqual([]);
});
