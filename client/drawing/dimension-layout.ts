import { type Point } from '#geometry/point.ts';
import { ARROW, textWidth } from './line-types.ts';
import { type Box, within } from './sheet-layout.ts';
import { Occupied } from './occupied.ts';

/** Size of the dimension texts in pixels. */
export const DIMENSION_TEXT = 12;
const TEXT_HEIGHT = 14;
/** Free space around a text. */
const CLEAR = 4;

/** A dimension before it has its place; all points in pixels of the sheet. */
export type DimensionSpec<Id extends string = string> =
  | {
      readonly id: Id;
      readonly kind: 'horizontal';
      readonly text: string;
      readonly from: Point;
      readonly to: Point;
      readonly side: 'above' | 'below';
    }
  | {
      readonly id: Id;
      readonly kind: 'across';
      readonly text: string;
      readonly upper: Point;
      readonly lower: Point;
    }
  | {
      readonly id: Id;
      readonly kind: 'leader';
      readonly text: string;
      readonly at: Point;
      /** Directions in which the text may stand, best first, as offsets of the elbow in pixels. */
      readonly offsets: readonly Point[];
    };

export interface Arrow extends Point {
  /** Direction in which it points, as a unit vector. */
  readonly dx: number;
  readonly dy: number;
}

export interface PlacedDimension<Id extends string = string> {
  readonly id: Id;
  readonly text: string;
  readonly textBox: Box;
  /** What the text stands on. */
  readonly ground: 'sheet' | 'foam';
  /** Dimension, extension and leader lines as one path. */
  readonly path: string;
  readonly arrows: readonly Arrow[];
}

export interface DimensionRoom {
  /** Texts stay within this. */
  readonly area: Box;
  /** Highest and lowest pixel of the section: dimensions along the chord stand outside. */
  readonly top: number;
  readonly bottom: number;
  /** The section as a row of boxes: a text stands outside it, or quite inside. */
  readonly section: readonly Box[];
  /** What no text may cover: the handles. */
  readonly keepClear: readonly Box[];
  /** Distance from the section to the first level, and from level to level. */
  readonly levels: { readonly first: number; readonly step: number };
}

/**
 * Gives every dimension its place (after ISO 129-1): shorter ones nearer to the section, each on a level of its own,
 * texts in a gap of their line; leaders where there is room. No text overlaps another text or any dimension line; a
 * dimension for which there is no room in sight is left out.
 */
export function layoutDimensions<Id extends string>(
  specs: readonly DimensionSpec<Id>[],
  room: DimensionRoom,
): PlacedDimension<Id>[] {
  const occupied = new Occupied(room.area, room.section, room.keepClear);
  const placed = new Map<Id, PlacedDimension<Id>>();
  const inOrder = [...specs].sort((a, b) => rank(a) - rank(b));
  for (const spec of inOrder) {
    const result = place(spec, room, occupied);
    if (result) placed.set(spec.id, result);
  }
  return specs.flatMap((spec) => placed.get(spec.id) ?? []);
}

/** Dimensions along the chord first, the shorter before the longer; then across; leaders find what room is left. */
function rank(spec: DimensionSpec): number {
  if (spec.kind === 'horizontal') return Math.abs(spec.to.x - spec.from.x);
  return spec.kind === 'across' ? 1e6 : 2e6;
}

function place<Id extends string>(
  spec: DimensionSpec<Id>,
  room: DimensionRoom,
  occupied: Occupied,
): PlacedDimension<Id> | null {
  switch (spec.kind) {
    case 'horizontal':
      return placeHorizontal(spec, room, occupied);
    case 'across':
      return placeAcross(spec, room, occupied);
    case 'leader':
      return placeLeader(spec, occupied);
  }
}

type Horizontal<Id extends string> = Extract<DimensionSpec<Id>, { kind: 'horizontal' }>;

const MOST_LEVELS = 8;

