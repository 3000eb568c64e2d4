import { describe, expect, test } from 'vitest';
import { ordinateAtStation, sidesOf } from '#geometry/contour/chord-line.ts';
import { thicknessAt } from '#geometry/contour/measures.ts';
import { naca4Outline } from '#geometry/shapes/naca4.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';
import { ORDINATES_2412, ORDINATES_4412, THICKNESS_COLUMNS, THICKNESS_FORMS } from './naca4-ordinates.ts';

describe('published thickness forms, 0.001 % of chord', () => {
  test.each(THICKNESS_COLUMNS.map((thickness, column) => [thickness, column + 1] as const))(
    'thickness %d %%',
    (thickness, column) => {
      const outline = naca4Outline({ ...naca4('0012', 'open'), maxThickness: thickness / 100 });
      for (const row of THICKNESS_FORMS) {
        expect(Math.abs(50 * thicknessAt(outline, row[0] / 100) - row[column]!)).toBeLessThan(0.001);
      }
    },
  );
});

describe('published cambered ordinates at equal stations, 0.03 % of chord', () => {
  test.each([
    ['2412', ORDINATES_2412],
    ['4412', ORDINATES_4412],
  ])('%s', (digits, rows) => {
    const { upper, lower } = sidesOf(naca4Outline(naca4(digits, 'open')));
    for (const [station, u, l] of rows) {
      expect(Math.abs(100 * ordinateAtStation(upper, station / 100).ordinate - u)).toBeLessThan(0.03);
      expect(Math.abs(100 * ordinateAtStation(lower, station / 100).ordinate - l)).toBeLessThan(0.03);
    }
  });

  test('thickness laid off vertically would fail: the tables tell the constructions apart', () => {
    const shape = naca4('4412', 'open');
    const half = naca4Outline({ ...shape, maxCamber: 0 });
    const line = naca4Outline(shape);
    const vertical = (station: number) => line.meanLine(station).y + thicknessAt(half, station) / 2;
    const worst = Math.max(
      ...ORDINATES_4412.map(([station, u]) => Math.abs(100 * vertical(station / 100) - u)),
    );
    expect(worst).toBeGreaterThan(0.1);
  });
});
