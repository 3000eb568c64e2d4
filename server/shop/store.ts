import { type Knex } from 'knex';
import { v7 as uuid } from 'uuid';
import {
  type MachineSettings,
  machineSettingsSchema,
  type MaterialSettings,
  materialSettingsSchema,
} from '#server/contracts/shop.ts';
import { isDuplicate } from '#server/database/errors.ts';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { inTransaction } from '#server/database/transaction.ts';
import { Refusal } from '#server/refusal.ts';
import { type Author } from '#server/sections/rules.ts';
import { type Item, type ItemChange, type ItemKeeping, itemOf, type ItemRow } from './items.ts';
import { checkRevision, checkRoom, checkSameKind, nameTaken } from './rules.ts';

export const machines: ItemKeeping<MachineSettings> = { table: 'machines', settings: machineSettingsSchema };
export const materials: ItemKeeping<MaterialSettings> = {
  table: 'materials',
  settings: materialSettingsSchema,
};
type Settings = MachineSettings | MaterialSettings;

function rowsOf(db: Knex, workshopId: string, table: ItemKeeping<Settings>['table']): Knex.QueryBuilder {
  const items = scoped(db, workshopId).table(table, { as: 'i' });
  return joinScoped(items, 'inner', ['people', 'p'], 'i', [['p.id', 'i.updated_by']]).select(
    'i.*',
    'p.name as updated_by_name',
  );
}

/** All machines or all materials of a workshop, by name, those in the archive last. */
export async function listItems<Kept extends Settings>(
  db: Knex,
  workshopId: string,
  keeping: ItemKeeping<Kept>,
): Promise<{ items: Item<Kept>[]; nextCursor: null }> {
  const rows: ItemRow[] = await rowsOf(db, workshopId, keeping.table)
    .orderByRaw('i.archived_at IS NOT NULL')
    .orderBy('i.name');
  return { items: rows.map((row) => itemOf(keeping, row)), nextCursor: null };
}

/** @throws Refusal `not-found` */
export async function findItem<Kept extends Settings>(
  db: Knex,
  workshopId: string,
  keeping: ItemKeeping<Kept>,
  id: string,
): Promise<Item<Kept>> {
  const row: ItemRow | undefined = await rowsOf(db, workshopId, keeping.table).where({ 'i.id': id }).first();
  if (!row) throw new Refusal('not-found');
  return itemOf(keeping, row);
}

/** @throws Refusal naming `name` when it is taken or the workshop has too many already */
export async function createItem<Kept extends Settings>(
  db: Knex,
  author: Author,
  keeping: ItemKeeping<Kept>,
  input: { readonly name: string; readonly settings: Kept },
): Promise<Item<Kept>> {
  const scope = scoped(db, author.workshopId);
  const counted: { count: number } | undefined = await scope
    .table(keeping.table)
    .count({ count: '*' })
    .first();
  checkRoom(counted?.count ?? 0);
  const id = uuid();
  const row = {
    id,
    name: input.name,
    kind: input.settings.kind,
    settings: JSON.stringify(input.settings),
    created_at: author.at,
    updated_at: author.at,
    updated_by: author.personId,
  };
  await refusingTaken(keeping.table, input.name, async () => scope.insert(keeping.table, row));
  return findItem(db, author.workshopId, keeping, id);
}

/**
 * Changes name or settings, archives or takes back; what is left out stays.
 * @throws Refusal `not-found`; `revision-conflict` when another changed it in between; `invalid` for a name that is taken or
 *   another kind
 */
export async function changeItem<Kept extends Settings>(
  db: Knex,
  author: Author,
  keeping: ItemKeeping<Kept>,
  id: string,
  change: ItemChange<Kept>,
): Promise<Item<Kept>> {
  await inTransaction(db, async (transaction) => {
    const item = () => scoped(transaction, author.workshopId).table(keeping.table).where({ id });
    await item().forUpdate().first('id');
    const before = await findItem(transaction, author.workshopId, keeping, id);
    checkRevision(change.revision, before);
    if (change.settings) checkSameKind(before.settings.kind, change.settings.kind);
    const columns = columnsOf(keeping, before, change, author.at);
    if (Object.keys(columns).length === 0) return;
    await refusingTaken(keeping.table, change.name ?? before.name, async () =>
      item().update({
        ...columns,
        revision: before.revision + 1,
        updated_at: author.at,
        updated_by: author.personId,
      }),
    );
  });
  return findItem(db, author.workshopId, keeping, id);
}

/** The columns in which a change differs from what is there. */
function columnsOf<Kept extends Settings>(
  keeping: ItemKeeping<Kept>,
  before: Item<Kept>,
  change: ItemChange<Kept>,
  at: Date,
): Record<string, string | Date | null> {
  const columns: Record<string, string | Date | null> = {};
  if (change.name !== undefined && change.name !== before.name) columns['name'] = change.name;
  if (change.settings !== undefined) {
    const text = JSON.stringify(keeping.settings.parse(change.settings));
    if (text !== JSON.stringify(before.settings)) columns['settings'] = text;
  }
  if (change.archived !== undefined && change.archived !== before.archived) {
    columns['archived_at'] = change.archived ? at : null;
  }
  return columns;
}

async function refusingTaken(
  table: ItemKeeping<Settings>['table'],
  name: string,
  write: () => Promise<unknown>,
): Promise<void> {
  try {
    await write();
  } catch (error) {
    if (isDuplicate(error, `${table}_name`)) throw nameTaken(name);
    throw error;
  }
}
