/** A rectangle of the sheet in pixels, y down. */
export interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Where everything on the sheet has its place, in pixels of the sheet: CSS pixels, or `scale` of them each. */
export interface SheetLayout {
  readonly width: number;
  readonly height: number;
  /** CSS pixels for each pixel of the sheet. */
  readonly scale: number;
  /** Narrow sheets (below about 640 px) have a flat title block over the full width and a shorter list of fields. */
  readonly compact: boolean;
  readonly frame: Box;
  readonly zones: { readonly columns: number; readonly rows: number };
  readonly titleBlock: Box;
  /** Inside of the frame above the title block: both views and their dimensions. */
  readonly drawing: Box;
  /** The first view: the section and its dimensions. */
  readonly section: Box;
  /** The second view, on the same stations as the first. */
  readonly distribution: Box;
  /** Line of text beside or above the title block, for what the sheet has to say about itself. */
  readonly remark: Box;
  /** Where the chord lies when the whole section is fitted: x of its ends. */
  readonly chord: { readonly left: number; readonly right: number };
}

const COMPACT_BELOW = 640;
/** Sheets never get flatter than this; the page scrolls instead. */
export const SMALLEST_SHEET = { width: 280, height: 440 } as const;

/** How much room the second view gets: its full share, less (while thickness is exaggerated), or none. */
export type SecondViewRoom = 'full' | 'small' | 'none';

/**
 * Lays out a sheet of the given size: a zoned frame (ISO 5457), the title block at the lower right (ISO 7200), and two
 * views under each other on common stations.
 * @param size Width and height in CSS pixels, and how many of them a pixel of the sheet gets; sizes below
 *   `SMALLEST_SHEET` are laid out at that size.
 */
export function sheetLayout(
  { width, height, scale }: { readonly width: number; readonly height: number; readonly scale: number },
  second: SecondViewRoom = 'full',
): SheetLayout {
  const w = Math.max(SMALLEST_SHEET.width, Math.round(width / scale));
  const h = Math.max(SMALLEST_SHEET.height, Math.round(height / scale));
  const compact = w < COMPACT_BELOW;
  const margin = compact ? { side: 6, top: 6, bottom: 6 } : { side: 17, top: 26, bottom: 26 };
  const frame: Box = {
    x: margin.side,
    y: margin.top,
    width: w - 2 * margin.side,
    height: h - margin.top - margin.bottom,
  };
  const titleBlock = titleBlockBox(frame, compact);
  const remarkHeight = compact ? 34 : 0;
  const drawing: Box = {
    x: frame.x,
    y: frame.y,
    width: frame.width,
    height: frame.height - titleBlock.height - remarkHeight,
  };
  const secondHeight = secondViewHeight(drawing.height, compact, second);
  const sectionHeight = drawing.height - secondHeight;
  const inset = compact ? { left: 26, right: 20 } : { left: w > 1000 ? 96 : 76, right: w > 1000 ? 104 : 72 };
  return {
    width: w,
    height: h,
    scale,
    compact,
    frame,
    zones: { columns: compact ? 4 : 8, rows: 4 },
    titleBlock,
    drawing,
    section: { ...drawing, height: sectionHeight },
    distribution: {
      ...drawing,
      y: drawing.y + sectionHeight,
      height: secondHeight,
    },
    remark: compact
      ? { x: frame.x, y: titleBlock.y - remarkHeight, width: frame.width, height: remarkHeight }
      : { x: frame.x, y: titleBlock.y, width: titleBlock.x - frame.x, height: titleBlock.height },
    chord: { left: frame.x + inset.left, right: frame.x + frame.width - inset.right },
  };
}

/** Height of the axis labels under the views, which stay without a second view. */
const AXIS_HEIGHT = 28;

function secondViewHeight(height: number, compact: boolean, second: SecondViewRoom): number {
  if (second === 'none') return AXIS_HEIGHT;
  const share = second === 'full' ? (compact ? 0.38 : 0.34) : 0.24;
  return Math.round(height * share);
}

function titleBlockBox(frame: Box, compact: boolean): Box {
  const height = 102;
  const width = compact ? frame.width : Math.min(520, Math.max(440, frame.width * 0.46));
  return { x: frame.x + frame.width - width, y: frame.y + frame.height - height, width, height };
}

/** Do two boxes overlap, grown by `gap` pixels between them? */
export function overlaps(a: Box, b: Box, gap = 0): boolean {
  return (
    a.x < b.x + b.width + gap &&
    b.x < a.x + a.width + gap &&
    a.y < b.y + b.height + gap &&
    b.y < a.y + a.height + gap
  );
}

/** Does `inner` lie within `outer`? */
export function within(inner: Box, outer: Box): boolean {
  return (
    inner.x >= outer.x &&
    inner.y >= outer.y &&
    inner.x + inner.width <= outer.x + outer.width &&
    inner.y + inner.height <= outer.y + outer.height
  );
}
