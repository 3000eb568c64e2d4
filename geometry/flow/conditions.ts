import { z } from 'zod';
import { issuesOf, ShapeError } from '../shapes/error.ts';
import { numberWithin } from '../shapes/fields.ts';
import { HIGHEST_MACH } from './compressibility.ts';

/** Accepted ranges; the method has been shown from 60,000 to 9,000,000, below 100,000 with the caution of low Reynolds numbers. */
export const VISCOUS_LIMITS = {
  reynolds: { min: 30_000, max: 20_000_000 },
  criticalN: { min: 1, max: 13 },
  trip: { min: 0.002, max: 1 },
  mach: { min: 0, max: HIGHEST_MACH },
} as const;

const trip = (name: string) =>
  numberWithin(VISCOUS_LIMITS.trip, `${name} must be between 0.2 % and 100 % of chord`).default(1);

/**
 * Under what conditions a section is calculated.
 * `reynolds` of the chord; `criticalN` the exponent N of the e^N method (9 in a quiet stream, see criticalExponent); `tripUpper`,
 * `tripLower` chord stations at which the layer turns turbulent at the latest, 1 for free transition; `mach` corrects the pressures only
 * (see karmanTsien).
 */
export const viscousConditionsSchema = z.strictObject({
  reynolds: numberWithin(VISCOUS_LIMITS.reynolds, 'reynolds must be between 30,000 and 20,000,000'),
  criticalN: numberWithin(VISCOUS_LIMITS.criticalN, 'criticalN must be between 1 and 13').default(9),
  tripUpper: trip('tripUpper'),
  tripLower: trip('tripLower'),
  mach: numberWithin(VISCOUS_LIMITS.mach, `mach must be between 0 and ${HIGHEST_MACH}`).default(0),
});

export type ViscousConditions = Readonly<z.infer<typeof viscousConditionsSchema>>;
/** The same with the values that have defaults left out at will. */
export type ViscousInput = Readonly<z.input<typeof viscousConditionsSchema>>;

/** Checks conditions and fills in the defaults. @throws ShapeError naming the fields */
export function checkConditions(input: unknown): ViscousConditions {
  const parsed = viscousConditionsSchema.safeParse(input);
  if (!parsed.success) throw new ShapeError(issuesOf(parsed.error, (key) => `${key} is not a condition`));
  return parsed.data;
}
