import { z } from 'zod';
import { idSchema, timeSchema } from '#server/contracts/common.ts';
import { decodeCursor, encodeCursor } from '#server/database/cursor.ts';
import { type Sort } from './views.ts';

interface Place {
  readonly value: string | Date;
  readonly id: string;
}

const cursorSchemas = {
  updated: z.tuple([z.literal('updated'), timeSchema.transform((text) => new Date(text)), idSchema]),
  name: z.tuple([z.literal('name'), z.string().max(60), idSchema]),
} as const satisfies Record<Sort, z.ZodType>;

/** The place behind a sheet in one order of the list; it says which order it belongs to. */
export function cursorOf(sort: Sort, { value, id }: Place): string {
  return encodeCursor([sort, value instanceof Date ? value.toISOString() : value, id]);
}

/**
 * Reads a place back.
 * @throws Refusal naming `cursor` when it is none, or belongs to another order
 */
export function placeOf(cursor: string, sort: Sort): Place {
  const [, value, id] = decodeCursor<readonly [Sort, string | Date, string]>(cursor, cursorSchemas[sort]);
  return { value, id };
}
