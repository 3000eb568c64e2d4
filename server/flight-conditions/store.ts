import { type Knex } from 'knex';
import { v7 as uuid } from 'uuid';
import { flightConditionSchema } from '#geometry/flow/flight-condition.ts';
import {
  type ConditionChange,
  type ConditionInput,
  type StoredCondition,
} from '#server/contracts/flight-conditions.ts';
import { isDuplicate } from '#server/database/errors.ts';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { inTransaction } from '#server/database/transaction.ts';
import { Refusal } from '#server/refusal.ts';
import { type Author } from '#server/sections/rules.ts';
import { checkInUse, checkRevision, checkRoom, nameTaken } from '#server/shop/rules.ts';
import { checkMayBeArchived } from './rules.ts';

interface ConditionRow {
  id: string;
  name: string;
  settings: unknown;
  is_default: number;
  archived_at: Date | null;
  revision: number;
  created_at: Date;
  updated_at: Date;
  updated_by: string;
  updated_by_name: string;
}

function conditionOf(row: ConditionRow): StoredCondition {
  return {
    id: row.id,
    name: row.name,
    settings: flightConditionSchema.parse(row.settings),
    isDefault: row.is_default === 1,
    archived: row.archived_at !== null,
    revision: row.revision,
    createdAt: row.created_at.toISOString(),
    updatedAt: row.updated_at.toISOString(),
    updatedBy: { id: row.updated_by, name: row.updated_by_name },
  };
}

function rowsOf(db: Knex, workshopId: string): Knex.QueryBuilder {
  const conditions = scoped(db, workshopId).table('flight_conditions', { as: 'c' });
  return joinScoped(conditions, 'inner', ['people', 'p'], 'c', [['p.id', 'c.updated_by']]).select(
    'c.*',
    'p.name as updated_by_name',
  );
}

/** All flight conditions of a workshop: the default, then by name, those in the archive last. */
export async function listConditions(
  db: Knex,
  workshopId: string,
): Promise<{ items: StoredCondition[]; nextCursor: null }> {
  const rows: ConditionRow[] = await rowsOf(db, workshopId)
    .orderBy('c.is_default', 'desc')
    .orderByRaw('c.archived_at IS NOT NULL')
    .orderBy('c.name');
  return { items: rows.map(conditionOf), nextCursor: null };
}

/** @throws Refusal `not-found` */
export async function findCondition(db: Knex, workshopId: string, id: string): Promise<StoredCondition> {
  const row: ConditionRow | undefined = await rowsOf(db, workshopId).where({ 'c.id': id }).first();
  if (!row) throw new Refusal('not-found');
  return conditionOf(row);
}

/**
 * Keeps a new flight condition; the first of a workshop is its default.
 * @throws Refusal naming `name` when it is taken or the workshop has too many already
 */
export async function createCondition(
  db: Knex,
  author: Author,
  { name, settings }: ConditionInput,
): Promise<StoredCondition> {
  const id = uuid();
  await inTransaction(db, async (transaction) => {
    const scope = scoped(transaction, author.workshopId);
    const others: { id: string }[] = await scope.table('flight_conditions').forUpdate().select('id');
    checkRoom(others.length);
    const row = {
      id,
      name,
      settings: JSON.stringify(settings),
      is_default: others.length === 0,
      created_at: author.at,
      updated_at: author.at,
      updated_by: author.personId,
    };
    await refusingTaken(name, async () => scope.insert('flight_conditions', row));
  });
  return findCondition(db, author.workshopId, id);
}

/**
 * Changes name or settings, archives or takes back; what is left out stays.
 * @throws Refusal `not-found`; `revision-conflict` when another changed it in between; `invalid` for a name that is taken and for the
 *   default, which cannot be archived
 */
export async function changeCondition(
  db: Knex,
  author: Author,
  id: string,
  change: ConditionChange,
): Promise<StoredCondition> {
  await inTransaction(db, async (transaction) => {
    const condition = () => scoped(transaction, author.workshopId).table('flight_conditions').where({ id });
    await condition().forUpdate().first('id');
    const before = await findCondition(transaction, author.workshopId, id);
    checkRevision(change.revision, before);
    if (change.archived === true) checkMayBeArchived(before);
    const columns = columnsOf(before, change, author.at);
    if (Object.keys(columns).length === 0) return;
    await refusingTaken(change.name ?? before.name, async () =>
      condition().update({
        ...columns,
        revision: before.revision + 1,
        updated_at: author.at,
        updated_by: author.personId,
      }),
    );
  });
  return findCondition(db, author.workshopId, id);
}

/** The columns in which a change differs from what is there. */
function columnsOf(
  before: StoredCondition,
  change: ConditionChange,
  at: Date,
): Record<string, string | Date | null> {
  const columns: Record<string, string | Date | null> = {};
  if (change.name !== undefined && change.name !== before.name) columns['name'] = change.name;
  if (change.settings !== undefined) {
    const text = JSON.stringify(change.settings);
    if (text !== JSON.stringify(before.settings)) columns['settings'] = text;
  }
  if (change.archived !== undefined && change.archived !== before.archived) {
    columns['archived_at'] = change.archived ? at : null;
  }
  return columns;
}

/**
 * Makes a condition the default in the place of the one before. What a condition says stays as it is, and so does its revision.
 * @throws Refusal `not-found`; `archived`
 */
export async function setDefault(db: Knex, workshopId: string, id: string): Promise<StoredCondition> {
  await inTransaction(db, async (transaction) => {
    const conditions = () => scoped(transaction, workshopId).table('flight_conditions');
    // All of them in one order, so that two who choose a default at the same time wait for each other.
    await conditions().orderBy('id').forUpdate().select('id');
    checkInUse(await findCondition(transaction, workshopId, id));
    await conditions().where({ is_default: true }).whereNot({ id }).update({ is_default: false });
    await conditions().where({ id }).update({ is_default: true });
  });
  return findCondition(db, workshopId, id);
}

async function refusingTaken(name: string, write: () => Promise<unknown>): Promise<void> {
  try {
    await write();
  } catch (error) {
    if (isDuplicate(error, 'flight_conditions_name')) throw nameTaken(name);
    throw error;
  }
}
