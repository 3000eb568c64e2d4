import { z } from 'zod';

/** A number within a range; the sentence of its refusal names it. */
export function number(label: string, unit: string, min: number, max: number) {
  const range = `${label} must be between ${min} and ${max}${unit}.`;
  return z.number({ error: range }).min(min, { error: range }).max(max, { error: range });
}
/** A length in mm. */
export const length = (label: string, min: number, max: number) => number(label, ' mm', min, max);
/** A chord station, 0 … 1. */
export const station = (label: string) => {
  const range = `${label} must be between 0 % and 100 % of chord.`;
  return z.number({ error: range }).min(0, { error: range }).max(1, { error: range });
};
/** A whole number within a range. */
export const whole = (label: string, min: number, max: number) => {
  const range = `${label} must be a whole number between ${min} and ${max}.`;
  return z
    .number({ error: range })
    .int({ error: range })
    .min(min, { error: range })
    .max(max, { error: range });
};
/** A short name, which may be empty. */
export const name = z
  .string({ error: 'A name must be text of at most 60 characters.' })
  .max(60, { error: 'A name must be text of at most 60 characters.' });
