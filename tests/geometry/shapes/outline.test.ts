import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { parameterOf, stationOf } from '#geometry/shapes/outline.ts';

describe('the parameter of a surface', () => {
  test('ends and middle', () => {
    expect([parameterOf(0), parameterOf(0.5), parameterOf(1)]).toEqual([0, expect.closeTo(0.5, 15), 1]);
    expect([stationOf(0), stationOf(0.5), stationOf(1)]).toEqual([0, expect.closeTo(0.5, 15), 1]);
  });

  test('equal steps of t are the cosine spacing', () => {
    for (let i = 0; i <= 20; i++) {
      expect(Math.abs(stationOf(i / 20) - (1 - Math.cos((Math.PI * i) / 20)) / 2)).toBeLessThan(1e-15);
    }
  });

  test('each undoes the other', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1, noNaN: true }), (station) => {
        expect(Math.abs(stationOf(parameterOf(station)) - station)).toBeLessThan(1e-15);
      }),
    );
  });
});
