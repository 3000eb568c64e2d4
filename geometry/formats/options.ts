import { z } from 'zod';

/** The layers of a drawing, in the order in which they are written. */
export const LAYERS = ['OUTLINE', 'CHORD', 'CAMBER', 'TEXT'] as const;
export type Layer = (typeof LAYERS)[number];

/** Query strings and form fields carry text: numbers in plain decimal notation become numbers, an empty field is an absent one. */
function typed(value: unknown): unknown {
  if (typeof value !== 'string') return value;
  const text = value.trim();
  if (text === '') return undefined;
  return /^[+-]?(\d+\.?\d*|\.\d+)$/.test(text) ? Number(text) : text;
}

function numberBetween(label: string, least: number, most: number, unit: string) {
  const error = `${label} must be a number from ${least} to ${most}${unit}.`;
  return z.number({ error }).min(least, { error }).max(most, { error });
}

function wholeBetween(label: string, least: number, most: number) {
  const error = `${label} must be a whole number from ${least} to ${most}.`;
  return z.int({ error }).min(least, { error }).max(most, { error });
}

function choice<const T extends readonly [string, ...string[]]>(
  label: string,
  values: T,
  fallback: T[number],
) {
  const error = `${label} must be one of ${values.join(', ')}.`;
  return z.preprocess(
    (value) => (value === '' ? undefined : value),
    z.enum(values, { error }).default(() => fallback),
  );
}

/** The lengths that a cut file, a draft and the screens accept, in mm, both ends included (common practice of foam cutting). */
export const LENGTH_LIMITS = {
  chordMm: { min: 10, max: 5000 },
  toleranceMm: { min: 0.001, max: 1 },
} as const;

const chord = numberBetween('The chord', LENGTH_LIMITS.chordMm.min, LENGTH_LIMITS.chordMm.max, ' mm');
const tolerance = numberBetween(
  'The tolerance',
  LENGTH_LIMITS.toleranceMm.min,
  LENGTH_LIMITS.toleranceMm.max,
  ' mm',
);
const chordMm = z.preprocess(typed, chord);
const toleranceMm = z.preprocess(typed, tolerance.default(0.01));

const LAYERS_ERROR = `The layers must be a comma list of ${LAYERS.join(', ')}.`;

/** A comma list of layers, or an array of them; written in the order of {@link LAYERS}, each once. */
const layers = z.preprocess(
  (value) => {
    if (typeof value !== 'string') return value;
    return value.trim() === '' ? undefined : value.split(',').map((name) => name.trim().toUpperCase());
  },
  z
    .array(z.enum(LAYERS, { error: LAYERS_ERROR }), {
      error: LAYERS_ERROR,
    })
    .min(1, { error: 'Choose at least one layer.' })
    .default([...LAYERS])
    .transform((chosen): readonly Layer[] => LAYERS.filter((layer) => chosen.includes(layer))),
);

const TRUTH: Readonly<Record<string, boolean | undefined>> = {
  true: true,
  on: true,
  '1': true,
  false: false,
  off: false,
  '0': false,
};
const arcs = z.preprocess(
  (value) =>
    typeof value === 'string' ? (value.trim() === '' ? undefined : (TRUTH[value.trim()] ?? value)) : value,
  z.boolean({ error: 'The arcs must be true or false.' }).default(false),
);

function optionsObject<T extends z.ZodRawShape>(shape: T) {
  return z.strictObject(shape, {
    error: (issue) =>
      issue.code === 'unrecognized_keys'
        ? `Unknown option ${issue.keys.join(', ')}; the options are ${Object.keys(shape).join(', ')}.`
        : undefined,
  });
}

/**
 * Options of a coordinate file. `points` (per surface, nose and trailing edge counted) is used with cosine spacing,
 * `toleranceMm` with spacing to a tolerance, which needs `chordMm`. Without `chordMm` the coordinates are fractions of chord.
 */
export const datOptionsSchema = optionsObject({
  points: z.preprocess(typed, wholeBetween('The number of points per surface', 10, 1000).default(100)),
  chordMm: z.preprocess(typed, chord.optional()),
  order: choice('The order', ['round', 'surfaces'], 'round'),
  decimals: z.preprocess(typed, wholeBetween('The number of decimals', 4, 10).default(6)),
  newline: choice('The line end', ['lf', 'crlf'], 'lf'),
  spacing: choice('The spacing', ['cosine', 'tolerance'], 'cosine'),
  toleranceMm,
}).refine((options) => options.spacing === 'cosine' || options.chordMm !== undefined, {
  path: ['chordMm'],
  error: 'The chord is needed for spacing to a tolerance in mm.',
});
export type DatOptions = z.output<typeof datOptionsSchema>;

/** Options of a DXF drawing, always in mm. `arcs`: the outline as tangent arcs within the tolerance instead of straight pieces. */
export const dxfOptionsSchema = optionsObject({
  chordMm,
  toleranceMm,
  release: choice('The DXF release', ['r12', 'r2000'], 'r2000'),
  layers,
  arcs,
});
export type DxfOptions = z.output<typeof dxfOptionsSchema>;

/** Options of an SVG drawing at true size. */
export const svgOptionsSchema = optionsObject({ chordMm, toleranceMm, layers });
export type SvgOptions = z.output<typeof svgOptionsSchema>;
