import { type Knex } from 'knex';
import { v7 as uuid } from 'uuid';
import { type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { partsOf } from '#server/contracts/sheet-plan.ts';
import { type Keyed, keyColumns, type KeyKeeping } from '#server/database/once.ts';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { type Author } from '#server/sections/rules.ts';
import { describeDocument, type SheetDocument } from '../document.ts';
import { type Count } from '../files/make.ts';
import { type PinnedPlan } from '../pin.ts';
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

/** The version that a request has made. */
interface Made {
  readonly sheet_id: string;
  readonly number: number;
}

export const sheetVersionKeys: KeyKeeping<Made> = {
  table: 'cut_sheet_versions',
  uniqueKey: 'sheet_versions_idempotency',
  columns: ['sheet_id', 'number'],
};

interface NewVersion extends Keyed {
  readonly sheetId: string;
  readonly number: number;
  readonly basedOn: number | null;
  readonly document: PinnedPlan;
  readonly count: Count;
  readonly note: string;
}

/** Writes a version as a draft. */
export async function addSheetVersion(db: Knex, author: Author, version: NewVersion): Promise<void> {
  const { plan, kinds } = version.document;
  const { text, checksum, shortCode } = describeDocument(version.document, version);
  const { root, tip, spanMm } = plan.panel;
  await scoped(db, author.workshopId).insert('cut_sheet_versions', {
    id: uuid(),
    sheet_id: version.sheetId,
    number: version.number,
    based_on: version.basedOn,
    document: text,
    checksum,
    short_code: shortCode,
    root_section_id: root.sectionId,
    root_number: root.versionNumber,
    root_chord_mm: root.chordMm,
    tip_section_id: tip.sectionId,
    tip_number: tip.versionNumber,
    tip_chord_mm: tip.chordMm,
    span_mm: spanMm,
    machine_id: plan.machineId,
    machine_kind: kinds.machine,
    material_id: plan.materialId,
    material_kind: kinds.material,
    rib_machine_id: plan.ribMachineId,
    rib_machine_kind: kinds.ribMachine,
    rib_material_id: plan.ribMaterialId,
    rib_material_kind: kinds.ribMaterial,
    quantity: plan.quantity,
    parts: partsOf(plan).join(','),
    errors: version.count.errors,
    warnings: version.count.warnings,
    note: version.note,
    author_id: author.personId,
    created_at: author.at,
    ...keyColumns(version),
  });
}

interface VersionColumns {
  id: string;
  sheet_id: string;
  sheet_name: string;
  number: number;
  based_on: number | null;
  document: SheetDocument;
  checksum: string;
  short_code: string;
  parts: string;
  errors: number;
  warnings: number;
  note: string;
  author_id: string;
  author_name: string;
  created_at: Date;
  status: VersionStatus;
  status_reason: string;
  status_by: string | null;
  status_by_name: string | null;
  status_at: Date | null;
}

/** Versions of a workshop with the names that belong to them; rows are read with {@link sheetVersionOf}. */
export function sheetVersionRows(db: Knex, workshopId: string): Knex.QueryBuilder {
  const rows = scoped(db, workshopId).table('cut_sheet_versions', { as: 'v' });
  joinScoped(rows, 'inner', ['cut_sheets', 's'], 'v', [['s.id', 'v.sheet_id']]);
  joinScoped(rows, 'inner', ['people', 'a'], 'v', [['a.id', 'v.author_id']]);
  joinScoped(rows, 'left', ['people', 'b'], 'v', [['b.id', 'v.status_by']]);
  rows.select('v.*', 's.name as sheet_name', 'a.name as author_name', 'b.name as status_by_name');
  joinSources(rows, 'v');
  return joinThings(rows, 'v', ['machine', 'material', 'rib_machine', 'rib_material']);
}

export function sheetVersionOf(row: unknown): SheetVersion {
  const of = row as VersionColumns & SourceRow & ThingRow;
  const { plan, pinned } = of.document;
  return {
    id: of.id,
    sheetId: of.sheet_id,
    sheetName: of.sheet_name,
    number: of.number,
    basedOn: of.based_on,
    status: of.status,
    statusReason: of.status_reason,
    statusBy: of.status_by === null ? null : { id: of.status_by, name: of.status_by_name ?? '' },
    statusAt: of.status_at?.toISOString() ?? null,
    plan,
    pinned,
    root: sourceOf(of, 'root'),
    tip: sourceOf(of, 'tip'),
    machine: machineOf(of.machine_id, of.machine_name, of.machine_kind),
    material: materialOf(of.material_id, of.material_name),
    ribMachine: machineOf(of.rib_machine_id, of.rib_machine_name, of.rib_machine_kind),
    ribMaterial: materialOf(of.rib_material_id, of.rib_material_name),
    parts: partsOfColumn(of.parts),
    errors: of.errors,
    warnings: of.warnings,
    checksum: of.checksum,
    shortCode: of.short_code,
    note: of.note,
    author: { id: of.author_id, name: of.author_name },
    createdAt: of.created_at.toISOString(),
  };
}
