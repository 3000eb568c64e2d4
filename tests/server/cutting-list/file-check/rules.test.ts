import { describe, expect, it } from 'vitest';
import { type SheetSource } from '#server/contracts/cut-sheets.ts';
import { type Origin, verdictOf } from '#server/cutting-list/file-check/rules.ts';

const day = (n: number) => new Date(Date.UTC(2026, 1, n));
const origin: Origin = {
  kind: 'cut-sheet',
  id: '0190a5b0-1111-7222-8333-444455556666',
  name: 'Marsh panel',
  versionNumber: 3,
  status: 'released',
  statusReason: 'tried',
  statusAt: day(10),
  inForce: 3,
  archived: false,
  sources: [],
  fileName: 'marsh-panel_v3_root_220mm.dxf',
  takenAt: null,
};
const source = (status: SheetSource['status']): SheetSource => ({
  sectionId: '0190a5b0-1111-7222-8333-444455556667',
  sectionName: 'Marsh 2412',
  versionNumber: 1,
  description: 'NACA 2412',
  checksum: 'a'.repeat(64),
  status,
  statusAt: day(9).toISOString(),
  inForce: null,
});

describe('the verdict on a file', () => {
  it('is current for the version in force, and says what it is', () => {
    expect(verdictOf([origin], 'file', 'released')).toEqual({
      verdict: 'current',
      what: {
        kind: 'cut-sheet',
        id: origin.id,
        name: 'Marsh panel',
        versionNumber: 3,
        fileName: 'marsh-panel_v3_root_220mm.dxf',
      },
      inForce: 3,
      since: day(10).toISOString(),
      reason: '',
      stale: [],
    });
  });

  it.each(['superseded', 'withdrawn'] as const)('is %s with the reason and since when', (status) => {
    const found = verdictOf([{ ...origin, status, inForce: 4 }], 'file', 'released');
    expect(found).toMatchObject({
      verdict: status,
      inForce: 4,
      reason: 'tried',
      since: day(10).toISOString(),
    });
  });

  it('names the section versions that are not in force any more', () => {
    const sources = [source('released'), source('withdrawn')];
    const { verdict, stale } = verdictOf([{ ...origin, sources }], 'file', 'released');
    expect([verdict, stale]).toEqual(['current', [sources[1]]]);
  });

  it('is a draft for a file that was taken before the release, and for that alone', () => {
    const taken = (takenAt: Date) => verdictOf([{ ...origin, takenAt }], 'file', 'all').verdict;
    expect([taken(day(9)), taken(day(10)), taken(day(11))]).toEqual(['draft', 'current', 'current']);
  });

  it('tells of a draft nothing but that to who sees released versions only', () => {
    for (const draft of [
      { ...origin, status: 'draft' as const, statusAt: null, sources: [source('draft')] },
      { ...origin, takenAt: day(1) },
    ]) {
      expect(verdictOf([draft], 'file', 'released')).toEqual({
        verdict: 'draft',
        what: null,
        inForce: null,
        since: null,
        reason: 'Draft: do not cut.',
        stale: [],
      });
      expect(verdictOf([draft], 'file', 'all').what?.name).toBe('Marsh panel');
    }
  });

  it('is that of the version in force where several have these bytes', () => {
    const old = { ...origin, id: 'old', status: 'superseded' as const };
    for (const origins of [
      [old, origin],
      [origin, old],
    ]) {
      expect(verdictOf(origins, 'code', 'released')).toMatchObject({
        verdict: 'current',
        what: { id: origin.id },
      });
    }
  });

  it('warns of what is in the archive', () => {
    expect(verdictOf([{ ...origin, archived: true }], 'code', 'all')).toMatchObject({
      verdict: 'current',
      reason: 'It is in the archive: ask before cutting.',
    });
  });

  it('is unknown for what nobody took here', () => {
    expect(verdictOf([], 'file', 'all')).toMatchObject({ verdict: 'unknown', what: null });
    expect(verdictOf([], 'file', 'all').reason).toContain('bytes');
    expect(verdictOf([], 'code', 'all').reason).toContain('code');
  });
});
