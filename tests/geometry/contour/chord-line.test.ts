import { describe, expect, test } from 'vitest';
import {
  chordLineOf,
  ordinateAtStation,
  ordinateOn,
  pointAtStation,
  sidesOf,
  stationOn,
} from '#geometry/contour/chord-line.ts';
import { cstOutline } from '#geometry/shapes/cst.ts';
import { naca4Outline } from '#geometry/shapes/naca4.ts';
import { FREE_FORM, naca4 } from '#tests/geometry/shapes/samples.ts';

describe('the chord line', () => {
  test('of a 4-digit section is the axis; of a placed shape, its placement', () => {
    const line = chordLineOf(naca4Outline(naca4('4412', 'open')));
    expect(line).toEqual({
      nose: { x: 0, y: 0 },
      length: expect.closeTo(1, 14),
      along: { x: 1, y: expect.closeTo(0, 14) },
    });
    const placed = chordLineOf(cstOutline(FREE_FORM));
    expect(placed.nose).toEqual({ x: -0.001, y: 0.003 });
    expect(placed.length).toBeCloseTo(1.0005, 14);
    expect((Math.atan2(placed.along.y, placed.along.x) * 180) / Math.PI).toBeCloseTo(-0.4, 12);
  });

  test('stations and ordinates are measured along and square to it', () => {
    const line = { nose: { x: 1, y: 1 }, length: 2, along: { x: 0, y: 1 } };
    expect([stationOn(line, { x: 0.5, y: 2 }), ordinateOn(line, { x: 0.5, y: 2 })]).toEqual([0.5, 0.5]);
  });

  test('a surface is solved at any station, the part ahead of the nose point left out', () => {
    for (const outline of [naca4Outline(naca4('6412', 'open')), cstOutline(FREE_FORM)]) {
      const { line, upper, lower } = sidesOf(outline);
      for (const side of [upper, lower]) {
        for (const station of [0, 1e-6, 0.001, 0.1, 0.5, 0.9, 0.99]) {
          const point = pointAtStation(side, station);
          expect(Math.abs(stationOn(line, point) - station)).toBeLessThan(1e-13);
          expect(point.dx * line.along.x + point.dy * line.along.y).toBeGreaterThan(-1e-9);
        }
      }
    }
    expect(sidesOf(naca4Outline(naca4('6412'))).upper.foremost).toBeGreaterThan(0);
    expect(sidesOf(naca4Outline(naca4('6412'))).lower.foremost).toBe(0);
    expect(sidesOf(naca4Outline(naca4('0012'))).upper.foremost).toBe(0);
  });

  test('the slope is that of the ordinate', () => {
    const { upper } = sidesOf(cstOutline(FREE_FORM));
    const h = 1e-6;
    const difference =
      (ordinateAtStation(upper, 0.3 + h).ordinate - ordinateAtStation(upper, 0.3 - h).ordinate) / (2 * h);
    expect(Math.abs(ordinateAtStation(upper, 0.3).slope - difference)).toBeLessThan(1e-8);
  });

  test('behind the end of a surface the oblique trailing-edge face leads to the other', () => {
    const { upper, lower } = sidesOf(naca4Outline(naca4('6412', 'open')));
    expect(lower.end.x).toBeLessThan(1);
    expect(Math.abs(ordinateAtStation(lower, 1).ordinate)).toBeLessThan(1e-15);
    expect(ordinateAtStation(lower, lower.end.x).ordinate).toBe(lower.end.y);
    expect(ordinateAtStation(upper, 1).ordinate).toBeGreaterThan(upper.end.y);
  });
});
