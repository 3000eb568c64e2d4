import { type Tick } from '../../cutting/template.ts';
import { type Point } from '../../point.ts';
import { LETTER, textBox, textWidth } from '../lettering.ts';
import { segment, text } from '../marks.ts';
import { type Occupied } from '../occupied.ts';
import { type Mark, type TextMark } from '../page.ts';
import { fits, isInside, touches } from './inside.ts';

const TICK = { plain: 2, long: 3.5, every: 5, outside: 1.2 } as const;

/** From the template's frame, y up, to that of the drawing, y down. */
export function down({ x, y }: Point): Point {
  return { x, y: -y };
}

/** Every fifth tick, the first and the last get their number first; the others where room is left, and none where ticks are crowded. */
export function tickMarks(ticks: readonly Tick[], outline: readonly Point[], room: Occupied) {
  const lines: Mark[] = [];
  const texts: TextMark[] = [];
  const isMain = ({ number }: Tick) => number % TICK.every === 0 || number === 1 || number === ticks.length;
  const crowded = isCrowded(ticks);
  for (const tick of [...ticks.filter(isMain), ...ticks.filter((of) => !isMain(of))]) {
    const foot = down(tick.at);
    const inwards = down(tick.inwards);
    const along = (by: number): Point => ({ x: foot.x + by * inwards.x, y: foot.y + by * inwards.y });
    const lengths = isMain(tick) ? [TICK.long, TICK.plain] : [TICK.plain];
    const label = crowded && !isMain(tick) ? null : numberAt(tick, along, lengths, outline, room);
    const begin = along(label?.from ?? 0);
    const end = along(longestInside(along, label?.length ?? TICK.plain, outline));
    lines.push(segment(begin.x, begin.y, end.x, end.y));
    if (!label) continue;
    room.take(textBox(label.mark));
    texts.push(label.mark);
  }
  return { lines, texts };
}

/** Do ticks stand so close that their numbers would be a row without gaps? */
function isCrowded(ticks: readonly Tick[]): boolean {
  const ways = ticks.slice(1).map((tick, i) => {
    const before = ticks[i]?.at ?? tick.at;
    return Math.hypot(tick.at.x - before.x, tick.at.y - before.y);
  });
  const middle = ways.toSorted((a, b) => a - b)[ways.length >> 1] ?? 0;
  return middle < 1.5 * textWidth(String(ticks.length), LETTER.small);
}

/** A tick reaches no further than to the middle of a thin template. */
function longestInside(along: (by: number) => Point, length: number, outline: readonly Point[]): number {
  for (let by = length; by > 0.4; by -= 0.2) if (isInside(along(2 * by), outline)) return by;
  return 0.4;
}

/** The number of a tick with the place where its tick begins, 0 at the edge, less outside, and how far it goes in. */
interface Placed {
  readonly mark: TextMark;
  readonly from: number;
  readonly length: number;
}

function numberAt(
  { number }: Tick,
  along: (by: number) => Point,
  lengths: readonly number[],
  outline: readonly Point[],
  room: Occupied,
): Placed | null {
  const mark = text({ x: 0, y: 0 }, String(number), LETTER.small, { anchor: 'middle' });
  const { width, height } = textBox(mark);
  const half = Math.hypot(width, height) / 2;
  const centred = (by: number): TextMark => {
    const { x, y } = along(by);
    return { ...mark, at: { x, y: y + LETTER.small / 2 } };
  };
  for (const length of lengths) {
    const by = length + half + 0.3;
    // On the tick's own side of the middle, so that it is not taken for one of the other surface.
    const own = isInside(along(2 * by), outline);
    if (own && fits(centred(by), outline, room)) return { mark: centred(by), from: 0, length };
  }
  for (const out of [TICK.outside, TICK.outside + 2.6]) {
    const outer = centred(-out - half - 0.3);
    const box = textBox(outer);
    if (room.isFree(box) && !touches(box, outline))
      return { mark: outer, from: -out, length: lengths[0] ?? TICK.plain };
  }
  return null;
}
