import { type ItemInput, type ShopSort } from '#client/api/shop.ts';
import { formatNumber, type Units } from '#client/app/units.ts';
import {
  machineCreateSchema,
  type MachineKind,
  type MachineSettings,
  materialCreateSchema,
  type MaterialKind,
  type MaterialSettings,
} from '#server/contracts/shop.ts';
import { FIELDS, type FieldSpec } from './fields.ts';
import { formatShopQuantity, readShopQuantity } from './quantities.ts';

export type ItemSettings = MachineSettings | MaterialSettings;
export type ItemKind = MachineKind | MaterialKind;

/** What stands in the form: texts, so that nothing typed is lost, whatever it is. */
export interface ItemTexts {
  name: string;
  kind: ItemKind;
  /** By {@link keyOf} a field. */
  values: Record<string, string>;
}

/** A form library reads dots in names as nesting. */
export const keyOf = (path: string) => path.replaceAll('.', '-');

export const fieldsOf = (kind: ItemKind): readonly FieldSpec[] =>
  FIELDS[kind].flatMap(({ fields }) => fields);

function valueAt(settings: unknown, path: string): unknown {
  return path
    .split('.')
    .reduce<unknown>((at, key) => (at as Record<string, unknown> | undefined)?.[key], settings);
}

/** A setting as it stands in its field. */
export function textOf(spec: FieldSpec, settings: ItemSettings, units: Units): string {
  const value = valueAt(settings, spec.path);
  if (spec.as === 'lines') return (value as readonly string[]).join('\n');
  if (spec.as === 'yes-no') return value === true ? 'yes' : 'no';
  if (typeof value !== 'number') return String(value);
  if (spec.as === 'whole' || spec.as === 'choice') return formatNumber(value, 0);
  return formatShopQuantity(value, spec.as, units, spec.decimals);
}

/** The texts of the fields of these settings. */
export function textsOf(settings: ItemSettings, units: Units): Record<string, string> {
  return Object.fromEntries(
    fieldsOf(settings.kind).map((spec) => [keyOf(spec.path), textOf(spec, settings, units)]),
  );
}

type ReadField = { readonly value: unknown; readonly error?: never } | { readonly error: string };

function readField(spec: FieldSpec, text: string, units: Units): ReadField {
  switch (spec.as) {
    case 'choice':
      return { value: text };
    case 'yes-no':
      return { value: text === 'yes' };
    case 'lines':
      return { value: text.split('\n').flatMap((line) => (line.trim() === '' ? [] : [line.trim()])) };
    case 'whole':
      return /^\s*\d+\s*$/.test(text) ? { value: Number(text) } : { error: 'Type a whole number.' };
    default:
      return readShopQuantity(text, spec.as, units);
  }
}

/** Field, or `name` or `root`, with the first sentence about it. */
export type FieldMessages = ReadonlyMap<string, string>;
export type ReadItem =
  | { readonly input: ItemInput; readonly errors?: never }
  | { readonly input?: never; readonly errors: FieldMessages };

/**
 * Reads the form by the schema that the server uses. A field whose text was not touched keeps its value of `original`
 * exactly, whatever its text was rounded to.
 */
export function readItem(
  sort: ShopSort,
  texts: ItemTexts,
  original: ItemSettings | null,
  units: Units,
): ReadItem {
  const errors = new Map<string, string>();
  const settings: Record<string, unknown> = { kind: texts.kind };
  const kept = original?.kind === texts.kind ? original : null;
  for (const spec of fieldsOf(texts.kind)) {
    const text = texts.values[keyOf(spec.path)] ?? '';
    const untouched = kept !== null && text === textOf(spec, kept, units);
    const read = untouched ? { value: valueAt(kept, spec.path) } : readField(spec, text, units);
    if (read.error !== undefined) errors.set(keyOf(spec.path), read.error);
    else put(settings, spec.path, read.value);
  }
  const schema = sort === 'machine' ? machineCreateSchema : materialCreateSchema;
  const parsed = schema.safeParse({ name: texts.name, settings });
  if (parsed.success) return { input: parsed.data };
  for (const { path, message } of parsed.error.issues) {
    const key = placeOf(path.map(String), texts.kind);
    if (!errors.has(key)) errors.set(key, message);
  }
  return { errors };
}

function put(settings: Record<string, unknown>, path: string, value: unknown): void {
  const keys = path.split('.');
  const last = keys.pop() ?? '';
  let at = settings;
  for (const key of keys) at = (at[key] ??= {}) as Record<string, unknown>;
  at[last] = value;
}

/** The field that an error of schema or server belongs to; `root` when it belongs to none. */
export function placeOf(path: readonly string[], kind: ItemKind): string {
  if (path[0] === 'name') return 'name';
  if (path[0] !== 'settings') return 'root';
  const wanted = path.slice(1).join('.');
  const paths = fieldsOf(kind).map((spec) => spec.path);
  const found =
    paths.find((one) => one === wanted || wanted.startsWith(`${one}.`)) ??
    paths.find((one) => wanted !== '' && one.startsWith(`${wanted}.`));
  return found === undefined ? 'root' : keyOf(found);
}
