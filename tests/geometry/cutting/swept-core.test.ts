import { expect, test } from 'vitest';
import { type Polyline, polylineOf } from '#geometry/cutting/arrays.ts';
import { type ExpectedCore } from '#geometry/cutting/expected-core.ts';
import { PART } from '#geometry/cutting/row.ts';
import { deviationAt } from '#geometry/cutting/swept-core.ts';

const square = (by: number): Polyline =>
  polylineOf([
    { x: 100 + by, y: 50 + by },
    { x: -by, y: 50 + by },
    { x: -by, y: -by },
    { x: 100 + by, y: -by },
    { x: 100 + by, y: 50 + by },
  ]);
const none = polylineOf([]);
const core = (changes: Partial<ExpectedCore> = {}): ExpectedCore => ({
  outline: { left: square(0), right: square(0) },
  part: new Uint8Array(5).fill(PART.upper),
  mouths: [],
  walls: { left: none, right: none },
  halfKerfLeftMm: 0.5,
  halfKerfRightMm: 0.7,
  ...changes,
});
/** Along one side of the square alone. */
const upper = polylineOf([
  { x: 0, y: 50 },
  { x: 25, y: 50 },
  { x: 100, y: 50 },
]);
const side = core({ outline: { left: upper, right: upper }, part: new Uint8Array(3) });
const above = (y: number) =>
  polylineOf([
    { x: -20, y },
    { x: 120, y },
  ]);

test('a kerf that just touches the core deviates by nothing, at each plane with the kerf there', () => {
  expect(deviationAt(above(50.5), side, 0).deviationMm).toBeCloseTo(0, 12);
  expect(deviationAt(above(50.6), side, 0.5).deviationMm).toBeCloseTo(0, 12);
  expect(deviationAt(above(50.7), side, 1).deviationMm).toBeCloseTo(0, 12);
});

test('a wire too near cuts into the core, one too far leaves foam: both are found with the move', () => {
  expect(deviationAt(above(50.4), side, 0)).toEqual({
    share: 0,
    deviationMm: expect.closeTo(0.1, 9),
    move: 1,
  });
  expect(deviationAt(above(50.8), side, 0).deviationMm).toBeCloseTo(0.3, 9);
  const bent = polylineOf([
    { x: -20, y: 50.5 },
    { x: 20, y: 50.5 },
    { x: 25, y: 50.45 },
    { x: 30, y: 50.5 },
    { x: 120, y: 50.5 },
  ]);
  expect(deviationAt(bent, side, 0)).toMatchObject({ deviationMm: expect.closeTo(0.05, 3) });
  expect([2, 3]).toContain(deviationAt(bent, side, 0).move);
});

test('a wire that never comes is far away, not unknown', () => {
  expect(deviationAt(above(80), side, 0).deviationMm).toBeCloseTo(29.5, 9);
});

test('round the corners of a square the kerf leaves the diagonal', () => {
  // A sharp corner of the path: 0.5 √2 from the core's.
  expect(deviationAt(square(0.5), core(), 0).deviationMm).toBeCloseTo(0, 12);
  const cut = deviationAt(square(0.5), core({ halfKerfLeftMm: 0.5 * Math.SQRT2 }), 0);
  expect(cut.deviationMm).toBeCloseTo(0.5 * Math.SQRT2 - 0.5, 9);
});

test('inside a mouth nothing is compared on its own surface, but walls are', () => {
  const mouth = polylineOf([
    { x: 30, y: 50 },
    { x: 20, y: 50 },
  ]);
  const wire = polylineOf([
    { x: -20, y: 50.5 },
    { x: 25, y: 50.5 },
    { x: 25, y: 40 },
    { x: 25, y: 50.5 },
    { x: 120, y: 50.5 },
  ]);
  const open = { ...side, mouths: [{ left: mouth, right: mouth, part: 0 }] };
  expect(deviationAt(wire, side, 0).deviationMm).toBeCloseTo(0.5, 9);
  expect(deviationAt(wire, open, 0).deviationMm).toBeCloseTo(0, 9);
  const wall = polylineOf([{ x: 25.5, y: 45 }]);
  expect(deviationAt(wire, { ...open, walls: { left: wall, right: wall } }, 0).deviationMm).toBeCloseTo(0, 9);
  const off = polylineOf([{ x: 25.6, y: 45 }]);
  expect(deviationAt(wire, { ...open, walls: { left: off, right: off } }, 0).deviationMm).toBeCloseTo(0.1, 9);
});
