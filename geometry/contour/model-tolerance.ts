import { type Surface } from '../shapes/cst.ts';
import { percent } from '../shapes/fields.ts';

/**
 * The usual tolerance of wind-tunnel models, in fractions of chord, by which the papers on class–shape transformation judge their fits
 * (Kulfan, AIAA 2007-0062, and J. Aircraft 45(1), 2008): about 4·10⁻⁴ ahead of 20 % chord and 8·10⁻⁴ behind. From memory of these
 * papers, not confirmed in them; said as "about" wherever people read it.
 */
export const MODEL_TOLERANCE = { ahead: 4e-4, behind: 8e-4, station: 0.2 } as const;

/** The tolerance at a chord station, in fractions of chord. @param station 0 … 1; beyond an end that of the end */
export function modelTolerance(station: number): number {
  return station < MODEL_TOLERANCE.station ? MODEL_TOLERANCE.ahead : MODEL_TOLERANCE.behind;
}

/** A deviation and its place. */
export interface PlacedDeviation {
  /** Square to the contour in fractions of chord, positive outside. */
  readonly deviation: number;
  readonly surface: Surface;
  readonly station: number;
}

/** "0.012 % of chord outside at 3.1 % on the upper surface" */
export function deviationWords({ deviation, surface, station }: PlacedDeviation): string {
  const side = deviation === 0 ? '' : deviation > 0 ? ' outside' : ' inside';
  const size = Number((100 * Math.abs(deviation)).toPrecision(2));
  const place = percent(Math.min(1, Math.max(0, station)), 1);
  return `${size} % of chord${side} at ${place} % on the ${surface} surface`;
}

/** What a fit with so many points out of tolerance amounts to, in words. */
export function toleranceVerdict(
  largest: PlacedDeviation,
  points: { readonly counted: number; readonly outside: number; readonly excluded: number },
): string {
  const { ahead, behind, station } = MODEL_TOLERANCE;
  const band = `about ${percent(ahead)} % of chord ahead of ${percent(station)} %, ${percent(behind)} % behind`;
  const left = points.excluded === 0 ? '' : ` ${pointsWord(points.excluded)} left out.`;
  const off = `Largest deviation ${deviationWords(largest)}.`;
  if (points.outside === 0)
    return `Within the usual tolerance of wind-tunnel models (${band}). ${off}${left}`;
  const count = `${points.outside} of ${pointsWord(points.counted)}`;
  return `Out of the usual tolerance of wind-tunnel models (${band}): ${count}. ${off}${left}`;
}

function pointsWord(count: number): string {
  return `${count} ${count === 1 ? 'point' : 'points'}`;
}
