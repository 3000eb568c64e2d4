import { type Knex } from 'knex';
import { type InspectionStatistics } from '#server/contracts/cutting-list.ts';
import { machineOf } from '#server/cut-sheets/source-rows.ts';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { type Reach, statusesFor } from '#server/sections/rules.ts';

interface Row {
  section_id: string;
  section_name: string;
  machine_id: string | null;
  machine_name: string | null;
  machine_kind: string | null;
  parts: number;
  readings: number;
  out_of_tolerance: number;
  mean_mm: number;
  spread_mm: number | null;
}

/**
 * Deviations by section and machine, sections by name: each reading counts for the section at its end of the panel. The spread is the sample's
 * standard deviation, with n − 1; the database gives none for one reading. Both to
 * the nanometre, so that the order in which the database adds up does not show.
 */
export async function inspectionStatistics(
  db: Knex,
  workshopId: string,
  reach: Reach,
): Promise<InspectionStatistics> {
  const readings = scoped(db, workshopId).table('inspection_measurements', { as: 'r' });
  joinScoped(readings, 'inner', ['inspections', 'i'], 'r', [['i.id', 'r.inspection_id']]);
  joinScoped(readings, 'inner', ['cut_sheet_versions', 'v'], 'i', [
    ['v.sheet_id', 'i.sheet_id'],
    ['v.number', 'i.version_number'],
  ]);
  joinScoped(readings, 'left', ['machines', 'm'], 'i', [['m.id', 'i.machine_id']]);
  const section = db.raw(`if(r.panel_end = 'root', v.root_section_id, v.tip_section_id)`);
  readings.join({ s: 'sections' }, (on) => on.on('s.workshop_id', 'r.workshop_id').on('s.id', section));
  const rows: Row[] = await readings
    .whereIn('v.status', statusesFor(reach))
    .groupBy('s.id', 's.name', 'm.id', 'm.name', 'm.kind')
    .orderBy(['s.name', 's.id', 'm.name', 'm.id'])
    .select(
      's.id as section_id',
      's.name as section_name',
      'm.id as machine_id',
      'm.name as machine_name',
      'm.kind as machine_kind',
      db.raw('count(DISTINCT i.id) AS parts'),
      db.raw('count(*) AS readings'),
      db.raw('count(CASE WHEN r.within_tolerance = 0 THEN 1 END) AS out_of_tolerance'),
      db.raw('round(avg(r.deviation_mm), 6) AS mean_mm'),
      db.raw('round(stddev_samp(r.deviation_mm), 6) AS spread_mm'),
    );
  return {
    items: rows.map((row) => ({
      sectionId: row.section_id,
      sectionName: row.section_name,
      machine: machineOf(row.machine_id, row.machine_name, row.machine_kind),
      parts: row.parts,
      readings: row.readings,
      outOfTolerance: row.out_of_tolerance,
      meanMm: row.mean_mm,
      spreadMm: row.spread_mm,
    })),
  };
}
