import { z } from 'zod';
import { type SheetDraft, type SheetPlan, sheetPlanSchema } from '#server/contracts/cut-sheets.ts';

/** What stands in the form: a plan in which any value may still be text that could not be read. JSON, so that it can be kept as it is. */
export type PlanValues = Readonly<Record<string, z.core.util.JSONType>>;

/** The values of a plan, free of what they were made from. */
export function valuesOf(plan: SheetPlan): PlanValues {
  return structuredClone(plan);
}

const partSchema = z.looseObject({});
const beginSchema = z.looseObject({
  panel: z.looseObject({ root: partSchema, tip: partSchema }),
  allowances: partSchema,
  kerfMm: partSchema,
  stock: partSchema,
  features: z.array(z.looseObject({ kind: z.enum(['slot', 'strip', 'tube', 'hinge']) })),
  block: partSchema.nullable(),
  cut: partSchema,
  ribs: z
    .looseObject({
      stations: z.looseObject({ kind: z.enum(['count', 'list']) }),
      sheet: partSchema,
      lighteningHoles: partSchema.nullable(),
      jigTabs: partSchema.nullable(),
    })
    .nullable(),
  template: partSchema.nullable(),
  limits: partSchema,
  inspection: partSchema,
});

/** The kept values of a draft, or null where they are not those of a plan at all (kept by another release, say). */
export function draftValues({ values }: Pick<SheetDraft, 'values'>): PlanValues | null {
  return beginSchema.safeParse(values).success ? structuredClone(values) : null;
}

/** Path in the plan, dotted, with the first sentence about it. */
export type PlanErrors = ReadonlyMap<string, string>;
export type ReadPlan =
  | { readonly plan: SheetPlan; readonly errors: PlanErrors }
  | { readonly plan: null; readonly errors: PlanErrors };

const NO_ERRORS: PlanErrors = new Map();

/** Reads the form by the schema that the server uses. */
export function readPlan(values: PlanValues): ReadPlan {
  const parsed = sheetPlanSchema.safeParse(values);
  if (parsed.success) return { plan: parsed.data, errors: NO_ERRORS };
  const errors = new Map<string, string>();
  for (const { path, message } of parsed.error.issues) {
    const key = path.map(String).join('.');
    if (!errors.has(key)) errors.set(key, message);
  }
  return { plan: null, errors };
}

/** The value at a dotted path; undefined where there is none. */
export function valueAt(values: unknown, path: string): unknown {
  return path
    .split('.')
    .reduce<unknown>((at, key) => (at as Record<string, unknown> | null | undefined)?.[key], values);
}

/** The same values with another one at a dotted path. @throws RangeError when nothing stands around it */
export function withValue(values: PlanValues, path: string, value: unknown): PlanValues {
  const copy = structuredClone(values) as Record<string, unknown>;
  const keys = path.split('.');
  const last = keys.pop() ?? '';
  const holder = keys.length === 0 ? copy : valueAt(copy, keys.join('.'));
  if (typeof holder !== 'object' || holder === null) throw new RangeError(`no values around ${path}`);
  (holder as Record<string, unknown>)[last] = value;
  return copy as PlanValues;
}

/** Says the same, whatever the order in which it was written. */
export function sameValues(a: unknown, b: unknown): boolean {
  if (Object.is(a, b)) return true;
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return false;
  if (Array.isArray(a) !== Array.isArray(b)) return false;
  const [keys, others] = [Object.keys(a), Object.keys(b)];
  return (
    keys.length === others.length &&
    keys.every((key) => sameValues((a as Record<string, unknown>)[key], (b as Record<string, unknown>)[key]))
  );
}
