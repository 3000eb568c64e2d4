import { type FlightCondition } from '#geometry/flow/flight-condition.ts';

const smooth = { turbulencePercent: 0.07, tripUpper: null, tripLower: null };

/** Plausible flight conditions to begin with, in the demo workshop and in an empty form. All of them are invented. */
export const levelTrainer = {
  massKg: 4.2,
  wing: { kind: 'span', spanM: 2.4, meanChordMm: 240 },
  rootChordMm: 280,
  tipChordMm: 200,
  flight: { kind: 'speed', speedMS: 17 },
  altitudeM: 0,
  temperatureOffsetC: 0,
  surface: smooth,
} satisfies FlightCondition;

export const slowLoiter = {
  ...levelTrainer,
  flight: { kind: 'lift', liftCoefficient: 0.9 },
  altitudeM: 1200,
  temperatureOffsetC: 10,
} satisfies FlightCondition;

export const fastDash = {
  massKg: 2.1,
  wing: { kind: 'area', areaM2: 0.26 },
  rootChordMm: 220,
  tipChordMm: 140,
  flight: { kind: 'speed', speedMS: 32 },
  altitudeM: 0,
  temperatureOffsetC: 0,
  surface: { turbulencePercent: 0.2, tripUpper: 0.05, tripLower: 0.1 },
} satisfies FlightCondition;
