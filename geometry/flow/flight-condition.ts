import { z } from 'zod';
import { ShapeError, issuesOf, shapeError } from '../shapes/error.ts';
import { numberWithin } from '../shapes/fields.ts';
import {
  AIR_LIMITS,
  type Air,
  STANDARD_GRAVITY,
  airAt,
  dynamicPressure,
  reynoldsNumber,
} from './atmosphere.ts';
import { criticalExponent } from './transition.ts';

/** Accepted ranges of a flight condition's fields, in the unit that the name ends in. */
export const FLIGHT_LIMITS = {
  massKg: { min: 0.02, max: 500 },
  areaM2: { min: 0.005, max: 60 },
  spanM: { min: 0.1, max: 40 },
  chordMm: { min: 10, max: 4000 },
  speedMS: { min: 1, max: 150 },
  liftCoefficient: { min: 0.02, max: 2.5 },
  turbulencePercent: { min: 0.02, max: 2.98 },
  trip: { min: 0.002, max: 0.99 },
  ...AIR_LIMITS,
} as const;

type Field = keyof typeof FLIGHT_LIMITS;
const field = (name: string, kind: Field, unit: string) =>
  numberWithin(
    FLIGHT_LIMITS[kind],
    `${name} must be between ${FLIGHT_LIMITS[kind].min} and ${FLIGHT_LIMITS[kind].max}${unit}`,
  );

const chord = (name: string) => field(name, 'chordMm', ' mm');

/**
 * The aircraft and the air for which a section is judged: mass, wing, speed (or a lift coefficient in level flight), altitude and the state
 * of the surface.
 * `turbulencePercent` is that of the air the wing meets: 0.07 gives the exponent N = 9 of a quiet tunnel. A trip is the chord station at
 * which the surface forces the layer turbulent; null leaves it free.
 */
export const flightConditionSchema = z.strictObject({
  massKg: field('massKg', 'massKg', ' kg'),
  wing: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('area'), areaM2: field('areaM2', 'areaM2', ' m²') }),
    z.strictObject({ kind: z.literal('span'), spanM: field('spanM', 'spanM', ' m'), meanChordMm: chord('meanChordMm') }), // prettier-ignore
  ]),
  rootChordMm: chord('rootChordMm'),
  tipChordMm: chord('tipChordMm'),
  flight: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('speed'), speedMS: field('speedMS', 'speedMS', ' m/s') }),
    z.strictObject({
      kind: z.literal('lift'),
      liftCoefficient: field('liftCoefficient', 'liftCoefficient', ''),
    }),
  ]),
  altitudeM: field('altitudeM', 'altitudeM', ' m').default(0),
  temperatureOffsetC: field('temperatureOffsetC', 'temperatureOffsetC', ' °C').default(0),
  surface: z
    .strictObject({
      turbulencePercent: field('turbulencePercent', 'turbulencePercent', ' %').default(0.07),
      tripUpper: field('tripUpper', 'trip', ' of chord').nullable().default(null),
      tripLower: field('tripLower', 'trip', ' of chord').nullable().default(null),
    })
    .prefault({}),
});

export type FlightCondition = Readonly<z.infer<typeof flightConditionSchema>>;

/** What follows from a flight condition. */
export interface FlightFigures {
  readonly air: Air;
  readonly areaM2: number;
  readonly meanChordMm: number;
  /** kg/m² */
  readonly wingLoading: number;
  readonly speedMS: number;
  /** Pa */
  readonly dynamicPressure: number;
  readonly mach: number;
  /** Lift coefficient of the wing in level flight. */
  readonly liftCoefficient: number;
  readonly reynoldsRoot: number;
  readonly reynoldsMean: number;
  readonly reynoldsTip: number;
  /** Exponent of the e^N method for the turbulence given. */
  readonly criticalN: number;
  /** Transition stations; 1 is free. */
  readonly tripUpper: number;
  readonly tripLower: number;
}

