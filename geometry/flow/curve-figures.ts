import { type FlowPoint, type SolvedPoint } from './flow-point.ts';

/** A lift coefficient and the angle where it is found. */
export interface AtAngle {
  readonly alphaDeg: number;
  readonly cl: number;
}

/** What decides between sections, read from a curve. A value that the curve does not hold is null. */
export interface CurveFigures {
  /** Highest lift and its angle: the stall. Null when the lift still rises at the end of the curve. */
  readonly maxLift: AtAngle | null;
  /** Abrupt when more than a tenth of the highest lift is lost within two degrees beyond it [own measure]. */
  readonly stall: 'abrupt' | 'gentle' | null;
  readonly bestRatio: (AtAngle & { readonly ratio: number }) | null;
  readonly leastDrag: (AtAngle & { readonly cd: number }) | null;
  readonly zeroLiftDeg: number | null;
  /** Moment about the quarter chord at zero lift. */
  readonly zeroLiftMoment: number | null;
  /**
   * Lift curve slope per degree: straight line through the converged points from a degree below to ten degrees above zero lift that stay
   * below 85 % of the highest lift [own range].
   */
  readonly slopePerDeg: number | null;
  /** Lift coefficients round that of least drag between which drag is at most a fifth higher [own measure]. */
  readonly lowDrag: { readonly from: number; readonly to: number } | null;
}

const SLOPE_RANGE_DEG = 10;
const SLOPE_BELOW = 0.85;
const STALL_LOSS = 0.1;
const STALL_RANGE_DEG = 2;
const LOW_DRAG = 1.2;

/**
 * The figures of a curve of points by ascending angle. Nothing is read across a point that did not converge.
 * @param points from sweep
 */
export function curveFigures(points: readonly FlowPoint[]): CurveFigures {
  const maxLift = highest(points);
  const zero = zeroLift(points);
  const solved = points.filter((point) => point.converged);
  const best = pick(solved, (point) => point.cl / point.cd);
  const least = pick(solved, (point) => -point.cd);
  return {
    maxLift,
    stall: stallOf(points, maxLift),
    bestRatio:
      best && best.cl > 0 ? { alphaDeg: best.alphaDeg, cl: best.cl, ratio: best.cl / best.cd } : null,
    leastDrag: least && { alphaDeg: least.alphaDeg, cl: least.cl, cd: least.cd },
    zeroLiftDeg: zero?.alphaDeg ?? null,
    zeroLiftMoment: zero?.cm ?? null,
    slopePerDeg:
      zero && slopeAbove(solved, zero.alphaDeg, SLOPE_BELOW * (pick(solved, (point) => point.cl)?.cl ?? 0)),
    lowDrag: least && lowDragRange(points, least),
  };
}

function pick(points: readonly SolvedPoint[], worth: (point: SolvedPoint) => number): SolvedPoint | null {
  return points.reduce<SolvedPoint | null>(
    (best, point) => (best && worth(best) >= worth(point) ? best : point),
    null,
  );
}

/** The highest lift with converged neighbours on both sides, by the parabola through the three. */
function highest(points: readonly FlowPoint[]): AtAngle | null {
  const solved = points.filter((point) => point.converged);
  const top = pick(solved, (point) => point.cl);
  const i = points.findIndex((point) => point === top);
  const [a, b, c] = [points[i - 1], points[i], points[i + 1]];
  if (!a?.converged || !b?.converged || !c?.converged) return null;
  const [x1, x2] = [a.alphaDeg - b.alphaDeg, c.alphaDeg - b.alphaDeg];
  const [y1, y2] = [a.cl - b.cl, c.cl - b.cl];
  const curve = (y2 / x2 - y1 / x1) / (x2 - x1);
  const slope = y1 / x1 - curve * x1;
  const x = curve < 0 ? -slope / (2 * curve) : 0;
  return { alphaDeg: b.alphaDeg + x, cl: b.cl + x * (slope + curve * x) };
}

function stallOf(points: readonly FlowPoint[], maxLift: AtAngle | null): 'abrupt' | 'gentle' | null {
  if (!maxLift) return null;
  const beyond = points.filter(
    (point) => point.alphaDeg > maxLift.alphaDeg && point.alphaDeg <= maxLift.alphaDeg + STALL_RANGE_DEG,
  );
  const known = beyond.filter((point) => point.converged);
  if (known.some((point) => point.cl < (1 - STALL_LOSS) * maxLift.cl)) return 'abrupt';
  return known.length > 0 && known.length === beyond.length ? 'gentle' : null;
}

/** Angle and moment where the lift changes sign between two neighbouring converged points. */
function zeroLift(points: readonly FlowPoint[]): { readonly alphaDeg: number; readonly cm: number } | null {
  for (let i = 1; i < points.length; i++) {
    const [a, b] = [points[i - 1], points[i]];
    if (!a?.converged || !b?.converged || a.cl > 0 || b.cl < 0 || a.cl === b.cl) continue;
    const share = a.cl / (a.cl - b.cl);
    return { alphaDeg: a.alphaDeg + share * (b.alphaDeg - a.alphaDeg), cm: a.cm + share * (b.cm - a.cm) };
  }
  return null;
}

function slopeAbove(solved: readonly SolvedPoint[], zeroDeg: number, bound: number): number | null {
  const used = solved.filter(
    ({ alphaDeg, cl }) => alphaDeg >= zeroDeg - 1 && alphaDeg <= zeroDeg + SLOPE_RANGE_DEG && cl <= bound,
  );
  const n = used.length;
  if (n < 3) return null;
  const mean = (value: (point: SolvedPoint) => number) =>
    used.reduce((sum, point) => sum + value(point), 0) / n;
  const [x, y] = [mean((point) => point.alphaDeg), mean((point) => point.cl)];
  const square = mean((point) => (point.alphaDeg - x) ** 2);
  return square > 0 ? mean((point) => (point.alphaDeg - x) * (point.cl - y)) / square : null;
}

/** Lift range of the unbroken run of converged points round the least drag that stay below the bound. */
function lowDragRange(
  points: readonly FlowPoint[],
  least: SolvedPoint,
): { readonly from: number; readonly to: number } {
  const bound = LOW_DRAG * least.cd;
  const at = points.indexOf(least);
  const end = (step: 1 | -1) => {
    let last = least;
    for (let i = at + step; ; i += step) {
      const point = points[i];
      if (!point?.converged || point.cd > bound) return last.cl;
      last = point;
    }
  };
  const [a, b] = [end(-1), end(1)];
  return { from: Math.min(a, b), to: Math.max(a, b) };
}
