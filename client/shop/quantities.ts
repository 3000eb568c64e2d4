import { ArithmeticError, evaluate } from '#client/app/arithmetic.ts';
import {
  formatLength,
  formatNumber,
  MM_PER_INCH,
  type ParsedQuantity,
  parseQuantity,
  type Units,
} from '#client/app/units.ts';

export type ShopQuantity = 'length' | 'feed' | 'density';

/** Factors to mm/min and kg/m³, by the way they are typed. */
const COMPOUND = {
  feed: { 'mm/min': 1, 'mm/s': 60, 'm/min': 1000, 'in/min': MM_PER_INCH, 'in/s': 60 * MM_PER_INCH },
  density: { 'kg/m³': 1, 'kg/m3': 1, 'g/l': 1 },
} as const;
const EXAMPLES = { length: '620, 3 mm or 0.25 in', feed: '200 or 5 mm/s', density: '32' } as const;

/** "620.0 mm", "200 mm/min", "32 kg/m³"; lengths and feeds in the person's unit, an inch with one decimal more. */
export function formatShopQuantity(
  value: number,
  quantity: ShopQuantity,
  units: Units,
  decimals: number,
): string {
  if (quantity === 'length') return formatLength(value, units, decimals);
  if (quantity === 'density') return `${formatNumber(value, decimals)} kg/m³`;
  return units === 'mm'
    ? `${formatNumber(value, decimals)} mm/min`
    : `${formatNumber(value / MM_PER_INCH, decimals + 1)} in/min`;
}

/**
 * Reads what a person typed, with its unit or in the person's own, with simple arithmetic: mm, mm/min or kg/m³.
 * Never NaN or infinite; `error` is a sentence to show under the field.
 */
export function readShopQuantity(text: string, quantity: ShopQuantity, units: Units): ParsedQuantity {
  if (text.trim() === '') return { error: `Type a number, such as ${EXAMPLES[quantity]}.` };
  if (quantity !== 'length') return readCompound(text, quantity, units);
  if (text.includes('%')) return { error: 'Type a length: there is no chord here that a percentage is of.' };
  return parseQuantity(text, { kind: 'length', chordMm: 1, units });
}

function readCompound(text: string, quantity: 'feed' | 'density', units: Units): ParsedQuantity {
  const typed = text.trim().toLowerCase();
  const factors: Readonly<Record<string, number>> = COMPOUND[quantity];
  // The longest first: "mm/min" also ends in "m/min".
  const unit = Object.keys(factors)
    .sort((a, b) => b.length - a.length)
    .find((name) => typed.endsWith(name));
  const own = quantity === 'feed' && units === 'inch' ? 'in/min' : Object.keys(factors)[0];
  const factor = factors[unit ?? own ?? ''] ?? 1;
  const number = unit === undefined ? typed : typed.slice(0, -unit.length);
  try {
    const { amount } = evaluate(number, { bareUnit: own ?? '', factors: new Map() });
    const value = Number((amount * factor).toPrecision(15));
    return Number.isFinite(value) ? { value } : { error: 'The result is too large to be a number.' };
  } catch (error) {
    if (error instanceof ArithmeticError) return { error: error.message };
    throw error;
  }
}
