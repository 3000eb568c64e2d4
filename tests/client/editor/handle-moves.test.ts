import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CST_LIMITS, type CstShape, weightStation } from '#geometry/shapes/cst.ts';
import { NACA4_LIMITS } from '#geometry/shapes/naca4.ts';
import { parameterOf } from '#geometry/shapes/outline.ts';
import { similarityOf, toChord, toSheet } from '#geometry/shapes/placement.ts';
import { outlineOf, type Shape } from '#geometry/shapes/shape.ts';
import { sheetLayout } from '#client/drawing/sheet-layout.ts';
import { FITTED, sheetTransform } from '#client/drawing/sheet-view.ts';
import { handleIds, type HandleId } from '#client/sections/editor/handle-ids.ts';
import { moveHandle, weightReach } from '#client/sections/editor/handle-moves.ts';
import { handlePoint } from '#client/sections/editor/handle-points.ts';
import { handleWords } from '#client/sections/editor/handle-words.ts';
import { type Present } from '#client/sections/editor/present.ts';
import { digits, freeForms } from './shapes.ts';

const within = ({ min, max }: { min: number; max: number }) => fc.double({ min, max, noNaN: true });

const presentOf = (shape: Shape): Present => ({ shape, chordMm: 220, equalNose: false });
const free = { snap: false };

function expectPoint(
  actual: { x: number; y: number } | null,
  wanted: { x: number; y: number },
  tolerance = 1e-9,
) {
  expect(Math.abs((actual?.x ?? Number.NaN) - wanted.x)).toBeLessThan(tolerance);
  expect(Math.abs((actual?.y ?? Number.NaN) - wanted.y)).toBeLessThan(tolerance);
}

describe('handles', () => {
  it('moved to where they stand change nothing', () => {
    fc.assert(
      fc.property(fc.oneof(digits, freeForms), (shape) => {
        for (const handle of handleIds(shape)) {
          const at = handlePoint(shape, handle);
          expect(at, handle).not.toBeNull();
          if (!at || (shape.kind === 'naca4' && handle === 'edge')) continue;
          const { present, notice } = moveHandle(presentOf(shape), handle, at, free);
          expectSameOutline(present?.shape ?? null, shape, handle);
          expect(notice?.code, handle).not.toBe('refused');
        }
      }),
      { numRuns: 40 },
    );
  });

  it('speak of finite values within their range', () => {
    fc.assert(
      fc.property(fc.oneof(digits, freeForms), (shape) => {
        for (const handle of handleIds(shape)) {
          const at = handlePoint(shape, handle) ?? { x: 0, y: 0 };
          const words = handleWords(shape, handle, at, 220, 'mm');
          expect(words.value, handle).toBeGreaterThanOrEqual(words.min - 1e-6);
          expect(words.value, handle).toBeLessThanOrEqual(words.max + 1e-6);
          expect(words.spoken).not.toMatch(/NaN|Infinity/);
        }
      }),
      { numRuns: 40 },
    );
  });
});

function expectSameOutline(actual: Shape | null, wanted: Shape, handle: HandleId): void {
  expect(actual, handle).not.toBeNull();
  if (!actual) return;
  for (const t of [0.02, 0.2, 0.5, 0.8, 1]) {
    for (const surface of ['upper', 'lower'] as const) {
      const [a, b] = [outlineOf(actual)[surface].at(t), outlineOf(wanted)[surface].at(t)];
      expect(Math.hypot(a.x - b.x, a.y - b.y), `${handle}, ${surface} ${t}`).toBeLessThan(1e-9);
    }
  }
}

describe('the camber crest', () => {
  it('goes to the pointer with camber and position together', () => {
    fc.assert(
      fc.property(
        digits,
        within(NACA4_LIMITS.maxCamber),
        within(NACA4_LIMITS.maxCamberPosition),
        (shape, y, x) => {
          const move = moveHandle(presentOf(shape), 'camber', { x, y }, free);
          fc.pre(move.present !== null);
          expect(move.present?.shape).toEqual({ ...shape, maxCamber: y, maxCamberPosition: x });
          expectPoint(move.at, { x, y });
        },
      ),
    );
  });
});

describe('a thickness handle', () => {
  it('carries the surface to a pointer that moves square to the mean line', () => {
    fc.assert(
      fc.property(
        digits,
        fc.constantFrom('upper', 'lower'),
        fc.double({ min: 0.3, max: 1.5, noNaN: true }),
        (shape, surface, factor) => {
          const handle = `thickness-${surface}` as const;
          const [upper, lower] = [
            handlePoint(shape, 'thickness-upper'),
            handlePoint(shape, 'thickness-lower'),
          ];
          const on = surface === 'upper' ? upper : lower;
          if (!upper || !lower || !on) throw new Error('A 4-digit section has both thickness handles.');
          const middle = { x: (upper.x + lower.x) / 2, y: (upper.y + lower.y) / 2 };
          const to = { x: middle.x + factor * (on.x - middle.x), y: middle.y + factor * (on.y - middle.y) };
          const { present, at, notice } = moveHandle(presentOf(shape), handle, to, free);
          fc.pre(present !== null && notice === null);
          if (present?.shape.kind === 'naca4')
            expect(present.shape.maxThickness).toBeCloseTo(factor * shape.maxThickness, 10);
          expectPoint(at, to);
        },
      ),
    );
  });
});

