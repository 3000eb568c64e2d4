import { contourPoints } from '#geometry/contour/contour.ts';
import { loopOf, trueChordOf } from '#geometry/contour/loop.ts';
import { SHEET_CHORD, pointsOnChord, residualsOf } from '#geometry/contour/point-residuals.ts';
import { rowsOf } from '#geometry/contour/surface-fit.ts';
import { sampleCosine } from '#geometry/contour/sampling.ts';
import { exportFile } from '#geometry/formats/export.ts';
import { dxfOptionsSchema } from '#geometry/formats/options.ts';
import { readRows } from '#geometry/imports/coordinate-rows.ts';
import { readDxf } from '#geometry/imports/dxf-entities.ts';
import { type FoundChains } from '#geometry/imports/imported.ts';
import { orderLoop } from '#geometry/imports/section-loop.ts';
import { type MeasuredShape } from '#geometry/shapes/measured.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { MARSH } from '#tests/geometry/formats/identity-example.ts';
import { FREE_FORM, naca4 } from '#tests/geometry/shapes/samples.ts';

const shape = () => structuredClone(FREE_FORM);
const outline = () => outlineOf(naca4('2412'));
const contour = () => sampleCosine(outline(), 20);
const point = () => ({ x: 0.3, y: 0.05 });
const measured = (): MeasuredShape => {
  const points = contourPoints(contour());
  const closed = [...points, points[0] ?? point()];
  return { kind: 'measured', x: closed.map(({ x }) => x), y: closed.map(({ y }) => y) };
};
const residuals = () =>
  residualsOf(outline(), pointsOnChord(measured(), SHEET_CHORD), () => point(), new Set());
const chordPoints = () => pointsOnChord(measured(), SHEET_CHORD);
const sourcePoints = () => contourPoints(contour()).map((at, i) => ({ ...at, line: i + 1 }));
const listed = () =>
  measured()
    .x.map((x, i) => `${x} ${measured().y[i] ?? 0}`)
    .join('\n');
const encoded = (text: string) => new TextEncoder().encode(text);
const foundChains = (): FoundChains => ({
  name: null,
  groups: [[sourcePoints()]],
  unit: { mm: null, hundred: 'mm' },
  notes: [],
  divided: new Set(),
  joint: 1e-9,
  extras: false,
  ordered: true,
});
const bezier = () => ({
  degree: 2,
  knots: [0, 0, 0, 1, 1, 1],
  control: [point(), { x: 1, y: 1 }, { x: 2, y: 0 }],
  weights: [1, 1, 1],
});
const dxfLine = () => readDxf('0\nSECTION\n2\nENTITIES\n0\nLINE\n10\n0\n20\n0\n11\n1\n21\n1\n').entities[0];

/** A call of each function of imports, measured contours, fit, difference, blend and adjustment that is given objects. */
export const importCalls: Readonly<Record<string, () => readonly unknown[]>> = {
  splineThrough: () => [
    [0, 1, 2],
    [0, 1, 0],
  ],
  crossingSides: () => [
    [0, 1, 1, 0],
    [0, 0, 1, 1],
  ],
  measuredOutline: () => [measured()],
  describeMeasured: () => [measured()],
  toMeasured: () => [measured()],
  readOutline: () => [encoded(listed()), 'marsh.dat'],
  deviationOf: () => [outline(), outlineOf(shape()), 'chord', 11],
  laidOn: () => [outline(), outlineOf(shape()), 'chord', [{ x: 0.3, y: 0.05 }]],
  outlineOfAny: () => [measured()],
  fitClosely: () => [outline()],
  toCst: () => [measured()],
  blendShapes: () => [naca4('2412'), shape(), 0.3],
  blendOutlines: () => [outline(), outlineOf(shape()), 0.3],
  blendToThickness: () => [naca4('2412'), naca4('4415'), 0.13],
  withThickness: () => [shape(), 0.1],
  withCamber: () => [shape(), 0.03],
  withTrailingEdgeGap: () => [shape(), 1, 200],
  loopOf: () => [outline()],
  trueChordOf: () => [outline()],
  onChord: () => [trueChordOf(outline()), point()],
  nearestOn: () => [loopOf(outline()), point(), 0.3],
  outwardNormal: () => [loopOf(outline()), 0.3],
  deviationWords: () => [{ deviation: 0.001, surface: 'upper', station: 0.3 }],
  toleranceVerdict: () => [
    { deviation: 0.001, surface: 'upper', station: 0.3 },
    { counted: 9, outside: 1, excluded: 0 },
  ],
  longestChordOf: () => [measured()],
  pointsOnChord: () => [measured(), trueChordOf(outline())],
  residualsOf: () => [outline(), pointsOnChord(measured(), SHEET_CHORD), () => point(), new Set([3])],
  largestOf: () => [residuals(), 'size'],
  shareOf: () => [residuals()],
  rowsOf: () => [chordPoints(), 'upper', 0],
  fitSurface: () => [rowsOf(chordPoints(), 'upper', 0), 4],
  ladderOf: () => [rowsOf(chordPoints(), 'upper', 0)],
  fitPoints: () => [measured(), { order: { upper: 4, lower: 4 }, excluded: [3] }],
  matchFourDigits: () => [measured(), [3]],
  textOf: () => [Uint8Array.of(49, 32, 48)],
  sizeOf: () => [[sourcePoints()]],
  apart: () => [point(), { x: 0, y: 0 }],
  withoutDuplicates: () => [sourcePoints(), 1],
  withoutReversedPairs: () => [sourcePoints()],
  joinChains: () => [[sourcePoints()], 1e-9],
  oneLoop: () => [[{ chain: sourcePoints(), closed: true }], 1, true],
  orderLoop: () => [sourcePoints()],
  normalise: () => [orderLoop(sourcePoints()), { mm: null, hundred: 'mm' }],
  contourOf: () => [foundChains()],
  blocksOf: () => [readRows('1 0\n0 0')],
  readCoordinates: () => [encoded(listed()), 'marsh.dat'],
  dxfNumber: () => [{ code: 10, value: '1', line: 1 }],
  arcPoints: () => [{ centre: point(), radius: 1, start: 0, sweep: 1 }, 0.1],
  bulgeArc: () => [point(), { x: 1, y: 0 }, 0.3],
  nurbsPoint: () => [bezier(), 2, 0.5],
  nurbsPoints: () => [bezier(), 0.01, 100],
  definingPoints: () => [dxfLine()],
  drawnPoints: () => [dxfLine(), 1],
  readDxfOutline: () => [
    encoded(exportFile('dxf', naca4('2412'), MARSH, dxfOptionsSchema.parse({ chordMm: 220 })).text),
  ],
};

/** Given text, bytes, numbers or functions only. */
export const importCallsWithoutObjects: readonly string[] = [
  'modelTolerance',
  'quoted',
  'linesOf',
  'numbersIn',
  'readRows',
  'eachDxfGroup',
  'readDxf',
];
