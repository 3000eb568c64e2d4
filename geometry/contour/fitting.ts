import { type Point } from '../point.ts';
import { type CstShape, cstOutline } from '../shapes/cst.ts';
import { FIT_STATIONS, fitWeights } from '../shapes/cst-order.ts';
import {
  type CurvePoint,
  type Outline,
  type SurfaceCurve,
  parameterOf,
  stationOf,
} from '../shapes/outline.ts';
import { checkShape } from '../shapes/shape.ts';
import { safeguardedRoot } from './roots.ts';

/** A free-form shape fitted to an outline, and how well. */
interface CstFit {
  /** With a placement when the source's true chord is not the line from (0, 0) to (1, 0), so that the shape lies where the source lay. */
  readonly shape: CstShape;
  /** Angle of the true chord, counter-clockwise from the sheet's chord, degrees. */
  readonly rotationDeg: number;
  /** The true nose: the point of the outline farthest from the middle of the trailing edge. */
  readonly nose: Point;
  /** Length of the true chord. */
  readonly scale: number;
  /** Largest normal distance of the fitted surfaces from the source outline, in fractions of the sheet's chord. */
  readonly residual: { readonly upper: number; readonly lower: number; readonly largest: number };
}

/** Class exponents of a round nose and a pointed or blunt trailing edge (Kulfan & Bussoletti, AIAA 2006-6948). */
const EXPONENTS = { n1: 0.5, n2: 1 } as const;
const T_TOLERANCE = 1e-13;

/**
 * Fits a CST shape to an outline by linear least squares of its ordinates on 201 cosine stations, the trailing-edge term taken out first.
 *
 * The chord is referenced anew first: a cambered 4-digit nose reaches ahead of x = 0, and no order of weights can follow it there
 * (0.2 to 2 % of chord are missed). So the point farthest from the middle of the trailing edge becomes the nose, the outline is split
 * there, shifted, turned and scaled to the unit chord; the placement brings the fit back to where the source lay.
 *
 * @param options order of each surface, whole, 2 … 12
 * @throws ShapeError when an order is out of range or the fitted shape is refused by checkShape
 */
export function fitCst(
  source: Outline,
  options: { readonly orderUpper: number; readonly orderLower: number },
): CstFit {
  const loop = loopOf(source);
  const chord = trueChordOf(source, loop);
  const upper = stationsOn(loop, chord, 1);
  const lower = stationsOn(loop, chord, -1);
  const gap = source.sharp ? 0 : local(chord, loop(1)).y - local(chord, loop(-1)).y;
  const weights = (side: Stations, order: number, halfGap: number) =>
    fitWeights(
      EXPONENTS,
      order,
      side.stations,
      side.ordinates.map((y, j) => y - halfGap * (side.stations[j] ?? 0)),
    );
  const { nose, scale, rotationDeg } = chord;
  const moved = nose.x !== 0 || nose.y !== 0 || scale !== 1 || rotationDeg !== 0;
  const shape: CstShape = {
    kind: 'cst',
    upper: weights(upper, options.orderUpper, gap / 2),
    lower: weights(lower, options.orderLower, -gap / 2),
    ...EXPONENTS,
    trailingEdgeGap: gap,
    ...(moved ? { placement: { x: nose.x, y: nose.y, rotationDeg, scale } } : {}),
  };
  checkShape(shape);
  const fitted = cstOutline(shape);
  const residualUpper = largestDistance(fitted.upper, loop, upper);
  const residualLower = largestDistance(fitted.lower, loop, lower);
  return {
    shape,
    rotationDeg,
    nose,
    scale,
    residual: { upper: residualUpper, lower: residualLower, largest: Math.max(residualUpper, residualLower) },
  };
}

/** The whole outline as one curve of w: −1 lower trailing edge, 0 where the surfaces meet, 1 upper trailing edge. */
type Loop = (w: number) => CurvePoint;

function loopOf({ upper, lower }: Outline): Loop {
  return (w) => {
    if (w >= 0) return upper.derivatives(w);
    const point = lower.derivatives(-w);
    return { ...point, dx: -point.dx, dy: -point.dy };
  };
}

interface TrueChord {
  readonly nose: Point;
  readonly noseW: number;
  readonly scale: number;
  readonly rotationDeg: number;
  /** Unit vector from nose to trailing edge. */
  readonly along: Point;
}

