import { leastSquares } from '../shapes/least-squares.ts';
import { measuredOutline } from '../shapes/measured.ts';
import { NACA4_LIMITS, type Naca4Shape, designationOf, naca4Outline, snapToDigits } from '../shapes/naca4.ts';
import { shapeSchema } from '../shapes/shape.ts';
import { type TrueChord, trueChordOf } from './loop.ts';
import { largestThicknessAndCamber } from './thickness.ts';
import {
  type ChordPoint,
  type ContourPoints,
  type PointResidual,
  SHEET_CHORD,
  largestOf,
  longestChordOf,
  pointsOnChord,
  residualsOf,
  shareOf,
} from './point-residuals.ts';

/** A 4-digit section that follows the points of a contour within the tolerance of wind-tunnel models. */
export interface FourDigitMatch {
  readonly shape: Naca4Shape;
  /** "NACA 2412" when whole digits lie within the tolerance, which are then preferred; else null. */
  readonly designation: string | null;
  /** The largest deviation, positive where the section lies outside the points. */
  readonly largest: PointResidual;
  /** By how much the section's own chord is turned against the contour's, counter-clockwise. */
  readonly rotationDeg: number;
}

/**
 * The 4-digit section nearest to the points of a contour, by least squares of the deviations square to it (Gauss–Newton in camber,
 * camber position and thickness, once for each trailing edge), when it lies within the tolerance. Contour and section are laid on each
 * other by the chords they are drawn on, or by their longest chords when that comes nearer.
 * @param excluded indices of points that do not count
 * @returns null when no 4-digit section lies within the tolerance
 */
export function matchFourDigits(
  contour: ContourPoints,
  excluded: readonly number[] = [],
): FourDigitMatch | null {
  const left = new Set(excluded);
  const start = measuredStart(contour);
  const targets = [SHEET_CHORD, longestChordOf(contour)].map((chord): Target => {
    const points = pointsOnChord(contour, chord);
    return { chord, points, few: thinned(points, left), excluded: left };
  });
  const found = targets.map((target) => {
    const nearest = (['open', 'closed'] as const).map((trailingEdge) =>
      refined({ ...start, trailingEdge }, target),
    );
    const digits = nearest.map(snapToDigits).filter((shape) => shapeSchema.safeParse(shape).success);
    return { digits: bestOf(digits, target), any: bestOf(nearest, target) };
  });
  return nearer(found.map(({ digits }) => digits)) ?? nearer(found.map(({ any }) => any));
}

function nearer(matches: readonly (FourDigitMatch | null)[]): FourDigitMatch | null {
  const size = (match: FourDigitMatch) => Math.abs(match.largest.deviation);
  return matches.reduce((best, match) => (match && (!best || size(match) < size(best)) ? match : best), null);
}

interface Target {
  /** Of the contour: the sheet's or its longest. */
  readonly chord: TrueChord;
  readonly points: readonly ChordPoint[];
  readonly few: readonly ChordPoint[];
  readonly excluded: ReadonlySet<number>;
}

/** Points taken while searching. */
const MOST_POINTS = 160;

function thinned(points: readonly ChordPoint[], excluded: ReadonlySet<number>): readonly ChordPoint[] {
  const used = points.filter(({ index }) => !excluded.has(index));
  const stride = Math.ceil(used.length / MOST_POINTS);
  return used.filter((_, i) => i % stride === 0);
}

function clamp(value: number, { min, max }: { readonly min: number; readonly max: number }): number {
  return Math.min(max, Math.max(min, value));
}

function measuredStart({ x, y }: ContourPoints): Omit<Naca4Shape, 'trailingEdge'> {
  const { maxCamber, maxCamberPosition, maxThickness } = largestThicknessAndCamber(
    measuredOutline({ kind: 'measured', x, y }),
  );
  return limited({ maxCamber, maxCamberPosition, maxThickness });
}

/** Less camber than this is none: its position would mean nothing. */
const NO_CAMBER = 2e-4;

type Values = Pick<Naca4Shape, 'maxCamber' | 'maxCamberPosition' | 'maxThickness'>;

function limited({ maxCamber, maxCamberPosition, maxThickness }: Values): Omit<Naca4Shape, 'trailingEdge'> {
  const camber = clamp(maxCamber, NACA4_LIMITS.maxCamber);
  const none = camber < NO_CAMBER;
  return {
    kind: 'naca4',
    maxCamber: none ? 0 : camber,
    maxCamberPosition: none ? 0 : clamp(maxCamberPosition, NACA4_LIMITS.maxCamberPosition),
    maxThickness: clamp(maxThickness, NACA4_LIMITS.maxThickness),
  };
}

/** How a section lies from points seen from the like chord of the contour. */
function residuals(shape: Naca4Shape, points: readonly ChordPoint[], { chord, excluded }: Target) {
  const outline = naca4Outline(shape);
  const own = chord === SHEET_CHORD ? SHEET_CHORD : trueChordOf(outline);
  const places = new Map(points.map((point) => [point.index, onSheet(own, point)]));
  const found = residualsOf(outline, points, (i) => places.get(i) ?? { x: 0, y: 0 }, excluded);
  return { found, rotationDeg: chord.rotationDeg - own.rotationDeg };
}

function onSheet({ nose, along, scale }: TrueChord, { x, y }: ChordPoint) {
  return { x: nose.x + scale * (along.x * x - along.y * y), y: nose.y + scale * (along.y * x + along.x * y) };
}

const STEPS = 5;
const DIFFERENCE = 1e-5;
/** A step that changes nothing that could be drawn. */
const SETTLED = 1e-8;

function refined(shape: Naca4Shape, target: Target): Naca4Shape {
  let best = shape;
  const deviations = (values: Naca4Shape) =>
    Float64Array.from(
      residuals(values, target.few, target).found,
      ({ deviation, allowed }) => deviation / allowed,
    );
  for (let step = 0; step < STEPS; step++) {
    const names: readonly (keyof Values)[] =
      best.maxCamber === 0 ? ['maxThickness'] : ['maxThickness', 'maxCamber', 'maxCamberPosition'];
    const here = deviations(best);
    const columns = names.map((name) => {
      const moved = deviations({ ...best, [name]: best[name] + DIFFERENCE });
      return moved.map((value, j) => (value - (here[j] ?? 0)) / DIFFERENCE);
    });
    const change = leastSquares(columns, here);
    if (!change || !change.every(Number.isFinite)) return best;
    const values: Values = { ...best };
    const next = names.reduce((sum, name, i) => ({ ...sum, [name]: best[name] - (change[i] ?? 0) }), values);
    best = { ...best, ...limited(next) };
    if (change.every((value) => Math.abs(value) < SETTLED)) break;
  }
  return best;
}

function bestOf(shapes: readonly Naca4Shape[], target: Target): FourDigitMatch | null {
  let best: { readonly share: number; readonly match: FourDigitMatch } | null = null;
  for (const shape of shapes) {
    const { found, rotationDeg } = residuals(shape, target.points, target);
    const largest = largestOf(found, 'size');
    const share = shareOf(found);
    if (!largest || !(share <= 1) || (best && best.share <= share)) continue;
    if (!shapeSchema.safeParse(shape).success) continue;
    best = {
      share,
      match: { shape, designation: designationOf(shape), largest, rotationDeg },
    };
  }
  return best?.match ?? null;
}
