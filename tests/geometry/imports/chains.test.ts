import { describe, expect, test } from 'vitest';
import {
  type SourcePoint,
  apart,
  joinChains,
  oneLoop,
  sizeOf,
  withoutDuplicates,
  withoutReversedPairs,
} from '#geometry/imports/chains.ts';
import { SHARP, numbered, refusalOf } from './files.ts';

type Pair = readonly [number, number];
const chain = (...points: readonly Pair[]): SourcePoint[] =>
  points.map(([x, y], i) => ({ x, y, line: i + 1 }));
const plain = (points: readonly { x: number; y: number }[]) => points.map(({ x, y }) => [x, y]);

describe('single chains', () => {
  test('size is the diagonal of the box', () => {
    expect(sizeOf([chain([0, 0], [3, 1]), chain([1, 4])])).toBe(5);
    expect(sizeOf([])).toBe(0);
    expect(apart({ x: 0, y: 0 }, { x: 3, y: 4 })).toBe(5);
    expect(apart(undefined, { x: 3, y: 4 })).toBe(Infinity);
  });

  test('repeated neighbours are removed and counted', () => {
    const { chain: kept, removed } = withoutDuplicates(chain([0, 0], [0, 0], [1, 0], [1, 1e-12], [0, 0]), 1);
    expect(plain(kept)).toEqual([[0, 0], [1, 0], [0, 0]]); // prettier-ignore
    expect(removed).toBe(2);
  });

  test('a reversed pair is exchanged, corners are left alone', () => {
    const { chain: points, pairs } = withoutReversedPairs(
      chain([0, 0], [1, 0], [3, 0.1], [2, 0], [4, 0.1], [5, 0]),
    );
    expect(plain(points)).toEqual([[0, 0], [1, 0], [2, 0], [3, 0.1], [4, 0.1], [5, 0]]); // prettier-ignore
    expect(pairs).toBe(1);
    expect(withoutReversedPairs(numbered(SHARP)).pairs).toBe(0);
    expect(withoutReversedPairs(chain([0, 0], [4, 0.1], [0, 0.2], [0, 1])).pairs).toBe(0);
  });
});

describe('chains joined where their ends meet', () => {
  test('in any order and direction, to a closed loop', () => {
    const sides = [
      chain([0, 0], [1, 0]),
      chain([0, 1], [1, 1]),
      chain([0, 1], [0, 0]),
      chain([1, 1], [1, 0]),
    ];
    const [loop, more] = joinChains(sides, 1e-6);
    expect(more).toBeUndefined();
    expect(loop!.closed).toBe(true);
    expect(loop!.chain).toHaveLength(4);
  });

  test('ends that are a little apart meet, others do not', () => {
    expect(joinChains([chain([0, 0], [1, 0]), chain([1.0005, 0], [2, 1])], 1e-3)).toHaveLength(1);
    expect(joinChains([chain([0, 0], [1, 0]), chain([1.002, 0], [2, 1])], 1e-3)).toHaveLength(2);
  });

  test('an end that is near, but not near enough, hides no other', () => {
    const joined = joinChains(
      [chain([0, 0], [0.9, 0]), chain([0.9, 1.9], [5, 5]), chain([0.95, 0.05], [2, 0])],
      1,
    );
    expect(joined.map(({ chain: one }) => one.length).toSorted()).toEqual([2, 3]);
  });

  test('several thousand ends at one place are each looked at once', () => {
    const star = Array.from({ length: 5000 }, (_, i) => chain([0, 0], [1, i]));
    const joined = joinChains(star, 1e-6);
    expect(joined.reduce((sum, { chain: one }) => sum + one.length - 1, 0)).toBe(5000);
  });
});

describe('the one outline', () => {
  const square = chain([0, 0], [1, 0], [1, 1], [0, 1]);
  const closed = { chain: square, closed: true };
  const open = (...points: readonly Pair[]) => ({ chain: chain(...points), closed: false });

  test('two surfaces are joined where that is shorter', () => {
    const [upper, lower] = [open([0, 0.1], [0.5, 0.5], [1, 0.1]), open([0, -0.1], [0.5, -0.5], [1, -0.1])];
    expect(plain(oneLoop([upper, lower], 1.5, false).points)).toEqual(
      [[0, 0.1], [0.5, 0.5], [1, 0.1], [1, -0.1], [0.5, -0.5], [0, -0.1]], // prettier-ignore
    );
  });

  test('open lines beside a closed outline are passed over when that is wanted', () => {
    const line = open([0, 0.5], [1, 0.5]);
    expect(oneLoop([closed, line], 1.5, true)).toEqual({
      points: square,
      notes: ['passed over 1 open line beside the outline'],
    });
    expect(refusalOf(() => oneLoop([closed, line], 1.5, false)).code).toBe('several-contours');
  });

  test('refused: none, several, and one that goes round twice', () => {
    expect(refusalOf(() => oneLoop([], 1, true)).code).toBe('no-outline');
    const several = refusalOf(() => oneLoop([closed, closed], 1, true));
    expect(several.message).toBe(
      'The file holds 2 closed outlines. One begins at line 1. One outline is read at a time.',
    );
    expect(refusalOf(() => oneLoop([open([0, 0], [1, 0]), open([5, 5], [6, 5])], 8, true)).code).toBe(
      'several-contours',
    );
    const twice = numbered([...SHARP, ...SHARP]);
    const round = refusalOf(() => oneLoop([{ chain: twice, closed: false }], 1, false));
    expect([round.code, round.line]).toEqual(['several-contours', 39]);
  });
});
