import { type Units } from '#client/app/units.ts';
import { type Kerf, KERF_MM, type KerfInput, kerfInputSchema } from '#server/contracts/shop.ts';
import { formatShopQuantity, readShopQuantity } from './quantities.ts';

export const KERF_FIELDS = ['kerfMm', 'speedMmMin', 'measuredOn'] as const;
export type KerfField = (typeof KERF_FIELDS)[number];

/** What stands in the form of a kerf: texts, so that nothing typed is lost. */
export interface KerfTexts extends Record<KerfField, string> {
  origin: 'measured' | 'default';
}

/** Today where the person is, as a field for dates wants it. */
export function today(now: Date = new Date()): string {
  const part = (number: number) => String(number).padStart(2, '0');
  return `${now.getFullYear()}-${part(now.getMonth() + 1)}-${part(now.getDate())}`;
}

const kerfText = (kerfMm: number, units: Units) => formatShopQuantity(kerfMm, 'length', units, 2);
const speedText = (speed: number | null, units: Units) =>
  speed === null ? '' : formatShopQuantity(speed, 'feed', units, 0);

/** The texts of a kerf; for a first one, the speed that the material is cut at, and a measurement of today. */
export function textsOfKerf(kerf: Kerf | null, speedMmMin: number | null, units: Units): KerfTexts {
  return {
    kerfMm: kerf ? kerfText(kerf.kerfMm, units) : '',
    speedMmMin: speedText(kerf ? kerf.speedMmMin : speedMmMin, units),
    origin: kerf?.isDefault ? 'default' : 'measured',
    measuredOn: kerf?.measuredOn ?? today(),
  };
}

export type ReadKerf =
  | { readonly input: KerfInput; readonly errors?: never }
  | { readonly input?: never; readonly errors: ReadonlyMap<KerfField, string> };

/** Reads the form by the schema that the server uses; an untouched text keeps its value of `original` exactly. */
export function readKerf(
  texts: KerfTexts,
  { original, byHand, units }: { original: Kerf | null; byHand: boolean; units: Units },
): ReadKerf {
  const errors = new Map<KerfField, string>();
  const read = (field: 'kerfMm' | 'speedMmMin', kept: string | undefined, was: number | null | undefined) => {
    if (was !== undefined && texts[field] === kept) return was;
    const quantity = readShopQuantity(texts[field], field === 'kerfMm' ? 'length' : 'feed', units);
    if (quantity.error !== undefined) errors.set(field, quantity.error);
    return quantity.value;
  };
  const kerfMm = read('kerfMm', original ? kerfText(original.kerfMm, units) : undefined, original?.kerfMm);
  const speedMmMin = byHand
    ? null
    : read('speedMmMin', original ? speedText(original.speedMmMin, units) : undefined, original?.speedMmMin);
  const parsed = kerfInputSchema.safeParse({
    kerfMm,
    speedMmMin,
    measuredOn: texts.origin === 'measured' ? texts.measuredOn : null,
    revision: original?.revision ?? null,
  });
  if (errors.size === 0 && parsed.success) return { input: parsed.data };
  for (const { path, message } of parsed.error?.issues ?? []) {
    const field = KERF_FIELDS.find((one) => one === path[0]);
    if (field !== undefined && !errors.has(field)) errors.set(field, message);
  }
  return { errors };
}

/** "From 0.01 mm to 6.00 mm." */
export function kerfRange(units: Units): string {
  return `From ${kerfText(KERF_MM.min, units)} to ${kerfText(KERF_MM.max, units)}.`;
}
