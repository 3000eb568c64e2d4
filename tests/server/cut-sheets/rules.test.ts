import { describe, expect, it } from 'vitest';
import { error, note, warning } from '#geometry/cutting/findings.ts';
import { resolvePlan } from '#server/contracts/sheet-plan.ts';
import { type SheetSource } from '#server/contracts/cut-sheets.ts';
import { accountRoles } from '#server/contracts/permissions.ts';
import { checkFindings, checkSheetSave, checkSources, sheetReachOf } from '#server/cut-sheets/rules.ts';
import { Refusal } from '#server/refusal.ts';
import { naca4 } from '../support/shapes.ts';
import { samplePlan } from '../support/sheets.ts';

function refusalOf(work: () => unknown): Refusal {
  try {
    work();
  } catch (thrown) {
    if (thrown instanceof Refusal) return thrown;
    throw thrown;
  }
  throw new Error('Nothing was refused.');
}

const id = '0190a5b0-1111-7222-8333-444455556666';
const source = (change: Partial<SheetSource> = {}): SheetSource => ({
  sectionId: id,
  sectionName: 'Heron',
  versionNumber: 2,
  description: 'NACA 2412',
  checksum: 'a'.repeat(64),
  status: 'released',
  statusAt: null,
  inForce: 2,
  ...change,
});

describe('checkSources', () => {
  it('lets through what is released', () => {
    expect(() => checkSources(source(), source({ sectionName: 'Reed' }))).not.toThrow();
  });

  it('names each section version that is not, once, with what is in force', () => {
    const old = source({ status: 'superseded', inForce: 3 });
    const gone = source({ sectionName: 'Reed', versionNumber: 1, status: 'withdrawn', inForce: null });
    const advice = 'Plan with released sections, save that and release it.';
    const one = 'Version 2 of “Heron” was superseded; version 3 is in force.';
    expect(refusalOf(() => checkSources(old, old)).details.detail).toBe(`${one} ${advice}`);
    const both = refusalOf(() => checkSources(old, gone));
    expect(both.code).toBe('status-conflict');
    expect(both.details.detail).toBe(
      `${one} Version 1 of “Reed” was withdrawn; none of it is released now. ${advice}`,
    );
  });
});

describe('checkFindings', () => {
  it('refuses errors alone, each at the field of the plan as people make it', () => {
    expect(() => checkFindings([warning('w', 'block', 'W.'), note('n', '', 'N.')], ['core'])).not.toThrow();
    const paths = [
      'block.heightMm',
      'machine.travelXMm',
      'material',
      'panel.tip.shape.upper',
      'panel.tip',
      '',
    ];
    const refused = refusalOf(() =>
      checkFindings(
        [warning('w', 'cut', 'W.'), ...paths.map((path) => error('e', path, `At ${path}.`))],
        ['core'],
      ),
    );
    expect(refused.details.errors).toEqual([
      { path: 'plan.block.heightMm', message: 'At block.heightMm.' },
      { path: 'plan.machineId', message: 'At machine.travelXMm.' },
      { path: 'plan.materialId', message: 'At material.' },
      { path: 'plan.panel.tip.sectionId', message: 'At panel.tip.shape.upper.' },
      { path: 'plan.panel.tip', message: 'At panel.tip.' },
      { path: 'plan', message: 'At .' },
    ]);
  });

  it('refuses a plan that makes nothing', () => {
    expect(refusalOf(() => checkFindings([], [])).details.errors?.[0]?.path).toBe('plan.block');
  });
});

describe('checkSheetSave', () => {
  const plan = samplePlan({ sectionId: id, machineId: id, materialId: id });
  const pinned = resolvePlan(plan, { root: naca4(), tip: naca4(), machine: null, material: null });
  const document = { plan, pinned };
  const target = { latestNumber: 3, archived: false, base: document };

  it('saves a change, or the same with a note, on the newest version only', () => {
    const other = { plan: { ...plan, quantity: 9 }, pinned };
    expect(checkSheetSave(target, { basedOn: 3, document: other, note: '' })).toBe('save');
    expect(checkSheetSave(target, { basedOn: 3, document, note: 'again' })).toBe('save');
    expect(checkSheetSave(target, { basedOn: 2, document, note: '' })).toBe('conflict');
  });

  it('refuses what changes nothing, stands on nothing, or is put away', () => {
    const fieldOf = (work: () => unknown) => refusalOf(work).details.errors?.map(({ path }) => path);
    expect(fieldOf(() => checkSheetSave(target, { basedOn: 3, document, note: '' }))).toEqual(['plan']);
    expect(fieldOf(() => checkSheetSave(target, { basedOn: 4, document, note: '' }))).toEqual(['basedOn']);
    const away = { ...target, archived: true };
    expect(refusalOf(() => checkSheetSave(away, { basedOn: 3, document, note: 'x' })).code).toBe('archived');
  });
});

describe('sheetReachOf', () => {
  it('shows drafts to those who plan, and what was released to those who cut', () => {
    expect(accountRoles.map(sheetReachOf)).toEqual(['all', 'all', 'all', 'released']);
  });
});
