import { z } from 'zod';
import { panelSchema, planSchema } from '#geometry/cutting/plan.ts';
import {
  idSchema,
  idempotencyKeySchema,
  itemNameSchema,
  noteSchema,
  pageOf,
  pageQuerySchema,
  personRefSchema,
  purposeSchema,
  timeSchema,
} from './common.ts';
import { versionStatuses } from './sections.ts';
import { machineKinds } from './shop.ts';

/** What a cut sheet makes: each is cut at another machine and waits in the cutting list by itself. */
export const sheetParts = ['core', 'ribs', 'templates'] as const;
export const sheetPartSchema = z.enum(sheetParts);
export type SheetPart = z.infer<typeof sheetPartSchema>;
export const papers = ['A4', 'A3', 'Letter'] as const;

const versionNumberSchema = z.int().min(1).max(1_000_000);
const chosen = (what: string) => z.uuid({ error: `Choose a ${what}.` });
const whichVersion = 'Choose a version of the section.';
const endSchema = (end: 'root' | 'tip') =>
  z.strictObject({
    sectionId: chosen('section'),
    versionNumber: z.int({ error: whichVersion }).min(1, whichVersion).max(1_000_000, whichVersion),
    chordMm: panelSchema.shape[end].shape.chordMm,
  });

const quantityRange = 'The number of panels is a whole number between 1 and 500.';

/**
 * A plan as people make it: the values of geometry/cutting/plan.ts, with section versions, machines and materials named instead of
 * copied. `machineId` is a wire machine or a hand bow, `ribMachineId` a laser or router; without foam (`block` null) there are ribs alone.
 */
export const sheetPlanSchema = planSchema.omit({ panel: true, machine: true, material: true }).extend({
  panel: panelSchema
    .omit({ root: true, tip: true })
    .extend({ root: endSchema('root'), tip: endSchema('tip') }),
  machineId: chosen('machine').nullable(),
  materialId: chosen('material').nullable(),
  ribMachineId: chosen('machine').nullable(),
  ribMaterialId: chosen('material').nullable(),
  /** Panels wanted; a mirrored pair counts as two. */
  quantity: z.int({ error: quantityRange }).min(1, quantityRange).max(500, quantityRange),
  /** What the templates are printed on. */
  paper: z.enum(papers, { error: `The paper is ${papers.slice(0, -1).join(', ')} or ${papers.at(-1)}.` }),
});
export type SheetPlan = z.infer<typeof sheetPlanSchema>;

const versionStatusSchema = z.enum(versionStatuses);

/** The section version that an end of the panel is pinned to, and how it stands now. */
export const sourceSchema = z.object({
  sectionId: idSchema,
  sectionName: z.string(),
  versionNumber: z.int(),
  description: z.string(),
  checksum: z.string(),
  status: versionStatusSchema,
  statusAt: timeSchema.nullable(),
  /** The version of that section which is released now. */
  inForce: z.int().nullable(),
});
export type SheetSource = z.infer<typeof sourceSchema>;

const machineRefSchema = z.object({ id: idSchema, name: z.string(), kind: z.enum(machineKinds) });
const materialRefSchema = z.object({ id: idSchema, name: z.string() });

/** How many parts of the released version are done. */
const progressSchema = z.object({ part: sheetPartSchema, wanted: z.int(), done: z.int(), scrapped: z.int() });

/** One line of the list. For a reader who may only see what is released, `latest` is the released version. */
export const cutSheetSchema = z.object({
  id: idSchema,
  name: z.string(),
  purpose: z.string(),
  archived: z.boolean(),
  createdAt: timeSchema,
  updatedAt: timeSchema,
  updatedBy: personRefSchema,
  versionCount: z.int(),
  releasedNumber: z.int().nullable(),
  latest: z.object({
    number: z.int(),
    status: versionStatusSchema,
    root: sourceSchema,
    tip: sourceSchema,
    rootChordMm: z.number(),
    tipChordMm: z.number(),
    spanMm: z.number(),
    quantity: z.int(),
    parts: z.array(sheetPartSchema),
    machine: machineRefSchema.nullable(),
    material: materialRefSchema.nullable(),
    errors: z.int(),
    warnings: z.int(),
  }),
  progress: z.array(progressSchema),
});
export type CutSheet = z.infer<typeof cutSheetSchema>;
export const cutSheetPageSchema = pageOf(cutSheetSchema);