function placeHorizontal<Id extends string>(
  spec: Horizontal<Id>,
  room: DimensionRoom,
  occupied: Occupied,
): PlacedDimension<Id> | null {
  const { area, levels } = room;
  const left = Math.min(spec.from.x, spec.to.x);
  const right = Math.max(spec.from.x, spec.to.x);
  const seen = { left: Math.max(left, area.x), right: Math.min(right, area.x + area.width) };
  if (seen.right - seen.left < 2) return null;
  const width = textWidth(spec.text, DIMENSION_TEXT);
  const fits = seen.right - seen.left >= width + 2 * (ARROW.length + CLEAR) + 6;
  const towards = spec.side === 'above' ? -1 : 1;
  const edge = spec.side === 'above' ? room.top : room.bottom;
  const lowest = area.y + TEXT_HEIGHT / 2 + 2;
  const start = Math.min(area.y + area.height - TEXT_HEIGHT, Math.max(lowest, edge + towards * levels.first));
  for (let level = 0; level < MOST_LEVELS; level++) {
    const y = start + towards * level * levels.step;
    const outside = ARROW.length * 2 + CLEAR + width / 2;
    const centres = fits ? [(seen.left + seen.right) / 2] : [left - outside, right + outside];
    for (const x of centres) {
      const textBox = boxAround(x, y, width);
      const line = horizontalLine(left, right, x, width, fits);
      if (!occupied.isFree(textBox, CLEAR)) continue;
      if (
        line.some(
          ([a, b]) =>
            occupied.crossesText({ x: a, y }, { x: b, y }) || occupied.onLine(a, b, y, levels.step * 0.6),
        )
      )
        continue;
      const extensions = [spec.from, spec.to].map((end) => extension(end, y, towards));
      if (extensions.some((ends) => occupied.crossesText(...ends))) continue;
      occupied.addText(textBox);
      for (const [a, b] of line) occupied.addLine({ x: a, y }, { x: b, y });
      for (const ends of extensions) occupied.addLine(...ends);
      return {
        id: spec.id,
        text: spec.text,
        textBox,
        ground: 'sheet',
        path: [
          ...line.map(([a, b]) => segment({ x: a, y }, { x: b, y })),
          ...extensions.map(([a, b]) => segment(a, b)),
        ].join(''),
        arrows: fits
          ? [
              { x: left, y, dx: -1, dy: 0 },
              { x: right, y, dx: 1, dy: 0 },
            ]
          : [
              { x: left, y, dx: 1, dy: 0 },
              { x: right, y, dx: -1, dy: 0 },
            ],
      };
    }
  }
  return null;
}

/** The pieces of a dimension line: broken by its text, or with tails outside where the text does not fit between. */
function horizontalLine(
  left: number,
  right: number,
  text: number,
  width: number,
  fits: boolean,
): (readonly [number, number])[] {
  const half = width / 2 + CLEAR;
  if (fits)
    return [
      [left, text - half],
      [text + half, right],
    ];
  const tail = ARROW.length * 2;
  return text > right
    ? [
        [left - tail, left],
        [left, right],
        [right, text - half],
      ]
    : [
        [text + half, left],
        [left, right],
        [right, right + tail],
      ];
}

/** From just off the section to just beyond the dimension line. */
function extension(end: Point, y: number, towards: number): readonly [Point, Point] {
  return [
    { x: end.x, y: end.y + towards * 4 },
    { x: end.x, y: y + towards * 4 },
  ];
}

