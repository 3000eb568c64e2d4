import { expect, test } from 'vitest';
import { placeSection, squareTipStation, surfacePoint } from '#geometry/cutting/placing.ts';
import { planWith, section, PLAN } from './plans.ts';

const { panel } = planWith({ panel: { ...PLAN.panel, washoutDeg: 3, washoutStation: 0.25 } });

test('the root lies with its leading edge at the origin and its chord along x', () => {
  const root = placeSection(panel, 'root');
  expect(root.toPanel({ x: 0, y: 0 })).toEqual({ x: 0, y: 0 });
  expect(root.toPanel({ x: 1, y: 0.1 })).toEqual({ x: 220, y: 22 });
});

test('washout turns the tip’s nose down about its station', () => {
  const tip = placeSection(panel, 'tip');
  const pivot = tip.toPanel({ x: 0.25, y: 0 });
  expect(pivot.x).toBeCloseTo(30 + 40, 12);
  expect(pivot.y).toBeCloseTo(4, 12);
  const nose = tip.toPanel({ x: 0, y: 0 });
  const tail = tip.toPanel({ x: 1, y: 0 });
  expect(nose.y).toBeCloseTo(4 - 40 * Math.sin(Math.PI / 60), 12);
  expect(tail.y).toBeCloseTo(4 + 120 * Math.sin(Math.PI / 60), 12);
  expect(Math.hypot(tail.x - nose.x, tail.y - nose.y)).toBeCloseTo(160, 10);
  const back = tip.toSheet(tip.toPanel({ x: 0.3, y: -0.05 }));
  expect(back.x).toBeCloseTo(0.3, 12);
  expect(back.y).toBeCloseTo(-0.05, 12);
});

test('normals are of unit length, point away and stand square on the surface', () => {
  const root = placeSection(panel, 'root');
  for (const surface of ['upper', 'lower'] as const) {
    for (const t of [0, 0.1, 0.5, 0.9, 1]) {
      const { x, y, nx, ny } = surfacePoint(root, surface, t);
      const near = surfacePoint(root, surface, t < 0.5 ? t + 1e-5 : t - 1e-5);
      expect(Math.hypot(nx, ny)).toBeCloseTo(1, 12);
      const along = Math.hypot(near.x - x, near.y - y);
      expect(Math.abs((near.x - x) * nx + (near.y - y) * ny) / along).toBeLessThan(2e-4);
      if (t > 0.05) expect(surface === 'upper' ? ny : -ny).toBeGreaterThan(0.5);
    }
  }
});

test('the normal at a closed trailing edge is that of its wedge', () => {
  const prism = planWith({ panel: { ...PLAN.panel, root: { shape: section('0012'), chordMm: 200 } } });
  const { nx, ny } = surfacePoint(placeSection(prism.panel, 'root'), 'upper', 1);
  // Half the trailing-edge angle of the closed 0012 is 8.2700°.
  expect((Math.atan2(nx, ny) * 180) / Math.PI).toBeCloseTo(8.27, 3);
});

test('a spar square on the root meets the tip where its x is the same', () => {
  const station = squareTipStation(panel, 0.3);
  expect(placeSection(panel, 'tip').toPanel({ x: station, y: 0 }).x).toBeCloseTo(66, 10);
});