describe('the nose handle', () => {
  it('stands at the far side of a circle of the radius it sets', () => {
    fc.assert(
      fc.property(
        fc.oneof(digits, freeForms),
        fc.double({ min: 0.5, max: 1.6, noNaN: true }),
        (shape, factor) => {
          const from = handlePoint(shape, 'nose');
          const nose = outlineOf(shape).upper.at(0);
          if (!from) throw new Error('Every shape has a nose handle.');
          const to = { x: nose.x + factor * (from.x - nose.x), y: nose.y + factor * (from.y - nose.y) };
          const { present, at, notice } = moveHandle(presentOf(shape), 'nose', to, free);
          fc.pre(present !== null && notice?.code !== 'limit');
          expectPoint(at, to);
        },
      ),
    );
  });
});

describe('a weight handle', () => {
  const layout = sheetLayout({ width: 1000, height: 640, scale: 1 });

  it('moves the surface exactly to the pointer, through the sheet and back', () => {
    fc.assert(
      fc.property(
        freeForms,
        fc.constantFrom('upper' as const, 'lower' as const),
        fc.nat(12),
        fc.double({ min: 0.05, max: 0.95, noNaN: true }),
        fc.double({ min: -0.02, max: 0.02, noNaN: true }),
        (shape, surface, wanted, share, rise) => {
          const index = wanted % shape[surface].length;
          const transform = sheetTransform(layout, { minY: -0.2, maxY: 0.2 }, 2, {
            ...FITTED,
            zoom: 3,
            panX: 40,
          });
          const reach = weightReach(shape, surface, index);
          const station = reach.from + share * (reach.to - reach.from);
          const frame = similarityOf(shape.placement);
          const on = outlineOf(shape)[surface].at(parameterOf(station));
          const local = toChord(frame, on);
          const pointer = toSheet(frame, station, local.y + rise);
          const pixel = { x: transform.toX(pointer.x), y: transform.toY(pointer.y) };
          const move = moveHandle(
            presentOf(shape),
            `${surface}-${index}`,
            transform.toPoint(pixel.x, pixel.y),
            free,
          );
          fc.pre(move.present !== null && move.notice === null);
          const after = move.present?.shape ?? shape;
          expectPoint(outlineOf(after)[surface].at(parameterOf(station)), pointer);
          expectPoint(move.at, pointer);
        },
      ),
      { numRuns: 200 },
    );
  });

  it('stays within its reach along the chord and within the range of its weight', () => {
    fc.assert(
      fc.property(
        freeForms,
        fc.nat(12),
        within({ min: -0.5, max: 1.5 }),
        within({ min: 0, max: 0.6 }),
        (shape, wanted, x, y) => {
          const index = wanted % shape.upper.length;
          const { present, at } = moveHandle(presentOf(shape), `upper-${index}`, { x, y }, free);
          fc.pre(present?.shape.kind === 'cst');
          const after = present?.shape as CstShape;
          expect(after.upper[index]).toBeGreaterThanOrEqual(CST_LIMITS.upper.min);
          expect(after.upper[index]).toBeLessThanOrEqual(CST_LIMITS.upper.max);
          const reach = weightReach(shape, 'upper', index);
          const station = toChord(similarityOf(shape.placement), at ?? { x: Number.NaN, y: 0 }).x;
          expect(station).toBeGreaterThanOrEqual(reach.from - 1e-9);
          expect(station).toBeLessThanOrEqual(reach.to + 1e-9);
        },
      ),
    );
  });

  it('reaches half way to the handles beside it', () => {
    const shape: CstShape = {
      kind: 'cst',
      upper: [0.2, 0.2, 0.2],
      lower: [-0.1, -0.1, -0.1],
      n1: 0.5,
      n2: 1,
      trailingEdgeGap: 0,
    };
    const [first, second, third] = [0, 1, 2].map((index) => weightStation(shape, 'upper', index));
    expect(weightReach(shape, 'upper', 1)).toEqual({
      from: ((first ?? 0) + (second ?? 0)) / 2,
      to: ((second ?? 0) + (third ?? 0)) / 2,
    });
  });
});

describe('the gap handle of a free form', () => {
  it('opens the trailing edge to both sides', () => {
    fc.assert(
      fc.property(freeForms, within({ min: 0, max: 0.02 }), (shape, half) => {
        const frame = similarityOf(shape.placement);
        const to = toSheet(frame, 1, half);
        const { present, at } = moveHandle(presentOf(shape), 'edge', to, free);
        fc.pre(present?.shape.kind === 'cst');
        expect((present?.shape as CstShape).trailingEdgeGap).toBeCloseTo(2 * half, 10);
        expectPoint(at, to);
      }),
    );
  });
});
