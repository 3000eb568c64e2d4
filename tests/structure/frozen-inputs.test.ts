import { expect, test } from 'vitest';
import { type Contour } from '#geometry/contour/contour.ts';
import { sidesOf } from '#geometry/contour/chord-line.ts';
import { arcContour } from '#geometry/contour/arcs.ts';
import { sampleCosine } from '#geometry/contour/sampling.ts';
import { datOptionsSchema, dxfOptionsSchema } from '#geometry/formats/options.ts';
import { roundContour } from '#geometry/formats/rounding.ts';
import { similarityOf } from '#geometry/shapes/placement.ts';
import { outlineOf, shapeSchema } from '#geometry/shapes/shape.ts';
import { SMALL_DOCUMENT, SMALL_DRAWING } from '#tests/geometry/formats/drawing-example.ts';
import { MARSH } from '#tests/geometry/formats/identity-example.ts';
import { cuttingCalls, cuttingCallsWithoutObjects } from '#tests/geometry/cutting/frozen-calls.ts';
import { importCalls, importCallsWithoutObjects } from '#tests/geometry/imports/frozen-calls.ts';
import { flowCalls, flowCallsWithoutObjects } from '#tests/geometry/flow/frozen-calls.ts';
import { pageCalls, pageCallsWithoutObjects } from '#tests/geometry/pages/frozen-calls.ts';
import { FREE_FORM, naca4 } from '#tests/geometry/shapes/samples.ts';

type AnyFunction = (...args: readonly unknown[]) => unknown;

const modules: Readonly<Record<string, Readonly<Record<string, unknown>>>> = import.meta.glob(
  '../../geometry/**/*.ts',
  { eager: true },
);
/** Every function that geometry/ gives out, by its name. */
const functions = new Map(
  Object.values(modules)
    .flatMap((module) => Object.entries(module))
    .filter((entry): entry is [string, AnyFunction] => typeof entry[1] === 'function')
    // Classes are made, not called.
    .filter(([, value]) => !/^class\b/.test(value.toString())),
);

const digits = naca4('2412');
const shape = () => structuredClone(FREE_FORM);
const outline = () => outlineOf(digits);
const contour = () => sampleCosine(outline(), 20);
const written = (): Contour => roundContour(contour(), 4);
const arcs = () => arcContour(outline(), 1e-4);
const line = () => sidesOf(outline()).line;
const upper = () => outline().upper;
const point = () => ({ x: 0.3, y: 0.05 });
const zodError = () => shapeSchema.safeParse({}).error;
const columns = () => [Float64Array.of(1, 1, 1), Float64Array.of(0, 1, 2)];
const drawingParts = () => ({
  outline: outline(),
  identity: MARSH,
  chordMm: 100,
  toleranceMm: 0.1,
  layers: ['OUTLINE', 'TEXT'],
  chain: { x: [100, 0, 100], y: [1, 0, -1] },
  extents: { minX: 0, maxX: 100, minY: -1, maxY: 1 },
  spacing: 'tolerance 0.1 mm',
});

