import { type SheetPlan } from '#server/contracts/cut-sheets.ts';
import { sameValues } from './plan-values.ts';

export interface Difference {
  /** Where, in words: "panel, tip, chord". */
  readonly place: string;
  readonly theirs: string;
  readonly yours: string;
}

/** What ids stand for. */
export type Names = ReadonlyMap<string, string>;

/** Where two plans differ, each place once, in the order of the plan. */
export function differencesOf(
  theirs: SheetPlan,
  yours: unknown,
  names: Names = new Map(),
): readonly Difference[] {
  return differences(theirs, yours, [], names);
}

function differences(
  theirs: unknown,
  yours: unknown,
  path: readonly string[],
  names: Names,
): readonly Difference[] {
  if (sameValues(theirs, yours)) return [];
  if (isRecord(theirs) && isRecord(yours)) {
    const keys = [...new Set([...Object.keys(theirs), ...Object.keys(yours)])];
    return keys.flatMap((key) => differences(theirs[key], yours[key], [...path, key], names));
  }
  return [{ place: placeWords(path), theirs: valueWords(theirs, names), yours: valueWords(yours, names) }];
}

function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null;
}

/** "panel.tip.chordMm" as "panel, tip, chord (mm)"; places in a list are counted from 1. */
function placeWords(path: readonly string[]): string {
  return path
    .map((key) => {
      if (/^\d+$/.test(key)) return String(Number(key) + 1);
      const [words = key, unit] = splitUnit(key);
      const text = words.replace(/([A-Z])/g, (letter) => ` ${letter.toLowerCase()}`).trim();
      return unit === undefined ? text : `${text} (${unit})`;
    })
    .join(', ');
}

const UNITS: Readonly<Record<string, string>> = { Mm: 'mm', Deg: '°', S: 's' };
/** An id stands for a thing, which is named by what is before it. */
const ID = 'Id';

function splitUnit(key: string): [words: string, unit?: string] {
  if (key.endsWith(ID)) return [key.slice(0, -ID.length)];
  const suffix = Object.keys(UNITS).find((unit) => key.length > unit.length && key.endsWith(unit));
  return suffix === undefined ? [key] : [key.slice(0, -suffix.length), UNITS[suffix] ?? ''];
}

function valueWords(value: unknown, names: Names): string {
  if (value === null || value === undefined) return 'none';
  if (typeof value === 'object') return Array.isArray(value) ? `${value.length} items` : 'given';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  return value === '' ? 'empty' : (names.get(String(value)) ?? String(value));
}
