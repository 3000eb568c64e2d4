import { type Knex } from 'knex';
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

/**
 * Continues a list behind a place, in the order of `column` and then of `idColumn`. The first condition is implied by
 * the second; it is the one that an index can follow.
 */
export function continueBehind(
  query: Knex.QueryBuilder,
  [column, idColumn]: readonly [string, string],
  direction: 'ascending' | 'descending',
  place: { readonly value: string | number | Date; readonly id: string },
): void {
  const [beyond, atOrBeyond] = direction === 'ascending' ? ['>', '>='] : ['<', '<='];
  query.where(column, atOrBeyond, place.value).where((either) => {
    either
      .where(column, beyond, place.value)
      .orWhere((tie) => tie.where(column, place.value).where(idColumn, beyond, place.id));
  });
}

/** Splits the rows of a page, asked for with one row more than its size, into the page and whether more follow. */
export function pageOfRows<Row>(
  rows: readonly Row[],
  limit: number,
): { page: readonly Row[]; last: Row | null } {
  const page = rows.slice(0, limit);
  return { page, last: rows.length > limit ? (page.at(-1) ?? null) : null };
}
