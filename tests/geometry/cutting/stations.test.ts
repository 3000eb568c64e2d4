import fc from 'fast-check';
import { expect, test } from 'vitest';
import { stationMap } from '#geometry/cutting/stations.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { naca4Shapes, shapes } from '#tests/geometry/shapes/samples.ts';
import { section } from './plans.ts';

const station = fc.double({ min: 0, max: 1, noNaN: true });

test('behind the first 2 % a station is x in parts of the surface’s own trailing edge', () => {
  fc.assert(
    fc.property(shapes, fc.constantFrom('upper' as const, 'lower' as const), station, (shape, side, s) => {
      const surface = outlineOf(shape)[side];
      const map = stationMap(surface);
      if (!map.monotone || s < 0.02) return;
      expect(surface.at(map.parameterAt(s)).x / surface.at(1).x).toBeCloseTo(s, 10);
    }),
    { numRuns: 400, seed: 3 },
  );
});

test('parameters rise with the stations from 0 to 1 and go back to them', () => {
  fc.assert(
    fc.property(naca4Shapes, station, station, (shape, a, b) => {
      const map = stationMap(outlineOf(shape).upper);
      expect(map.parameterAt(0)).toBe(0);
      expect(map.parameterAt(1)).toBe(1);
      if (a < b - 1e-9) expect(map.parameterAt(a)).toBeLessThan(map.parameterAt(b));
      expect(map.stationAt(map.parameterAt(a))).toBeCloseTo(a, 9);
    }),
    { numRuns: 300, seed: 4 },
  );
});

test('a surface that turns back along the chord follows its construction and says so', () => {
  const folded = { at: (t: number) => ({ x: t < 0.5 ? 2 * t : 1.4 - 0.8 * t, y: t }) };
  const surface = { ...outlineOf(section('0012')).upper, at: folded.at };
  expect(stationMap(surface).monotone).toBe(false);
  expect(stationMap(outlineOf(section('2412')).upper).monotone).toBe(true);
});
