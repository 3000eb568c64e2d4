import { type Point } from '#geometry/point.ts';
import { MM_PER_INCH } from '#client/app/units.ts';
import { type SheetLayout } from './sheet-layout.ts';

/** What part of the drawing is in sight. Pan is in pixels; zoom 1 with no pan is the fitted sheet. */
export interface SheetView {
  readonly zoom: number;
  readonly panX: number;
  readonly panY: number;
}

export const FITTED: SheetView = { zoom: 1, panX: 0, panY: 0 };
export const ZOOM_LIMITS = { smallest: 0.4, largest: 60 } as const;
export const EXAGGERATIONS = [1, 2, 4] as const;
export type Exaggeration = (typeof EXAGGERATIONS)[number];

/** From fractions of chord (y up) to pixels of the sheet (y down) and back. Both axes are straight lines. */
export interface SheetTransform {
  readonly toX: (x: number) => number;
  readonly toY: (y: number) => number;
  readonly toPoint: (pixelX: number, pixelY: number) => Point;
  /** Pixels per chord along the chord line. */
  readonly chordPixels: number;
  /** Pixels per chord across it: `chordPixels` times the exaggeration. */
  readonly crossPixels: number;
  /** CSS pixels for each pixel of the sheet: what a pointer moves is divided by it. */
  readonly scale: number;
}

/** Lowest and highest ordinate of what is drawn, in fractions of chord. */
export interface Ordinates {
  readonly minY: number;
  readonly maxY: number;
}

/**
 * Puts the section on the sheet. The fitted chord fills the room between the margins, or less where an exaggerated
 * thickness would leave no room for the dimensions.
 */
export function sheetTransform(
  layout: SheetLayout,
  ordinates: Ordinates,
  exaggeration: Exaggeration,
  view: SheetView,
): SheetTransform {
  const { section, chord } = layout;
  const height = Math.max(1e-6, (ordinates.maxY - ordinates.minY) * exaggeration);
  const room = Math.max(40, section.height - above(layout) - below(layout));
  const fitted = Math.min(chord.right - chord.left, room / height);
  const middle = (chord.left + chord.right) / 2;
  const chordPixels = fitted * view.zoom;
  const crossPixels = chordPixels * exaggeration;
  const centreX = middle + view.panX;
  const centreY = restY(layout) + view.panY;
  const middleOrdinate = (ordinates.maxY + ordinates.minY) / 2;
  return {
    toX: (x) => centreX + (x - 0.5) * chordPixels,
    toY: (y) => centreY - (y - middleOrdinate) * crossPixels,
    toPoint: (pixelX, pixelY) => ({
      x: 0.5 + (pixelX - centreX) / chordPixels,
      y: middleOrdinate + (centreY - pixelY) / crossPixels,
    }),
    chordPixels,
    crossPixels,
    scale: layout.scale,
  };
}

/**
 * Zooms by a factor so that what lies under the given pixel stays there. Stops at `ZOOM_LIMITS`.
 */
export function zoomAbout(
  view: SheetView,
  layout: SheetLayout,
  pixel: { x: number; y: number },
  factor: number,
): SheetView {
  const zoom = Math.min(ZOOM_LIMITS.largest, Math.max(ZOOM_LIMITS.smallest, view.zoom * factor));
  const applied = zoom / view.zoom;
  const rest = restY(layout);
  const restX = (layout.chord.left + layout.chord.right) / 2;
  return keepInSight(
    {
      zoom,
      panX: pixel.x - restX - (pixel.x - restX - view.panX) * applied,
      panY: pixel.y - rest - (pixel.y - rest - view.panY) * applied,
    },
    layout,
  );
}

/** Room for two levels of dimensions above the fitted section and one below. */
const above = (layout: SheetLayout) => (layout.compact ? 58 : 68);
const below = (layout: SheetLayout) => (layout.compact ? 38 : 44);

/** Where the middle of the fitted section lies. */
function restY(layout: SheetLayout): number {
  const { section } = layout;
  return section.y + above(layout) + (section.height - above(layout) - below(layout)) / 2;
}

/** Moves the drawing by pixels; some part of the chord line always stays on the sheet. */
export function panBy(view: SheetView, layout: SheetLayout, dx: number, dy: number): SheetView {
  return keepInSight({ ...view, panX: view.panX + dx, panY: view.panY + dy }, layout);
}

function keepInSight(view: SheetView, layout: SheetLayout): SheetView {
  const reachX = layout.section.width * 0.5 + (view.zoom * (layout.chord.right - layout.chord.left)) / 2 - 48;
  const reachY = layout.section.height * 0.5 + view.zoom * 0.25 * (layout.chord.right - layout.chord.left);
  const hold = (value: number, reach: number) => Math.min(reach, Math.max(-reach, value));
  return { ...view, panX: hold(view.panX, reachX), panY: hold(view.panY, reachY) };
}

/** CSS pixels per millimetre: a CSS inch is 96 pixels. */
export const PIXELS_PER_MM = 96 / MM_PER_INCH;

/**
 * The scale along the chord as the title block states it, "1 : 1", "2.35 : 1" or "1 : 1.4": drawing to workpiece
 * (ISO 5455), true for a screen or printer that keeps the CSS millimetre.
 */
export function scaleText(chordPixels: number, chordMm: number): string {
  const ratio = chordPixels / PIXELS_PER_MM / chordMm;
  const number = (value: number) => String(Number(value.toPrecision(3)));
  if (Math.abs(ratio - 1) < 0.005) return '1 : 1';
  return ratio > 1 ? `${number(ratio)} : 1` : `1 : ${number(1 / ratio)}`;
}
