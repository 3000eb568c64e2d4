import { describe, expect, test } from 'vitest';
import { normalise } from '#geometry/imports/normalise.ts';
import { type Point } from '#geometry/point.ts';
import { OPEN, SHARP, largestShift, numbered, refusalOf } from './files.ts';

const unknown = { mm: null, hundred: 'percent' } as const;
const loop = (points: readonly Point[]) => ({
  points: numbered(points),
  sharp: false,
  mirrored: false,
  reversed: false,
  facePoints: 0,
});
const scaled = (points: readonly Point[], factor: number) =>
  points.map(({ x, y }) => ({ x: factor * x, y: factor * y }));
const moved = (points: readonly Point[], deg: number, dx: number, dy: number) => {
  const [c, s] = [Math.cos((deg * Math.PI) / 180), Math.sin((deg * Math.PI) / 180)];
  return points.map(({ x, y }) => ({ x: c * x - s * y + dx, y: s * x + c * y + dy }));
};

describe('the unit chord', () => {
  test('an outline on it stays as it is, a cambered nose ahead of its origin included', () => {
    for (const points of [SHARP, OPEN]) {
      const found = normalise(loop(points), unknown);
      expect(largestShift(found, points)).toBeLessThan(1e-15);
      expect([found.sourceChordMm, found.notes]).toEqual([null, []]);
    }
  });

  test.each([
    [250, unknown, 250, 'scaled from 250 mm chord'],
    [250.5, unknown, 250.5, 'scaled from 250.5 mm chord'],
    [100, unknown, null, 'scaled from per cent of chord'],
    [100, { mm: null, hundred: 'mm' }, 100, 'scaled from 100 mm chord'],
    [100, { mm: 1, hundred: 'percent' }, 100, 'scaled from 100 mm chord'],
    [10, { mm: 25.4, hundred: 'mm' }, 254, 'scaled from 254 mm chord'],
    [0.25, { mm: 1000, hundred: 'mm' }, 250, 'scaled from 250 mm chord'],
    [0.97, unknown, null, 'scaled from a chord of 0.97'],
    [5, unknown, null, 'scaled from a chord of 5 in an unknown unit'],
    [80_000, unknown, null, 'scaled from a chord of 80000 in an unknown unit'],
  ] as const)('a chord of %f', (chord, unit, mm, note) => {
    const found = normalise(loop(scaled(SHARP, chord)), unit);
    expect(largestShift(found, SHARP)).toBeLessThan(1e-14);
    if (mm === null) expect(found.sourceChordMm).toBe(null);
    else expect(Math.abs(found.sourceChordMm! - mm)).toBeLessThan(1e-9 * mm);
    expect(found.notes).toEqual([note]);
  });

  test('turned, moved and scaled outlines come to the same points as unturned ones', () => {
    const plain = normalise(loop(moved(SHARP, 0, 3, 2)), unknown);
    for (const deg of [-20, -0.31, 4, 60]) {
      const found = normalise(loop(moved(scaled(SHARP, 200), deg, 40, -7)), unknown);
      expect(
        largestShift(
          found,
          plain.x.map((x, i) => ({ x, y: plain.y[i]! })),
        ),
      ).toBeLessThan(1e-8);
      expect(found.notes.at(-2)).toBe('moved the nose to the origin');
    }
    // 2412's longest chord slopes by 0.09° (to be seen in a coarse list as well).
    expect(normalise(loop(moved(SHARP, 0.31, 0, 0)), unknown).notes[0]).toMatch(
      /^rotated 0\.\d\d° clockwise$/,
    );
  });

  test('the nose is the farthest point of the curve, between the points as well', () => {
    const even = SHARP.map(({ x, y }) => ({ x, y: y > 0 ? y : -SHARP.find((other) => other.x <= x)!.y }));
    const found = normalise(
      loop(
        moved(
          even.filter(({ x }) => x > 0.001),
          0,
          0,
          0,
        ),
      ),
      unknown,
    );
    expect(Math.abs(found.x[0]! - 1)).toBeLessThan(1e-12);
    expect(Math.abs(found.y[0]!)).toBeLessThan(1e-12);
    expect(Math.min(...found.x)).toBeGreaterThan(0);
  });

  test('a trailing edge open by more than a tenth is refused', () => {
    const wide = OPEN.map(({ x, y }, i) => ({ x, y: y + (i < 20 ? 0.06 : -0.06) * x }));
    const refusal = refusalOf(() => normalise(loop(wide), unknown));
    expect(refusal.message).toBe('The trailing edge is open by 12.3 % of chord; 10 % is the most.');
  });
});
