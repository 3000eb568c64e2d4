import { EndType, JoinType, inflatePathsD } from 'clipper2-ts';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type Polyline, areaOf, at, polylineOf } from '#geometry/cutting/arrays.ts';
import { offsetInStep, roundOffset, withoutLoops } from '#geometry/cutting/offset.ts';
import { type Face, buildPanel } from '#geometry/cutting/panel.ts';
import { PART } from '#geometry/cutting/row.ts';
import { type Point } from '#geometry/point.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { crossingsByHand, distanceTo, farthest, fine, perimeterOf } from './measuring.ts';
import { PLAN, planWith, plans, prismOf, section } from './plans.ts';

/** The contour moved by a polygon-offset library that shares nothing with ours; of several pieces the largest. */
function independent(line: Polyline, by: number): Polyline {
  const path = Array.from(line.x, (x, i) => ({ x, y: at(line.y, i) }));
  const pieces = inflatePathsD([path], by, JoinType.Round, EndType.Polygon, 2, 6, 0.002);
  const lines = pieces.map(polylineOf);
  return lines.reduce((a, b) => (Math.abs(areaOf(a)) > Math.abs(areaOf(b)) ? a : b));
}

function faceOf(points: readonly { x: number; y: number; nx: number; ny: number }[]): Face {
  const of = (key: 'x' | 'y' | 'nx' | 'ny') => Float64Array.from(points, (p) => p[key]);
  return { x: of('x'), y: of('y'), nx: of('nx'), ny: of('ny'), skin: new Float64Array(points.length) };
}

const fineCut = { ...PLAN.cut, toleranceMm: 0.002 };

test('circle of 10 mm, half a kerf of 0.5 mm: 10.5 mm', () => {
  const circle = faceOf(
    Array.from({ length: 400 }, (_, i) => {
      const [nx, ny] = [Math.cos((Math.PI * i) / 200), Math.sin((Math.PI * i) / 200)];
      return { x: 10 * nx, y: 10 * ny, nx, ny };
    }),
  );
  const moved = offsetInStep(circle, 0.5);
  moved?.x.forEach((x, i) => expect(Math.hypot(x, at(moved.y, i))).toBeCloseTo(10.5, 12));
  expect(offsetInStep(circle, -10.5)).toBeNull();
});

test('square of 100 mm with round corners outward by 0.5 mm: area 10200.785 mm², perimeter 403.1416 mm', () => {
  const steps = 100;
  const corners = [0, 1, 2, 3].flatMap((c) => {
    const [x, y] = [
      [100, 100],
      [0, 100],
      [0, 0],
      [100, 0],
    ][c]!;
    return Array.from({ length: steps + 1 }, (_, i) => {
      const angle = (Math.PI / 2) * (c + i / steps);
      return { x: x!, y: y!, nx: Math.cos(angle), ny: Math.sin(angle) };
    });
  });
  const moved = offsetInStep(faceOf(corners), 0.5)!;
  expect(areaOf(moved)).toBeCloseTo(10200.785, 3);
  expect(perimeterOf(moved)).toBeCloseTo(403.1416, 3);
});

test('closed 0012 at 200 mm: area and perimeter, and those of the path 0.5 mm outside (round joins, Steiner’s formula)', () => {
  const plan = planWith({ ...prismOf(section('0012'), 200), kerfMm: { root: 1, tip: 1 }, cut: fineCut });
  const { root } = buildPanel(plan).chain;
  expect(areaOf(root) / 3268.24).toBeCloseTo(1, 3);
  expect(perimeterOf(root) / 407.91).toBeCloseTo(1, 3);
  const path = offsetInStep(root, 0.5)!;
  expect(areaOf(path) / 3472.98).toBeCloseTo(1, 3);
  expect(perimeterOf(path) / 411.051).toBeCloseTo(1, 3);
  // Steiner for the polygon itself, which is convex: A + P d + π d².
  const steiner = areaOf(root) + perimeterOf(root) * 0.5 + Math.PI * 0.25;
  expect(Math.abs(areaOf(path) - steiner)).toBeLessThan(0.4);
});

test('our path and an independent polygon offset differ by at most 0.01 mm, outward and inward', () => {
  for (const [digits, edge, kerf, skin] of [
    ['0012', 'closed', 0.8, 0],
    ['2412', 'closed', 1.6, 0.3],
    ['4415', 'closed', 0.4, 1],
    ['4415', 'closed', 0.8, 0],
    ['2412', 'open', 0.8, 0],
    ['2412', 'open', 0.4, 1],
    ['0012', 'closed', 0, 1.5],
  ] as const) {
    const plan = planWith({
      ...prismOf(section(digits, edge), 200),
      kerfMm: { root: kerf, tip: kerf },
      allowances: { upperMm: skin, lowerMm: skin },
      cut: fineCut,
    });
    const path = offsetInStep(buildPanel(plan).chain.root, kerf / 2)!;
    const other = independent(fine(outlineOf(section(digits, edge)), 200, 450), kerf / 2 - skin);
    expect(farthest(other, path)).toBeLessThanOrEqual(0.01);
    expect(farthest(path, other)).toBeLessThanOrEqual(0.01);
  }
}, 60_000);

