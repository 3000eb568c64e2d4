import { type Knex } from 'knex';
import { v7 as uuid } from 'uuid';
import { z } from 'zod';
import { type CutAction, type CutLog, type cutLogCreateSchema } from '#server/contracts/cutting-list.ts';
import { idSchema, timeSchema } from '#server/contracts/common.ts';
import { type SheetPart } from '#server/contracts/cut-sheets.ts';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { canonicalText } from '#server/cut-sheets/document.ts';
import { machineOf, partsOfColumn } from '#server/cut-sheets/source-rows.ts';
import { continueBehind, decodeCursor, encodeCursor, pageOfRows } from '#server/database/cursor.ts';
import { keyColumns, type KeyKeeping, madeBefore, once } from '#server/database/once.ts';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { Refusal } from '#server/refusal.ts';
import { requestChecksum } from '#server/sections/described.ts';
import { type Author, type Reach, statusesFor } from '#server/sections/rules.ts';
import { checkNamedMachine, holdNamedVersion } from '../named.ts';
import { checkMoment, checkPart } from '../rules.ts';
import { countAgain } from './progress.ts';

interface Row {
  id: string;
  sheet_id: string;
  sheet_name: string;
  version_number: number;
  part: SheetPart;
  action: CutAction;
  quantity: number;
  reason: string;
  machine_id: string | null;
  machine_name: string | null;
  machine_kind: string | null;
  person_id: string;
  person_name: string;
  happened_at: Date;
  standing: VersionStatus;
}

function logOf(row: Row): CutLog {
  return {
    id: row.id,
    sheetId: row.sheet_id,
    sheetName: row.sheet_name,
    versionNumber: row.version_number,
    part: row.part,
    action: row.action,
    quantity: row.quantity,
    reason: row.reason,
    machine: machineOf(row.machine_id, row.machine_name, row.machine_kind),
    person: { id: row.person_id, name: row.person_name },
    at: row.happened_at.toISOString(),
    standing: row.standing,
  };
}

/** Entries of versions within reach, with the names that belong to them. */
function logRows(db: Knex, workshopId: string, reach: Reach): Knex.QueryBuilder {
  const rows = scoped(db, workshopId).table('cut_logs', { as: 'l' });
  joinScoped(rows, 'inner', ['cut_sheets', 's'], 'l', [['s.id', 'l.sheet_id']]);
  joinScoped(rows, 'inner', ['cut_sheet_versions', 'v'], 'l', [
    ['v.sheet_id', 'l.sheet_id'],
    ['v.number', 'l.version_number'],
  ]);
  joinScoped(rows, 'inner', ['people', 'p'], 'l', [['p.id', 'l.person_id']]);
  joinScoped(rows, 'left', ['machines', 'm'], 'l', [['m.id', 'l.machine_id']]);
  return rows
    .whereIn('v.status', statusesFor(reach))
    .select(
      'l.*',
      's.name as sheet_name',
      'p.name as person_name',
      'm.name as machine_name',
      'm.kind as machine_kind',
    );
}

const cursorSchema = z.tuple([timeSchema, idSchema]);

interface LogListQuery {
  readonly sheetId?: string | undefined;
  readonly versionNumber?: number | undefined;
  readonly cursor?: string | undefined;
  readonly limit: number;
}

/**
 * Entries of versions within reach, newest first by the time at which they happened.
 * @throws Refusal naming `cursor` when it is not one of this list
 */
export async function listCutLogs(
  db: Knex,
  workshopId: string,
  reach: Reach,
  { sheetId, versionNumber, cursor, limit }: LogListQuery,
): Promise<{ items: CutLog[]; nextCursor: string | null }> {
  const query = logRows(db, workshopId, reach);
  if (sheetId !== undefined) query.where('l.sheet_id', sheetId);
  if (versionNumber !== undefined) query.where('l.version_number', versionNumber);
  if (cursor !== undefined) {
    const [text, id] = decodeCursor(cursor, cursorSchema);
    continueBehind(query, ['l.happened_at', 'l.id'], 'descending', { value: new Date(text), id });
  }
  const rows: Row[] = await query
    .orderBy('l.happened_at', 'desc')
    .orderBy('l.id', 'desc')
    .limit(limit + 1);
  const { page, last } = pageOfRows(rows.map(logOf), limit);
  return { items: [...page], nextCursor: last ? encodeCursor([last.at, last.id]) : null };
}

const logKeys: KeyKeeping<{ readonly id: string }> = {
  table: 'cut_logs',
  uniqueKey: 'cut_logs_idempotency',
  columns: ['id'],
};

type LogInput = z.output<typeof cutLogCreateSchema>;

/**
 * Keeps an entry once for each key, whoever sends it again. It is a fact: it is taken also when the version is not in force any more, and the reply
 * says how the version stood when it came in.
 *
 * @throws Refusal `key-reused`; `invalid` for a moment to come, or a version, part or machine that there is not
 */
export async function logCut(db: Knex, author: Author, reach: Reach, input: LogInput): Promise<CutLog> {
  const { workshopId } = author;
  const { key, ...content } = input;
  const happenedAt = new Date(input.at);
  const keyed = { key, request: requestChecksum('cut-log', canonicalText(content)) };
  const made = await once(db, workshopId, logKeys, keyed, async (transaction) => {
    const version = await holdNamedVersion(transaction, workshopId, input, reach);
    const before = await madeBefore(transaction, workshopId, logKeys, keyed);
    if (before) return before;
    checkMoment(happenedAt, author.at);
    checkPart(input.part, partsOfColumn(version.parts));
    await checkNamedMachine(transaction, workshopId, input.machineId);
    const id = uuid();
    await scoped(transaction, workshopId).insert('cut_logs', {
      id,
      sheet_id: input.sheetId,
      version_number: input.versionNumber,
      part: input.part,
      action: input.action,
      quantity: input.quantity,
      reason: input.reason,
      machine_id: input.machineId,
      person_id: author.personId,
      happened_at: happenedAt,
      received_at: author.at,
      standing: version.status,
      ...keyColumns(keyed),
    });
    await countAgain(transaction, workshopId, input);
    return { id };
  });
  const row: Row | undefined = await logRows(db, workshopId, reach).where('l.id', made.id).first();
  if (!row) throw new Refusal('not-found');
  return logOf(row);
}
