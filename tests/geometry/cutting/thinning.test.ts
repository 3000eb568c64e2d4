import { expect, test } from 'vitest';
import { type Row, PART } from '#geometry/cutting/row.ts';
import { thin } from '#geometry/cutting/thinning.ts';
import { farthest } from './measuring.ts';

function arc(radius: number, count: number, fixed: (i: number) => boolean = () => false): Row[] {
  return Array.from({ length: count }, (_, i) => {
    const angle = (Math.PI * i) / (count - 1);
    const [nx, ny] = [Math.cos(angle), Math.sin(angle)];
    const end = { x: radius * nx, y: radius * ny, nx, ny, skin: 0 };
    const last = i === 0 || i === count - 1;
    return { station: 0, part: PART.upper, fixed: last || fixed(i), root: end, tip: end };
  });
}
const lineOf = (rows: readonly Row[]) => ({
  x: Float64Array.from(rows, (row) => row.root.x),
  y: Float64Array.from(rows, (row) => row.root.y),
});

test('a half circle is left with about as few points as its sagitta allows', () => {
  const rows = arc(50, 2001);
  const kept = thin(rows, 0.02, 2000, { root: 0, tip: 0 });
  // The sagitta of a chord over the angle a is r (1 - cos a/2): the cone method is allowed twice as many chords.
  const fewest = Math.ceil(Math.PI / (2 * Math.acos(1 - 0.02 / 50)));
  expect(kept.length - 1).toBeGreaterThanOrEqual(fewest);
  expect(kept.length - 1).toBeLessThanOrEqual(2 * fewest);
  expect(farthest(lineOf(rows), lineOf(kept))).toBeLessThanOrEqual(0.02 + 1e-9);
});

test('the wire’s path at a larger radius needs more points', () => {
  const rows = arc(2, 2001);
  const contour = thin(rows, 0.005, 2000, { root: 0, tip: 0 }).length;
  expect(thin(rows, 0.005, 2000, { root: 0, tip: 3 }).length).toBeGreaterThan(contour);
});

test('fixed rows stay and no segment spans more rows than allowed', () => {
  const rows = arc(50, 101, (i) => i === 37);
  const kept = thin(rows, 10, 20, { root: 0, tip: 0 });
  const at = kept.map((row) => rows.indexOf(row));
  expect(at).toContain(37);
  expect(at[0]).toBe(0);
  expect(at.at(-1)).toBe(100);
  at.slice(1).forEach((i, k) => expect(i - at[k]!).toBeLessThanOrEqual(20));
});

test('rows that coincide do no harm', () => {
  const rows = arc(50, 5);
  const doubled = rows.flatMap((row) => [row, { ...row, fixed: false }]);
  expect(thin(doubled, 0.01, 100, { root: 0, tip: 0 }).length).toBeGreaterThanOrEqual(5);
});
