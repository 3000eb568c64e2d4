import { expect, test } from 'vitest';
import { cornerRows, noseRows } from '#geometry/cutting/corners.ts';
import { type Row, PART } from '#geometry/cutting/row.ts';

const FINE = { radius: 0.5, tolerance: 0.01 };

function row(x: number, y: number, angleDeg: number, skin: number): Row {
  const angle = (angleDeg * Math.PI) / 180;
  const end = { x, y, nx: Math.cos(angle), ny: Math.sin(angle), skin };
  return { station: 1, part: PART.upper, fixed: false, root: end, tip: end };
}

test('a face: normals turn from the lower surface over the face to the upper, at the corners of the foam', () => {
  const { rows, middle } = cornerRows(row(100, 0, -90, 1), row(100, 6, 90, 2), PART.tail, FINE);
  const ends = rows.map((of) => of.root);
  expect(rows[middle]!.root).toMatchObject({ x: 100, y: 2.5, nx: 1, ny: 0, skin: 0 });
  const angles = ends.map(({ nx, ny }) => Math.atan2(ny, nx));
  angles.slice(1).forEach((angle, i) => expect(angle).toBeGreaterThanOrEqual(angles[i]! - 1e-12));
  // Skins of 1 and 2 mm on the face: the foam's corners at 1 and 4 mm.
  const corners = ends.slice(1, -1).map(({ y }) => Math.round(y * 1e9) / 1e9);
  expect([...new Set(corners)]).toEqual([1, 2.5, 4]);
  // An arc of 0.5 mm in steps whose sagitta keeps the tolerance.
  const step = Math.max(...angles.slice(1).map((angle, i) => angle - angles[i]!));
  expect(0.5 * (1 - Math.cos(step / 2))).toBeLessThanOrEqual(0.01);
});

test('an edge points half way between the surfaces that meet in it', () => {
  const { rows, middle } = cornerRows(row(100, 0, -80, 0.4), row(100, 0, 96, 0.4), PART.tail, FINE);
  const { nx, ny, skin } = rows[middle]!.root;
  expect((Math.atan2(ny, nx) * 180) / Math.PI).toBeCloseTo(8, 9);
  expect(skin).toBeCloseTo(0.4, 12);
  expect(rows.every(({ root }) => root.x === 100 && root.y === 0)).toBe(true);
});

test('a round nose is one point, a pointed one a fan', () => {
  expect(noseRows(row(0, 0, 180, 0), row(0, 0, 180, 0), FINE)).toHaveLength(1);
  const fan = noseRows(row(0, 0, 120, 0), row(0, 0, -120, 0), FINE);
  expect(fan.length).toBeGreaterThan(3);
  expect(fan[Math.floor(fan.length / 2)]!.root.nx).toBeLessThan(-0.9);
});
