import { type FlightCondition, flightConditionSchema } from '#geometry/flow/flight-condition.ts';
import { type Units } from '#client/app/units.ts';
import { conditionCreateSchema } from '#server/contracts/flight-conditions.ts';
import { type FlightQuantity, formatFlight, readFlight } from './quantities.ts';

/** What stands in the form: texts, so that nothing typed is lost, whatever it is. */
export interface ConditionTexts {
  name: string;
  wing: 'area' | 'span';
  flight: 'speed' | 'lift';
  surface: 'smooth' | 'forced';
  massKg: string;
  areaM2: string;
  spanM: string;
  meanChordMm: string;
  rootChordMm: string;
  tipChordMm: string;
  speedMS: string;
  liftCoefficient: string;
  altitudeM: string;
  temperatureOffsetC: string;
  turbulencePercent: string;
  /** Empty: free. */
  tripUpper: string;
  tripLower: string;
}
export type QuantityField = Exclude<keyof ConditionTexts, 'name' | 'wing' | 'flight' | 'surface'>;

export interface FieldSpec {
  readonly label: string;
  readonly as: FlightQuantity;
  readonly hint?: string;
}

export const FIELDS: Readonly<Record<QuantityField, FieldSpec>> = {
  massKg: { label: 'Mass', as: 'mass' },
  areaM2: { label: 'Wing area', as: 'area' },
  spanM: { label: 'Span', as: 'span' },
  meanChordMm: { label: 'Mean chord', as: 'chord' },
  rootChordMm: { label: 'Root chord', as: 'chord' },
  tipChordMm: { label: 'Tip chord', as: 'chord' },
  speedMS: { label: 'Speed', as: 'speed' },
  liftCoefficient: { label: 'Lift coefficient', as: 'lift' },
  altitudeM: { label: 'Altitude', as: 'altitude' },
  temperatureOffsetC: { label: 'Temperature offset', as: 'temperature' },
  turbulencePercent: { label: 'Turbulence of the air', as: 'percent', hint: '0.07 % is quiet air.' },
  tripUpper: { label: 'Transition, upper', as: 'station', hint: 'Empty: free.' },
  tripLower: { label: 'Transition, lower', as: 'station', hint: 'Empty: free.' },
};

/** The fields that count, by what is chosen for wing, flight and surface. */
export function fieldsOf(texts: Pick<ConditionTexts, 'wing' | 'flight' | 'surface'>): QuantityField[] {
  return [
    'massKg',
    ...(texts.wing === 'area' ? (['areaM2'] as const) : (['spanM', 'meanChordMm'] as const)),
    'rootChordMm',
    'tipChordMm',
    texts.flight === 'speed' ? 'speedMS' : 'liftCoefficient',
    'altitudeM',
    'temperatureOffsetC',
    'turbulencePercent',
    ...(texts.surface === 'forced' ? (['tripUpper', 'tripLower'] as const) : []),
  ];
}

/** The number of a field in a condition; undefined where it has none, null for free transition. */
function valueOf(condition: FlightCondition, field: QuantityField): number | null | undefined {
  const flat = { ...condition, ...condition.wing, ...condition.flight, ...condition.surface };
  const value = (flat as Readonly<Record<string, unknown>>)[field];
  return typeof value === 'number' || value === null ? value : undefined;
}

/** A field of a condition as it stands in the form. */
export function textOf(condition: FlightCondition, field: QuantityField, units: Units): string {
  const value = valueOf(condition, field);
  return value === undefined || value === null ? '' : formatFlight(value, FIELDS[field].as, units);
}

/** A condition as the form begins with it. */
export function textsOf(name: string, condition: FlightCondition, units: Units): ConditionTexts {
  const fields = Object.keys(FIELDS) as QuantityField[];
  const { tripUpper, tripLower } = condition.surface;
  return {
    name,
    wing: condition.wing.kind,
    flight: condition.flight.kind,
    surface: tripUpper === null && tripLower === null ? 'smooth' : 'forced',
    ...(Object.fromEntries(fields.map((field) => [field, textOf(condition, field, units)])) as Record<
      QuantityField,
      string
    >),
  };
}

