import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { SMALLEST_SHEET, sheetLayout, within } from '#client/drawing/sheet-layout.ts';
import {
  EXAGGERATIONS,
  FITTED,
  panBy,
  PIXELS_PER_MM,
  scaleText,
  sheetTransform,
  ZOOM_LIMITS,
  zoomAbout,
} from '#client/drawing/sheet-view.ts';

const ordinates = { minY: -0.05, maxY: 0.08 };
const layout = sheetLayout({ width: 1040, height: 560, scale: 1 });
const views = fc.record({
  zoom: fc.double({ min: 0.5, max: 20, noNaN: true }),
  panX: fc.double({ min: -200, max: 200, noNaN: true }),
  panY: fc.double({ min: -100, max: 100, noNaN: true }),
});
const pixels = fc.record({
  x: fc.double({ min: 0, max: 1040, noNaN: true }),
  y: fc.double({ min: 0, max: 560, noNaN: true }),
});

describe('sheetTransform', () => {
  it('goes to the sheet and back', () => {
    fc.assert(
      fc.property(views, fc.constantFrom(...EXAGGERATIONS), pixels, (view, exaggeration, pixel) => {
        const transform = sheetTransform(layout, ordinates, exaggeration, view);
        const point = transform.toPoint(pixel.x, pixel.y);
        expect(transform.toX(point.x)).toBeCloseTo(pixel.x, 8);
        expect(transform.toY(point.y)).toBeCloseTo(pixel.y, 8);
        expect(transform.crossPixels / transform.chordPixels).toBeCloseTo(exaggeration, 12);
      }),
    );
  });

  it('fits the section into its view with room for dimensions, exaggerated or not', () => {
    for (const exaggeration of EXAGGERATIONS) {
      const { toX, toY } = sheetTransform(layout, ordinates, exaggeration, FITTED);
      expect(toX(0)).toBeGreaterThanOrEqual(layout.chord.left - 1e-9);
      expect(toX(1)).toBeLessThanOrEqual(layout.chord.right + 1e-9);
      expect(toY(ordinates.maxY)).toBeGreaterThan(layout.section.y + 60);
      expect(toY(ordinates.minY)).toBeLessThan(layout.section.y + layout.section.height - 36);
    }
  });
});

describe('zoomAbout', () => {
  it('keeps what lies under the pointer there', () => {
    fc.assert(
      fc.property(pixels, fc.double({ min: 0.8, max: 1.5, noNaN: true }), (pixel, factor) => {
        const before = sheetTransform(layout, ordinates, 1, FITTED);
        const view = zoomAbout(FITTED, layout, pixel, factor);
        const after = sheetTransform(layout, ordinates, 1, view);
        const point = before.toPoint(pixel.x, pixel.y);
        expect(after.toX(point.x)).toBeCloseTo(pixel.x, 6);
        expect(after.toY(point.y)).toBeCloseTo(pixel.y, 6);
      }),
    );
  });

  it('stops at its limits', () => {
    expect(zoomAbout(FITTED, layout, { x: 500, y: 200 }, 1e9).zoom).toBe(ZOOM_LIMITS.largest);
    expect(zoomAbout(FITTED, layout, { x: 500, y: 200 }, 1e-9).zoom).toBe(ZOOM_LIMITS.smallest);
  });
});

describe('panBy', () => {
  it('never loses the chord line from the sheet', () => {
    fc.assert(
      fc.property(views, fc.double({ min: -1e5, max: 1e5, noNaN: true }), (view, far) => {
        const { toX } = sheetTransform(layout, ordinates, 1, panBy(view, layout, far, 0));
        expect(toX(1)).toBeGreaterThan(layout.section.x);
        expect(toX(0)).toBeLessThan(layout.section.x + layout.section.width);
      }),
    );
  });
});

describe('scaleText', () => {
  it('states drawing to workpiece, as the title block is read', () => {
    expect(scaleText(220 * PIXELS_PER_MM, 220)).toBe('1 : 1');
    expect(scaleText(440 * PIXELS_PER_MM, 220)).toBe('2 : 1');
    expect(scaleText(110 * PIXELS_PER_MM, 220)).toBe('1 : 2');
    expect(scaleText(517 * PIXELS_PER_MM, 220)).toBe('2.35 : 1');
  });
});

describe('sheetLayout', () => {
  it('keeps title block, views and remarks inside the frame, and the views above the title block', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 200, max: 4000 }),
        fc.integer({ min: 200, max: 2200 }),
        fc.constantFrom('full' as const, 'small' as const, 'none' as const),
        (width, height, second) => {
          const sheet = sheetLayout({ width, height, scale: 1 }, second);
          expect(sheet.width).toBeGreaterThanOrEqual(SMALLEST_SHEET.width);
          for (const box of [
            sheet.titleBlock,
            sheet.drawing,
            sheet.section,
            sheet.distribution,
            sheet.remark,
          ]) {
            expect(within(box, sheet.frame)).toBe(true);
          }
          expect(sheet.section.height + sheet.distribution.height).toBe(sheet.drawing.height);
          expect(sheet.drawing.y + sheet.drawing.height).toBeLessThanOrEqual(sheet.titleBlock.y);
          expect(sheet.chord.right - sheet.chord.left).toBeGreaterThan(150);
        },
      ),
    );
  });
});
