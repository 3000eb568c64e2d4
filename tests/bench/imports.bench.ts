import { deviationOf } from '#geometry/contour/deviation.ts';
import { fitPoints } from '#geometry/contour/fit-points.ts';
import { readCoordinates } from '#geometry/imports/coordinates.ts';
import { readDxfOutline } from '#geometry/imports/dxf-outline.ts';
import { toMeasured } from '#geometry/imports/measured-from.ts';
import { IMPORT_LIMITS, ImportRefusal } from '#geometry/imports/refusal.ts';
import { measuredOutline } from '#geometry/shapes/measured.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';
import { type Bench, type Figure } from './figures.ts';

/** Every file must be read or refused within this time. */
const GOAL_MS = 200;
const RUNS = 7;

/** Median processor time of one call in ms, after one to warm up; a refusal is an outcome like any other. */
function medianMs(work: () => unknown): number {
  const once = () => {
    const start = process.cpuUsage();
    try {
      work();
    } catch (error) {
      if (!(error instanceof ImportRefusal)) throw error;
    }
    const { user, system } = process.cpuUsage(start);
    return (user + system) / 1000;
  };
  once();
  return Array.from({ length: RUNS }, once).sort((a, b) => a - b)[(RUNS - 1) / 2] ?? NaN;
}

const { bytes: most, points } = IMPORT_LIMITS;
const fill = (piece: string, start = '') =>
  start + piece.repeat(Math.floor((most - start.length) / piece.length));
const outline = outlineOf(naca4('2412'));
const list = (perSurface: number) => {
  const steps = Array.from({ length: perSurface }, (_, i) => i / (perSurface - 1));
  const upper = steps.toReversed().map((t) => outline.upper.at(t));
  const round = [...upper, ...steps.slice(1).map((t) => outline.lower.at(t))];
  return round.map(({ x, y }) => `${x} ${y}`).join('\n');
};
const entities = '0\nSECTION\n2\nENTITIES\n';
const zigzag = Array.from({ length: points.max }, (_, i) => `${(i * 7919) % 10007} ${(i * 104729) % 1009}`);
const lines = Array.from({ length: points.max / 2 }, (_, i) => {
  const [x, y] = [(i * 7919) % 10007, (i * 104729) % 1009];
  return `0\nLINE\n8\n0\n10\n${x}\n20\n${y}\n11\n${y}\n21\n${x}\n`;
});
const knots = Array.from(
  { length: points.max },
  (_, i) => `40\n${i}\n10\n${(i * 7919) % 10007}\n20\n${i % 97}\n`,
);

const LISTS: readonly (readonly [string, string])[] = [
  ['section of 200 points', list(100)],
  ['section of 10 000 points', list(5000)],
  ['10 000 points that cross', zigzag.join('\n')],
  ['5 MB of points', fill('0.5 0.25\n')],
  ['5 MB of comments', fill('# nothing to see here\n')],
  ['5 MB of line ends', fill('\n')],
  ['5 MB of commas, one on a line', fill(',\n')],
  ['5 MB of digits on one line', fill('7')],
  ['5 MB of words', fill('word word\n')],
  ['5 MB of tags', fill('<a>', '<?xml version="1.0"?>')],
  ['5 MB of letters with accents', fill('é ').slice(0, most / 2)],
];
const DRAWINGS: readonly (readonly [string, string])[] = [
  ['5 MB of unwanted groups', fill('5\nA1\n', entities)],
  ['5 MB of texts', fill('0\nTEXT\n', entities)],
  ['5 MB of lines', fill('0\nLINE\n10\n0\n20\n0\n11\n1\n21\n1\n', entities)],
  ['5000 lines that meet nowhere', entities + lines.join('')],
  ['spline of 10 000 control points', `${entities}0\nSPLINE\n71\n3\n${knots.join('')}40\n9999\n40\n9999\n40\n9999\n40\n9999\n`],
]; // prettier-ignore

function figures(): Figure[] {
  const encoder = new TextEncoder();
  const figure = (what: string, work: () => unknown, goal = GOAL_MS): Figure => {
    return { what, value: medianMs(work), unit: 'ms', goal };
  };
  const reading = LISTS.map(([what, text]) => {
    const bytes = encoder.encode(text);
    return figure(`coordinates: ${what}`, () => readCoordinates(bytes, 'a.txt'));
  });
  const drawings = DRAWINGS.map(([what, text]) => {
    const bytes = encoder.encode(text);
    return figure(`DXF: ${what}`, () => readDxfOutline(bytes));
  });
  const contour = readCoordinates(encoder.encode(list(100)), 'a.txt');
  const dense = readCoordinates(encoder.encode(list(5000)), 'a.txt');
  const { shape } = toMeasured(contour);
  return [
    ...reading,
    ...drawings,
    figure('fit of 199 points, automatic order, 4-digit match', () => fitPoints(contour, { order: 'auto' })),
    figure('fit of 9999 points', () => fitPoints(dense, { order: 'auto' }), 1000),
    figure('2000 of 9999 points kept and checked', () => toMeasured(dense)),
    figure(
      'difference of two sections, 241 places',
      () => deviationOf(outline, measuredOutline(shape), 'chord'),
      20,
    ),
  ];
}

const bench: Bench = {
  name: `Shapes from outside (median processor time of ${RUNS} warm calls)`,
  run: () => Promise.resolve(figures()),
};
export default bench;
