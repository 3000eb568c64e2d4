import { type Preferences } from '#server/contracts/people.ts';
import { ArithmeticError, evaluate, type UnitTable } from './arithmetic.ts';
import { useMe } from './session.tsx';

export type Units = Preferences['units'];
export type QuantityKind = 'fraction' | 'length' | 'angle';

/** The inch, exactly (international yard and pound agreement, 1959). */
export const MM_PER_INCH = 25.4;
const LONGEST_TEXT = 60;

/** The signed-in person's choice of unit for lengths on screen; files are always in mm. */
export function useUnits(): Units {
  return useMe().preferences.units;
}

/** Fixed decimals, and never a zero with a minus sign. */
export function formatNumber(value: number, decimals: number): string {
  const text = value.toFixed(decimals);
  return /^-0(\.0*)?$/.test(text) ? text.slice(1) : text;
}

/** "26.40 mm" or "1.039 in"; `decimals` counts those of mm, an inch gets one more (two by default for mm). */
export function formatLength(mm: number, units: Units, decimals = 2): string {
  return units === 'mm'
    ? `${formatNumber(mm, decimals)} mm`
    : `${formatNumber(mm / MM_PER_INCH, decimals + 1)} in`;
}

/** A fraction of chord as "12.00 %". */
export function formatPercent(fraction: number, decimals = 2): string {
  return `${formatNumber(fraction * 100, decimals)} %`;
}

/** Degrees as "16.0°". */
export function formatAngle(deg: number, decimals = 1): string {
  return `${formatNumber(deg, decimals)}°`;
}

export interface QuantityContext {
  readonly kind: QuantityKind;
  /** The chord that turns lengths into fractions of chord and back; finite and above zero. */
  readonly chordMm: number;
  readonly units: Units;
}

export type ParsedQuantity =
  { readonly value: number; readonly error?: never } | { readonly error: string; readonly value?: never };

/**
 * Reads what a person typed: a fraction of chord for `fraction`, mm for `length`, degrees for `angle`.
 * "3 mm", "1.5 %", "0.25 in", "3/8 in", "12+0.4", "2*1.1 %"; a bare number is % for fractions, the person's unit for
 * lengths and degrees for angles. Never NaN or infinite; `error` is a sentence to show under the field.
 */
export function parseQuantity(text: string, context: QuantityContext): ParsedQuantity {
  if (text.trim() === '') return { error: `Type a number, such as ${EXAMPLES[context.kind]}.` };
  if (text.length > LONGEST_TEXT) return { error: 'This is too long to be a number.' };
  const units = unitsOf(context);
  try {
    const term = evaluate(text, units);
    const value = term.unit === null ? term.amount * (units.factors.get(units.bareUnit) ?? 1) : term.amount;
    return Number.isFinite(value)
      ? { value: withoutBinaryNoise(value) }
      : { error: 'The result is too large to be a number.' };
  } catch (error) {
    if (error instanceof ArithmeticError) return { error: error.message };
    throw error;
  }
}

/** 57 % typed is 0.57, not 0.5700000000000001: what was typed has fewer than 15 digits. */
function withoutBinaryNoise(value: number): number {
  return Number(value.toPrecision(15));
}

const EXAMPLES: Readonly<Record<QuantityKind, string>> = {
  fraction: '12, 1.5 % or 3 mm',
  length: '220, 3 mm or 0.25 in',
  angle: '2 or 2.5°',
};

function unitsOf({ kind, chordMm, units }: QuantityContext): UnitTable {
  if (kind === 'angle')
    return {
      bareUnit: 'deg',
      factors: new Map([
        ['deg', 1],
        ['°', 1],
        ['rad', 180 / Math.PI],
      ]),
    };
  const perMm = kind === 'length' ? 1 : 1 / chordMm;
  const inch = MM_PER_INCH * perMm;
  return {
    bareUnit: kind === 'fraction' ? '%' : units === 'mm' ? 'mm' : 'in',
    factors: new Map([
      ['%', kind === 'fraction' ? 0.01 : 0.01 * chordMm],
      ['mm', perMm],
      ['cm', 10 * perMm],
      ['in', inch],
      ['m', 1000 * perMm],
      ['inch', inch],
      ['"', inch],
      ['″', inch],
    ]),
  };
}
