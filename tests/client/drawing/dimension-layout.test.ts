import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { layoutDimensions } from '#client/drawing/dimension-layout.ts';
import { crosses } from '#client/drawing/occupied.ts';
import { drawSection } from '#client/drawing/section-drawing.ts';
import { dimensionRoom, sectionDimensions } from '#client/drawing/section-dimensions.ts';
import { overlaps, sheetLayout, within } from '#client/drawing/sheet-layout.ts';
import { type Exaggeration, FITTED, sheetTransform, type SheetView } from '#client/drawing/sheet-view.ts';
import { type Shape } from '#geometry/shapes/shape.ts';
import { handleIds } from '#client/sections/editor/handle-ids.ts';
import { handlePoint } from '#client/sections/editor/handle-points.ts';
import { naca2412 } from '#tests/client/editor/editor-driver.ts';
import { digits, freeForms } from '#tests/client/editor/shapes.ts';

interface Scene {
  shape: Shape;
  width: number;
  height: number;
  chordMm: number;
  exaggeration: Exaggeration;
  view: SheetView;
  units: 'mm' | 'inch';
}

function placed({ shape, width, height, chordMm, exaggeration, view, units }: Scene) {
  const layout = sheetLayout({ width, height, scale: 1 });
  const drawing = drawSection(shape);
  const transform = sheetTransform(layout, drawing.measures.extents, exaggeration, view);
  const handles = handleIds(shape).flatMap((handle) => handlePoint(shape, handle) ?? []);
  const room = dimensionRoom(layout, drawing, transform, handles);
  return {
    room,
    dimensions: layoutDimensions(sectionDimensions({ drawing, transform, chordMm, units }), room),
  };
}

const fitted: Scene = {
  shape: naca2412,
  width: 1040,
  height: 600,
  chordMm: 220,
  exaggeration: 1,
  view: FITTED,
  units: 'mm',
};

const scenes: fc.Arbitrary<Scene> = fc.record({
  shape: fc.oneof(digits, freeForms),
  width: fc.integer({ min: 300, max: 2400 }),
  height: fc.integer({ min: 440, max: 1300 }),
  chordMm: fc.double({ min: 10, max: 5000, noNaN: true }),
  exaggeration: fc.constantFrom<Exaggeration>(1, 2, 4),
  view: fc.record({
    zoom: fc.double({ min: 0.5, max: 12, noNaN: true }),
    panX: fc.integer({ min: -600, max: 600 }),
    panY: fc.integer({ min: -200, max: 200 }),
  }),
  units: fc.constantFrom('mm' as const, 'inch' as const),
});

describe('layoutDimensions', () => {
  it('never lets a text overlap another, leave the view, or lie on a line of another', () => {
    fc.assert(
      fc.property(scenes, (scene) => {
        const { room, dimensions } = placed(scene);
        dimensions.forEach((dimension, i) => {
          expect(within(dimension.textBox, room.area), dimension.id).toBe(true);
          expect(dimension.path).not.toMatch(/NaN|Infinity/);
          for (const other of dimensions.slice(i + 1)) {
            expect(overlaps(dimension.textBox, other.textBox), `${dimension.id} and ${other.id}`).toBe(false);
          }
          for (const other of dimensions) {
            if (other.id === dimension.id) continue;
            for (const [a, b] of segmentsOf(other.path)) {
              expect(crosses(a, b, dimension.textBox), `${other.id} through ${dimension.id}`).toBe(false);
            }
          }
        });
      }),
      { numRuns: 300 },
    );
  });

  it('finds room for every dimension of an ordinary section on an ordinary sheet', () => {
    const ids = placed(fitted).dimensions.map(({ id }) => id);
    expect(ids).toEqual([
      'maxThicknessPosition',
      'maxThickness',
      'maxCamber',
      'chordMm',
      'noseRadius',
      'trailingEdgeGap',
      'maxCamberPosition',
    ]);
  });

  it('puts the shorter of two dimensions nearer to the section', () => {
    const { dimensions } = placed(fitted);
    const y = (id: string) => dimensions.find((dimension) => dimension.id === id)?.textBox.y ?? Number.NaN;
    expect(y('maxCamberPosition')).toBeLessThan(y('maxThicknessPosition'));
    const early = placed({ ...fitted, shape: { ...naca2412, maxCamberPosition: 0.2 } }).dimensions;
    const at = (id: string) => early.find((dimension) => dimension.id === id)?.textBox.y ?? Number.NaN;
    expect(at('maxThicknessPosition')).toBeLessThan(at('maxCamberPosition'));
  });

  it('gives the same places for the same drawing', () => {
    expect(placed(fitted)).toEqual(placed(fitted));
  });
});

function segmentsOf(path: string) {
  return [...path.matchAll(/M(\S+) (\S+)L(\S+) ([^M]+)/g)].map(
    ([, ax, ay, bx, by]) =>
      [
        { x: Number(ax), y: Number(ay) },
        { x: Number(bx), y: Number(by) },
      ] as const,
  );
}
