import { type Knex } from 'knex';
import { type Shape } from '#geometry/shapes/shape.ts';
import { type Section, type SectionListQuery, type VersionStatus } from '#server/contracts/sections.ts';
import { continueBehind, pageOfRows } from '#server/database/cursor.ts';
import { containing, joinScoped, scoped } from '#server/database/scoped.ts';
import { Refusal } from '#server/refusal.ts';
import { type Reach } from '../rules.ts';
import { cursorOf, type Direction, placeOf } from './cursor.ts';
import { type Sort, type View, views } from './views.ts';

interface Row {
  id: string;
  name: string;
  purpose: string;
  created_at: Date;
  shown_at: Date;
  shown_by: string;
  shown_by_name: string;
  shown_count: number;
  archived: 0 | 1;
  released_number: number | null;
  version_number: number;
  version_status: VersionStatus;
  version_description: string;
  version_thickness: number;
  version_camber: number;
  version_shape: Shape;
  sort_value: string | number | Date;
}

function sectionOf(row: Row): Section {
  return {
    id: row.id,
    name: row.name,
    purpose: row.purpose,
    archived: row.archived === 1,
    createdAt: row.created_at.toISOString(),
    updatedAt: row.shown_at.toISOString(),
    updatedBy: { id: row.shown_by, name: row.shown_by_name },
    versionCount: row.shown_count,
    releasedNumber: row.released_number,
    latest: {
      number: row.version_number,
      status: row.version_status,
      description: row.version_description,
      maxThickness: row.version_thickness,
      maxCamber: row.version_camber,
      shape: row.version_shape,
    },
  };
}

const versionColumns = ['number', 'status', 'description', 'thickness', 'camber', 'shape'];

/** Adds version and person to sections that are already chosen: a page is cut before anything is joined to it. */
function withVersions(db: Knex, chosen: Knex.QueryBuilder): Knex.QueryBuilder {
  const rows = db
    .from(chosen.as('s'))
    .select(
      's.*',
      'p.name as shown_by_name',
      ...versionColumns.map((column) => `v.${column} as version_${column}`),
    );
  joinScoped(rows, 'inner', ['section_versions', 'v'], 's', [
    ['v.section_id', 's.id'],
    ['v.number', 's.shown_number'],
  ]);
  return joinScoped(rows, 'inner', ['people', 'p'], 's', [['p.id', 's.shown_by']]);
}

function columnsOf(view: View, sort: Sort): string[] {
  return [
    's.workshop_id',
    's.id',
    's.name',
    's.purpose',
    's.created_at',
    's.archived',
    's.released_number',
    `s.${view.at} as shown_at`,
    `s.${view.by} as shown_by`,
    `s.${view.count} as shown_count`,
    `s.${view.number} as shown_number`,
    `s.${view.sorts[sort].column} as sort_value`,
  ];
}

type Filter = Pick<SectionListQuery, 'search' | 'status' | 'kind'>;

function narrow(query: Knex.QueryBuilder, view: View, reach: Reach, filter: Filter): void {
  query.where('s.archived', filter.status === 'archived' ? 1 : 0);
  if (reach === 'released') query.where('s.released', 1);
  if (filter.status === 'released') query.where('s.released', 1);
  // What a reader of released versions sees is released, never a draft and never withdrawn.
  if (filter.status === 'draft' || filter.status === 'withdrawn') {
    query.where('s.latest_status', filter.status);
    if (reach === 'released') query.whereRaw('1 = 0');
  }
  if (filter.kind) query.where(`s.${view.kind}`, filter.kind);
  if (filter.search) {
    const pattern = containing(filter.search);
    query.where((either) => {
      for (const column of ['name', 'purpose', view.description])
        either.orWhere(`s.${column}`, 'like', pattern);
    });
  }
}

/** The library is read newest first by default, and in every other order from its beginning. */
function directionOf({ sort, direction }: Pick<SectionListQuery, 'sort' | 'direction'>): Direction {
  return direction ?? (sort === 'updated' ? 'descending' : 'ascending');
}

/** The query behind a page of the library, for one row more than the page; apart, so that it can be explained. */
export function libraryQuery(
  db: Knex,
  workshopId: string,
  reach: Reach,
  asked: SectionListQuery,
): Knex.QueryBuilder {
  const view = views[reach];
  const direction = directionOf(asked);
  const { column, index } = view.sorts[asked.sort];
  const order = direction === 'ascending' ? 'asc' : 'desc';
  const chosen = scoped(db, workshopId).table('sections', { as: 's', index });
  narrow(chosen, view, reach, asked);
  if (asked.cursor !== undefined) {
    const place = placeOf(asked.cursor, asked.sort, direction);
    continueBehind(chosen, [`s.${column}`, 's.id'], direction, place);
  }
  chosen
    .select(columnsOf(view, asked.sort))
    .orderBy(`s.${column}`, order)
    .orderBy('s.id', order)
    .limit(asked.limit + 1);
  return withVersions(db, chosen).orderBy('s.sort_value', order).orderBy('s.id', order);
}

/**
 * A page of the library within reach.
 * @throws Refusal naming `cursor` when it is not one of this list in this order
 */
export async function listSections(
  db: Knex,
  workshopId: string,
  reach: Reach,
  asked: SectionListQuery,
): Promise<{ items: Section[]; nextCursor: string | null }> {
  const rows: Row[] = await libraryQuery(db, workshopId, reach, asked);
  const { page, last } = pageOfRows(rows, asked.limit);
  const nextCursor = last
    ? cursorOf(asked.sort, directionOf(asked), { value: last.sort_value, id: last.id })
    : null;
  return { items: page.map(sectionOf), nextCursor };
}

/**
 * One section as the library shows it.
 * @throws Refusal `not-found` when there is none within reach
 */
export async function findSection(
  db: Knex,
  workshopId: string,
  sectionId: string,
  reach: Reach,
): Promise<Section> {
  const chosen = scoped(db, workshopId)
    .table('sections', { as: 's' })
    .where('s.id', sectionId)
    .select(columnsOf(views[reach], 'name'));
  if (reach === 'released') chosen.where('s.released', 1);
  const rows: Row[] = await withVersions(db, chosen);
  const [row] = rows;
  if (!row) throw new Refusal('not-found');
  return sectionOf(row);
}
