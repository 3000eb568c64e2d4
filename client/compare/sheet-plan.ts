import { type Extents } from '#geometry/contour/contour.ts';
import { sheetLayout, type SheetLayout } from '#client/drawing/sheet-layout.ts';
import { FITTED, type SheetTransform, sheetTransform } from '#client/drawing/sheet-view.ts';
import { type Size } from '#client/drawing/use-sheet-size.ts';
import { MAGNIFICATIONS } from './choice.ts';
import { type Compared, largestOf } from './comparison.ts';

/** The room of the deviations of one surface; the line of no deviation runs through its middle. */
interface Band {
  readonly surface: 'upper' | 'lower';
  readonly top: number;
  readonly bottom: number;
}

export interface SheetPlan {
  readonly layout: SheetLayout;
  readonly transform: SheetTransform;
  readonly bands: readonly [Band, Band];
  /** How many times larger than the outlines the deviations are drawn. */
  readonly magnification: number;
  /** The largest deviation at this magnification leaves its band. */
  readonly leaves: boolean;
}

/** Share of the drawing's height for the deviations. */
const SECOND_VIEW = 0.5;

/** Where everything lies on the sheet; without a wanted magnification the largest that fits is taken. */
export function planSheet(size: Size, compared: readonly Compared[], wanted: number | null): SheetPlan {
  const usual = sheetLayout(size);
  const { drawing } = usual;
  const second = Math.round(drawing.height * SECOND_VIEW);
  const lowered = loweredBy(usual, compared.length);
  const layout: SheetLayout = {
    ...usual,
    section: { ...drawing, y: drawing.y + lowered, height: drawing.height - second - lowered },
    distribution: { ...drawing, y: drawing.y + drawing.height - second, height: second },
  };
  const transform = sheetTransform(layout, extentsOf(compared), 1, FITTED);
  const bands = bandsOf(layout);
  const half = (bands[0].bottom - bands[0].top) / 2;
  const largest = largestOf(compared) * transform.chordPixels;
  const fitting = MAGNIFICATIONS.findLast((factor) => factor * largest <= half) ?? MAGNIFICATIONS[0];
  const magnification = wanted ?? fitting;
  return { layout, transform, bands, magnification, leaves: magnification * largest > half };
}

function extentsOf(compared: readonly Compared[]): Extents {
  const box = { minX: Infinity, maxX: -Infinity, minY: Infinity, maxY: -Infinity };
  for (const { points } of compared) {
    for (const { x, y } of points) {
      box.minX = Math.min(box.minX, x);
      box.maxX = Math.max(box.maxX, x);
      box.minY = Math.min(box.minY, y);
      box.maxY = Math.max(box.maxY, y);
    }
  }
  return box;
}

/** How far above its line a tag stands. */
export function tagLift(compact: boolean): number {
  return compact ? 15 : 24;
}

/** Height of a line of the legend. */
export function legendLine(compact: boolean): number {
  return compact ? 13 : 17;
}

/** How far the outlines lie lower than in a sheet of one section, so that the tags stay below the legend. */
function loweredBy({ compact }: SheetLayout, count: number): number {
  const legend = 8 + Math.ceil(count / 2) * legendLine(compact);
  return Math.max(0, legend + tagLift(compact) + 10 - (compact ? 54 : 64));
}

const AXIS = 26;
const GAP = 18;

function bandsOf({ distribution: { y, height } }: SheetLayout): [Band, Band] {
  const [top, bottom] = [y + GAP, y + height - AXIS - 4];
  const each = (bottom - top - GAP) / 2;
  return [
    { surface: 'upper', top, bottom: top + each },
    { surface: 'lower', top: bottom - each, bottom },
  ];
}