/** A call of each function that is given objects. */
const calls: Readonly<Record<string, () => readonly unknown[]>> = {
  halfThickness: () => [naca4('2412'), 0.3],
  thickestStation: () => [naca4('2412')],
  meanLine: () => [naca4('2412'), 0.3],
  naca4Outline: () => [naca4('2412')],
  designationOf: () => [naca4('2412')],
  snapToDigits: () => [naca4('2412')],
  ordinateAt: () => [shape(), 'upper', 0.3],
  cstOutline: () => [shape()],
  leastSquares: () => [columns(), Float64Array.of(1, 2, 3)],
  cstCrossing: () => [shape()],
  naca4Fault: () => [naca4('2412')],
  issuesOf: () => [zodError(), () => ''],
  shapeErrorOf: () => [zodError()],
  scaledWeights: () => [[1, 2, 3]],
  evaluateScaled: () => [Float64Array.of(1, 2, 3), 0.3, 0.7],
  derivativeWeights: () => [[1, 2, 3]],
  elevate: () => [[1, 2, 3]],
  halve: () => [[1, 2, 3]],
  similarityOf: () => [shape().placement],
  toSheet: () => [similarityOf(shape().placement), 0.3, 0.1],
  toChord: () => [similarityOf(shape().placement), point()],
  numberWithin: () => [{ min: 0, max: 1 }, 'from 0 to 1'],
  fractionWithin: () => ['x', { min: 0, max: 1 }],
  outsideChord: () => ['x', { min: 0, max: 1 }],
  raiseOrder: () => [shape(), 'both', 8],
  lowerOrder: () => [shape(), 'both', 3],
  fitWeights: () => [{ n1: 0.5, n2: 1 }, 2, Float64Array.of(0, 0.2, 0.4, 0.6, 0.8), new Float64Array(5)],
  crossesItself: () => [[point(), { x: 0.4, y: 0 }, { x: 0.3, y: -0.05 }]],
  checkShape: () => [shape()],
  outlineOf: () => [shape()],
  canonicalShape: () => [shape()],
  describeShape: () => [shape()],
  withWeight: () => [shape(), 'upper', 1, 0.2],
  noseRadiusOf: () => [shape(), 'upper'],
  withNoseRadius: () => [shape(), 'both', 0.01],
  withEqualNoseRadius: () => [shape()],
  boatTailAngleDegOf: () => [shape(), 'upper'],
  withBoatTailAngleDeg: () => [shape(), 'both', 8],
  weightInfluence: () => [shape(), 'upper', 1, 0.3],
  weightStation: () => [shape(), 'upper', 1],
  weightThrough: () => [shape(), 'upper', 1, point()],
  measure: () => [outline()],
  extentsOf: () => [outline()],
  chordLineOf: () => [outline()],
  stationOn: () => [line(), point()],
  ordinateOn: () => [line(), point()],
  sidesOf: () => [outline()],
  ordinateAtStation: () => [sidesOf(outline()).upper, 0.3],
  pointAtStation: () => [sidesOf(outline()).upper, 0.3],
  sampleCosine: () => [outline(), 20],
  sampleToTolerance: () => [outline(), 1e-4],
  biarc: () => [(t: number) => ({ x: t, y: t * t }), 0, 0.2, { x: 1, y: 0 }, { x: 1, y: 0.4 }],
  arcHeight: () => [{ a: point(), b: { x: 1, y: 0 }, bulge: 0.1 }],
  arcDistance: () => [point(), { a: { x: 0, y: 0 }, b: { x: 1, y: 0 }, bulge: 0.1 }],
  arcExtremes: () => [{ a: point(), b: { x: 1, y: 0 }, bulge: 0.1 }],
  convexCurvature: () => [upper().derivatives(0.3), -1],
  radiiOf: () => [outline()],
  areaProperties: () => [outline()],
  inflectionsOf: () => [upper()],
  arcError: () => [upper(), 0.2, 0.3, [0.25]],
  bestDivision: () => [upper(), []],
  largestChordalError: () => [outline(), contour()],
  fitCst: () => [outline(), { orderUpper: 4, orderLower: 4 }],
  thicknessAt: () => [outline(), 0.3],
  camberAt: () => [outline(), 0.3],
  largestThicknessAndCamber: () => [outline()],
  arcContour: () => [outline(), 1e-4],
  largestArcError: () => [outline(), arcs()],
  arcExtents: () => [arcs()],
  scaleContour: () => [contour(), 220],
  extents: () => [contour()],
  contourPoints: () => [contour()],
  contourAt: () => [outline(), [0, 0.5, 1], [0, 0.5, 1]],
  writeDxf: () => [structuredClone(SMALL_DRAWING), 'r2000'],
  writeDxfDocument: () => [structuredClone(SMALL_DOCUMENT), 'r2000'],
  writeR12: () => [structuredClone(SMALL_DOCUMENT)],
  writeR2000: () => [structuredClone(SMALL_DOCUMENT)],
  dxfVertices: () => [{ layer: 'CUT', chain: structuredClone(SMALL_DRAWING.outline), closed: true }],
  writeSvg: () => [structuredClone(SMALL_DRAWING)],
  writeDat: () => [written(), 'Marsh', datOptionsSchema.parse({})],
  fileNameOf: () => [structuredClone(MARSH), 220, 'dxf'],
  sectionDrawing: () => [drawingParts()],
  textsBelow: () => [['a', 'b'], 220, point()],
  titleOf: () => [structuredClone(MARSH)],
  headerLines: () => [structuredClone(MARSH), { chordMm: 220, spacing: 'tolerance 0.1 mm' }],
  parseExportOptions: () => ['dxf', { chordMm: '220' }],
  exportFile: () => ['dxf', shape(), structuredClone(MARSH), dxfOptionsSchema.parse({ chordMm: 220 })],
  roundContour: () => [contour(), 4],
  withoutRepeats: () => [written()],
  ...cuttingCalls,
  ...flowCalls,
  ...pageCalls,
  ...importCalls,
};

