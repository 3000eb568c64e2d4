import { shapeError } from '../shapes/error.ts';

/** Altitudes and temperature offsets accepted: the troposphere of ISO 2533. */
export const AIR_LIMITS = {
  altitudeM: { min: -500, max: 11_000 },
  temperatureOffsetC: { min: -60, max: 60 },
} as const;

/** ISO 2533 (1975): sea-level values, lapse rate, gas constant, ratio of specific heats; standard gravity. */
export const STANDARD_GRAVITY = 9.80665;
const SEA_LEVEL_K = 288.15;
const SEA_LEVEL_PA = 101_325;
const LAPSE_K_PER_M = 0.0065;
const GAS_CONSTANT = 287.05287;
const HEAT_RATIO = 1.4;
/** Sutherland's law as in ISO 2533: μ = β T^1.5 / (T + S). */
const SUTHERLAND_BETA = 1.458e-6;
const SUTHERLAND_K = 110.4;

/** Air at rest. SI units. */
export interface Air {
  readonly temperatureK: number;
  readonly pressurePa: number;
  /** kg/m³ */
  readonly density: number;
  /** Dynamic viscosity, Pa s. */
  readonly viscosity: number;
  /** ν = μ/ρ, m²/s. */
  readonly kinematicViscosity: number;
  /** m/s */
  readonly speedOfSound: number;
}

/**
 * The standard atmosphere (ISO 2533) at an altitude, warmer or colder by an offset; the offset leaves the pressure as it is.
 * T = 288.15 − 0.0065 h + offset, p = 101325 (1 − 0.0065 h/288.15)^(g/(R·0.0065)), ρ = p/(R T), a = √(κ R T).
 * @param altitudeM geopotential metres, −500 … 11 000 @param temperatureOffsetC −60 … 60 °C
 * @throws ShapeError naming the value out of range
 */
export function airAt(altitudeM: number, temperatureOffsetC = 0): Air {
  const { altitudeM: altitude, temperatureOffsetC: offset } = AIR_LIMITS;
  if (!(altitudeM >= altitude.min && altitudeM <= altitude.max)) {
    throw shapeError('altitudeM', `altitudeM must be between ${altitude.min} and ${altitude.max} m`);
  }
  if (!(temperatureOffsetC >= offset.min && temperatureOffsetC <= offset.max)) {
    throw shapeError(
      'temperatureOffsetC',
      `temperatureOffsetC must be between ${offset.min} and ${offset.max} °C`,
    );
  }
  const standardK = SEA_LEVEL_K - LAPSE_K_PER_M * altitudeM;
  const temperatureK = standardK + temperatureOffsetC;
  const exponent = STANDARD_GRAVITY / (GAS_CONSTANT * LAPSE_K_PER_M);
  const pressurePa = SEA_LEVEL_PA * (standardK / SEA_LEVEL_K) ** exponent;
  const density = pressurePa / (GAS_CONSTANT * temperatureK);
  const viscosity = (SUTHERLAND_BETA * temperatureK ** 1.5) / (temperatureK + SUTHERLAND_K);
  return {
    temperatureK,
    pressurePa,
    density,
    viscosity,
    kinematicViscosity: viscosity / density,
    speedOfSound: Math.sqrt(HEAT_RATIO * GAS_CONSTANT * temperatureK),
  };
}

/** Dynamic pressure ½ ρ V², Pa. @param speedMS m/s */
export function dynamicPressure(air: Air, speedMS: number): number {
  return (air.density * speedMS * speedMS) / 2;
}

/** Reynolds number V c/ν. @param speedMS m/s @param chordMm mm */
export function reynoldsNumber(air: Air, speedMS: number, chordMm: number): number {
  return (speedMS * chordMm) / 1000 / air.kinematicViscosity;
}
