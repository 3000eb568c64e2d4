import { z } from 'zod';
import { idSchema, timeSchema } from '#server/contracts/common.ts';
import { decodeCursor, encodeCursor } from '#server/database/cursor.ts';
import { type Sort } from './views.ts';

export type Direction = 'ascending' | 'descending';

/** The last row of a page in one order of the library: the next page begins behind it. */
interface Place {
  readonly value: string | number | Date;
  readonly id: string;
}

const valueSchemas = {
  updated: timeSchema.transform((text) => new Date(text)),
  name: z.string().max(80),
  thickness: z.number(),
  camber: z.number(),
} as const satisfies Record<Sort, z.ZodType>;

/** The place as opaque text; it says which order it belongs to. */
export function cursorOf(sort: Sort, direction: Direction, { value, id }: Place): string {
  return encodeCursor([sort, direction, value instanceof Date ? value.toISOString() : value, id]);
}

/**
 * Reads a place back.
 * @throws Refusal naming `cursor` when it is none, or belongs to another order
 */
export function placeOf(cursor: string, sort: Sort, direction: Direction): Place {
  const schema = z.tuple([z.literal(sort), z.literal(direction), valueSchemas[sort], idSchema]);
  const [, , value, id] = decodeCursor<readonly [string, string, string | number | Date, string]>(
    cursor,
    schema,
  );
  return { value, id };
}
