import { shapeError } from '../shapes/error.ts';
import { type Outline, stationOf } from '../shapes/outline.ts';
import { type Ordinate, ordinateAtStation, sidesOf } from './chord-line.ts';

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
const STEPS = 48;
/** The value is stationary, so its own error is of the order of the square of this. */
const STATION_TOLERANCE = 1e-10;
const MOST_STEPS = 90;

/** Ordinates of both surfaces at one station. */
interface Cut {
  readonly station: number;
  readonly upper: Ordinate;
  readonly lower: Ordinate;
}

/** The combination a · upper + b · lower that is made largest. */
type Combination = readonly [a: number, b: number];

interface Peak {
  readonly station: number;
  readonly value: number;
  readonly slope: number;
}

/** Largest thickness and camber of the true outline: a scan of cosine-spaced stations, then the root of the slope about each high point. */
export function largestThicknessAndCamber(outline: Outline): Extremes {
  const { upper, lower } = sidesOf(outline);
  const cut = (station: number): Cut => {
    return { station, upper: ordinateAtStation(upper, station), lower: ordinateAtStation(lower, station) };
  };
  const scan = Array.from({ length: STEPS + 1 }, (_, i) => cut(stationOf(i / STEPS)));
  const thickness = largest(scan, cut, [1, -1]);
  const above = largest(scan, cut, [0.5, 0.5]);
  const below = largest(scan, cut, [-0.5, -0.5]);
  const camber = above.value >= below.value ? above : { ...below, value: -below.value };
  const none = Math.abs(camber.value) < NO_CAMBER;
  return {
    maxThickness: thickness.value,
    maxThicknessPosition: thickness.station,
    maxCamber: none ? 0 : camber.value,
    maxCamberPosition: none ? 0 : camber.station,
  };
}

/** Share of the largest scanned value from which a high point is refined: the scan misses less between its stations. */
const RIVAL = 0.97;

function peakOf({ station, upper, lower }: Cut, [a, b]: Combination): Peak {
  return {
    station,
    value: a * upper.ordinate + b * lower.ordinate,
    slope: a * upper.slope + b * lower.slope,
  };
}

function largest(scan: readonly Cut[], cut: (station: number) => Cut, combination: Combination): Peak {
  const peaks = scan.map((at) => peakOf(at, combination));
  let best = peaks.reduce(higher);
  const worthwhile = RIVAL * best.value;
  if (best.value < NO_CAMBER) return best;
  for (let i = 1; i < peaks.length; i++) {
    const [from, to] = [peaks[i - 1], peaks[i]];
    if (!from || !to || Math.max(from.value, to.value) < worthwhile || from.slope <= 0 || to.slope >= 0)
      continue;
    best = higher(
      best,
      peakBetween(from, to, (station) => peakOf(cut(station), combination)),
    );
  }
  return best;
}

function higher(a: Peak, b: Peak): Peak {
  return b.value > a.value ? b : a;
}

/**
 * The high point between a rising and a falling place: regula falsi on the slope with the Illinois rule (the weight of an end that stays
 * twice is halved), and every third step in the middle, because the slope jumps at the camber position of a 4-digit section.
 */
function peakBetween(from: Peak, to: Peak, at: (station: number) => Peak): Peak {
  let [rising, falling] = [from, to];
  let [risingWeight, fallingWeight] = [1, 1];
  for (let step = 1; step <= MOST_STEPS && falling.station - rising.station > STATION_TOLERANCE; step++) {
    const [r, f] = step % 3 === 0 ? [1, 1] : [rising.slope * risingWeight, -falling.slope * fallingWeight];
    const next = at((rising.station * f + falling.station * r) / (r + f));
    if (next.slope > 0) [rising, risingWeight, fallingWeight] = [next, 1, fallingWeight / 2];
    else [falling, fallingWeight, risingWeight] = [next, 1, risingWeight / 2];
    if (next.slope === 0) break;
  }
  return higher(rising, falling);
}
