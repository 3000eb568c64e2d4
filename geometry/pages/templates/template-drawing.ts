import { type Box, type Polyline, at, boxOf } from '../../cutting/arrays.ts';
import { type Template } from '../../cutting/template.ts';
import { type Point } from '../../point.ts';
import { clippedLine } from '../clip.ts';
import { LETTER, textBox } from '../lettering.ts';
import { WIDTH, circle, segment, text } from '../marks.ts';
import { type Occupied, occupied } from '../occupied.ts';
import { type Anchor, type Mark, type TextMark } from '../page.ts';
import { fits, isInside, touches } from './inside.ts';
import { down, tickMarks } from './tick-marks.ts';
import { type Tile, type Tiling, OVERLAP_MM } from './tiles.ts';

/** A template with all that stands on and about it, at true size. The frame is the template's with y down, so that texts stand upright. */
export interface TemplateDrawing {
  readonly outline: readonly Point[];
  readonly lines: readonly Mark[];
  readonly texts: readonly TextMark[];
}

/** Room around the template for the numbers that do not fit inside, mm. */
const SURROUND_MM = { x: 6, y: 9 } as const;

/** Half of a cross with the names beside it must stand within half of the overlap. */
const CROSS_MM = 3.6;

/** The tiles on which there is something of the template. */
export function usedTiles(template: Template, tiles: readonly Tile[]): Tile[] {
  const outline = pointsOf(template.outline);
  return tiles.filter(({ minX, maxX, minY, maxY }) => {
    const rect = { x: minX, y: minY, width: maxX - minX, height: maxY - minY };
    const middle = { x: (minX + maxX) / 2, y: (minY + maxY) / 2 };
    return isInside(middle, outline) || clippedLine(outline, true, rect).length > 0;
  });
}

/** What a template needs on paper, in its own frame. */
export function contentOf(template: Template): Box {
  const box = boxOf(template.outline, template.reference);
  return {
    minX: box.minX - SURROUND_MM.x,
    maxX: box.maxX + SURROUND_MM.x,
    minY: box.minY - SURROUND_MM.y,
    maxY: box.maxY + SURROUND_MM.y,
  };
}

/**
 * Draws a template: edge, numbered ticks, pins, level and chord line, and the marks by which its tiles are joined. A number stands inside where there
 * is room and beside its tick where the template is too thin; where ticks are crowded only some carry their number.
 * @param chord both ends of the section's chord line in the template's frame
 * @param names what is written on each tile's part, longest first
 */
export function drawTemplate(
  template: Template,
  chord: readonly [Point, Point],
  tiling: Tiling,
  names: readonly string[],
): TemplateDrawing {
  const outline = pointsOf(template.outline).map(down);
  const room = occupied();
  const joins = joinMarks(tiling, room);
  const axes = axisMarks(template, chord, outline, room);
  const pins = template.pins.map(down).flatMap((pin) => pinMarks(pin, template.pinDiameterMm, room));
  const ticks = tickMarks(template.ticks, outline, room);
  const titles = tiling.tiles.flatMap((tile) => titleOn(tile, tiling, names, outline, room));
  return {
    outline,
    lines: [...joins.lines, ...axes.lines, ...pins, ...ticks.lines],
    texts: [...joins.texts, ...axes.texts, ...ticks.texts, ...titles],
  };
}

function pointsOf({ x, y }: Polyline): Point[] {
  return Array.from(x, (value, i) => ({ x: value, y: at(y, i) }));
}

function pinMarks(pin: Point, diameter: number, room: Occupied): Mark[] {
  const reach = diameter / 2 + 2;
  room.take({ x: pin.x - reach, y: pin.y - reach, width: 2 * reach, height: 2 * reach });
  return [
    circle(pin, diameter / 2, { widthMm: WIDTH.edge }),
    segment(pin.x - reach, pin.y, pin.x + reach, pin.y, { widthMm: WIDTH.hair }),
    segment(pin.x, pin.y - reach, pin.x, pin.y + reach, { widthMm: WIDTH.hair }),
  ];
}

/** Level line and chord line; the latter only where it is not the same. */
function axisMarks(
  { reference }: Template,
  chord: readonly [Point, Point],
  outline: readonly Point[],
  room: Occupied,
): { lines: Mark[]; texts: TextMark[] } {
  const level = pointsOf(reference).map(down);
  const [from, to] = [level[0], level.at(-1)];
  if (!from || !to) return { lines: [], texts: [] };
  const [nose, tail] = [down(chord[0]), down(chord[1])];
  const same = Math.abs(nose.y - from.y) + Math.abs(tail.y - from.y) < 0.02;
  const lines: Mark[] = [segment(from.x, from.y, to.x, to.y)];
  room.take({ x: from.x, y: from.y - 0.4, width: to.x - from.x, height: 0.8 });
  if (!same) {
    lines.push(segment(nose.x, nose.y, tail.x, tail.y, { type: 'long-dash-dot' }));
    takeAlong(nose, tail, room);
  }
  const word = text({ x: 0, y: 0 }, same ? 'level = chord' : 'level', LETTER.small, { ink: 'graphite' });
  const inside = Array.from({ length: 12 }, (_, k) => ({
    ...word,
    at: { x: from.x + (0.3 + k * 0.05) * (to.x - from.x), y: from.y - LEVEL_CLEAR_MM },
  })).find((of) => fits(of, outline, room));
  // Behind the line's end where the template has no room for it, clear of the last tick's number.
  const placed = inside ?? { ...word, at: { x: to.x + 5, y: to.y + LETTER.small / 2 } };
  if (!inside && (touches(textBox(placed), outline) || !room.isFree(textBox(placed))))
    return { lines, texts: [] };
  room.take(textBox(placed));
  return { lines, texts: [placed] };
}

