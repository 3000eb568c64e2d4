import { type Point } from '#geometry/point.ts';
import { convexCurvature } from '#geometry/contour/curvature.ts';
import { stationOf } from '#geometry/shapes/outline.ts';
import { type SectionDrawing } from './section-drawing.ts';

/** Thickness and camber along the chord, square to the sheet's chord line; fractions of chord. */
interface ThicknessDistribution {
  readonly thickness: readonly Point[];
  readonly camber: readonly Point[];
}

const STATIONS = 81;

/**
 * Reads thickness and camber off the sampled contour, by straight lines between its points: good for drawing, where the
 * error is far below a pixel. Values that are stated come from the exact outline.
 */
export function thicknessDistribution({ contour }: SectionDrawing): ThicknessDistribution {
  const { x, y, noseIndex } = contour;
  const upper = surfaceReader(noseIndex, -1);
  const lower = surfaceReader(noseIndex, 1);
  const thickness: Point[] = [];
  const camber: Point[] = [];
  for (let i = 0; i < STATIONS; i++) {
    const station = stationOf(i / (STATIONS - 1));
    const high = upper(station);
    const low = lower(station);
    if (high === null || low === null) continue;
    thickness.push({ x: station, y: Math.max(0, high - low) });
    camber.push({ x: station, y: (high + low) / 2 });
  }
  return { thickness, camber };

  /** Walks a surface from the nose; stations must come in ascending order. */
  function surfaceReader(start: number, direction: 1 | -1): (station: number) => number | null {
    let index = start;
    // The last point of a closed contour stands once, at index 0.
    const at = (i: number) => (i >= x.length ? 0 : i);
    return (station) => {
      while (index >= 0 && index < x.length) {
        const next = at(index + direction);
        const fromX = x[index] ?? 0;
        const toX = x[next] ?? Number.NaN;
        if (Number.isNaN(toX)) return y[index] ?? null;
        if (toX >= station) {
          const share = toX === fromX ? 0 : Math.min(1, Math.max(0, (station - fromX) / (toX - fromX)));
          return (y[index] ?? 0) + share * ((y[next] ?? 0) - (y[index] ?? 0));
        }
        if (next === 0) return y[0] ?? null;
        index += direction;
      }
      return null;
    };
  }
}

/** Curvature along both surfaces in units of 1/chord, positive where the section is convex. */
interface CurvatureDistribution {
  readonly upper: readonly Point[];
  readonly lower: readonly Point[];
}

const LAST_T = 0.985;
const CURVATURE_POINTS = 121;

/**
 * Curvature of both surfaces over the chord, from the exact derivatives. The last two hundredths of a per cent before the
 * trailing edge are left out: there the parameter stands still and the outline has a corner.
 */
export function curvatureDistribution({ outline }: SectionDrawing): CurvatureDistribution {
  const along = (surface: 'upper' | 'lower') =>
    Array.from({ length: CURVATURE_POINTS }, (_, i) => {
      const t = (LAST_T * i) / (CURVATURE_POINTS - 1);
      const point = outline[surface].derivatives(t);
      return { x: point.x, y: convexCurvature(point, surface === 'upper' ? -1 : 1) };
    }).filter(({ y }) => Number.isFinite(y));
  return { upper: along('upper'), lower: along('lower') };
}

/** One tooth of the curvature comb, in fractions of chord. */
interface CombTooth {
  readonly root: Point;
  readonly tip: Point;
}

/** Length of a tooth in fractions of chord per square root of curvature: the root keeps the nose in sight. */
const TOOTH = 0.012;
const TEETH = 96;

/** The curvature comb of a surface: teeth square to it, outwards where it is convex, as long as the root of the curvature. */
export function curvatureComb({ outline }: SectionDrawing, surface: 'upper' | 'lower'): CombTooth[] {
  const sense = surface === 'upper' ? -1 : 1;
  const teeth: CombTooth[] = [];
  for (let i = 0; i < TEETH; i++) {
    const t = (LAST_T * i) / (TEETH - 1);
    const point = outline[surface].derivatives(t);
    const speed = Math.hypot(point.dx, point.dy);
    const curvature = convexCurvature(point, sense);
    if (speed < 1e-9 || !Number.isFinite(curvature)) continue;
    const length = Math.sign(curvature) * TOOTH * Math.sqrt(Math.abs(curvature));
    const outward = { x: (sense * point.dy) / speed, y: (-sense * point.dx) / speed };
    teeth.push({
      root: { x: point.x, y: point.y },
      tip: { x: point.x + outward.x * length, y: point.y + outward.y * length },
    });
  }
  return teeth;
}
