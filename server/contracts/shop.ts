import { z } from 'zod';
import {
  blockSchema,
  machineSchema as wireMachineSchema,
  materialSchema as foamPlanSchema,
  PLAN_LIMITS,
  ribsSchema,
  templateSchema,
} from '#geometry/cutting/plan.ts';
import { idSchema, itemNameSchema, pageOf, personRefSchema, timeSchema } from './common.ts';

export const machineKinds = ['wire', 'bow', 'laser', 'router'] as const;
export type MachineKind = (typeof machineKinds)[number];
export const materialKinds = ['foam', 'sheet'] as const;
export type MaterialKind = (typeof materialKinds)[number];

/** Hot wire melts foam; laser and router cut sheet. Only such a pair has a kerf. */
export function cuts(machine: MachineKind, material: MaterialKind): boolean {
  return (machine === 'wire' || machine === 'bow') === (material === 'foam');
}

function number(label: string, unit: string, min: number, max: number) {
  const range = `${label} must be between ${min} and ${max} ${unit}.`;
  return z.number({ error: range }).min(min, { error: range }).max(max, { error: range });
}
const feed = (label: string) => number(label, 'mm/min', PLAN_LIMITS.feedMmMin.min, PLAN_LIMITS.feedMmMin.max);

/** What a plan needs to know of a four-axis machine, but for its name. Lengths in mm, feeds in mm/min. */
const wireSettingsSchema = wireMachineSchema
  .omit({ name: true })
  .extend({ kind: z.literal('wire') })
  .refine((machine) => machine.travelFeedMmMin <= machine.maxFeedMmMin, {
    path: ['travelFeedMmMin'],
    error: 'The travel feed must not be above the machine’s largest feed.',
  });

const bowSettingsSchema = z.strictObject({
  kind: z.literal('bow'),
  wireDiameterMm: templateSchema.shape.wireDiameterMm,
  /** Free wire between the arms: the widest panel that two people can cut. */
  wireLengthMm: number('The free wire', 'mm', 50, 3000),
});

const { widthMm, heightMm } = ribsSchema.shape.sheet.shape;
const bedShape = {
  /** The largest sheet that lies flat on the bed. */
  sheetWidthMm: widthMm,
  sheetHeightMm: heightMm,
  travelXMm: number('The travel in X', 'mm', 10, 8000),
  travelYMm: number('The travel in Y', 'mm', 10, 4000),
  maxFeedMmMin: feed('The machine’s feed limit'),
};
const laserSettingsSchema = z.strictObject({ kind: z.literal('laser'), ...bedShape });
const routerSettingsSchema = z.strictObject({ kind: z.literal('router'), ...bedShape });

export const machineSettingsSchema = z.discriminatedUnion(
  'kind',
  [wireSettingsSchema, bowSettingsSchema, laserSettingsSchema, routerSettingsSchema],
  { error: 'A machine is a four-axis wire machine, a hand bow, a laser or a router.' },
);
export type MachineSettings = z.infer<typeof machineSettingsSchema>;

/** What a plan needs to know of a foam, but for its name, and the size in which its blocks come. */
const foamSettingsSchema = foamPlanSchema
  .omit({ name: true })
  .extend({
    kind: z.literal('foam'),
    blockLengthMm: blockSchema.shape.lengthMm,
    blockHeightMm: blockSchema.shape.heightMm,
    blockSpanMm: blockSchema.shape.spanMm,
  })
  .refine((foam) => foam.feedMmMin <= foam.maxFeedMmMin, {
    path: ['feedMmMin'],
    error: 'The wire speed wanted must not be above the limit.',
  });

const sheetSettingsSchema = z.strictObject({
  kind: z.literal('sheet'),
  thicknessMm: ribsSchema.shape.materialThicknessMm,
  /** Balsa is the lightest wood in use, glass and carbon plate the heaviest sheet. */
  densityKgM3: number('The density', 'kg/m³', 20, 3000),
  sheetWidthMm: widthMm,
  sheetHeightMm: heightMm,
});

export const materialSettingsSchema = z.discriminatedUnion(
  'kind',
  [foamSettingsSchema, sheetSettingsSchema],
  {
    error: 'A material is a foam or a sheet.',
  },
);
export type MaterialSettings = z.infer<typeof materialSettingsSchema>;

/** Counts the changes of a thing; a change names the one it was made on. */
const revisionSchema = z.int().min(1).max(4_000_000_000);

function itemSchemas<Settings extends z.ZodType>(settings: Settings) {
  const item = z.object({
    id: idSchema,
    name: z.string(),
    settings,
    archived: z.boolean(),
    revision: revisionSchema,
    createdAt: timeSchema,
    updatedAt: timeSchema,
    updatedBy: personRefSchema,
  });
  return {
    item,
    page: pageOf(item),
    create: z.strictObject({ name: itemNameSchema, settings }),
    change: z.strictObject({
      revision: revisionSchema,
      name: itemNameSchema.optional(),
      settings: settings.optional(),
      archived: z.boolean().optional(),
    }),
  };
}

const machines = itemSchemas(machineSettingsSchema);
export const machineSchema = machines.item;
export const machinePageSchema = machines.page;
export const machineCreateSchema = machines.create;
export const machineChangeSchema = machines.change;
export type Machine = z.infer<typeof machineSchema>;

const materials = itemSchemas(materialSettingsSchema);
export const materialSchema = materials.item;
export const materialPageSchema = materials.page;
export const materialCreateSchema = materials.create;
export const materialChangeSchema = materials.change;
export type Material = z.infer<typeof materialSchema>;

/** A kerf of nothing is no kerf; the widest is what a plan takes. */
export const KERF_MM = { min: 0.01, max: PLAN_LIMITS.kerfMm.max } as const;
const kerfMmSchema = number('The kerf', 'mm', KERF_MM.min, KERF_MM.max);

/** Width that a machine takes out of a material. `isDefault`: a value of common practice that nobody measured yet. */
export const kerfSchema = z.object({
  machineId: idSchema,
  materialId: idSchema,
  kerfMm: kerfMmSchema,
  /** The speed of wire, beam or cutter that it holds for; null for a hand bow, which has none that is set. */
  speedMmMin: feed('The speed').nullable(),
  isDefault: z.boolean(),
  /** The day of the test strip; null for a default. */
  measuredOn: z.iso.date().nullable(),
  /** Who measured it, or entered the default. */
  by: personRefSchema,
  revision: revisionSchema,
  updatedAt: timeSchema,
});
export type Kerf = z.infer<typeof kerfSchema>;
export const kerfPageSchema = pageOf(kerfSchema);

export const kerfInputSchema = z.strictObject({
  kerfMm: kerfMmSchema,
  speedMmMin: feed('The speed').nullable(),
  /** Null marks a default that nobody measured yet. */
  measuredOn: z.iso.date({ error: 'Give the day on which the test strip was cut.' }).nullable(),
  /** The revision that it replaces; null where there is no kerf yet. */
  revision: revisionSchema.nullable(),
});
export type KerfInput = z.infer<typeof kerfInputSchema>;
