import { safeguardedRoot } from '../contour/roots.ts';
import { type SurfaceCurve, parameterOf, stationOf } from '../shapes/outline.ts';

/** Up to here a surface may run forward of its nose point, so that a station does not name one point of it. */
const NOSE_ZONE = 0.02;
const CHECKS = 96;
const TOLERANCE = 1e-13;

/** Finds the curve parameter that belongs to a chord station of one surface. */
export interface StationMap {
  /** The parameter t of the point at a station, 0 (nose) … 1 (the surface's own trailing-edge point). */
  parameterAt(station: number): number;
  /** The station of a parameter. */
  stationAt(t: number): number;
  /** False when the surface turns back along the chord and stations are those of its construction instead. */
  readonly monotone: boolean;
}

/**
 * Chord stations of a surface: x on the sheet in parts of the x of the surface's own trailing-edge point. The first 2 % are shared out
 * evenly in the curve's parameter, because the surface of a cambered section passes a little forward of its nose point.
 */
export function stationMap(surface: SurfaceCurve): StationMap {
  const end = surface.at(1).x;
  const zone = noseZone(surface, NOSE_ZONE * end);
  if (zone === null) return { parameterAt: parameterOf, stationAt: stationOf, monotone: false };
  const share = parameterOf(NOSE_ZONE);
  return {
    monotone: true,
    parameterAt: (station) => {
      if (station >= 1) return 1;
      if (station <= NOSE_ZONE) return (zone * parameterOf(station)) / share;
      return solve(surface, station * end, zone, 1, parameterOf(station));
    },
    stationAt: (t) => {
      if (t >= 1) return 1;
      return t <= zone ? stationOf((t * share) / zone) : surface.at(t).x / end;
    },
  };
}

function solve(surface: SurfaceCurve, x: number, low: number, high: number, start: number): number {
  return safeguardedRoot(
    (t) => {
      const point = surface.derivatives(t);
      return { value: point.x - x, slope: point.dx };
    },
    low,
    high,
    start,
    TOLERANCE,
  );
}

/** The parameter at the end of the nose zone, or null when x does not rise steadily behind it. */
function noseZone(surface: SurfaceCurve, x: number): number | null {
  let ahead = surface.at(1).x;
  let from = 0;
  for (let i = CHECKS - 1; i > 0; i--) {
    const t = i / CHECKS;
    const here = surface.at(t).x;
    if (here >= ahead) return null;
    ahead = here;
    if (here <= x) {
      from = t;
      break;
    }
  }
  return solve(surface, x, from, from + 1 / CHECKS, parameterOf(NOSE_ZONE));
}
