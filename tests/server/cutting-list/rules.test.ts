import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type CutAction, cutActions } from '#server/contracts/cutting-list.ts';
import { versionStatuses } from '#server/contracts/sections.ts';
import { checkMoment, checkPart, countParts, isInList, type PartEntry } from '#server/cutting-list/rules.ts';
import { Refusal } from '#server/refusal.ts';

type Line = [action: CutAction, quantity?: number, machineId?: string | null];
const entries = (...lines: Line[]): PartEntry[] =>
  lines.map(([action, quantity = 1, machineId = null], i) => ({ id: `${i}`, action, quantity, machineId }));

function refusedField(act: () => void): string | undefined {
  try {
    act();
  } catch (error) {
    if (error instanceof Refusal) return error.details.errors?.[0]?.path;
    throw error;
  }
  return undefined;
}

describe('counting parts', () => {
  it.each<[string, Line[], ReturnType<typeof countParts>]>([
    ['nothing', [], { done: 0, scrapped: 0, open: 0, openEntry: null }],
    ['a start', [['started']], { done: 0, scrapped: 0, open: 1, openEntry: '0' }],
    ['a start and its end', [['started'], ['done']], { done: 1, scrapped: 0, open: 0, openEntry: null }],
    ['done without a start', [['done', 2]], { done: 2, scrapped: 0, open: 0, openEntry: null }],
    ['scrapped on the way', [['started'], ['scrapped']], { done: 0, scrapped: 1, open: 0, openEntry: null }],
    [
      'scrapped after it was done: another is wanted',
      [['started'], ['done'], ['scrapped']],
      { done: 0, scrapped: 1, open: 0, openEntry: null },
    ],
    [
      'scrapped more than was begun: the rest was done before',
      [
        ['done', 3],
        ['started', 1],
        ['scrapped', 2],
      ],
      { done: 2, scrapped: 2, open: 0, openEntry: null },
    ],
    [
      'scrapped with nothing there: no less than none is done',
      [['scrapped', 4], ['done']],
      { done: 1, scrapped: 4, open: 0, openEntry: null },
    ],
    [
      'a pair begun, one of it done',
      [['started', 2], ['done']],
      { done: 1, scrapped: 0, open: 1, openEntry: '0' },
    ],
    [
      'two starts, one done: the oldest ends first',
      [['started'], ['started'], ['done']],
      { done: 1, scrapped: 0, open: 1, openEntry: '1' },
    ],
    [
      'two machines: the one that says so ends',
      [
        ['started', 1, 'a'],
        ['started', 1, 'b'],
        ['done', 1, 'b'],
      ],
      { done: 1, scrapped: 0, open: 1, openEntry: '0' },
    ],
    [
      'two machines, done at a third: the oldest ends',
      [
        ['started', 1, 'a'],
        ['started', 1, 'b'],
        ['done', 1, 'c'],
      ],
      { done: 1, scrapped: 0, open: 1, openEntry: '1' },
    ],
    [
      'the last open start is named',
      [['started'], ['started'], ['started']],
      { done: 0, scrapped: 0, open: 3, openEntry: '2' },
    ],
  ])('%s', (_name, lines, expected) => {
    expect(countParts(entries(...lines))).toEqual(expected);
  });

  it('never loses a start nor counts below nothing', () => {
    const line = fc.tuple(fc.constantFrom(...cutActions), fc.integer({ min: 1, max: 4 }));
    fc.assert(
      fc.property(fc.array(line, { maxLength: 12 }), (lines) => {
        const list = entries(...lines);
        const total = (action: CutAction) =>
          list.filter((entry) => entry.action === action).reduce((sum, { quantity }) => sum + quantity, 0);
        const { done, scrapped, open, openEntry } = countParts(list);
        expect(Math.min(done, scrapped, open)).toBeGreaterThanOrEqual(0);
        expect(scrapped).toBe(total('scrapped'));
        expect(done).toBeLessThanOrEqual(total('done'));
        expect(open).toBeLessThanOrEqual(total('started'));
        expect(open).toBeGreaterThanOrEqual(total('started') - total('done') - total('scrapped'));
        expect(openEntry === null).toBe(open === 0);
        const [again] = entries(['started', 2]);
        const more = countParts([...list, { ...again!, id: 'last' }]);
        expect(more).toEqual({ done, scrapped, open: open + 2, openEntry: 'last' });
      }),
      { numRuns: 100 },
    );
  });
});

describe('what stands in the list', () => {
  const part = { status: 'released', archived: false, wanted: 2, done: 0, open: 0 } as const;

  it('is what a released version still wants', () => {
    expect(isInList(part)).toBe(true);
    expect(isInList({ ...part, done: 1 })).toBe(true);
    expect(isInList({ ...part, done: 2 })).toBe(false);
    expect(isInList({ ...part, done: 3 })).toBe(false);
    expect(isInList({ ...part, archived: true })).toBe(false);
  });

  it('is what was begun, whatever became of its version', () => {
    for (const status of versionStatuses) {
      expect([status, isInList({ ...part, status })]).toEqual([status, status === 'released']);
      const begun = isInList({ ...part, status, done: 2, open: 1, archived: true });
      expect([status, begun]).toEqual([status, status !== 'draft']);
    }
  });
});

describe('an entry', () => {
  const now = new Date('2026-03-02T10:00:00.000Z');
  it.each([
    ['2026-03-02T10:05:00.000Z', undefined],
    ['2026-03-02T10:05:00.001Z', 'at'],
    ['2025-03-02T10:00:00.000Z', undefined],
  ])('of %s at ten is refused at %s', (at, field) => {
    expect(refusedField(() => checkMoment(new Date(at), now))).toBe(field);
  });

  it('is of a part that the version makes', () => {
    expect(refusedField(() => checkPart('core', ['core', 'ribs']))).toBeUndefined();
    expect(refusedField(() => checkPart('templates', ['core', 'ribs']))).toBe('part');
  });
});
