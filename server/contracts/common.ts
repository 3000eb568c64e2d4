import { z } from 'zod';

export const idSchema = z.uuid();
export const timeSchema = z.iso.datetime();

/** A key the client makes once per intended write; a retry with the same key answers as the first time did. */
export const idempotencyKeySchema = z.uuid();

export const sectionNameSchema = z
  .string()
  .trim()
  .min(1, 'Give the section a name.')
  .max(80, 'A name holds at most 80 characters.')
  .regex(/^[^\p{Cc}\p{Zl}\p{Zp}]*$/u, 'A name is one line of plain text.');
/** The name of a machine, a material or a cut sheet. */
export const itemNameSchema = z
  .string({ error: 'Give it a name.' })
  .trim()
  .min(1, 'Give it a name.')
  .max(60, 'A name holds at most 60 characters.')
  .regex(/^[^\p{Cc}\p{Zl}\p{Zp}]*$/u, 'A name is one line of plain text.');
export const purposeSchema = z
  .string()
  .trim()
  .max(200, 'The purpose holds at most 200 characters.')
  .regex(/^[^\p{Cc}\p{Zl}\p{Zp}]*$/u, 'The purpose is one line of plain text.');
export const noteSchema = z.string().trim().max(500, 'A note holds at most 500 characters.');

export const personRefSchema = z.object({ id: idSchema, name: z.string() });
export type PersonRef = z.infer<typeof personRefSchema>;

/** Problem details of RFC 9457; `errors` names the fields, `code` is for programs. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  code: z.string(),
  detail: z.string().optional(),
  requestId: z.string().optional(),
  errors: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
});
export type Problem = z.infer<typeof problemSchema>;

export function pageOf<Item extends z.ZodType>(item: Item) {
  return z.object({ items: z.array(item), nextCursor: z.string().nullable() });
}

/** Page position and size; the cursor is opaque and comes from `nextCursor`. */
export const pageQuerySchema = z.strictObject({
  cursor: z.string().max(500).optional(),
  limit: z.coerce.number().int().min(1).max(100).default(30),
});
