import { z } from 'zod';

/** The lowest and highest value a field accepts, both included. */
interface Range {
  readonly min: number;
  readonly max: number;
}

/** A finite number within a range, refused with the same sentence whatever is wrong with it. */
export function numberWithin(range: Range, error: string): z.ZodNumber {
  return z.number({ error }).min(range.min, { error }).max(range.max, { error });
}

/** A length in fractions of chord within a range, which its refusal states in per cent of chord. */
export function fractionWithin(name: string, range: Range): z.ZodNumber {
  return numberWithin(range, outsideChord(name, range));
}

/** "maxThickness must be between 1 % and 40 % of chord" */
export function outsideChord(name: string, range: Range): string {
  return `${name} must be between ${percent(range.min)} % and ${percent(range.max)} % of chord`;
}

/** A fraction in per cent, in as few digits as say it, at most `decimals`. */
export function percent(fraction: number, decimals = 6): string {
  return String(Number((fraction * 100).toFixed(decimals)));
}
