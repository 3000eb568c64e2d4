import { MaxRectsPacker, PACKING_LOGIC } from 'maxrects-packer/dist/maxrects-packer.mjs';
import { type Box, type Polyline, boxOf } from './arrays.ts';
import { type RibsPlan } from './plan.ts';

/** What packing has to know of a rib. */
export interface PackedRib {
  readonly number: number;
  readonly outlines: readonly Polyline[];
  readonly areaMm2: number;
}

/** Where a rib lies on a sheet: turned by a quarter or not, then moved by (dx, dy) so that it lies in the sheet's frame, mm. */
export interface RibPlace {
  readonly number: number;
  readonly sheet: number;
  readonly turned: boolean;
  readonly dx: number;
  readonly dy: number;
}

export interface SheetLayout {
  readonly sheets: number;
  readonly places: readonly RibPlace[];
  /** Numbers of ribs that no sheet holds. */
  readonly tooLarge: readonly number[];
  /** Area of the ribs over the area of the sheets used, 0 … 1. */
  readonly yield: number;
}

/** Packs the boxes around the ribs on as few sheets as the maximal-rectangles method needs. Same ribs, same layout. */
export function packRibs(ribs: readonly PackedRib[], sheet: RibsPlan['sheet']): SheetLayout {
  const boxes = ribs.map((rib) => ({ rib, box: boxOf(...rib.outlines) }));
  const [width, height] = [sheet.widthMm - 2 * sheet.borderMm, sheet.heightMm - 2 * sheet.borderMm];
  const fits = ({ maxX, minX, maxY, minY }: Box) => {
    const [w, h] = [maxX - minX, maxY - minY];
    return (w <= width && h <= height) || (h <= width && w <= height);
  };
  const packed = boxes.filter(({ box }) => fits(box));
  const tooLarge = boxes.filter(({ box }) => !fits(box)).map(({ rib }) => rib.number);
  const packer = new MaxRectsPacker(width, height, sheet.spacingMm, {
    smart: false,
    pot: false,
    square: false,
    allowRotation: true,
    logic: PACKING_LOGIC.MAX_EDGE,
  });
  for (const { rib, box } of packed) packer.add(box.maxX - box.minX, box.maxY - box.minY, { rib, box });
  const places = packer.bins.flatMap((bin, index) =>
    bin.rects.map((rect): RibPlace => {
      const { rib, box } = rect.data as (typeof packed)[number];
      const [x, y] = [rect.x + sheet.borderMm, rect.y + sheet.borderMm];
      // A quarter turn takes (x, y) to (−y, x), so the box's left side is then its former top.
      return rect.rot
        ? { number: rib.number, sheet: index, turned: true, dx: x + box.maxY, dy: y - box.minX }
        : { number: rib.number, sheet: index, turned: false, dx: x - box.minX, dy: y - box.minY };
    }),
  );
  const used = packed.reduce((sum, { rib }) => sum + rib.areaMm2, 0);
  const sheets = packer.bins.length;
  return {
    sheets,
    places: places.sort((a, b) => a.number - b.number),
    tooLarge,
    yield: sheets === 0 ? 0 : used / (sheets * sheet.widthMm * sheet.heightMm),
  };
}
