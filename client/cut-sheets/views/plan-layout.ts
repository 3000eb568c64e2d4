import { type Box, sheetLayout, type SheetLayout } from '#client/drawing/sheet-layout.ts';
import { FITTED, sheetTransform, type SheetView } from '#client/drawing/sheet-view.ts';
import { type Size } from '#client/drawing/use-sheet-size.ts';

export type ViewId = 'planform' | 'root' | 'tip' | 'isometric';
/** What stands in the room of the isometric view. */
export type SideViews = 'isometric' | 'ribs' | 'both';

/** The sheet with the places of its views: the faces under each other, the planform above them. */
export interface PlanLayout extends SheetLayout {
  readonly views: Readonly<Record<ViewId, Box>>;
}

export function planLayout(size: Size): PlanLayout {
  const sheet = sheetLayout(size, 'none');
  return { ...sheet, views: sheet.compact ? stacked(sheet.drawing) : composed(sheet.drawing) };
}

const PLANFORM = 0.47;
const FACES = 0.62;

function composed({ x, y, width, height }: Box): PlanLayout['views'] {
  const upper = Math.round(height * PLANFORM);
  const face = (height - upper) / 2;
  const left = Math.round(width * FACES);
  return {
    planform: { x, y, width, height: upper },
    root: { x, y: y + upper, width: left, height: face },
    tip: { x, y: y + upper + face, width: left, height: face },
    isometric: { x: x + left, y: y + upper, width: width - left, height: height - upper },
  };
}

function stacked({ x, y, width, height }: Box): PlanLayout['views'] {
  const shares = [0.28, 0.21, 0.21, 0.3];
  let top = y;
  const [planform, root, tip, isometric] = shares.map((share) => {
    const box = { x, y: top, width, height: share * height };
    top += box.height;
    return box;
  }) as [Box, Box, Box, Box];
  return { planform, root, tip, isometric };
}

/** The room of the isometric view shared out: the ribs take the whole where nothing is cut from a block. */
export function sideBoxes(
  { views }: PlanLayout,
  side: SideViews,
): { isometric: Box | null; ribs: Box | null } {
  const box = views.isometric;
  if (side !== 'both')
    return { isometric: side === 'isometric' ? box : null, ribs: side === 'ribs' ? box : null };
  const height = box.height / 2;
  return { isometric: { ...box, height }, ribs: { ...box, y: box.y + height, height } };
}

/** What zooming and panning do to a pixel of the fitted sheet. */
export interface Zoom {
  readonly factor: number;
  readonly dx: number;
  readonly dy: number;
}

export const UNZOOMED: Zoom = { factor: 1, dx: 0, dy: 0 };

const WHOLE = { minY: -0.5, maxY: 0.5 };

/** The same zoom as that of a section's sheet, as a step from fitted to shown pixels. */
export function zoomOf(layout: SheetLayout, view: SheetView): Zoom {
  const fitted = sheetTransform(layout, WHOLE, 1, FITTED);
  const shown = sheetTransform(layout, WHOLE, 1, view);
  const factor = shown.chordPixels / fitted.chordPixels;
  return {
    factor,
    dx: shown.toX(0) - factor * fitted.toX(0),
    dy: shown.toY(0) - factor * fitted.toY(0),
  };
}

/** From mm of a view, y up, to pixels of the sheet, y down. */
export interface Place {
  readonly toX: (x: number) => number;
  readonly toY: (y: number) => number;
  /** Pixels per mm. */
  readonly scale: number;
  /** Where the upper left corner of the view's room is now. */
  readonly corner: { readonly x: number; readonly y: number };
}

interface Extent {
  readonly minX: number;
  readonly maxX: number;
  readonly minY: number;
  readonly maxY: number;
}

interface Room {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

/** The largest scale at which an extent stands in a box with room around it. */
export function fittingScale(box: Box, extent: Extent, room: Room): number {
  const [width, height] = [extent.maxX - extent.minX, extent.maxY - extent.minY];
  const across = Math.max(20, box.width - room.left - room.right) / Math.max(1e-6, width);
  return Math.min(across, Math.max(20, box.height - room.top - room.bottom) / Math.max(1e-6, height));
}

/** Puts an extent in the middle of a box, or at its left, and zooms it with the sheet. */
export function placeIn(
  box: Box,
  extent: Extent,
  room: Room,
  zoom: Zoom,
  {
    scale = fittingScale(box, extent, room),
    align = 'middle',
  }: { scale?: number; align?: 'left' | 'middle' } = {},
): Place {
  const free = box.width - room.left - room.right - scale * (extent.maxX - extent.minX);
  const x0 = box.x + room.left + (align === 'middle' ? free / 2 : 0) - scale * extent.minX;
  const height = scale * (extent.maxY - extent.minY);
  const spare = box.height - room.top - room.bottom - height;
  const y0 = box.y + room.top + spare / 2 + scale * extent.maxY;
  const { factor, dx, dy } = zoom;
  return {
    scale: scale * factor,
    corner: { x: factor * box.x + dx, y: factor * box.y + dy },
    toX: (x) => factor * (x0 + scale * x) + dx,
    toY: (y) => factor * (y0 - scale * y) + dy,
  };
}