export type FieldMessages = ReadonlyMap<keyof ConditionTexts | 'root', string>;
export type Read<Value> =
  | { readonly value: Value; readonly errors?: never }
  | { readonly value?: never; readonly errors: FieldMessages };

/**
 * Reads the condition by the schema that the server and the estimates use. A field whose text was not touched keeps its value of `original`
 * exactly, whatever its text was rounded to.
 */
export function readCondition(
  texts: ConditionTexts,
  original: FlightCondition | null,
  units: Units,
): Read<FlightCondition> {
  const errors = new Map<keyof ConditionTexts | 'root', string>();
  const numbers: Partial<Record<QuantityField, number | null>> = {};
  for (const field of fieldsOf(texts)) {
    const text = texts[field];
    const kept = original === null ? undefined : valueOf(original, field);
    if (kept !== undefined && original !== null && text === textOf(original, field, units)) {
      numbers[field] = kept;
    } else if (FIELDS[field].as === 'station' && text.trim() === '') {
      numbers[field] = null;
    } else {
      const read = readFlight(text, FIELDS[field].as, units);
      if (read.error === undefined) numbers[field] = read.value;
      else errors.set(field, read.error);
    }
  }
  const parsed = flightConditionSchema.safeParse(shapeOf(texts, numbers));
  if (parsed.success) return { value: parsed.data };
  for (const issue of parsed.error.issues) {
    const field = fieldAt(issue.path.map(String));
    if (!errors.has(field)) errors.set(field, sentenceFor(field, issue.message));
  }
  return { errors };
}

function shapeOf(texts: ConditionTexts, numbers: Partial<Record<QuantityField, number | null>>): unknown {
  const { massKg, rootChordMm, tipChordMm, altitudeM, temperatureOffsetC, turbulencePercent } = numbers;
  return {
    massKg,
    wing:
      texts.wing === 'area'
        ? { kind: 'area', areaM2: numbers.areaM2 }
        : { kind: 'span', spanM: numbers.spanM, meanChordMm: numbers.meanChordMm },
    rootChordMm,
    tipChordMm,
    flight:
      texts.flight === 'speed'
        ? { kind: 'speed', speedMS: numbers.speedMS }
        : { kind: 'lift', liftCoefficient: numbers.liftCoefficient },
    altitudeM,
    temperatureOffsetC,
    surface: {
      turbulencePercent,
      tripUpper: numbers.tripUpper ?? null,
      tripLower: numbers.tripLower ?? null,
    },
  };
}

/** The field that an error of schema or server belongs to; `root` when it belongs to none. */
export function fieldAt(path: readonly string[]): keyof ConditionTexts | 'root' {
  if (path[0] === 'name') return 'name';
  const last = path.at(-1) ?? '';
  return last in FIELDS ? (last as QuantityField) : 'root';
}

/** "massKg must be between …" as people read it: "Mass must be between …". */
function sentenceFor(field: keyof ConditionTexts | 'root', message: string): string {
  return field in FIELDS ? `${message.replace(field, FIELDS[field as QuantityField].label)}.` : message;
}

/** Reads name and condition as they are sent. */
export function readForm(
  texts: ConditionTexts,
  original: FlightCondition | null,
  units: Units,
): Read<{ name: string; settings: FlightCondition }> {
  const name = conditionCreateSchema.shape.name.safeParse(texts.name);
  const condition = readCondition(texts, original, units);
  if (name.success && condition.value !== undefined) {
    return { value: { name: name.data, settings: condition.value } };
  }
  const errors = new Map(condition.errors);
  if (!name.success) errors.set('name', name.error.issues[0]?.message ?? 'Give it a name.');
  return { errors };
}