function placeAcross<Id extends string>(
  spec: Extract<DimensionSpec<Id>, { kind: 'across' }>,
  room: DimensionRoom,
  occupied: Occupied,
): PlacedDimension<Id> | null {
  const { upper, lower } = spec;
  const length = Math.hypot(lower.x - upper.x, lower.y - upper.y);
  if (length < 1e-6) return null;
  const unit = { x: (lower.x - upper.x) / length, y: (lower.y - upper.y) / length };
  const width = textWidth(spec.text, DIMENSION_TEXT);
  const inside = length >= 3 * ARROW.length;
  const beside = width / 2 + 8;
  const middle = (share: number) => ({
    x: upper.x + unit.x * length * share,
    y: upper.y + unit.y * length * share,
  });
  const spots: (Point & { tail: number })[] = [];
  if (length >= TEXT_HEIGHT + 6) {
    for (const share of [0.74, 0.26, 0.62, 0.38, 0.5]) {
      const at = middle(share);
      spots.push({ x: at.x + beside, y: at.y, tail: 0 }, { x: at.x - beside, y: at.y, tail: 0 });
    }
  }
  for (let step = 0; step < 10; step++) {
    const off = 2.5 * ARROW.length + TEXT_HEIGHT / 2 + step * 8;
    spots.push(
      { x: lower.x + unit.x * off, y: lower.y + unit.y * off, tail: 1 },
      { x: upper.x - unit.x * off, y: upper.y - unit.y * off, tail: -1 },
    );
  }
  for (const spot of spots) {
    const textBox = boxAround(spot.x, spot.y, width);
    const end = spot.tail > 0 ? lower : upper;
    const tail: readonly [Point, Point] = [end, { x: spot.x, y: spot.y - spot.tail * (TEXT_HEIGHT / 2 + 2) }];
    const covered = spot.tail === 0 ? occupied.isFree(textBox, 2, 'inside') : occupied.isFree(textBox, CLEAR);
    if (!covered || !within(textBox, room.area) || occupied.crossesText(upper, lower)) continue;
    if (spot.tail !== 0 && occupied.crossesText(...tail)) continue;
    occupied.addText(textBox);
    occupied.addLine(upper, lower);
    if (spot.tail !== 0) occupied.addLine(...tail);
    const outward = inside ? 1 : -1;
    return {
      id: spec.id,
      text: spec.text,
      textBox,
      ground: spot.tail === 0 ? 'foam' : 'sheet',
      path: segment(upper, lower) + (spot.tail === 0 ? '' : segment(...tail)),
      arrows: [
        { ...upper, dx: -unit.x * outward, dy: -unit.y * outward },
        { ...lower, dx: unit.x * outward, dy: unit.y * outward },
      ],
    };
  }
  return null;
}

function placeLeader<Id extends string>(
  spec: Extract<DimensionSpec<Id>, { kind: 'leader' }>,
  occupied: Occupied,
): PlacedDimension<Id> | null {
  const width = textWidth(spec.text, DIMENSION_TEXT);
  const shelf = width + 2 * CLEAR;
  for (const reach of [1, 1.35, 1.8, 2.4, 3.2, 0.7]) {
    for (const offset of spec.offsets) {
      const elbow = { x: spec.at.x + offset.x * reach, y: spec.at.y + offset.y * reach };
      const right = offset.x >= 0;
      const end = { x: elbow.x + (right ? shelf : -shelf), y: elbow.y };
      const textBox = boxAround((elbow.x + end.x) / 2, elbow.y - TEXT_HEIGHT / 2 - 1.5, width);
      const whole: Box = { ...textBox, height: textBox.height + 4 };
      if (
        !occupied.isFree(whole, CLEAR) ||
        occupied.crossesText(spec.at, elbow) ||
        occupied.crossesText(elbow, end)
      )
        continue;
      occupied.addText(whole);
      occupied.addLine(spec.at, elbow);
      const length = Math.hypot(elbow.x - spec.at.x, elbow.y - spec.at.y) || 1;
      return {
        id: spec.id,
        text: spec.text,
        textBox,
        ground: 'sheet',
        path: segment(spec.at, elbow) + segment(elbow, end),
        arrows: [{ ...spec.at, dx: (spec.at.x - elbow.x) / length, dy: (spec.at.y - elbow.y) / length }],
      };
    }
  }
  return null;
}

function boxAround(x: number, y: number, width: number): Box {
  return { x: x - width / 2, y: y - TEXT_HEIGHT / 2, width, height: TEXT_HEIGHT };
}

function segment(a: Point, b: Point): string {
  return `M${round(a.x)} ${round(a.y)}L${round(b.x)} ${round(b.y)}`;
}

/** Hundredths of a pixel are finer than any screen. */
function round(value: number): number {
  return Math.round(value * 100) / 100;
}
