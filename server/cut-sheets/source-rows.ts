import { type Knex } from 'knex';
import { type SheetPart, type SheetSource } from '#server/contracts/cut-sheets.ts';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { type MachineKind } from '#server/contracts/shop.ts';
import { joinScoped } from '#server/database/scoped.ts';

interface SourceColumns {
  section_id: string;
  number: number;
  section_name: string;
  description: string;
  checksum: string;
  status: VersionStatus;
  status_at: Date | null;
  in_force: number | null;
}
type Prefixed<Prefix extends string, Columns> = {
  [Column in keyof Columns & string as `${Prefix}_${Column}`]: Columns[Column];
};
/** What {@link joinSources} adds to a row, with the version's own columns that it stands on. */
export type SourceRow = Prefixed<'root', SourceColumns> & Prefixed<'tip', SourceColumns>;

/** Adds the section versions at both ends to versions of cut sheets: how they stand is read at the moment of asking. */
export function joinSources(query: Knex.QueryBuilder, versions: string): Knex.QueryBuilder {
  for (const end of ['root', 'tip'] as const) {
    joinScoped(query, 'inner', ['section_versions', `${end}_v`], versions, [
      [`${end}_v.section_id`, `${versions}.${end}_section_id`],
      [`${end}_v.number`, `${versions}.${end}_number`],
    ]);
    joinScoped(query, 'inner', ['sections', `${end}_s`], versions, [
      [`${end}_s.id`, `${versions}.${end}_section_id`],
    ]);
    query.select(
      `${versions}.${end}_section_id`,
      `${versions}.${end}_number`,
      `${end}_s.name as ${end}_section_name`,
      `${end}_v.description as ${end}_description`,
      `${end}_v.checksum as ${end}_checksum`,
      `${end}_v.status as ${end}_status`,
      `${end}_v.status_at as ${end}_status_at`,
      `${end}_s.released_number as ${end}_in_force`,
    );
  }
  return query;
}

export function sourceOf(row: SourceRow, end: 'root' | 'tip'): SheetSource {
  return {
    sectionId: row[`${end}_section_id`],
    sectionName: row[`${end}_section_name`],
    versionNumber: row[`${end}_number`],
    description: row[`${end}_description`],
    checksum: row[`${end}_checksum`],
    status: row[`${end}_status`],
    statusAt: row[`${end}_status_at`]?.toISOString() ?? null,
    inForce: row[`${end}_in_force`],
  };
}

type ThingName = 'machine' | 'material' | 'rib_machine' | 'rib_material';
interface ThingColumns {
  id: string | null;
  kind: string | null;
  name: string | null;
}
export type ThingRow<Name extends ThingName = ThingName> = Prefixed<Name, ThingColumns>;

/** Adds the present names of machines and materials to versions of cut sheets. */
export function joinThings(
  query: Knex.QueryBuilder,
  versions: string,
  names: readonly ThingName[],
): Knex.QueryBuilder {
  for (const name of names) {
    const table = name.endsWith('machine') ? 'machines' : 'materials';
    joinScoped(query, 'left', [table, `${name}_t`], versions, [[`${name}_t.id`, `${versions}.${name}_id`]]);
    query.select(`${versions}.${name}_id`, `${versions}.${name}_kind`, `${name}_t.name as ${name}_name`);
  }
  return query;
}

export function machineOf(id: string | null, name: string | null, kind: string | null) {
  return id === null || name === null ? null : { id, name, kind: kind as MachineKind };
}

export function materialOf(id: string | null, name: string | null) {
  return id === null || name === null ? null : { id, name };
}

/** Parts as the database keeps them: a set, written with commas. */
export function partsOfColumn(parts: string): SheetPart[] {
  return parts === '' ? [] : (parts.split(',') as SheetPart[]);
}