/** A section version that a sheet uses is no longer the one in force. */
export function isStale({ root, tip }: { readonly root: SheetSource; readonly tip: SheetSource }): boolean {
  return root.status !== 'released' || tip.status !== 'released';
}

export const cutSheetSorts = ['updated', 'name'] as const;
export const cutSheetListQuerySchema = pageQuerySchema.extend({
  search: z.string().trim().max(80).optional(),
  status: z.enum(['draft', 'released', 'withdrawn', 'archived', 'stale']).optional(),
  sort: z.enum(cutSheetSorts).default('updated'),
});
export type CutSheetListQuery = z.infer<typeof cutSheetListQuerySchema>;

export const cutSheetCreateSchema = z.strictObject({
  name: itemNameSchema,
  purpose: purposeSchema.default(''),
  plan: sheetPlanSchema,
  note: noteSchema.default(''),
  key: idempotencyKeySchema.optional(),
});
export const cutSheetChangeSchema = z
  .strictObject({ name: itemNameSchema, purpose: purposeSchema, archived: z.boolean() })
  .partial();

/** A person's unsaved plan as it stands in the form, right or wrong, so that a closed tab loses nothing. */
export const sheetDraftInputSchema = z.strictObject({
  basedOn: versionNumberSchema,
  values: z.record(z.string().max(60), z.json()),
});
export const sheetDraftSchema = sheetDraftInputSchema.extend({ updatedAt: timeSchema });
export type SheetDraft = z.infer<typeof sheetDraftSchema>;

/**
 * An immutable version. `pinned` is the whole plan with the shapes, machine and material as they were when it was saved; the checksum is
 * the SHA-256 of its canonical text, and the short code its first 40 bits, to be typed from a printed template.
 */
export const sheetVersionSchema = z.object({
  id: idSchema,
  sheetId: idSchema,
  sheetName: z.string(),
  number: z.int(),
  basedOn: z.int().nullable(),
  status: versionStatusSchema,
  statusReason: z.string(),
  statusBy: personRefSchema.nullable(),
  statusAt: timeSchema.nullable(),
  plan: sheetPlanSchema,
  pinned: planSchema,
  root: sourceSchema,
  tip: sourceSchema,
  machine: machineRefSchema.nullable(),
  material: materialRefSchema.nullable(),
  ribMachine: machineRefSchema.nullable(),
  ribMaterial: materialRefSchema.nullable(),
  parts: z.array(sheetPartSchema),
  errors: z.int(),
  warnings: z.int(),
  checksum: z.string().regex(/^[0-9a-f]{64}$/),
  shortCode: z.string(),
  note: z.string(),
  author: personRefSchema,
  createdAt: timeSchema,
});
export type SheetVersion = z.infer<typeof sheetVersionSchema>;
export const sheetVersionPageSchema = pageOf(sheetVersionSchema);

export const sheetVersionCreateSchema = z.strictObject({
  basedOn: versionNumberSchema,
  plan: sheetPlanSchema,
  note: noteSchema.default(''),
  key: idempotencyKeySchema.optional(),
});

/** 409 of a save: the version that came in between. */
export const sheetConflictSchema = z.object({
  code: z.literal('version-conflict'),
  basedOn: z.int(),
  latest: sheetVersionSchema,
});

/** A file of a version; its checksum is the SHA-256 of its bytes. */
export const sheetFileSchema = z.object({
  name: z.string(),
  part: z.enum([...sheetParts, 'sheet', 'all']),
  downloadName: z.string(),
  mediaType: z.string(),
  bytes: z.int(),
  checksum: z.string(),
});
export type SheetFile = z.infer<typeof sheetFileSchema>;
export const sheetFilesSchema = z.object({ items: z.array(sheetFileSchema) });

export const sheetDownloadPageSchema = pageOf(
  z.object({
    id: idSchema,
    person: personRefSchema,
    fileName: z.string(),
    checksum: z.string(),
    at: timeSchema,
  }),
);
