import { type Knex } from 'knex';
import { type CutSheet } from '#server/contracts/cut-sheets.ts';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { joinScoped } from '#server/database/scoped.ts';
import { type Reach } from '#server/sections/rules.ts';
import {
  joinSources,
  joinThings,
  machineOf,
  materialOf,
  partsOfColumn,
  sourceOf,
  type SourceRow,
  type ThingRow,
} from '../source-rows.ts';
import { type Sort, views } from './views.ts';

interface SheetColumns {
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
  sort_value: string | Date;
  number: number;
  status: VersionStatus;
  root_chord_mm: number;
  tip_chord_mm: number;
  span_mm: number;
  quantity: number;
  parts: string;
  errors: number;
  warnings: number;
}
/** A line of the list as {@link withVersions} finds it. */
export type Row = SheetColumns & SourceRow & ThingRow<'machine' | 'material'>;

export function sheetOf(row: Row, progress: CutSheet['progress']): CutSheet {
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
      number: row.number,
      status: row.status,
      root: sourceOf(row, 'root'),
      tip: sourceOf(row, 'tip'),
      rootChordMm: row.root_chord_mm,
      tipChordMm: row.tip_chord_mm,
      spanMm: row.span_mm,
      quantity: row.quantity,
      parts: partsOfColumn(row.parts),
      machine: machineOf(row.machine_id, row.machine_name, row.machine_kind),
      material: materialOf(row.material_id, row.material_name),
      errors: row.errors,
      warnings: row.warnings,
    },
    progress,
  };
}

const versionColumns = [
  'number',
  'status',
  'root_chord_mm',
  'tip_chord_mm',
  'span_mm',
  'quantity',
  'parts',
  'errors',
  'warnings',
];

/** Adds version, sections, machine and person to sheets that are already chosen: a page is cut before anything is joined to it. */
export function withVersions(db: Knex, chosen: Knex.QueryBuilder): Knex.QueryBuilder {
  const rows = db
    .from(chosen.as('s'))
    .select('s.*', 'p.name as shown_by_name', ...versionColumns.map((column) => `v.${column}`));
  joinScoped(rows, 'inner', ['cut_sheet_versions', 'v'], 's', [
    ['v.sheet_id', 's.id'],
    ['v.number', 's.shown_number'],
  ]);
  joinScoped(rows, 'inner', ['people', 'p'], 's', [['p.id', 's.shown_by']]);
  joinSources(rows, 'v');
  return joinThings(rows, 'v', ['machine', 'material']);
}

/** What of a sheet the list needs, under names that are the same for every reader. */
export function columnsOf(reach: Reach, sort: Sort): string[] {
  const view = views[reach];
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
