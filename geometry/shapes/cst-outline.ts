import { derivativeWeights, evaluateScaled, scaledWeights } from './bernstein.ts';
import { type CstShape, type Surface } from './cst-schema.ts';
import { type CurvePoint, type Outline, type SurfaceCurve } from './outline.ts';
import { similarityOf, toSheet } from './placement.ts';

const QUARTER = Math.PI / 2;

/**
 * How near an end second derivatives are taken when they grow without bound there (class exponents that are no multiple of one
 * half): at this value of sin or cos of πt/2 instead of at zero, so that what is handed out stays finite.
 */
const END_OFFSET = 1e-9;

/** s^p with 0^0 = 1, and the powers that nearly every section uses without a call of pow. */
function power(base: number, exponent: number): number {
  if (exponent === 0) return 1;
  if (exponent === 1) return base;
  if (exponent === 2) return base * base;
  return Math.pow(base, exponent);
}

/** Class function C = s^a c^b with s = sin(πt/2), c = cos(πt/2), a = 2 n1, b = 2 n2, with its first and second derivative by t. */
interface ClassFunction {
  readonly value: number;
  readonly first: number;
  readonly second: number;
}

function classFunction(s: number, c: number, a: number, b: number): ClassFunction {
  const sa = power(s, a);
  const cb = power(c, b);
  const first = a * power(s, a - 1) * cb * c - b * sa * s * power(c, b - 1);
  let second = -(a * (b + 1) + b * (a + 1)) * sa * cb;
  if (a !== 1) second += a * (a - 1) * power(a < 2 ? Math.max(s, END_OFFSET) : s, a - 2) * cb * c * c;
  if (b !== 1) second += b * (b - 1) * sa * s * s * power(b < 2 ? Math.max(c, END_OFFSET) : c, b - 2);
  return { value: sa * cb, first: QUARTER * first, second: QUARTER * QUARTER * second };
}

/** Ordinate of a surface in the shape's own chord frame. @param station 0 … 1 */
export function ordinateAt(shape: CstShape, surface: Surface, station: number): number {
  const rest = 1 - station;
  const halfGap = (surface === 'upper' ? shape.trailingEdgeGap : -shape.trailingEdgeGap) / 2;
  const classValue = Math.pow(station, shape.n1) * Math.pow(rest, shape.n2);
  return classValue * evaluateScaled(scaledWeights(shape[surface]), station, rest) + station * halfGap;
}

/** The outline of a CST shape on the sheet. The shape is taken as valid (see checkShape). */
export function cstOutline(shape: CstShape): Outline {
  const frame = similarityOf(shape.placement);
  const upper = surfaceCurve(shape, 'upper');
  const lower = surfaceCurve(shape, 'lower');
  const [upperEnd, lowerEnd] = [upper.at(1), lower.at(1)];
  return {
    upper,
    lower,
    sharp: upperEnd.x === lowerEnd.x && upperEnd.y === lowerEnd.y,
    meanLine: (station) =>
      toSheet(
        frame,
        station,
        (ordinateAt(shape, 'upper', station) + ordinateAt(shape, 'lower', station)) / 2,
      ),
  };
}

function surfaceCurve(shape: CstShape, surface: Surface): SurfaceCurve {
  const frame = similarityOf(shape.placement);
  const halfGap = (surface === 'upper' ? shape.trailingEdgeGap : -shape.trailingEdgeGap) / 2;
  const a = 2 * shape.n1;
  const b = 2 * shape.n2;
  const weights = shape[surface];
  const slopes = derivativeWeights(weights);
  const value = scaledWeights(weights);
  const first = scaledWeights(slopes);
  const second = scaledWeights(derivativeWeights(slopes));
  return {
    breaks: [],
    at(t) {
      const s = Math.sin(QUARTER * t);
      const c = Math.sin(QUARTER * (1 - t));
      const x = s * s;
      const y = power(s, a) * power(c, b) * evaluateScaled(value, x, c * c) + x * halfGap;
      return { x: frame.x + frame.a * x - frame.b * y, y: frame.y + frame.b * x + frame.a * y };
    },
    derivatives(t): CurvePoint {
      const s = Math.sin(QUARTER * t);
      const c = Math.sin(QUARTER * (1 - t));
      const x = s * s;
      const rest = c * c;
      const x1 = 2 * QUARTER * s * c;
      const x2 = 2 * QUARTER * QUARTER * (rest - x);
      const { value: c0, first: c1, second: c2 } = classFunction(s, c, a, b);
      const s0 = evaluateScaled(value, x, rest);
      const s1 = evaluateScaled(first, x, rest);
      const s2 = evaluateScaled(second, x, rest);
      const y = c0 * s0 + x * halfGap;
      const y1 = c1 * s0 + c0 * s1 * x1 + x1 * halfGap;
      const y2 = c2 * s0 + 2 * c1 * s1 * x1 + c0 * (s2 * x1 * x1 + s1 * x2) + x2 * halfGap;
      return {
        x: frame.x + frame.a * x - frame.b * y,
        y: frame.y + frame.b * x + frame.a * y,
        dx: frame.a * x1 - frame.b * y1,
        dy: frame.b * x1 + frame.a * y1,
        ddx: frame.a * x2 - frame.b * y2,
        ddy: frame.b * x2 + frame.a * y2,
      };
    },
  };
}
