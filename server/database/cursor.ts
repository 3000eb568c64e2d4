import { type z } from 'zod';
import { refuseField } from '#server/refusal.ts';

/** The place behind a row, as opaque text for `nextCursor`. */
export function encodeCursor(values: readonly (string | number)[]): string {
  return Buffer.from(JSON.stringify(values)).toString('base64url');
}

/**
 * Reads a cursor back.
 * @throws Refusal naming `cursor` when it is not one that this very list has given
 */
export function decodeCursor<Values>(cursor: string, schema: z.ZodType<Values>): Values {
  const result = schema.safeParse(jsonOf(cursor));
  if (!result.success) {
    throw refuseField('cursor', 'This is not a place in this list. Start again from its beginning.');
  }
  return result.data;
}

function jsonOf(cursor: string): unknown {
  try {
    return JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
  } catch {
    return undefined;
  }
}

/** Splits the rows of a page, asked for with one row more than its size, into the page and whether more follow. */
export function pageOfRows<Row>(
  rows: readonly Row[],
  limit: number,
): { page: readonly Row[]; last: Row | null } {
  const page = rows.slice(0, limit);
  return { page, last: rows.length > limit ? (page.at(-1) ?? null) : null };
}
