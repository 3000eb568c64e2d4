import { z } from 'zod';
import { PLAN_LIMITS } from '#geometry/cutting/plan.ts';
import {
  idSchema,
  idempotencyKeySchema,
  noteSchema,
  pageOf,
  pageQuerySchema,
  personRefSchema,
  timeSchema,
} from './common.ts';
import { cutSheetSchema, sheetPartSchema, sourceSchema } from './cut-sheets.ts';
import { sectionSchema, versionStatuses } from './sections.ts';
import { machineKinds } from './shop.ts';

const machineRefSchema = z.object({ id: idSchema, name: z.string(), kind: z.enum(machineKinds) });
const materialRefSchema = z.object({ id: idSchema, name: z.string() });

export const cutActions = ['started', 'done', 'scrapped'] as const;
export type CutAction = (typeof cutActions)[number];

/** What the shop says of a part. `at` is when it happened at the machine, which may be before it reached the server. */
export const cutLogSchema = z.object({
  id: idSchema,
  sheetId: idSchema,
  sheetName: z.string(),
  versionNumber: z.int(),
  part: sheetPartSchema,
  action: z.enum(cutActions),
  quantity: z.int(),
  reason: z.string(),
  machine: machineRefSchema.nullable(),
  person: personRefSchema,
  at: timeSchema,
  /** How the version stood when the entry came in: one that is no longer released is said aloud. */
  standing: z.enum(versionStatuses),
});
export type CutLog = z.infer<typeof cutLogSchema>;
export const cutLogPageSchema = pageOf(cutLogSchema);

export const cutLogCreateSchema = z
  .strictObject({
    sheetId: idSchema,
    versionNumber: z.int().min(1),
    part: sheetPartSchema,
    action: z.enum(cutActions),
    quantity: z.int().min(1).max(500).default(1),
    reason: noteSchema.default(''),
    machineId: idSchema.nullable().default(null),
    at: timeSchema,
    /** Made once by the tablet; an entry that is sent again after a network loss is kept once. */
    key: idempotencyKeySchema,
  })
  .refine(({ action, reason }) => action !== 'scrapped' || reason !== '', {
    path: ['reason'],
    error: 'Say why the part is scrapped.',
  });
export const cutLogListQuerySchema = pageQuerySchema.extend({
  sheetId: idSchema.optional(),
  versionNumber: z.coerce.number().int().min(1).optional(),
});

/** One line of the cutting list: a part of a released version, or one begun from a version that is no longer in force. */
export const cuttingListItemSchema = z.object({
  sheetId: idSchema,
  sheetName: z.string(),
  versionNumber: z.int(),
  standing: z.enum(versionStatuses),
  shortCode: z.string(),
  part: sheetPartSchema,
  machine: machineRefSchema.nullable(),
  material: materialRefSchema.nullable(),
  root: sourceSchema,
  tip: sourceSchema,
  rootChordMm: z.number(),
  tipChordMm: z.number(),
  spanMm: z.number(),
  wanted: z.int(),
  done: z.int(),
  scrapped: z.int(),
  /** The last start that is neither done nor scrapped. */
  started: z.object({ by: personRefSchema, at: timeSchema, machine: machineRefSchema.nullable() }).nullable(),
  files: z.array(z.string()),
  releasedAt: timeSchema.nullable(),
});
export type CuttingListItem = z.infer<typeof cuttingListItemSchema>;
export const cuttingListSchema = z.object({ items: z.array(cuttingListItemSchema) });

/** Is this file current? By the SHA-256 of its bytes, or by the short code printed on a sheet or template. */
export const fileCheckQuerySchema = z
  .strictObject({
    checksum: z
      .string()
      .regex(/^[0-9a-f]{64}$/i, 'A checksum has 64 digits.')
      .toLowerCase()
      .optional(),
    code: z.string().trim().min(4, 'The code has 8 signs.').max(20, 'The code has 8 signs.').optional(),
  })
  .refine(({ checksum, code }) => (checksum === undefined) !== (code === undefined), {
    path: ['code'],
    error: 'Give a file or a code.',
  });