/** From the level line to the baseline of its name, mm. */
const LEVEL_CLEAR_MM = 1.6;

/** Keeps texts off a slanting line. */
function takeAlong(from: Point, to: Point, room: Occupied): void {
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  const steps = Math.min(80, Math.ceil(length / 2));
  for (let k = 0; k < steps; k += 1) {
    const [a, b] = [k, k + 1].map((of) => from.y + (of / steps) * (to.y - from.y));
    if (a === undefined || b === undefined) continue;
    const x = from.x + (k / steps) * (to.x - from.x);
    room.take({ x, y: Math.min(a, b), width: (to.x - from.x) / steps, height: Math.abs(b - a) });
  }
}

/** Where pages are joined: a line in the middle of the overlap, with crosses that must fall together. */
function joinMarks({ tiles, joins }: Tiling, room: Occupied): { lines: Mark[]; texts: TextMark[] } {
  const lines: Mark[] = [];
  const texts: TextMark[] = [];
  const cross = (x: number, y: number, names: readonly TextMark[]) => {
    lines.push(
      circle({ x, y }, CROSS_MM / 2, { ink: 'graphite' }),
      segment(x - CROSS_MM, y, x + CROSS_MM, y),
      segment(x, y - CROSS_MM, x, y + CROSS_MM),
    );
    room.take({ x: x - CROSS_MM, y: y - CROSS_MM, width: 2 * CROSS_MM, height: 2 * CROSS_MM });
    for (const name of names) room.take(textBox(name));
    texts.push(...names);
  };
  const name = (x: number, y: number, words: string, anchor: Anchor) =>
    text({ x, y }, words, LETTER.least, { ink: 'graphite', anchor });
  for (const tile of tiles) {
    const right = tiles.find(({ row, column }) => row === tile.row && column === tile.column + 1);
    const below = tiles.find(({ row, column }) => row === tile.row + 1 && column === tile.column);
    const [joinX, joinY] = [joins.x[tile.column], joins.y[joins.y.length - 1 - tile.row]];
    if (right && joinX !== undefined) {
      const [top, bottom] = [joins.y[joins.y.length - tile.row] ?? tile.maxY, joinY ?? tile.minY];
      lines.push(segment(joinX, -top, joinX, -bottom, { type: 'dashed', widthMm: WIDTH.hair }));
      for (const share of CROSSES) {
        const y = -tile.minY - share * (tile.maxY - tile.minY);
        const above = y - CROSS_MM - 0.7;
        cross(joinX, y, [
          name(joinX - 0.8, above, tile.name, 'end'),
          name(joinX + 0.8, above, right.name, 'start'),
        ]);
      }
    }
    if (below && joinY !== undefined) {
      const [left, end] = [joins.x[tile.column - 1] ?? tile.minX, joinX ?? tile.maxX];
      lines.push(segment(left, -joinY, end, -joinY, { type: 'dashed', widthMm: WIDTH.hair }));
      for (const share of CROSSES) {
        const x = tile.minX + share * (tile.maxX - tile.minX);
        const beside = x + CROSS_MM + 0.8;
        cross(x, -joinY, [
          name(beside, -joinY - 0.9, tile.name, 'start'),
          name(beside, -joinY + 0.9 + LETTER.least, below.name, 'start'),
        ]);
      }
    }
  }
  return { lines, texts };
}

/** Places of the crosses along a join, in parts of the tile. */
const CROSSES = [0.2, 0.8] as const;

/** What the template is, on each tile's part of it, clear of the overlaps. */
function titleOn(
  tile: Tile,
  tiling: Tiling,
  names: readonly string[],
  outline: readonly Point[],
  room: Occupied,
): TextMark[] {
  const inner = tiling.tiles.length > 1 ? OVERLAP_MM : 0;
  const xs = outline.map(({ x }) => x);
  const ys = outline.map(({ y }) => y);
  const [left, right] = [
    Math.max(tile.minX + inner, Math.min(...xs)),
    Math.min(tile.maxX - inner, Math.max(...xs)),
  ];
  const [top, bottom] = [
    Math.max(inner - tile.maxY, Math.min(...ys)),
    Math.min(-tile.minY - inner, Math.max(...ys)),
  ];
  for (const words of names) {
    for (const height of [LETTER.title, LETTER.plain, LETTER.small]) {
      const mark = text({ x: 0, y: 0 }, words, height, { weight: 600 });
      const { width } = textBox(mark);
      const spots = spotsFromMiddle(left, right - width, top + height, bottom);
      const found = spots.map((at) => ({ ...mark, at })).find((of) => fits(of, outline, room));
      if (!found) continue;
      room.take(textBox(found));
      return [found];
    }
  }
  return [];
}

/** Places of a rectangle, those nearest to its middle first. */
function spotsFromMiddle(left: number, right: number, top: number, bottom: number): Point[] {
  const spots: (Point & { readonly off: number })[] = [];
  for (let y = top; y <= bottom; y += 2) {
    for (let x = left; x <= right; x += 6) {
      spots.push({ x, y, off: Math.hypot(x - (left + right) / 2, 3 * (y - (top + bottom) / 2)) });
    }
  }
  return spots.sort((a, b) => a.off - b.off);
}
