import { shapeError } from '../shapes/error.ts';
import { type Outline } from '../shapes/outline.ts';
import { stationOf } from '../shapes/outline.ts';
import { type Side, ordinateAtStation, ordinateOn, sidesOf } from './chord-line.ts';

/**
 * Thickness of the section at a station, square to the chord line: the way it is measured with a height gauge, and the definition of
 * the NACA reports' ordinate tables. In fractions of chord.
 * @param station 0 … 1 along the chord line, from the nose point to the middle of the trailing edge
 * @throws ShapeError for a station outside 0 … 1
 */
export function thicknessAt(outline: Outline, station: number): number {
  const { upper, lower } = sidesOf(outline);
  checkStation(station);
  return ordinateAtStation(upper, station).ordinate - ordinateAtStation(lower, station).ordinate;
}

/**
 * Camber of the section at a station: the middle between both surfaces, square to the chord line. A 4-digit section's construction
 * line, from which thickness is laid off obliquely, differs from it slightly. In fractions of chord, positive upwards.
 * @param station 0 … 1 along the chord line
 * @throws ShapeError for a station outside 0 … 1
 */
export function camberAt(outline: Outline, station: number): number {
  const { upper, lower } = sidesOf(outline);
  checkStation(station);
  return (ordinateAtStation(upper, station).ordinate + ordinateAtStation(lower, station).ordinate) / 2;
}

function checkStation(station: number): void {
  if (!(station >= 0 && station <= 1))
    throw shapeError('station', 'station must be between 0 % and 100 % of chord');
}

/** Largest thickness and camber with their stations. */
export interface Extremes {
  readonly maxThickness: number;
  readonly maxThicknessPosition: number;
  /** The largest in magnitude, with its sign. */
  readonly maxCamber: number;
  /** 0 when there is no camber. */
  readonly maxCamberPosition: number;
}

/** Camber below this is rounding: the section is symmetric. */
const NO_CAMBER = 1e-12;
const STEPS = 64;
const STATION_TOLERANCE = 1e-12;

/** Weights with which upper and lower ordinate make the quantity. */
type Combination = readonly [number, number];

/** Largest thickness and camber of the true outline: a scan at equal steps of t, then the root of the slope about each high point. */
export function largestThicknessAndCamber(outline: Outline): Extremes {
  const { upper, lower } = sidesOf(outline);
  const heights = new Float64Array(2 * (STEPS + 1));
  for (let i = 0; i <= STEPS; i++) {
    heights[2 * i] = ordinateOn(upper.line, upper.surface.at(i / STEPS));
    heights[2 * i + 1] = ordinateOn(lower.line, lower.surface.at(i / STEPS));
  }
  const thickness = largest(upper, lower, heights, [1, -1]);
  const above = largest(upper, lower, heights, [0.5, 0.5]);
  const below = largest(upper, lower, heights, [-0.5, -0.5]);
  const camber = above.value >= below.value ? above : { ...below, value: -below.value };
  const none = Math.abs(camber.value) < NO_CAMBER;
  return {
    maxThickness: thickness.value,
    maxThicknessPosition: thickness.station,
    maxCamber: none ? 0 : camber.value,
    maxCamberPosition: none ? 0 : camber.station,
  };
}

interface Peak {
  readonly station: number;
  readonly value: number;
}

/** Share of the best sampled value above which a second high point is refined too: the scan pairs both surfaces only nearly square to the chord. */
const RIVAL = 0.97;

function largest(upper: Side, lower: Side, heights: Float64Array, combination: Combination): Peak {
  const sampled = (i: number) =>
    combination[0] * (heights[2 * i] ?? 0) + combination[1] * (heights[2 * i + 1] ?? 0);
  let top = 0;
  for (let i = 0; i <= STEPS; i++) top = Math.max(top, sampled(i));
  let best: Peak = { station: 0, value: 0 };
  if (top < NO_CAMBER) return best;
  for (let i = 1; i <= STEPS; i++) {
    const value = sampled(i);
    if (value < RIVAL * top || value < sampled(i - 1) || (i < STEPS && value < sampled(i + 1))) continue;
    const peak = peakNear(upper, lower, combination, i);
    if (peak.value > best.value) best = peak;
  }
  return best;
}

/** The high point within one step of scan index i; the best end of the bracket when the slope has no root there. */
function peakNear(upper: Side, lower: Side, [a, b]: Combination, i: number): Peak {
  const at = (station: number) => {
    const [u, l] = [ordinateAtStation(upper, station), ordinateAtStation(lower, station)];
    return { station, value: a * u.ordinate + b * l.ordinate, slope: a * u.slope + b * l.slope };
  };
  let rising = at(stationOf(Math.max(i - 1, 0.5) / STEPS));
  let falling = at(stationOf(Math.min(i + 1, STEPS) / STEPS));
  const middle = at(stationOf(i / STEPS));
  if (rising.slope > 0 && falling.slope < 0) {
    // Regula falsi with the Illinois rule: the weight of an end that stays twice is halved.
    let [risingWeight, fallingWeight] = [1, 1];
    for (let step = 0; step < 60 && falling.station - rising.station > STATION_TOLERANCE; step++) {
      const [r, f] = [rising.slope * risingWeight, -falling.slope * fallingWeight];
      const next = at((rising.station * f + falling.station * r) / (r + f));
      if (next.slope === 0) return next;
      if (next.slope > 0) {
        if (Math.abs(next.station - rising.station) <= STATION_TOLERANCE) return next;
        [rising, risingWeight, fallingWeight] = [next, 1, fallingWeight / 2];
      } else {
        if (Math.abs(next.station - falling.station) <= STATION_TOLERANCE) return next;
        [falling, fallingWeight, risingWeight] = [next, 1, risingWeight / 2];
      }
    }
  }
  return [rising, middle, falling].reduce((best, peak) => (peak.value > best.value ? peak : best));
}