export const fileCheckSchema = z.object({
  verdict: z.enum(['current', 'superseded', 'withdrawn', 'draft', 'unknown']),
  what: z
    .object({
      kind: z.enum(['section', 'cut-sheet']),
      id: idSchema,
      name: z.string(),
      versionNumber: z.int(),
      fileName: z.string().nullable(),
    })
    .nullable(),
  /** The version in force, and since when the verdict holds. */
  inForce: z.int().nullable(),
  since: timeSchema.nullable(),
  reason: z.string(),
  /** Section versions behind a cut sheet that are no longer released. */
  stale: z.array(sourceSchema),
});
export type FileCheck = z.infer<typeof fileCheckSchema>;

const ends = z.enum(['root', 'tip']);
const measuredRange = 'A caliper reading is between 0 and 500 mm.';
const measuredSchema = z.number({ error: measuredRange }).min(0, measuredRange).max(500, measuredRange);

/** One caliper reading beside what the plan wants there; the deviation is measured less nominal. */
export const measurementSchema = z.object({
  end: ends,
  station: z.number(),
  nominalMm: z.number(),
  toleranceMm: z.number(),
  measuredMm: z.number(),
  deviationMm: z.number(),
  within: z.boolean(),
});
export const inspectionSchema = z.object({
  id: idSchema,
  sheetId: idSchema,
  sheetName: z.string(),
  versionNumber: z.int(),
  /** What is written on the part, such as "left 2". */
  mark: z.string(),
  measured: z.enum(['core', 'with-skin']),
  machine: machineRefSchema.nullable(),
  measurements: z.array(measurementSchema),
  within: z.boolean(),
  note: z.string(),
  person: personRefSchema,
  at: timeSchema,
  photos: z.array(z.object({ id: idSchema, width: z.int(), height: z.int(), bytes: z.int() })),
  /** What a designer or builder said to a part out of tolerance. */
  answer: z
    .object({
      decision: z.enum(['accepted', 'rejected']),
      note: z.string(),
      by: personRefSchema,
      at: timeSchema,
    })
    .nullable(),
});
export type Inspection = z.infer<typeof inspectionSchema>;
export const inspectionPageSchema = pageOf(inspectionSchema);

export const inspectionCreateSchema = z.strictObject({
  sheetId: idSchema,
  versionNumber: z.int().min(1),
  mark: z.string().trim().max(40, 'The mark holds at most 40 characters.').default(''),
  machineId: idSchema.nullable().default(null),
  /** One reading for each station of the plan that was measured; the nominal comes from the pinned plan. */
  measurements: z
    .array(z.strictObject({ end: ends, station: z.number().min(0).max(1), measuredMm: measuredSchema }))
    .min(1, 'Measure at one station at least.')
    .max(2 * PLAN_LIMITS.inspectionStations),
  note: noteSchema.default(''),
  at: timeSchema,
  key: idempotencyKeySchema,
});
export const inspectionListQuerySchema = pageQuerySchema.extend({
  sheetId: idSchema.optional(),
  versionNumber: z.coerce.number().int().min(1).optional(),
  outcome: z.enum(['within', 'out', 'unanswered']).optional(),
});
export const inspectionAnswerSchema = z.strictObject({
  decision: z.enum(['accepted', 'rejected']),
  note: noteSchema.min(1, 'Say what is to be done with the part.'),
});
export const photoSchema = z.object({ id: idSchema, width: z.int(), height: z.int(), bytes: z.int() });

/** Deviations of all readings of one section cut at one machine: their number, mean and standard deviation. */
export const inspectionStatisticsSchema = z.object({
  items: z.array(
    z.object({
      sectionId: idSchema,
      sectionName: z.string(),
      machine: machineRefSchema.nullable(),
      parts: z.int(),
      readings: z.int(),
      outOfTolerance: z.int(),
      meanMm: z.number(),
      /** Null for a single reading. */
      spreadMm: z.number().nullable(),
    }),
  ),
});
export type InspectionStatistics = z.infer<typeof inspectionStatisticsSchema>;

/** What waits for the one who is signed in; lists that the role has nothing to do with are empty. */
export const deskSchema = z.object({
  drafts: z.array(
    z.object({
      kind: z.enum(['section', 'cut-sheet']),
      id: idSchema,
      name: z.string(),
      updatedAt: timeSchema,
    }),
  ),
  recentSections: z.array(sectionSchema),
  outOfTolerance: z.array(inspectionSchema),
  unplanned: z.array(sectionSchema),
  sheetsInWork: z.array(cutSheetSchema),
  staleSheets: z.array(cutSheetSchema),
});
export type Desk = z.infer<typeof deskSchema>;
