import { type Point } from '../point.ts';
import { type CstShape, cstOutline } from '../shapes/cst.ts';
import { FIT_STATIONS, fitWeights } from '../shapes/cst-order.ts';
import { type Outline, type SurfaceCurve, parameterOf, stationOf } from '../shapes/outline.ts';
import { checkShape } from '../shapes/shape.ts';
import { type Loop, type TrueChord, loopOf, nearestOn, onChord, trueChordOf } from './loop.ts';
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
  const chord = trueChordOf(source);
  const upper = stationsOn(loop, chord, 1);
  const lower = stationsOn(loop, chord, -1);
  const gap = source.sharp ? 0 : onChord(chord, loop(1)).y - onChord(chord, loop(-1)).y;
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

interface Stations {
  readonly stations: Float64Array;
  readonly ordinates: Float64Array;
  /** w of the source point at each station. */
  readonly parameters: Float64Array;
}

/** The source's ordinates on the cosine stations that the side reaches; an oblique blunt trailing edge may end just before the last. */
function stationsOn(loop: Loop, chord: TrueChord, side: 1 | -1): Stations {
  const end = onChord(chord, loop(side)).x;
  const stations = Float64Array.from({ length: FIT_STATIONS }, (_, j) =>
    stationOf(j / (FIT_STATIONS - 1)),
  ).filter((station) => station <= end);
  const parameters = stations.map((station) => {
    const evaluate = (w: number) => {
      const point = loop(w);
      const { along, scale } = chord;
      return {
        value: onChord(chord, point).x - station,
        slope: (point.dx * along.x + point.dy * along.y) / scale,
      };
    };
    const start = side * parameterOf(station);
    return station === 0 ? chord.noseW : safeguardedRoot(evaluate, chord.noseW, side, start, T_TOLERANCE);
  });
  return { stations, parameters, ordinates: parameters.map((w) => onChord(chord, loop(w)).y) };
}

/** Largest distance of a fitted surface from the source, each foot found by Newton's method from the source point at the same station. */
function largestDistance(fitted: SurfaceCurve, loop: Loop, source: Stations): number {
  let largest = 0;
  source.stations.forEach((station, j) => {
    const point = fitted.at(parameterOf(station));
    largest = Math.max(largest, nearestOn(loop, point, source.parameters[j] ?? 0).distance);
  });
  return largest;
}
