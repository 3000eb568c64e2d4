import fc from 'fast-check';
import { expect, test } from 'vitest';
import { areaOf, at } from '#geometry/cutting/arrays.ts';
import { buildPanel, faceAt, ruledVolume } from '#geometry/cutting/panel.ts';
import { PART } from '#geometry/cutting/row.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { distanceTo, farthest, fine } from './measuring.ts';
import { PLAN, planWith, plans, prismOf, section } from './plans.ts';

test('constant chord without kerf and skin: each point is a point of the section, and the polygon holds the tolerance', () => {
  for (const digits of ['0012', '4418']) {
    const shape = section(digits, 'open');
    const { chain } = buildPanel(prismOf(shape, 250));
    const exact = fine(outlineOf(shape), 250, 6000);
    chain.root.x.forEach((x, i) => {
      expect(Math.hypot(x - at(chain.tip.x, i), at(chain.root.y, i) - at(chain.tip.y, i))).toBeLessThan(
        1e-12,
      );
    });
    // The fine polygon cuts the corner at the camber position by up to 3e-5 mm.
    chain.root.x.forEach((x, i) => expect(distanceTo(exact, x, at(chain.root.y, i))).toBeLessThan(5e-5));
    expect(farthest(exact, chain.root)).toBeLessThanOrEqual(PLAN.cut.toleranceMm);
  }
});

test('the chordal tolerance holds for both ends of a twisted, tapered panel', () => {
  const panel = buildPanel(PLAN);
  for (const end of ['root', 'tip'] as const) {
    const unit = fine(outlineOf(PLAN.panel[end].shape), 1, 3000);
    const placed = Array.from(unit.x, (x, i) => panel[end].toPanel({ x, y: at(unit.y, i) }));
    const curve = { x: Float64Array.from(placed, (p) => p.x), y: Float64Array.from(placed, (p) => p.y) };
    expect(farthest(curve, panel.chain[end])).toBeLessThanOrEqual(PLAN.cut.toleranceMm);
  }
});

test('rulings join equal chord stations of the same surface', () => {
  fc.assert(
    fc.property(plans, (plan) => {
      const panel = buildPanel(plan);
      const { chain } = panel;
      for (let i = 0; i < chain.station.length; i++) {
        const part = at(chain.part, i);
        if ((part !== PART.upper && part !== PART.lower) || at(chain.station, i) < 0.02) continue;
        const surface = part === PART.upper ? ('upper' as const) : ('lower' as const);
        const [root, tip] = (['root', 'tip'] as const).map((end) => {
          const { x } = panel[end].toSheet({ x: at(chain[end].x, i), y: at(chain[end].y, i) });
          return x / panel[end].outline[surface].at(1).x;
        });
        expect(root).toBeCloseTo(at(chain.station, i), 9);
        expect(tip).toBeCloseTo(at(chain.station, i), 9);
      }
    }),
    { numRuns: 8 },
  );
});

test('features’ stations and the nose are points; each surface has at least the points asked for', () => {
  const { chain } = buildPanel(PLAN);
  for (const station of [0.28, 0.4]) {
    const pairs = Array.from(chain.station.keys()).filter(
      (i) => Math.abs(at(chain.station, i) - station) < 1e-12,
    );
    expect(pairs.map((i) => chain.part[i])).toEqual([PART.upper, PART.lower]);
  }
  expect(Array.from(chain.part).filter((part) => part === PART.nose)).toHaveLength(1);
  for (const part of [PART.upper, PART.lower]) {
    const count = Array.from(chain.part).filter((of) => of === part).length;
    expect(count + 1).toBeGreaterThanOrEqual(PLAN.cut.pointsPerSurface);
  }
});

test('a linear taper of similar sections has the volume of a frustum: L/3 (A₀ + √(A₀A₁) + A₁)', () => {
  const plan = planWith({
    panel: {
      root: { shape: section('2412'), chordMm: 240 },
      tip: { shape: section('2412'), chordMm: 150 },
      sweepMm: 45,
      washoutDeg: 0,
      verticalOffsetMm: 12,
      spanMm: 700,
    },
    features: [],
  });
  const { chain } = buildPanel(plan);
  const [a, b] = [areaOf(chain.root), areaOf(chain.tip)];
  expect(b / a).toBeCloseTo((150 / 240) ** 2, 12);
  const frustum = (700 / 3) * (a + Math.sqrt(a * b) + b);
  expect(ruledVolume(chain.root, chain.tip, 700) / frustum).toBeCloseTo(1, 12);
});

test('the prismatoid formula equals the sum of many slices of a twisted panel', () => {
  const panel = buildPanel(PLAN);
  const slices = 800;
  let sum = 0;
  for (let i = 0; i < slices; i++) sum += areaOf(faceAt(panel, (i + 0.5) / slices)) * (600 / slices);
  expect(ruledVolume(panel.chain.root, panel.chain.tip, 600) / sum).toBeCloseTo(1, 7);
});

test('the section between the ends lies on the rulings, with unit normals', () => {
  const panel = buildPanel(PLAN);
  const face = faceAt(panel, 0.25);
  face.x.forEach((x, i) => {
    expect(x).toBeCloseTo(0.75 * at(panel.chain.root.x, i) + 0.25 * at(panel.chain.tip.x, i), 10);
    expect(Math.hypot(at(face.nx, i), at(face.ny, i))).toBeCloseTo(1, 12);
  });
});

test('stock cuts the contour off square at its stations', () => {
  const plan = planWith({ stock: { leadingEdgeStation: 0.06, trailingEdgeStation: 0.7 } });
  const { chain } = buildPanel(plan);
  expect(Math.min(...chain.root.x)).toBeCloseTo(0.06 * 220, 1);
  expect(Math.max(...chain.root.x)).toBeCloseTo(0.7 * 220, 1);
  expect(Math.min(...chain.station)).toBe(0.06);
  expect(Math.max(...chain.station)).toBe(0.7);
});
