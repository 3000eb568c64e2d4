import { ArithmeticError, evaluate } from '#client/app/arithmetic.ts';
import {
  formatLength,
  formatNumber,
  MM_PER_INCH,
  type ParsedQuantity,
  parseQuantity,
  type Units,
} from '#client/app/units.ts';

/** A quantity of a flight condition; its number is in the first unit of {@link UNITS}, a chord in mm, a span in m. */
export type FlightQuantity =
  'mass' | 'area' | 'speed' | 'altitude' | 'temperature' | 'percent' | 'station' | 'lift' | 'chord' | 'span';
type Plain = Exclude<FlightQuantity, 'chord' | 'span'>;

/** Factors to the unit that the number is kept in, the one that is shown first. Foot, mile and knot are exact by definition. */
const UNITS: Readonly<Record<Plain, Readonly<Record<string, number>>>> = {
  mass: { kg: 1, g: 0.001, lb: 0.453_592_37 },
  area: { 'm²': 1, m2: 1, 'dm²': 0.01, dm2: 0.01, 'cm²': 1e-4, cm2: 1e-4 },
  speed: { 'm/s': 1, 'km/h': 1 / 3.6, kn: 1852 / 3600 },
  altitude: { m: 1, ft: 0.3048 },
  temperature: { '°C': 1, c: 1, k: 1 },
  percent: { '%': 1 },
  station: { '%': 0.01 },
  lift: {},
};
const DECIMALS: Readonly<Record<FlightQuantity, number>> = {
  mass: 3,
  area: 4,
  speed: 1,
  altitude: 0,
  temperature: 1,
  percent: 2,
  station: 1,
  lift: 2,
  chord: 1,
  span: 3,
};
const EXAMPLES: Readonly<Record<FlightQuantity, string>> = {
  mass: '4.2 or 850 g',
  area: '0.58 or 58 dm²',
  speed: '17 or 60 km/h',
  altitude: '300 or 1000 ft',
  temperature: '-5 or 12.5',
  percent: '0.07',
  station: '5 or 7.5 %',
  lift: '0.6',
  chord: '220, 24 cm or 9 in',
  span: '2.4 m, 1800 mm or 70 in',
};

/** "4.200 kg", "240.0 mm" or "9.45 in", "2.400 m" or "94.49 in": fixed decimals for each quantity, the unit always in sight. */
export function formatFlight(value: number, quantity: FlightQuantity, units: Units): string {
  const decimals = DECIMALS[quantity];
  if (quantity === 'chord') return formatLength(value, units, decimals);
  if (quantity === 'span') {
    return units === 'inch'
      ? `${formatNumber((value * 1000) / MM_PER_INCH, 2)} in`
      : `${formatNumber(value, decimals)} m`;
  }
  if (quantity === 'lift') return formatNumber(value, decimals);
  const [unit = '', factor = 1] = Object.entries(UNITS[quantity])[0] ?? [];
  return `${formatNumber(value / factor, decimals)} ${unit}`;
}

/**
 * Reads what a person typed, with its unit or in the one that is shown, with simple arithmetic. Never NaN or infinite; `error` is a sentence to
 * show under the field.
 */
export function readFlight(text: string, quantity: FlightQuantity, units: Units): ParsedQuantity {
  if (text.trim() === '') return { error: `Type a number, such as ${EXAMPLES[quantity]}.` };
  if (quantity === 'chord') return readLength(text, units);
  if (quantity === 'span') {
    const read = readLength(units === 'mm' && isBare(text) ? `(${text}) m` : text, units);
    return read.error === undefined ? { value: exact(read.value / 1000) } : read;
  }
  return readPlain(text, UNITS[quantity]);
}

const isBare = (text: string) => !/[a-z"″%]/i.test(text);

function readLength(text: string, units: Units): ParsedQuantity {
  if (text.includes('%')) return { error: 'Type a length: there is no chord here that a percentage is of.' };
  return parseQuantity(text, { kind: 'length', chordMm: 1, units });
}

function readPlain(text: string, table: Readonly<Record<string, number>>): ParsedQuantity {
  const typed = text.trim().toLowerCase();
  // The longest first: "m/s" also ends in "s", "dm²" in "m²".
  const unit = Object.keys(table)
    .sort((a, b) => b.length - a.length)
    .find((name) => typed.endsWith(name.toLowerCase()));
  const factor = (unit === undefined ? Object.values(table)[0] : table[unit]) ?? 1;
  const number = unit === undefined ? typed : typed.slice(0, -unit.length);
  try {
    const { amount } = evaluate(number, { bareUnit: '', factors: new Map() });
    const value = exact(amount * factor);
    return Number.isFinite(value) ? { value } : { error: 'The result is too large to be a number.' };
  } catch (error) {
    if (error instanceof ArithmeticError) return { error: error.message };
    throw error;
  }
}

/** What was typed has fewer than 15 digits: 5 % is 0.05, whatever the product of binary numbers says. */
function exact(value: number): number {
  return Number(value.toPrecision(15));
}
