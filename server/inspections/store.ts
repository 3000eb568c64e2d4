import { type Knex } from 'knex';
import { v7 as uuid } from 'uuid';
import { z } from 'zod';
import { idSchema, timeSchema } from '#server/contracts/common.ts';
import {
  type Inspection,
  type inspectionAnswerSchema,
  type inspectionCreateSchema,
  type inspectionListQuerySchema,
} from '#server/contracts/cutting-list.ts';
import { canonicalText, type SheetDocument } from '#server/cut-sheets/document.ts';
import { checkNamedMachine, holdNamedVersion, type NamedVersion } from '#server/cutting-list/named.ts';
import { checkMoment } from '#server/cutting-list/rules.ts';
import { continueBehind, decodeCursor, encodeCursor, pageOfRows } from '#server/database/cursor.ts';
import { keyColumns, type KeyKeeping, madeBefore, once } from '#server/database/once.ts';
import { scoped } from '#server/database/scoped.ts';
import { inTransaction } from '#server/database/transaction.ts';
import { Refusal } from '#server/refusal.ts';
import { requestChecksum } from '#server/sections/described.ts';
import { type Author, type Reach } from '#server/sections/rules.ts';
import { inspectionRows, inspectionsOf } from './rows.ts';
import { checkAnswerable, compareReadings, isWithin, nominalRows } from './rules.ts';

const cursorSchema = z.tuple([timeSchema, idSchema]);

/**
 * Inspections of versions within reach, newest first by the time at which they happened.
 * @throws Refusal naming `cursor` when it is not one of this list
 */
export async function listInspections(
  db: Knex,
  workshopId: string,
  reach: Reach,
  { sheetId, versionNumber, outcome, cursor, limit }: z.output<typeof inspectionListQuerySchema>,
): Promise<{ items: Inspection[]; nextCursor: string | null }> {
  const query = inspectionRows(db, workshopId, reach);
  if (sheetId !== undefined) query.where('i.sheet_id', sheetId);
  if (versionNumber !== undefined) query.where('i.version_number', versionNumber);
  if (outcome === 'within') query.where('i.within_tolerance', 1);
  if (outcome === 'out') query.where('i.within_tolerance', 0);
  if (outcome === 'unanswered') query.where('i.waiting', 1);
  if (cursor !== undefined) {
    const [text, id] = decodeCursor(cursor, cursorSchema);
    continueBehind(query, ['i.happened_at', 'i.id'], 'descending', { value: new Date(text), id });
  }
  const rows: unknown[] = await query
    .orderBy('i.happened_at', 'desc')
    .orderBy('i.id', 'desc')
    .limit(limit + 1);
  const { page, last } = pageOfRows(rows as { id: string; happened_at: Date }[], limit);
  return {
    items: await inspectionsOf(db, workshopId, page),
    nextCursor: last ? encodeCursor([last.happened_at.toISOString(), last.id]) : null,
  };
}

/**
 * One inspection.
 * @throws Refusal `not-found` when there is none of a version within reach
 */
export async function findInspection(
  db: Knex,
  workshopId: string,
  reach: Reach,
  inspectionId: string,
): Promise<Inspection> {
  const rows: unknown[] = await inspectionRows(db, workshopId, reach).where('i.id', inspectionId);
  const [inspection] = await inspectionsOf(db, workshopId, rows);
  if (!inspection) throw new Refusal('not-found');
  return inspection;
}

const inspectionKeys: KeyKeeping<{ readonly id: string }> = {
  table: 'inspections',
  uniqueKey: 'inspections_idempotency',
  columns: ['id'],
};

/** The document of a version that is there. */
async function documentOf(
  db: Knex,
  workshopId: string,
  { sheetId, versionNumber }: NamedVersion,
): Promise<SheetDocument> {
  const row = (await scoped(db, workshopId)
    .table('cut_sheet_versions')
    .where({ sheet_id: sheetId, number: versionNumber })
    .first('document')) as { document: SheetDocument } | undefined;
  if (!row) throw new Refusal('not-found');
  return row.document;
}

type InspectionInput = z.output<typeof inspectionCreateSchema>;

/**
 * Keeps the readings of a part once for each key. Nominals and tolerances come from the pinned plan, and stay as they were.
 * @throws Refusal `key-reused`; `invalid` for a moment to come, a version or machine that there is not, and every station that the
 *   plan does not have
 */
export async function addInspection(
  db: Knex,
  author: Author,
  reach: Reach,
  input: InspectionInput,
): Promise<Inspection> {
  const { workshopId } = author;
  const { key, ...content } = input;
  const keyed = { key, request: requestChecksum('inspection', canonicalText(content)) };
  const made = await once(db, workshopId, inspectionKeys, keyed, async (transaction) => {
    await holdNamedVersion(transaction, workshopId, input, reach);
    const before = await madeBefore(transaction, workshopId, inspectionKeys, keyed);
    if (before) return before;
    checkMoment(new Date(input.at), author.at);
    await checkNamedMachine(transaction, workshopId, input.machineId);
    const { pinned } = await documentOf(transaction, workshopId, input);
    const measurements = compareReadings(nominalRows(pinned), input.measurements);
    const id = uuid();
    await scoped(transaction, workshopId).insert('inspections', {
      id,
      sheet_id: input.sheetId,
      version_number: input.versionNumber,
      mark: input.mark,
      measured: pinned.inspection.measured,
      machine_id: input.machineId,
      within_tolerance: isWithin(measurements),
      note: input.note,
      person_id: author.personId,
      happened_at: new Date(input.at),
      received_at: author.at,
      ...keyColumns(keyed),
    });
    await addMeasurements(transaction, workshopId, id, measurements);
    return { id };
  });
  return findInspection(db, workshopId, reach, made.id);
}

async function addMeasurements(
  db: Knex,
  workshopId: string,
  inspectionId: string,
  measurements: Inspection['measurements'],
): Promise<void> {
  for (const [place, one] of measurements.entries()) {
    await scoped(db, workshopId).insert('inspection_measurements', {
      inspection_id: inspectionId,
      place,
      panel_end: one.end,
      station: one.station,
      nominal_mm: one.nominalMm,
      tolerance_mm: one.toleranceMm,
      measured_mm: one.measuredMm,
      deviation_mm: one.deviationMm,
      within_tolerance: one.within,
    });
  }
}

/**
 * Answers a part out of tolerance, once.
 * @throws Refusal `not-found`; `status-conflict` when there is nothing to answer, or it was answered
 */
export async function answerInspection(
  db: Knex,
  author: Author,
  reach: Reach,
  inspectionId: string,
  answer: z.output<typeof inspectionAnswerSchema>,
): Promise<Inspection> {
  const { workshopId } = author;
  return inTransaction(db, async (transaction) => {
    const own = () => scoped(transaction, workshopId).table('inspections').where({ id: inspectionId });
    await own().forUpdate().first('id');
    checkAnswerable(await findInspection(transaction, workshopId, reach, inspectionId));
    await own().update({
      decision: answer.decision,
      decision_note: answer.note,
      decided_by: author.personId,
      decided_at: author.at,
    });
    return findInspection(transaction, workshopId, reach, inspectionId);
  });
}
