import { z } from 'zod';
import { type CurvePoint, type Outline, type SurfaceCurve, parameterOf } from './outline.ts';
import { fractionWithin, outsideChord } from './fields.ts';

/** The accepted ranges in fractions of chord. The position's range counts when there is camber; without it, 0 is accepted too. */
export const NACA4_LIMITS = {
  maxCamber: { min: 0, max: 0.12 },
  maxCamberPosition: { min: 0.1, max: 0.9 },
  maxThickness: { min: 0.01, max: 0.4 },
} as const;

const POSITION_WITHOUT_CAMBER = { min: 0, max: NACA4_LIMITS.maxCamberPosition.max };

/**
 * A section of the NACA 4-digit family with continuous values: Jacobs, Ward & Pinkerton, NACA Report 460 (1933).
 * Trailing edge "open" is the published thickness polynomial (last coefficient −0.1015), "closed" the variant with −0.1036.
 */
export const naca4Schema = z
  .strictObject({
    kind: z.literal('naca4'),
    maxCamber: fractionWithin('maxCamber', NACA4_LIMITS.maxCamber),
    maxCamberPosition: fractionWithin('maxCamberPosition', POSITION_WITHOUT_CAMBER),
    maxThickness: fractionWithin('maxThickness', NACA4_LIMITS.maxThickness),
    trailingEdge: z.enum(['open', 'closed'], { error: 'trailingEdge must be "open" or "closed"' }),
  })
  .refine((shape) => shape.maxCamber === 0 || shape.maxCamberPosition >= NACA4_LIMITS.maxCamberPosition.min, {
    path: ['maxCamberPosition'],
    error: `${outsideChord('maxCamberPosition', NACA4_LIMITS.maxCamberPosition)} when there is camber`,
    when: ({ issues }) => issues.length === 0,
  });

export type Naca4Shape = Readonly<z.infer<typeof naca4Schema>>;

/**
 * Coefficients of the half-thickness in powers of s = sqrt(x), without the last: yt = 5 t s (a₀ + a₁ s + a₂ s³ + a₃ s⁵ + a₄ s⁷).
 * NACA Report 460, eq. for the basic thickness; printed also by Ladson & Brooks, NASA TM X-3284 (1975).
 */
const A0 = 0.2969;
const A1 = -0.126;
const A2 = -0.3516;
const A3 = 0.2843;
const LAST = { open: -0.1015, closed: -0.1036 } as const;
/** a₀ + … + a₄: the half-thickness left at the trailing edge, in units of 5 t. Written out so that "closed" is exactly zero. */
const REST = { open: 0.0021, closed: 0 } as const;

/**
 * Half-thickness of the section at a station of the mean line, laid off square to it.
 * @param station 0 … 1, fractions of chord
 */
export function halfThickness(shape: Naca4Shape, station: number): number {
  return 5 * shape.maxThickness * halfThicknessForm(Math.sqrt(station), REST[shape.trailingEdge]);
}

/** The polynomial divided by (1 − s), so that it reaches its value at the trailing edge without cancellation. */
function halfThicknessForm(s: number, rest: number): number {
  const s2 = s * s;
  const quotient =
    A0 + (A0 + A1) * (s + s2) + (A0 + A1 + A2) * s2 * (s + s2) + (A0 + A1 + A2 + A3) * s2 * s2 * (s + s2);
  return s * ((1 - s) * quotient + rest * s2 * s2 * s2 * s);
}

/**
 * Nose radius in fractions of chord at a thickness: the polynomial begins as 5 t a₀ √x, so R = (5 t a₀)² / 2 (NACA Report 824
 * prints 1.1019 t²).
 * @param maxThickness fractions of chord, 0 or more
 */
export function naca4NoseRadius(maxThickness: number): number {
  return (5 * A0 * maxThickness) ** 2 / 2;
}

/** The thickness, in fractions of chord, that has a nose radius. @param radius fractions of chord; below 0 counts as 0 */
export function naca4ThicknessOfNose(radius: number): number {
  return Math.sqrt(2 * Math.max(0, radius)) / (5 * A0);
}

/**
 * Where the half-thickness is largest, as a station of the mean line: nominally 30 % chord; computed here as the zero of the
 * polynomial's derivative with each of its last coefficients.
 */
const THICKEST_STATION = { open: 0.29983, closed: 0.29953 } as const;

/** The station of the mean line (fractions of chord) at which a 4-digit section is thickest. */
export function thickestStation(shape: Naca4Shape): number {
  return THICKEST_STATION[shape.trailingEdge];
}

/**
 * Ordinate and slope of the mean line: two parabolas that meet at the position of the maximum (NACA Report 460).
 * @param station 0 … 1, fractions of chord
 */
export function meanLine(shape: Naca4Shape, station: number): { readonly y: number; readonly slope: number } {
  const { maxCamber: m, maxCamberPosition: p } = shape;
  if (m === 0) return { y: 0, slope: 0 };
  const ahead = station < p;
  const k = ahead ? m / (p * p) : m / ((1 - p) * (1 - p));
  return {
    y: ahead ? k * station * (2 * p - station) : k * (1 - station) * (1 + station - 2 * p),
    slope: 2 * k * (p - station),
  };
}

/**
 * The outline of a 4-digit section: the thickness laid off at right angles to the mean line at the construction station
 * x = sin²(πt/2) (Report 460; Abbott, von Doenhoff & Stivers, NACA Report 824, 1945). A cambered nose therefore reaches a little
 * ahead of x = 0, as the published sections do. The shape is taken as valid (see checkShape).
 */