/** Given numbers, text or functions only; writeTables adds to the collector of tags that it is given for that. */
const withoutObjects = [
  ...importCallsWithoutObjects,
  'naca4NoseRadius',
  'naca4ThicknessOfNose',
  'parseDesignation',
  'parameterOf',
  'stationOf',
  'shapeError',
  'binomial',
  'percent',
  'safeguardedRoot',
  'goldenMaximum',
  'gaussLegendre',
  'readDat',
  'singleLine',
  'dxfText',
  'slugOf',
  'shortLength',
  'xmlText',
  'fixed',
  'roundTo',
  'writeTables',
  ...cuttingCallsWithoutObjects,
  ...flowCallsWithoutObjects,
  ...pageCallsWithoutObjects,
];

/** Freezes a value with all that is in it; the numbers of typed arrays cannot be frozen and are compared instead. */
function freeze(value: unknown): void {
  if (typeof value !== 'object' || value === null || ArrayBuffer.isView(value)) return;
  Object.freeze(value);
  for (const part of Object.values(value)) freeze(part);
}

/** A copy of the data in a value, functions left out. */
function dataOf(value: unknown): unknown {
  if (ArrayBuffer.isView(value)) return Array.from(value as Float64Array);
  if (Array.isArray(value)) return value.map(dataOf);
  if (typeof value !== 'object' || value === null) return typeof value === 'function' ? undefined : value;
  return Object.fromEntries(Object.entries(value).map(([key, part]) => [key, dataOf(part)]));
}

/** Whether a call leaves all that it is given as it was. */
function leavesInputs(call: AnyFunction, args: readonly unknown[]): boolean {
  freeze(args);
  const before = dataOf(args);
  call(...args);
  return JSON.stringify(dataOf(args)) === JSON.stringify(before);
}

test('each function of geometry/ has a call here, or takes no objects', () => {
  expect([...Object.keys(calls), ...withoutObjects].sort()).toEqual([...functions.keys()].sort());
});

test.each(Object.entries(calls))('%s leaves what it is given as it was', (name, args) => {
  const call = functions.get(name);
  if (!call) throw new Error(`geometry/ has no function ${name}`);
  expect(leavesInputs(call, args())).toBe(true);
});

test('a function that writes on its argument is found', () => {
  const sorting: AnyFunction = (list) => (list as number[]).sort();
  const doubling: AnyFunction = (numbers) =>
    (numbers as Float64Array).forEach((value, i, all) => (all[i] = 2 * value));
  expect(() => leavesInputs(sorting, [[2, 1]])).toThrow(TypeError);
  expect(leavesInputs(doubling, [Float64Array.of(1, 2)])).toBe(false);
});
