import { type Knex } from 'knex';
import { type Kerf, type KerfInput } from '#server/contracts/shop.ts';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { inTransaction } from '#server/database/transaction.ts';
import { Refusal } from '#server/refusal.ts';
import { type Author } from '#server/sections/rules.ts';
import { checkInUse, checkKerf, checkRevision } from '../rules.ts';
import { findItem, machines, materials } from '../store.ts';

/** Of which machine in which material. */
export interface KerfPlace {
  readonly machineId: string;
  readonly materialId: string;
}

interface Row {
  machine_id: string;
  material_id: string;
  kerf_mm: number;
  speed_mm_min: number | null;
  is_default: 0 | 1;
  measured_on: string | null;
  person_id: string;
  person_name: string;
  revision: number;
  updated_at: Date;
}

function kerfOf(row: Row): Kerf {
  return {
    machineId: row.machine_id,
    materialId: row.material_id,
    kerfMm: row.kerf_mm,
    speedMmMin: row.speed_mm_min,
    isDefault: row.is_default === 1,
    measuredOn: row.measured_on,
    by: { id: row.person_id, name: row.person_name },
    revision: row.revision,
    updatedAt: row.updated_at.toISOString(),
  };
}

/** Days are read as text: a day has no time zone. */
function kerfRows(db: Knex, workshopId: string): Knex.QueryBuilder {
  const kerfs = scoped(db, workshopId).table('kerfs', { as: 'k' });
  return joinScoped(kerfs, 'inner', ['people', 'p'], 'k', [['p.id', 'k.person_id']]).select(
    'k.*',
    db.raw("date_format(k.measured_on, '%Y-%m-%d') as measured_on"),
    'p.name as person_name',
  );
}

/** Every kerf of a workshop, by machine and material. */
export async function listKerfs(db: Knex, workshopId: string): Promise<{ items: Kerf[]; nextCursor: null }> {
  const rows: Row[] = await kerfRows(db, workshopId).orderBy(['k.machine_id', 'k.material_id']);
  return { items: rows.map(kerfOf), nextCursor: null };
}

/** The kerf of a pair; null when there is none. */
export async function findKerf(db: Knex, workshopId: string, place: KerfPlace): Promise<Kerf | null> {
  const row: Row | undefined = await kerfRows(db, workshopId)
    .where({ 'k.machine_id': place.machineId, 'k.material_id': place.materialId })
    .first();
  return row ? kerfOf(row) : null;
}

/**
 * Sets the kerf of a machine in a material, the first or in the place of the one before, which goes into the history.
 * @throws Refusal `not-found`; `archived` when machine or material is put away; `revision-conflict` when another set it in between; `invalid` with the field at fault
 */
export async function putKerf(db: Knex, author: Author, place: KerfPlace, input: KerfInput): Promise<Kerf> {
  const { workshopId } = author;
  const written = await inTransaction(db, async (transaction) => {
    const scope = scoped(transaction, workshopId);
    // The lock comes first, so that whoever waited for it reads what the one before has written.
    await scope.table('machines').where({ id: place.machineId }).forUpdate().first('id');
    const machine = await findItem(transaction, workshopId, machines, place.machineId);
    const material = await findItem(transaction, workshopId, materials, place.materialId);
    checkInUse(machine, material);
    const keys = {
      machine_id: machine.id,
      machine_kind: machine.settings.kind,
      material_id: material.id,
      material_kind: material.settings.kind,
    };
    checkKerf({ machineKind: keys.machine_kind, materialKind: keys.material_kind }, input, author.at);
    const before = await findKerf(transaction, workshopId, place);
    checkRevision(input.revision, before);
    const columns = columnsOf(author, input);
    if (before) {
      await keepEarlier(transaction, author, before);
      const revision = before.revision + 1;
      await scope
        .table('kerfs')
        .where(keys)
        .update({ ...columns, revision });
    } else await scope.insert('kerfs', { ...keys, ...columns });
    return findKerf(transaction, workshopId, place);
  });
  if (!written) throw new Refusal('not-found');
  return written;
}

/** What the kerf was, who had set it and when, and who replaced it. */
async function keepEarlier(db: Knex, author: Author, before: Kerf): Promise<void> {
  await scoped(db, author.workshopId).insert('kerf_history', {
    machine_id: before.machineId,
    material_id: before.materialId,
    revision: before.revision,
    kerf_mm: before.kerfMm,
    speed_mm_min: before.speedMmMin,
    measured_on: before.measuredOn,
    person_id: before.by.id,
    set_at: new Date(before.updatedAt),
    replaced_by: author.personId,
    replaced_at: author.at,
  });
}

function columnsOf(author: Author, input: KerfInput) {
  return {
    kerf_mm: input.kerfMm,
    speed_mm_min: input.speedMmMin,
    is_default: input.measuredOn === null,
    measured_on: input.measuredOn,
    person_id: author.personId,
    updated_at: author.at,
  };
}
