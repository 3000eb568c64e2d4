import { z } from 'zod';
import { LENGTH_LIMITS } from '#geometry/formats/options.ts';
import { shapeSchema } from '#geometry/shapes/shape.ts';
import {
  idSchema,
  idempotencyKeySchema,
  noteSchema,
  pageOf,
  pageQuerySchema,
  personRefSchema,
  purposeSchema,
  sectionNameSchema,
  timeSchema,
} from './common.ts';

export const versionStatuses = ['draft', 'released', 'superseded', 'withdrawn'] as const;
const versionStatusSchema = z.enum(versionStatuses);
export type VersionStatus = z.infer<typeof versionStatusSchema>;

/**
 * One line of the library. For a reader who may only see what is released, `latest` is the released version.
 * `maxThickness` and `maxCamber` are measured on the true contour of `latest`, in fractions of chord.
 */
export const sectionSchema = z.object({
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
    description: z.string(),
    maxThickness: z.number(),
    maxCamber: z.number(),
    shape: shapeSchema,
  }),
});
export type Section = z.infer<typeof sectionSchema>;

export const sectionSorts = ['updated', 'name', 'thickness', 'camber'] as const;
/**
 * `status` is the status of the latest version; `released` also finds sections whose released version is older.
 * Archived sections are listed under `archived` and nowhere else. Without a direction: newest first when sorted by
 * `updated`, ascending otherwise. `search` finds text anywhere in name, purpose and description.
 */
export const sectionListQuerySchema = pageQuerySchema.extend({
  search: z.string().trim().max(80).optional(),
  status: z.enum(['draft', 'released', 'withdrawn', 'archived']).optional(),
  kind: z.enum(['naca4', 'cst']).optional(),
  sort: z.enum(sectionSorts).default('updated'),
  direction: z.enum(['ascending', 'descending']).optional(),
});
export type SectionListQuery = z.infer<typeof sectionListQuerySchema>;
export const sectionPageSchema = pageOf(sectionSchema);

export const sectionCreateSchema = z.strictObject({
  name: sectionNameSchema,
  purpose: purposeSchema.default(''),
  shape: shapeSchema,
  note: noteSchema.default(''),
  key: idempotencyKeySchema.optional(),
});
export const sectionChangeSchema = z
  .strictObject({ name: sectionNameSchema, purpose: purposeSchema, archived: z.boolean() })
  .partial();

/** A person's unsaved work on a section, kept on every change so that a closed tab loses nothing. */
export const draftInputSchema = z.strictObject({
  basedOn: z.int().min(1),
  shape: shapeSchema,
  chordMm: z.number().min(LENGTH_LIMITS.chordMm.min).max(LENGTH_LIMITS.chordMm.max),
});
export const draftSchema = draftInputSchema.extend({ updatedAt: timeSchema });
export type Draft = z.infer<typeof draftSchema>;

export const versionSchema = z.object({
  id: idSchema,
  sectionId: idSchema,
  sectionName: z.string(),
  number: z.int(),
  basedOn: z.int().nullable(),
  status: versionStatusSchema,
  statusReason: z.string(),
  statusBy: personRefSchema.nullable(),
  statusAt: timeSchema.nullable(),
  shape: shapeSchema,
  description: z.string(),
  checksum: z.string().regex(/^[0-9a-f]{64}$/),
  note: z.string(),
  author: personRefSchema,
  createdAt: timeSchema,
});
export type SectionVersion = z.infer<typeof versionSchema>;
export const versionPageSchema = pageOf(versionSchema);

export const versionCreateSchema = z.strictObject({
  basedOn: z.int().min(1),
  shape: shapeSchema,
  note: noteSchema.default(''),
  key: idempotencyKeySchema.optional(),
});

/** 409 of a save: what was offered is echoed by the client itself; the server names what came in between. */
export const versionConflictSchema = z.object({
  code: z.literal('version-conflict'),
  basedOn: z.int(),
  latest: versionSchema,
});

export const releaseSchema = z.strictObject({ reason: noteSchema.default('') });
export const withdrawSchema = z.strictObject({
  reason: noteSchema.min(1, 'Say why the version is withdrawn.'),
});

const downloadSchema = z.object({
  id: idSchema,
  person: personRefSchema,
  fileName: z.string(),
  format: z.enum(['dat', 'dxf', 'svg']),
  checksum: z.string(),
  at: timeSchema,
});
export type Download = z.infer<typeof downloadSchema>;
export const downloadPageSchema = pageOf(downloadSchema);