test('each point of the path has the wanted distance from the true contour within 0.005 mm', () => {
  fc.assert(
    fc.property(plans, (plan) => {
      const panel = buildPanel(plan);
      for (const end of ['root', 'tip'] as const) {
        const path = offsetInStep(panel.chain[end], plan.kerfMm[end] / 2);
        if (!path) continue;
        const placedFrom = (points: readonly Point[]) => polylineOf(points.map((p) => panel[end].toPanel(p)));
        const along = Array.from({ length: 1201 }, (_, i) => i / 1200);
        const surfaces = {
          [PART.upper]: placedFrom(along.map((t) => panel[end].outline.upper.at(t))),
          [PART.lower]: placedFrom(along.map((t) => panel[end].outline.lower.at(t))),
        };
        path.x.forEach((x, i) => {
          const part = panel.chain.part[i];
          if ((part !== PART.upper && part !== PART.lower) || path.collapsed[i] === 1) return;
          const wanted = Math.abs(at(path.distance, i));
          const own = distanceTo(surfaces[part], x, at(path.y, i), false);
          const other = distanceTo(
            surfaces[part === PART.upper ? PART.lower : PART.upper],
            x,
            at(path.y, i),
            false,
          );
          expect(Math.abs(own - wanted)).toBeLessThanOrEqual(0.005);
          // The other surface keeps its own distance, where both are moved to the same side.
          const { upperMm, lowerMm } = plan.allowances;
          const others = plan.kerfMm[end] / 2 - (part === PART.upper ? lowerMm : upperMm);
          if (others * at(path.distance, i) > 0) {
            expect(other).toBeGreaterThanOrEqual(Math.min(wanted, Math.abs(others)) - 0.005);
          }
        });
      }
    }),
    { numRuns: 6 },
  );
}, 60_000);

test('the number of points stays and the path does not cross itself', () => {
  fc.assert(
    fc.property(plans, (plan) => {
      const { chain } = buildPanel(plan);
      for (const end of ['root', 'tip'] as const) {
        const path = offsetInStep(chain[end], plan.kerfMm[end] / 2)!;
        expect(path.x).toHaveLength(chain.station.length);
        expect(crossingsByHand(path)).toBe(0);
      }
    }),
    { numRuns: 15 },
  );
}, 60_000);

test('a loop inside and a tail outside are collapsed into their crossings', () => {
  const hook = polylineOf([
    { x: 10, y: 1 },
    { x: 0, y: 5 },
    { x: -5, y: 1 },
    { x: -6, y: 0.5 },
    { x: -5.5, y: 0.5 },
    { x: -6, y: 1 },
    { x: -8, y: 0 },
    { x: 0, y: -5 },
    { x: 10, y: 2 },
  ]);
  const cleared = withoutLoops(hook, hook)!;
  expect(cleared.x).toHaveLength(9);
  expect(crossingsByHand(cleared)).toBe(0);
  expect(cleared.tail).not.toBeNull();
});

test('a path round a wedge moved inwards: along both sides, and round its edge in an arc', () => {
  const shape = prismOf(section('0012'), 200);
  const core = offsetInStep(buildPanel(planWith({ ...shape, cut: fineCut })).chain.root, -1)!;
  const path = roundOffset(core, 0.4)!;
  expect(crossingsByHand(path)).toBe(0);
  expect(path.collapsed.includes(1)).toBe(false);
  path.x.forEach((x, i) => {
    expect(Math.hypot(x - at(core.x, i), at(path.y, i) - at(core.y, i))).toBeCloseTo(0.4, 12);
    expect(at(path.distance, i)).toBeCloseTo(-0.6, 12);
    // Nowhere nearer to the core than half the kerf, but for the chords of the arcs.
    expect(distanceTo(core, x, at(path.y, i))).toBeGreaterThan(0.4 - 0.002);
  });
  expect(roundOffset(core, 0)).toBe(core);
});

test('skins that fill the section leave nothing', () => {
  const plan = planWith({ ...prismOf(section('0012'), 100), allowances: { upperMm: 7, lowerMm: 7 } });
  expect(offsetInStep(buildPanel(plan).chain.root, 0)).toBeNull();
});
