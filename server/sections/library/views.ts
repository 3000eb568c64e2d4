import { type sectionSorts } from '#server/contracts/sections.ts';
import { type Reach } from '../rules.ts';

export type Sort = (typeof sectionSorts)[number];

/** Where a kind of reader finds what the library shows, and the index that holds each order. */
export interface View {
  readonly number: string;
  readonly kind: string;
  readonly description: string;
  readonly at: string;
  readonly by: string;
  readonly count: string;
  readonly sorts: Readonly<Record<Sort, { readonly column: string; readonly index: string }>>;
}

/** For a reader of everything a section is its newest version, for others the released one. */
export const views: Readonly<Record<Reach, View>> = {
  all: {
    number: 'latest_number',
    kind: 'latest_kind',
    description: 'latest_description',
    at: 'updated_at',
    by: 'updated_by',
    count: 'latest_number',
    sorts: {
      updated: { column: 'updated_at', index: 'sections_by_update' },
      name: { column: 'name', index: 'sections_by_name' },
      thickness: { column: 'latest_thickness', index: 'sections_by_thickness' },
      camber: { column: 'latest_camber', index: 'sections_by_camber' },
    },
  },
  released: {
    number: 'released_number',
    kind: 'released_kind',
    description: 'released_description',
    at: 'released_at',
    by: 'released_by',
    count: 'released_count',
    sorts: {
      updated: { column: 'released_at', index: 'released_by_update' },
      name: { column: 'name', index: 'released_by_name' },
      thickness: { column: 'released_thickness', index: 'released_by_thickness' },
      camber: { column: 'released_camber', index: 'released_by_camber' },
    },
  },
};
