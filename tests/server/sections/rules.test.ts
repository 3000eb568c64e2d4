import { describe, expect, it } from 'vitest';
import { accountRoles } from '#server/contracts/permissions.ts';
import { versionStatuses } from '#server/contracts/sections.ts';
import { Refusal } from '#server/refusal.ts';
import { checkSave, checkTransition, isSavedWork, reachOf, statusesFor } from '#server/sections/rules.ts';
import { cst, naca4 } from '../support/shapes.ts';

function refusalOf(work: () => unknown): Refusal {
  try {
    work();
  } catch (error) {
    if (error instanceof Refusal) return error;
    throw error;
  }
  throw new Error('Nothing was refused.');
}

describe('reach', () => {
  it('is everything for who reads sections, and the released for the technician', () => {
    expect(accountRoles.map(reachOf)).toEqual(['all', 'all', 'all', 'released']);
    expect(statusesFor('all')).toEqual([...versionStatuses]);
    expect(statusesFor('released')).toEqual(['released', 'superseded', 'withdrawn']);
  });
});

describe('checkSave', () => {
  const target = { latestNumber: 3, archived: false, base: naca4() };
  const offer = { basedOn: 3, shape: naca4({ maxCamber: 0.03 }), note: '' };

  it('saves on the newest version and sees a conflict on an older one', () => {
    expect(checkSave(target, offer)).toBe('save');
    expect(checkSave(target, { ...offer, basedOn: 2 })).toBe('conflict');
  });

  it('names the base that does not exist', () => {
    const refusal = refusalOf(() => checkSave(target, { ...offer, basedOn: 4 }));
    expect(refusal.details.errors).toEqual([
      { path: 'basedOn', message: 'There is no version 4; the newest is 3.' },
    ]);
  });

  it('takes the same shape again only with a note', () => {
    const same = { ...offer, shape: { ...naca4() } };
    expect(refusalOf(() => checkSave(target, same)).details.errors?.[0]).toMatchObject({
      path: 'shape',
      message: expect.stringContaining('Nothing changed since version 3') as string,
    });
    expect(checkSave(target, { ...same, note: 'flown' })).toBe('save');
  });

  it('saves nothing into the archive', () => {
    expect(refusalOf(() => checkSave({ ...target, archived: true }, offer)).code).toBe('archived');
  });
});

describe('checkTransition', () => {
  it('allows draft to released and released to withdrawn, and nothing else', () => {
    const allowed = versionStatuses.flatMap((from) =>
      (['released', 'withdrawn'] as const)
        .filter((to) => {
          try {
            checkTransition(5, from, to);
            return true;
          } catch {
            return false;
          }
        })
        .map((to) => `${from} to ${to}`),
    );
    expect(allowed).toEqual(['draft to released', 'released to withdrawn']);
  });

  it('says how the version stands and what to do', () => {
    expect(refusalOf(() => checkTransition(5, 'superseded', 'released')).details.detail).toBe(
      'Version 5 was superseded by a later release. Save its shape as a new version and release that.',
    );
    expect(refusalOf(() => checkTransition(5, 'released', 'released')).details.detail).toBe(
      'Version 5 is released already.',
    );
    expect(refusalOf(() => checkTransition(5, 'draft', 'withdrawn')).details.detail).toBe(
      'Version 5 was never released.',
    );
  });
});

describe('isSavedWork', () => {
  it('compares the shapes and not the order of their keys', () => {
    const { kind, ...rest } = naca4();
    expect(isSavedWork({ ...rest, kind }, naca4())).toBe(true);
    expect(isSavedWork(naca4({ maxCamber: 0.0200001 }), naca4())).toBe(false);
    expect(isSavedWork(cst(), naca4())).toBe(false);
  });
});
