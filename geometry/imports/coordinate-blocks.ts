import { type SourcePoint } from './chains.ts';
import { type Row, type Rows } from './coordinate-rows.ts';
import { ImportRefusal } from './refusal.ts';

/** The points of a coordinate file in the groups that it parts them into. */
interface Blocks {
  readonly blocks: readonly (readonly SourcePoint[])[];
  readonly notes: readonly string[];
}

type NumberRow = Extract<Row, { kind: 'numbers' }>;

/**
 * The points in the rows of a coordinate file. Lines that count the points are passed over, a third column that says nothing is
 * dropped. Tables with both surfaces on a line (station, upper, lower; or x and y of each) are read as two groups.
 * @throws ImportRefusal when there are no points, or a line that is not two numbers
 */
export function blocksOf({ rows }: Rows): Blocks {
  const table = tableOf(rows);
  if (table) return table;
  const columns = columnsOf(rows);
  const groups: SourcePoint[][] = [];
  const counts: string[] = [];
  let group: SourcePoint[] | undefined;
  for (const row of rows) {
    const isCount = row.kind === 'numbers' && row.values.length === 1;
    if (isCount) counts.push(countOf(row));
    if (row.kind === 'break' || isCount || isMark(row, columns)) {
      group = undefined;
      continue;
    }
    const point = pointOf(row, columns);
    if (!group) groups.push((group = []));
    group.push(point);
  }
  if (groups.length === 0) throw new ImportRefusal('not-numbers', 'No line of the file holds two numbers.');
  const split = withoutCountPair(groups);
  if (split.note) counts.push(split.note);
  if (counts.length > MOST_COUNTS) throw alone(rows);
  return { blocks: mended(split.groups), notes: [...columns.notes, ...countNote(counts)] };
}

/** The pairs of columns of a table of both surfaces, and what is said about it. */
const TABLES = [
  { count: 4, pairs: [[0, 1], [2, 3]], note: 'read the columns as x and y of the upper, then of the lower surface' },
  { count: 3, pairs: [[0, 1], [0, 2]], note: 'read the columns as station, upper and lower ordinate' },
] as const; // prettier-ignore

/** Both surfaces of a table, when every line of numbers has as many of them and the stations run one way. */
function tableOf(rows: readonly Row[]): Blocks | null {
  const numbers = rows.filter((row) => row.kind === 'numbers');
  const table = TABLES.find(({ count }) => numbers.every(({ values }) => values.length === count));
  if (!table || numbers.length === 0) return null;
  const surfaces = table.pairs.map(([x, y]) =>
    numbers.map(({ values, line }) => ({ x: values[x] ?? 0, y: values[y] ?? 0, line })),
  );
  const stations = surfaces.every((points) => runsOneWay(points.map(({ x }) => x)));
  const ordinates = surfaces.every((points) => points.some(({ y }) => y !== points[0]?.y));
  if (!stations || !ordinates || (table.count === 3 && counts(numbers))) return null;
  return { blocks: surfaces, notes: [table.note] };
}

function runsOneWay(values: readonly number[]): boolean {
  const steps = values.slice(1).map((value, i) => value - (values[i] ?? 0));
  return steps.every((step) => step > 0) || steps.every((step) => step < 0);
}

/** Whether the first column counts the lines. */
function counts(numbers: readonly NumberRow[]): boolean {
  return numbers.every(({ values }, i) => values[0] === (numbers[0]?.values[0] ?? 0) + i);
}

const MOST_COUNTS = 4;

function countNote(counts: readonly string[]): string[] {
  return counts.length === 0 ? [] : [`passed over the number of points: ${counts.join(', ')}`];
}

function alone(rows: readonly Row[]): ImportRefusal {
  const row = rows.find((one) => one.kind === 'numbers' && one.values.length === 1);
  const line = row?.line ?? null;
  return new ImportRefusal('not-numbers', `Line ${line ?? ''} holds one number, not two.`, line);
}

function countOf(row: NumberRow): string {
  const [count = 0] = row.values;
  if (Number.isInteger(count) && count > 0) return `${count} in line ${row.line}`;
  throw new ImportRefusal('not-numbers', `Line ${row.line} holds one number, not two.`, row.line);
}

interface Columns {
  readonly x: number;
  readonly y: number;
  readonly count: 2 | 3;
  readonly notes: readonly string[];
}

