import { type cutSheetSorts } from '#server/contracts/cut-sheets.ts';
import { type Reach } from '#server/sections/rules.ts';

export type Sort = (typeof cutSheetSorts)[number];

/** Where a kind of reader finds what the list shows, and the index that holds each order. */
interface View {
  readonly number: string;
  readonly at: string;
  readonly by: string;
  readonly count: string;
  readonly sorts: Readonly<Record<Sort, { readonly column: string; readonly index: string }>>;
}

/** For a reader of everything a cut sheet is its newest version, for others the released one. */
export const views: Readonly<Record<Reach, View>> = {
  all: {
    number: 'latest_number',
    at: 'updated_at',
    by: 'updated_by',
    count: 'latest_number',
    sorts: {
      updated: { column: 'updated_at', index: 'sheets_by_update' },
      name: { column: 'name', index: 'sheets_by_name' },
    },
  },
  released: {
    number: 'released_number',
    at: 'released_at',
    by: 'released_by',
    count: 'released_count',
    sorts: {
      updated: { column: 'released_at', index: 'released_sheets_by_update' },
      name: { column: 'name', index: 'released_sheets_by_name' },
    },
  },
};
