import { type Knex } from 'knex';

/** Tables whose rows belong to a workshop: all but the workshops themselves. */
export type WorkshopTable =
  | 'people'
  | 'sections'
  | 'section_versions'
  | 'section_drafts'
  | 'downloads'
  | 'machines'
  | 'materials'
  | 'kerfs'
  | 'cut_sheets'
  | 'cut_sheet_versions'
  | 'cut_sheet_drafts'
  | 'cut_files'
  | 'cut_downloads'
  | 'cut_logs'
  | 'cut_progress'
  | 'inspections'
  | 'inspection_measurements'
  | 'photos'
  | 'kerf_history'
  | 'flight_conditions';

/** A row to be written, without the workshop: that comes from the scope and from nowhere else. */
type NewRow = Readonly<Record<string, string | number | boolean | Date | Buffer | null>>;

/** The tables of one workshop. */
interface Scope {
  /** Selects, updates or deletes in a table of this workshop. An alias names the table in joins. */
  table(name: WorkshopTable, options?: { as?: string; index?: string }): Knex.QueryBuilder;
  /** Adds a row to this workshop. */
  insert(name: WorkshopTable, row: NewRow): Knex.QueryBuilder;
}

/**
 * The one way to the rows of a workshop: what it gives can neither read nor write another workshop's. (Sign-in, which
 * does not know the workshop yet, is the exception and stands in account/store.ts.) Alternatives belong into a group,
 * `where((either) => either.where(…).orWhere(…))`: an `orWhere` beside the scope would lead out of it.
 */
export function scoped(db: Knex, workshopId: string): Scope {
  return {
    table: (name, { as = name, index } = {}) => {
      const hint = index === undefined ? '' : ' FORCE INDEX (??)';
      const bindings = index === undefined ? [name, as] : [name, as, index];
      const source = as === name && index === undefined ? name : db.raw(`?? AS ??${hint}`, bindings);
      return db(source as string).where(`${as}.workshop_id`, workshopId);
    },
    insert: (name, row) => db(name).insert({ ...row, workshop_id: workshopId }),
  };
}

/**
 * Joins a table of the same workshop to a query made by {@link scoped}; `on` pairs further columns,
 * such as `['v.section_id', 's.id']`.
 */
export function joinScoped(
  query: Knex.QueryBuilder,
  join: 'inner' | 'left',
  [table, as]: readonly [WorkshopTable, string],
  from: string,
  on: readonly (readonly [string, string])[],
): Knex.QueryBuilder {
  const clause = (builder: Knex.JoinClause) => {
    builder.on(`${as}.workshop_id`, `${from}.workshop_id`);
    for (const [left, right] of on) builder.on(left, right);
  };
  return join === 'inner' ? query.join({ [as]: table }, clause) : query.leftJoin({ [as]: table }, clause);
}

/** A pattern for LIKE that finds text anywhere; the signs that LIKE gives a meaning are taken as they stand. */
export function containing(text: string): string {
  return `%${text.replace(/[\\%_]/g, '\\$&')}%`;
}
