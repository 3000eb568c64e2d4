import { type Knex } from 'knex';
import { type Inspection } from '#server/contracts/cutting-list.ts';
import { machineOf } from '#server/cut-sheets/source-rows.ts';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { type Reach, statusesFor } from '#server/sections/rules.ts';

interface Row {
  id: string;
  sheet_id: string;
  sheet_name: string;
  version_number: number;
  mark: string;
  measured: Inspection['measured'];
  machine_id: string | null;
  machine_name: string | null;
  machine_kind: string | null;
  within_tolerance: 0 | 1;
  note: string;
  person_id: string;
  person_name: string;
  happened_at: Date;
  decision: 'accepted' | 'rejected' | null;
  decision_note: string | null;
  decided_by: string | null;
  decided_by_name: string | null;
  decided_at: Date | null;
}

/** Inspections of versions within reach, with the names that belong to them. */
export function inspectionRows(db: Knex, workshopId: string, reach: Reach): Knex.QueryBuilder {
  const rows = scoped(db, workshopId).table('inspections', { as: 'i' });
  joinScoped(rows, 'inner', ['cut_sheets', 's'], 'i', [['s.id', 'i.sheet_id']]);
  joinScoped(rows, 'inner', ['cut_sheet_versions', 'v'], 'i', [
    ['v.sheet_id', 'i.sheet_id'],
    ['v.number', 'i.version_number'],
  ]);
  joinScoped(rows, 'inner', ['people', 'p'], 'i', [['p.id', 'i.person_id']]);
  joinScoped(rows, 'left', ['people', 'd'], 'i', [['d.id', 'i.decided_by']]);
  joinScoped(rows, 'left', ['machines', 'm'], 'i', [['m.id', 'i.machine_id']]);
  return rows
    .whereIn('v.status', statusesFor(reach))
    .select(
      'i.*',
      's.name as sheet_name',
      'p.name as person_name',
      'd.name as decided_by_name',
      'm.name as machine_name',
      'm.kind as machine_kind',
    );
}

interface MeasurementRow {
  inspection_id: string;
  panel_end: 'root' | 'tip';
  station: number;
  nominal_mm: number;
  tolerance_mm: number;
  measured_mm: number;
  deviation_mm: number;
  within_tolerance: 0 | 1;
}

interface PhotoRow {
  inspection_id: string;
  id: string;
  width: number;
  height: number;
  byte_count: number;
}

function answerOf(row: Row): Inspection['answer'] {
  const { decision, decision_note, decided_by, decided_by_name, decided_at } = row;
  if (decision === null || decided_by === null || decided_at === null) return null;
  return {
    decision,
    note: decision_note ?? '',
    by: { id: decided_by, name: decided_by_name ?? '' },
    at: decided_at.toISOString(),
  };
}

function inspectionOf(
  row: Row,
  measurements: readonly MeasurementRow[],
  photos: readonly PhotoRow[],
): Inspection {
  return {
    id: row.id,
    sheetId: row.sheet_id,
    sheetName: row.sheet_name,
    versionNumber: row.version_number,
    mark: row.mark,
    measured: row.measured,
    machine: machineOf(row.machine_id, row.machine_name, row.machine_kind),
    measurements: measurements.map((one) => ({
      end: one.panel_end,
      station: one.station,
      nominalMm: one.nominal_mm,
      toleranceMm: one.tolerance_mm,
      measuredMm: one.measured_mm,
      deviationMm: one.deviation_mm,
      within: one.within_tolerance === 1,
    })),
    within: row.within_tolerance === 1,
    note: row.note,
    person: { id: row.person_id, name: row.person_name },
    at: row.happened_at.toISOString(),
    photos: photos.map(({ id, width, height, byte_count }) => ({ id, width, height, bytes: byte_count })),
    answer: answerOf(row),
  };
}

/** Reads rows of {@link inspectionRows} with their readings and photographs: two queries, however many they are. */
export async function inspectionsOf(
  db: Knex,
  workshopId: string,
  rows: readonly unknown[],
): Promise<Inspection[]> {
  const found = rows as Row[];
  const ids = found.map(({ id }) => id);
  if (ids.length === 0) return [];
  const scope = scoped(db, workshopId);
  const measurements: MeasurementRow[] = await scope
    .table('inspection_measurements')
    .whereIn('inspection_id', ids)
    .orderBy(['inspection_id', 'place']);
  const photos: PhotoRow[] = await scope
    .table('photos')
    .whereIn('inspection_id', ids)
    .orderBy(['created_at', 'id'])
    .select('inspection_id', 'id', 'width', 'height', 'byte_count');
  return found.map((row) =>
    inspectionOf(
      row,
      measurements.filter(({ inspection_id }) => inspection_id === row.id),
      photos.filter(({ inspection_id }) => inspection_id === row.id),
    ),
  );
}