export function naca4Outline(shape: Naca4Shape): Outline {
  return {
    upper: surface(shape, 1),
    lower: surface(shape, -1),
    sharp: shape.trailingEdge === 'closed',
    meanLine: (station) => ({ x: station, y: meanLine(shape, station).y }),
  };
}

function surface(shape: Naca4Shape, side: 1 | -1): SurfaceCurve {
  const { maxCamber: m, maxCamberPosition: p } = shape;
  const scale = 5 * side * shape.maxThickness;
  const rest = REST[shape.trailingEdge];
  const last = LAST[shape.trailingEdge];
  const kAhead = m === 0 ? 0 : m / (p * p);
  const kBehind = m === 0 ? 0 : m / ((1 - p) * (1 - p));
  const h = Math.PI / 2;
  return {
    breaks: m === 0 ? [] : [parameterOf(p)],
    at(t) {
      const s = Math.sin(h * t);
      const x = s * s;
      const y = scale * halfThicknessForm(s, rest);
      if (m === 0) return { x, y };
      const ahead = x < p;
      const slope = 2 * (ahead ? kAhead : kBehind) * (p - x);
      const camber = ahead ? kAhead * x * (2 * p - x) : kBehind * (1 - x) * (1 + x - 2 * p);
      const cos = 1 / Math.sqrt(1 + slope * slope);
      return { x: x - y * slope * cos, y: camber + y * cos };
    },
    derivatives(t): CurvePoint {
      const s = Math.sin(h * t);
      const c = Math.sin(h * (1 - t));
      const x = s * s;
      const x1 = 2 * h * s * c;
      const x2 = 2 * h * h * (c * c - x);
      const bySqrt = scale * (A0 + s * (2 * A1 + x * (4 * A2 + x * (6 * A3 + x * 8 * last))));
      const bySqrt2 = scale * (2 * A1 + x * (12 * A2 + x * (30 * A3 + x * 56 * last)));
      const y = scale * halfThicknessForm(s, rest);
      const y1 = bySqrt * h * c;
      const y2 = h * h * (bySqrt2 * c * c - bySqrt * s);
      const ahead = x < p;
      const k = ahead ? kAhead : kBehind;
      const slope = 2 * k * (p - x);
      const camber = ahead ? k * x * (2 * p - x) : k * (1 - x) * (1 + x - 2 * p);
      const norm = 1 + slope * slope;
      const cos = 1 / Math.sqrt(norm);
      const sin = slope * cos;
      const turn1 = (-2 * k * x1) / norm;
      const turn2 = (-2 * k * x2) / norm - 2 * slope * turn1 * turn1;
      return {
        x: x - y * sin,
        y: camber + y * cos,
        dx: x1 - y1 * sin - y * cos * turn1,
        dy: slope * x1 + y1 * cos - y * sin * turn1,
        ddx: x2 - y2 * sin - 2 * y1 * cos * turn1 + y * (sin * turn1 * turn1 - cos * turn2),
        ddy:
          -2 * k * x1 * x1 +
          slope * x2 +
          y2 * cos -
          2 * y1 * sin * turn1 -
          y * (cos * turn1 * turn1 + sin * turn2),
      };
    },
  };
}

/** How far a value may lie from a whole digit (in digits) and still be called by it. */
const DIGIT_TOLERANCE = 1e-9;

/** "NACA 2412" when camber, position and thickness are whole digits, else null. Without camber the position does not count. */
export function designationOf(shape: Naca4Shape): string | null {
  const camber = wholeDigits(shape.maxCamber, 100);
  const position = camber === 0 ? 0 : wholeDigits(shape.maxCamberPosition, 10);
  const thickness = wholeDigits(shape.maxThickness, 100);
  if (camber === null || position === null || thickness === null || camber > 9) return null;
  return `NACA ${camber}${position}${String(thickness).padStart(2, '0')}`;
}

function wholeDigits(value: number, unit: number): number | null {
  const digits = Math.round(value * unit);
  return Math.abs(value - digits / unit) <= DIGIT_TOLERANCE ? digits : null;
}

/** Reads "2412", "NACA 2412" or "naca-0012"; null when it is no 4-digit designation, or one outside the accepted ranges. */
export function parseDesignation(
  text: string,
): Pick<Naca4Shape, 'maxCamber' | 'maxCamberPosition' | 'maxThickness'> | null {
  const match = /^\s*(?:naca[\s_-]*)?(\d)(\d)(\d\d)\s*$/i.exec(text);
  if (!match) return null;
  const values = {
    maxCamber: Number(match[1]) / 100,
    maxCamberPosition: Number(match[2]) / 10,
    maxThickness: Number(match[3]) / 100,
  };
  if (values.maxCamber === 0 && values.maxCamberPosition !== 0) return null;
  return naca4Schema.safeParse({ kind: 'naca4', trailingEdge: 'closed', ...values }).success ? values : null;
}

/** The shape with the nearest values that four digits can write: camber 0 … 9 %, position in tenths, thickness in whole per cent. */
export function snapToDigits(shape: Naca4Shape): Naca4Shape {
  const maxCamber = Math.min(9, Math.round(shape.maxCamber * 100)) / 100;
  const tenths = Math.round(shape.maxCamberPosition * 10);
  return {
    ...shape,
    maxCamber,
    maxCamberPosition: (maxCamber === 0 ? tenths : Math.min(9, Math.max(1, tenths))) / 10,
    maxThickness: Math.min(40, Math.max(1, Math.round(shape.maxThickness * 100))) / 100,
  };
}
