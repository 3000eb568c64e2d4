import type { Contour } from '../contour/contour.ts';
import type { Point } from '../point.ts';
import { shapeError } from '../shapes/error.ts';
import type { DatOptions } from './options.ts';
import { fixed, singleLine } from './text.ts';

/** How the points of a coordinate file follow each other: once round the nose, or from the nose to the trailing edge twice. */
type DatOrder = DatOptions['order'];

/**
 * A coordinate file: one line with the name, then a line with `x y` for each point (common practice).
 *
 * `round` runs from the upper trailing edge over the nose to the lower trailing edge; a sharp trailing edge stands on the
 * first and on the last line. `surfaces` writes the upper surface from nose to trailing edge, a blank line, and the lower
 * surface from nose to trailing edge, the nose on both.
 *
 * @param contour in the unit that is written
 * @param title what the name line says; put on one line here
 * @throws ShapeError naming `decimals` when rounding makes two neighbouring points coincide
 * @throws RangeError when a coordinate is not finite
 */
export function writeDat(
  contour: Contour,
  title: string,
  options: Pick<DatOptions, 'order' | 'decimals' | 'newline'>,
): string {
  const round = contour.sharp ? [...contour.x.keys(), 0] : [...contour.x.keys()];
  const xs = round.map((i) => fixed(contour.x[i] ?? NaN, options.decimals));
  const ys = round.map((i) => fixed(contour.y[i] ?? NaN, options.decimals));
  refuseCoincident(xs, ys, options.decimals);

  const width = Math.max(...[...xs, ...ys].map((text) => text.length));
  const lines = xs.map((x, i) => `${x.padStart(width)} ${(ys[i] ?? '').padStart(width)}`);
  const surfaces = [
    ...lines.slice(0, contour.noseIndex + 1).reverse(),
    '',
    ...lines.slice(contour.noseIndex),
  ];
  const newline = options.newline === 'crlf' ? '\r\n' : '\n';
  return [nameLine(title), ...(options.order === 'round' ? lines : surfaces), ''].join(newline);
}

/** Readers tell the name line by its not being numbers, so a name that begins like a number gets a word in front. */
function nameLine(title: string): string {
  const name = singleLine(title);
  return name === '' || /^[\d+.,;-]/.test(name) ? `section ${name}`.trimEnd() : name;
}

function refuseCoincident(xs: readonly string[], ys: readonly string[], decimals: number): void {
  for (let i = 1; i < xs.length; i += 1) {
    if (xs[i] !== xs[i - 1] || ys[i] !== ys[i - 1]) continue;
    const message = `with ${decimals} decimals points ${i} and ${i + 1} both become ${xs[i]} ${ys[i]}: write more decimals or fewer points`;
    throw shapeError('decimals', message);
  }
}

/** What a coordinate file says. */
interface DatContent {
  /** The name line, or null when the file begins with numbers. */
  readonly name: string | null;
  /** The order in which the file had its points. */
  readonly order: DatOrder;
  /** Upper trailing edge, nose, lower trailing edge, as read: a sharp trailing edge stands at both ends. */
  readonly points: readonly Point[];
}

const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)([eEdD][+-]?\d+)?$/;

/**
 * Reads a coordinate file in either order. Numbers may be parted by blanks, tabs, commas or semicolons, lines may end in any
 * way, blank lines may stand anywhere, and a line with the number of points of each surface is passed over.
 *
 * @throws ShapeError naming the line (`line 7`, counted from 1) that is not two finite numbers, or `points` when there are
 * fewer than five points
 */
export function readDat(text: string): DatContent {
  const lines = text.replace(/^\ufeff/, '').split(/\r\n|\r|\n/);
  const start = lines.findIndex((line) => line.trim() !== '');
  const first = lines[start] ?? '';
  const name = numbersOf(first) === null ? singleLine(first) : null;
  const blocks = withoutCounts(blocksOf(lines, name === null ? start : start + 1));
  const count = blocks.reduce((sum, block) => sum + block.length, 0);
  if (count < 5) throw shapeError('points', `a section needs at least five points, not ${count}`);

  const [upper = [], lower = []] = blocks;
  if (blocks.length === 2 && runsBackward(upper)) {
    const [nose, ...rest] = lower;
    const shared = nose?.x === upper[0]?.x && nose?.y === upper[0]?.y;
    return { name, order: 'surfaces', points: [...upper.toReversed(), ...(shared ? rest : lower)] };
  }
  return { name, order: 'round', points: blocks.flat() };
}

const runsBackward = (block: readonly Point[]): boolean => (block[0]?.x ?? 0) < (block.at(-1)?.x ?? 0);

function numbersOf(line: string): readonly number[] | null {
  const words = line
    .trim()
    .split(/[\s,;]+/)
    .filter((word) => word !== '');
  if (words.length === 0 || !words.every((word) => NUMBER.test(word))) return null;
  return words.map((word) => Number(word.replace(/[dD]/, 'e')));
}

/** The points from line `start` on, in the groups that blank lines part. */
function blocksOf(lines: readonly string[], start: number): Point[][] {
  const blocks: Point[][] = [];
  let block: Point[] | undefined;
  for (const [i, line] of lines.entries()) {
    if (i < start) continue;
    if (line.trim() === '') {
      block = undefined;
      continue;
    }
    const [x, y, ...more] = numbersOf(line) ?? [];
    if (x === undefined || y === undefined || more.length > 0 || !Number.isFinite(x) || !Number.isFinite(y)) {
      const message = `line ${i + 1} should hold two numbers: "${singleLine(line).slice(0, 40)}"`;
      throw shapeError(`line ${i + 1}`, message);
    }
    if (block === undefined) blocks.push((block = []));
    block.push({ x, y });
  }
  return blocks;
}

/** Some files state the number of points of each surface first: two whole numbers that add up to what follows. */
function withoutCounts(blocks: Point[][]): Point[][] {
  const [first = [], ...others] = blocks;
  const [counts, ...rest] = first;
  if (counts === undefined || !Number.isInteger(counts.x) || !Number.isInteger(counts.y) || counts.y < 2)
    return blocks;
  const points = [...rest, ...others.flat()];
  if (counts.x + counts.y !== points.length || counts.x < 2) return blocks;
  return [points.slice(0, counts.x), points.slice(counts.x)];
}
