import { z } from 'zod';
import { flightConditionSchema } from '#geometry/flow/flight-condition.ts';
import { idSchema, itemNameSchema, pageOf, personRefSchema, timeSchema } from './common.ts';

/** Counts the changes of a condition; a change names the one it was made on. */
const revisionSchema = z.int().min(1).max(4_000_000_000);

/** A flight condition as the workshop keeps it. One of those in use is the default of the workshop. */
export const storedConditionSchema = z.object({
  id: idSchema,
  name: z.string(),
  settings: flightConditionSchema,
  isDefault: z.boolean(),
  archived: z.boolean(),
  revision: revisionSchema,
  createdAt: timeSchema,
  updatedAt: timeSchema,
  updatedBy: personRefSchema,
});
export type StoredCondition = z.infer<typeof storedConditionSchema>;

export const storedConditionPageSchema = pageOf(storedConditionSchema);

export const conditionCreateSchema = z.strictObject({
  name: itemNameSchema,
  settings: flightConditionSchema,
});
export type ConditionInput = z.infer<typeof conditionCreateSchema>;

export const conditionChangeSchema = z.strictObject({
  revision: revisionSchema,
  name: itemNameSchema.optional(),
  settings: flightConditionSchema.optional(),
  archived: z.boolean().optional(),
});
export type ConditionChange = z.infer<typeof conditionChangeSchema>;
