import { sampleCosine } from '#geometry/contour/sampling.ts';
import { measure } from '#geometry/contour/measures.ts';
import { scaleContour, extents } from '#geometry/contour/contour.ts';
import { writeDxf } from '#geometry/formats/dxf.ts';
import { exportFile, parseExportOptions } from '#geometry/formats/export.ts';
import { sectionDrawing } from '#geometry/formats/section-drawing.ts';
import { LAYERS } from '#geometry/formats/options.ts';
import { outlineOf, type Shape } from '#geometry/shapes/shape.ts';
import { type Bench, type Figure } from './figures.ts';

const FOUR_DIGIT: Shape = {
  kind: 'naca4',
  maxCamber: 0.02,
  maxCamberPosition: 0.4,
  maxThickness: 0.12,
  trailingEdge: 'open',
};
const FREE_FORM: Shape = {
  kind: 'cst',
  upper: [0.17, 0.16, 0.14, 0.16, 0.15, 0.16, 0.17, 0.18, 0.16],
  lower: [-0.14, -0.1, -0.09, -0.08, -0.06, -0.05, -0.04, -0.03, -0.02],
  n1: 0.5,
  n2: 1,
  trailingEdgeGap: 0.0025,
};
const IDENTITY = {
  sectionName: 'Marsh 2412',
  versionNumber: 3,
  status: 'released',
  designation: 'NACA 2412',
  checksum: '3f2a9c81b0de5577a1c0ffee00112233445566778899aabbccddeeff00112233',
};

const WARM_UP = 300;
const RUNS = 501;

/** Median time of one call in ms, after the engine has compiled it. */
function medianMs(work: () => unknown): number {
  let kept: unknown;
  for (let i = 0; i < WARM_UP; i += 1) kept = work();
  const times = Array.from({ length: RUNS }, () => {
    const start = performance.now();
    kept = work();
    return performance.now() - start;
  });
  if (kept === undefined) throw new Error('Nothing was measured.');
  return times.sort((a, b) => a - b)[(RUNS - 1) / 2] ?? NaN;
}

function figuresOf(kind: string, shape: Shape): Figure[] {
  const outline = outlineOf(shape);
  const chain = scaleContour(sampleCosine(outline, 200), 220);
  const drawing = sectionDrawing({
    outline,
    identity: IDENTITY,
    chordMm: 220,
    toleranceMm: 0.01,
    layers: LAYERS,
    chain,
    extents: extents(chain),
    spacing: '200 points per surface',
  });
  const straight = parseExportOptions('dxf', { chordMm: 220 });
  const arcs = parseExportOptions('dxf', { chordMm: 220, arcs: true });
  const ms = (what: string, work: () => unknown, goal?: number): Figure => ({
    what: `${kind}: ${what}`,
    value: medianMs(work),
    unit: 'ms',
    ...(goal === undefined ? {} : { goal }),
  });
  return [
    ms('contour of 400 points', () => sampleCosine(outlineOf(shape), 200), 0.1),
    ms('all measures', () => measure(outlineOf(shape)), 0.5),
    ms('DXF R2000 of 400 points', () => writeDxf(drawing, 'r2000'), 2),
    ms('DXF R12 of 400 points', () => writeDxf(drawing, 'r12'), 2),
    ms('whole DXF export at 0.01 mm, checked', () => exportFile('dxf', shape, IDENTITY, straight)),
    ms('whole DXF export with arcs, checked', () => exportFile('dxf', shape, IDENTITY, arcs)),
  ];
}

const bench: Bench = {
  name: 'Geometry (medians of 501 warm calls)',
  run: () =>
    Promise.resolve([...figuresOf('4-digit', FOUR_DIGIT), ...figuresOf('free form order 8', FREE_FORM)]),
};
export default bench;
