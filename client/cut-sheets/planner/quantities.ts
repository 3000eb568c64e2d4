import { ArithmeticError, evaluate } from '#client/app/arithmetic.ts';
import {
  formatAngle,
  formatLength,
  formatNumber,
  formatPercent,
  MM_PER_INCH,
  type ParsedQuantity,
  parseQuantity,
  type Units,
} from '#client/app/units.ts';

/** How a number of a plan is typed: mm, a share of the chord, degrees, seconds, a whole count or a plain number. */
export type PlanQuantity = 'length' | 'station' | 'angle' | 'seconds' | 'whole' | 'number';

export interface QuantityForm {
  readonly as: PlanQuantity;
  readonly decimals: number;
  /** The chord that a station is a share of, mm; typed lengths become stations by it. */
  readonly chordMm: number;
  readonly units: Units;
}

export function formatQuantity(value: number, { as, decimals, units }: QuantityForm): string {
  switch (as) {
    case 'length':
      return formatLength(value, units, decimals);
    case 'station':
      return formatPercent(value, decimals);
    case 'angle':
      return formatAngle(value, decimals);
    case 'seconds':
      return `${formatNumber(value, decimals)} s`;
    default:
      return formatNumber(value, decimals);
  }
}

/** Reads what was typed, with its unit and simple arithmetic; `error` is a sentence to show under the field. Never NaN or infinite. */
export function readQuantity(text: string, { as, chordMm, units }: QuantityForm): ParsedQuantity {
  switch (as) {
    case 'length':
      if (text.includes('%')) return { error: 'Type a length: a percentage of what is not known here.' };
      return parseQuantity(text, { kind: 'length', chordMm: 1, units });
    case 'station':
      return parseQuantity(text, { kind: 'fraction', chordMm, units });
    case 'angle':
      return parseQuantity(text, { kind: 'angle', chordMm, units });
    case 'whole':
      return /^\s*\d{1,6}\s*$/.test(text) ? { value: Number(text) } : { error: 'Type a whole number.' };
    default:
      return readPlain(as === 'seconds' ? text.replace(/\s*s\s*$/i, '') : text);
  }
}

function readPlain(text: string): ParsedQuantity {
  if (text.trim() === '') return { error: 'Type a number.' };
  try {
    const { amount } = evaluate(text, { bareUnit: '', factors: new Map() });
    return Number.isFinite(amount)
      ? { value: Number(amount.toPrecision(15)) }
      : { error: 'The result is too large to be a number.' };
  } catch (error) {
    if (error instanceof ArithmeticError) return { error: error.message };
    throw error;
  }
}

/** One step of the last shown decimal, on that grid. */
export function stepQuantity(value: number, steps: number, { as, decimals, units }: QuantityForm): number {
  const inch = as === 'length' && units === 'inch';
  const perShown = as === 'station' ? 100 : inch ? 1 / MM_PER_INCH : 1;
  const grid = 10 ** (inch ? decimals + 1 : decimals);
  return Number(((Math.round(value * perShown * grid) + steps) / grid / perShown).toPrecision(15));
}

/** A list of lengths or stations with one unit at its end, "15 30 50 %": parted by spaces or semicolons. */
export function readList(text: string, form: QuantityForm): { values: number[] } | { error: string } {
  const unit = /(?:%|[a-z]+)\s*$/i.exec(text)?.[0] ?? '';
  const parts = text
    .slice(0, text.length - unit.length)
    .split(/[;\s]+|,\s+/)
    .filter((part) => part !== '');
  const values: number[] = [];
  for (const part of parts) {
    const read = readQuantity(`${part} ${unit}`, form);
    if (read.error !== undefined)
      return { error: `"${part}" cannot be read. Type numbers with spaces between.` };
    values.push(read.value);
  }
  return { values };
}

/** "15.0 30.0 50.0 %" */
export function formatList(values: readonly number[], form: QuantityForm): string {
  const texts = values.map((value) => formatQuantity(value, form));
  return texts.map((text, i) => (i < texts.length - 1 ? text.replace(/\s.*$/, '') : text)).join('  ');
}