/** Which columns are x and y. A third one is dropped when it is the same all along or counts the points. */
function columnsOf(rows: readonly Row[]): Columns {
  const numbers = rows.filter((row) => row.kind === 'numbers');
  const triples = numbers.filter(({ values }) => values.length === 3);
  const pairs = numbers.filter(({ values }) => values.length === 2);
  if (triples.length <= pairs.length) return { x: 0, y: 1, count: 2, notes: [] };
  const column = (i: number) => triples.map(({ values }) => values[i] ?? 0);
  const same = [2, 1, 0].find((i) => column(i).every((value, _, all) => value === all[0]));
  const running = counts(triples);
  const dropped = running ? 0 : same;
  const first = triples[0]?.line ?? 0;
  if (dropped === undefined) {
    throw new ImportRefusal('not-numbers', `Line ${first} holds three numbers, not two.`, first);
  }
  const [x = 0, y = 1] = [0, 1, 2].filter((i) => i !== dropped);
  const what = running ? 'which counts the points' : `${column(dropped)[0] ?? 0} all along`;
  return { x, y, count: 3, notes: [`dropped column ${dropped + 1}, ${what}`] };
}

function pointOf({ values, line }: NumberRow, columns: Columns): SourcePoint {
  const { x, y, count } = columns;
  if (values.length === count) return { x: values[x] ?? 0, y: values[y] ?? 0, line };
  const held = values.length > 3 ? 'more than three numbers' : `${values.length} numbers`;
  throw new ImportRefusal('not-numbers', `Line ${line} holds ${held}, not ${count}.`, line);
}

/** Files of several elements part them by a pair of numbers that no section reaches (common practice). */
const MARK = 999;

function isMark(row: NumberRow, { count }: Columns): boolean {
  return (
    count === 2 &&
    row.values.length === 2 &&
    row.values.every((value) => value >= MARK && value === row.values[0])
  );
}

/** Larger than any coordinate of the unit chord. */
const BEYOND_UNIT = 2;
const LEAST_COUNT = 3;

/** Some files begin with the number of points of each surface: two whole numbers that add up, or are far outside the unit chord. */
function withoutCountPair(groups: readonly SourcePoint[][]): {
  readonly groups: readonly SourcePoint[][];
  readonly note: string | null;
} {
  const [first = [], ...others] = groups;
  const [pair, ...rest] = first;
  const whole = pair && [pair.x, pair.y].every((value) => Number.isInteger(value) && value >= LEAST_COUNT);
  if (!whole) return { groups, note: null };
  const points = [...rest, ...others.flat()];
  const adds = pair.x + pair.y === points.length;
  const beyond = points.every(({ x, y }) => Math.abs(x) < BEYOND_UNIT && Math.abs(y) < BEYOND_UNIT);
  if (!adds && !beyond) return { groups, note: null };
  const note = `${pair.x} and ${pair.y} in line ${pair.line}`;
  if (adds) return { groups: [points.slice(0, pair.x), points.slice(pair.x)], note };
  return { groups: rest.length === 0 ? others : [rest, ...others], note };
}

/** Steps between groups that are no longer than so many of the steps beside them are steps of one list. */
const ONE_LIST = 3;

/** Blank lines part surfaces; when they part more than two groups, those that go on where the last one ended are put together again. */
function mended(groups: readonly SourcePoint[][]): readonly (readonly SourcePoint[])[] {
  const kept = groups.filter((group) => group.length > 0);
  if (kept.length < 3) return kept;
  if (kept.every((group) => group.length === 1)) return [kept.flat()];
  const lists: SourcePoint[][] = [];
  for (const group of kept) {
    const before = lists.at(-1);
    if (before && step(before.at(-1), group[0]) <= ONE_LIST * stepsBeside(before, group)) {
      for (const point of group) before.push(point);
    } else lists.push([...group]);
  }
  return lists;
}

function step(a: SourcePoint | undefined, b: SourcePoint | undefined): number {
  return a && b ? Math.hypot(a.x - b.x, a.y - b.y) : 0;
}

function stepsBeside(before: readonly SourcePoint[], after: readonly SourcePoint[]): number {
  return Math.max(step(before.at(-2), before.at(-1)), step(after[0], after[1]));
}