/** Checks a flight condition and fills in the defaults. @throws ShapeError naming the fields */
export function checkFlightCondition(input: unknown): FlightCondition {
  const parsed = flightConditionSchema.safeParse(input);
  if (!parsed.success) {
    throw new ShapeError(issuesOf(parsed.error, (key) => `${key} is not a value of a flight condition`));
  }
  return parsed.data;
}

/**
 * Density, Reynolds numbers and the lift coefficient needed, in level flight: ½ ρ V² S c_l = m g. Where the wing is given by its area the
 * mean chord is that of a straight taper from root to tip.
 */
export function flightFigures(condition: FlightCondition): FlightFigures {
  const { wing, rootChordMm, tipChordMm, flight, surface } = condition;
  const air = airAt(condition.altitudeM, condition.temperatureOffsetC);
  const areaM2 = wingArea(condition);
  const meanChordMm = wing.kind === 'span' ? wing.meanChordMm : (rootChordMm + tipChordMm) / 2;
  const speedMS = flight.kind === 'speed' ? flight.speedMS : speedAtLift(condition, flight.liftCoefficient);
  const q = dynamicPressure(air, speedMS);
  return {
    air,
    areaM2,
    meanChordMm,
    wingLoading: condition.massKg / areaM2,
    speedMS,
    dynamicPressure: q,
    mach: speedMS / air.speedOfSound,
    liftCoefficient:
      flight.kind === 'lift' ? flight.liftCoefficient : (condition.massKg * STANDARD_GRAVITY) / (q * areaM2),
    reynoldsRoot: reynoldsNumber(air, speedMS, rootChordMm),
    reynoldsMean: reynoldsNumber(air, speedMS, meanChordMm),
    reynoldsTip: reynoldsNumber(air, speedMS, tipChordMm),
    criticalN: criticalExponent(surface.turbulencePercent / 100),
    tripUpper: surface.tripUpper ?? 1,
    tripLower: surface.tripLower ?? 1,
  };
}

function wingArea({ wing }: FlightCondition): number {
  return wing.kind === 'area' ? wing.areaM2 : (wing.spanM * wing.meanChordMm) / 1000;
}

/**
 * Speed in level flight at a lift coefficient of the wing, m/s: with the largest the aircraft stalls, with a small one it flies fast.
 * @param liftCoefficient above 0
 */
export function speedAtLift(condition: FlightCondition, liftCoefficient: number): number {
  const { density } = airAt(condition.altitudeM, condition.temperatureOffsetC);
  return Math.sqrt(
    (2 * condition.massKg * STANDARD_GRAVITY) / (density * wingArea(condition) * liftCoefficient),
  );
}

/** Speeds in level flight, m/s. */
export interface SpeedRange {
  readonly stallMS: number;
  readonly fastMS: number;
}

/**
 * The range of speeds in level flight: from the stall, at the highest lift coefficient, to fast flight, at the lowest one still worth flying (the
 * lower end of the section's low-drag range serves: see curveFigures).
 * @param highestLift above lowestLift @param lowestLift above 0
 * @throws ShapeError naming the value out of range
 */
export function speedRange(condition: FlightCondition, highestLift: number, lowestLift: number): SpeedRange {
  if (!(lowestLift > 0)) throw shapeError('lowestLift', 'lowestLift must be above 0');
  if (!(highestLift > lowestLift)) throw shapeError('highestLift', 'highestLift must be above lowestLift');
  return { stallMS: speedAtLift(condition, highestLift), fastMS: speedAtLift(condition, lowestLift) };
}

/** Reynolds numbers over speeds (columns) and chords (rows). @param speedsMS m/s @param chordsMm mm */
export function reynoldsTable(
  air: Air,
  speedsMS: readonly number[],
  chordsMm: readonly number[],
): number[][] {
  return chordsMm.map((chordMm) => speedsMS.map((speed) => reynoldsNumber(air, speed, chordMm)));
}