const SCAN = 128;

function trueChordOf(source: Outline, loop: Loop): TrueChord {
  const [u, l] = [source.upper.at(1), source.lower.at(1)];
  const edge = { x: (u.x + l.x) / 2, y: (u.y + l.y) / 2 };
  const noseW = farthestFrom(edge, loop);
  const { x, y } = loop(noseW);
  const [dx, dy] = [edge.x - x, edge.y - y];
  const scale = Math.hypot(dx, dy);
  const rotationDeg = (Math.atan2(dy, dx) * 180) / Math.PI;
  return { nose: { x, y }, noseW, scale, rotationDeg, along: { x: dx / scale, y: dy / scale } };
}

/** w of the point farthest from the trailing edge: a scan, then the root of the distance's derivative. */
function farthestFrom(edge: Point, loop: Loop): number {
  let [best, largest] = [0, -1];
  for (let i = -SCAN; i <= SCAN; i++) {
    const { x, y } = loop(i / SCAN);
    const square = (x - edge.x) ** 2 + (y - edge.y) ** 2;
    if (square > largest) [best, largest] = [i / SCAN, square];
  }
  const evaluate = (w: number) => {
    const { x, y, dx, dy, ddx, ddy } = loop(w);
    const [rx, ry] = [x - edge.x, y - edge.y];
    return { value: rx * dx + ry * dy, slope: dx * dx + dy * dy + rx * ddx + ry * ddy };
  };
  const [before, after] = [Math.max(-1, best - 1 / SCAN), Math.min(1, best + 1 / SCAN)];
  if (evaluate(before).value <= 0 || evaluate(after).value >= 0) return best;
  return safeguardedRoot(evaluate, after, before, best, T_TOLERANCE);
}

/** A point of the sheet in the true chord's frame, in fractions of the true chord. */
function local({ nose, scale, along }: TrueChord, point: Point): Point {
  const [dx, dy] = [point.x - nose.x, point.y - nose.y];
  return { x: (dx * along.x + dy * along.y) / scale, y: (dy * along.x - dx * along.y) / scale };
}

interface Stations {
  readonly stations: Float64Array;
  readonly ordinates: Float64Array;
  /** w of the source point at each station. */
  readonly parameters: Float64Array;
}

/** The source's ordinates on the cosine stations that the side reaches; an oblique blunt trailing edge may end just before the last. */
function stationsOn(loop: Loop, chord: TrueChord, side: 1 | -1): Stations {
  const end = local(chord, loop(side)).x;
  const stations = Float64Array.from({ length: FIT_STATIONS }, (_, j) =>
    stationOf(j / (FIT_STATIONS - 1)),
  ).filter((station) => station <= end);
  const parameters = stations.map((station) => {
    const evaluate = (w: number) => {
      const point = loop(w);
      const { along, scale } = chord;
      return {
        value: local(chord, point).x - station,
        slope: (point.dx * along.x + point.dy * along.y) / scale,
      };
    };
    const start = side * parameterOf(station);
    return station === 0 ? chord.noseW : safeguardedRoot(evaluate, chord.noseW, side, start, T_TOLERANCE);
  });
  return { stations, parameters, ordinates: parameters.map((w) => local(chord, loop(w)).y) };
}

/** Largest distance of a fitted surface from the source, each foot found by Newton's method from the source point at the same station. */
function largestDistance(fitted: SurfaceCurve, loop: Loop, source: Stations): number {
  let largest = 0;
  source.stations.forEach((station, j) => {
    const point = fitted.at(parameterOf(station));
    largest = Math.max(largest, distanceTo(loop, point, source.parameters[j] ?? 0));
  });
  return largest;
}

const NEWTON_STEPS = 8;

function distanceTo(loop: Loop, point: Point, start: number): number {
  let w = start;
  let nearest = Infinity;
  for (let step = 0; step <= NEWTON_STEPS; step++) {
    const { x, y, dx, dy, ddx, ddy } = loop(w);
    const [rx, ry] = [x - point.x, y - point.y];
    nearest = Math.min(nearest, Math.sqrt(rx * rx + ry * ry));
    const bend = dx * dx + dy * dy + rx * ddx + ry * ddy;
    if (!(bend > 0)) break;
    w = Math.min(1, Math.max(-1, w - (rx * dx + ry * dy) / bend));
  }
  return nearest;
}
