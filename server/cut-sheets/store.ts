import { type Knex } from 'knex';
import { v7 as uuid } from 'uuid';
import { type CutSheet, type SheetPlan } from '#server/contracts/cut-sheets.ts';
import { madeBefore, once } from '#server/database/once.ts';
import { scoped } from '#server/database/scoped.ts';
import { requestChecksum } from '#server/sections/described.ts';
import { type Author } from '#server/sections/rules.ts';
import { canonicalText } from './document.ts';
import { type SheetWorks } from './files/works.ts';
import { findCutSheet } from './list/store.ts';
import { pinPlan } from './pin.ts';
import { addSheetVersion, sheetVersionKeys } from './versions/rows.ts';

interface SheetInput {
  readonly name: string;
  readonly purpose: string;
  readonly plan: SheetPlan;
  readonly note: string;
  /** Made by the client once for each sheet it wants; a retry with it makes no second one. */
  readonly key?: string | undefined;
}

/**
 * Makes a cut sheet with version 1, a draft.
 * @throws Refusal `key-reused` when the key stands for another request, `invalid` for ids that the workshop does not have
 */
export async function createCutSheet(
  db: Knex,
  works: SheetWorks,
  author: Author,
  input: SheetInput,
): Promise<CutSheet> {
  const { workshopId } = author;
  const { name, purpose, note, key } = input;
  const asked = [author.personId, name, purpose, note, canonicalText(input.plan)];
  const keyed = { key, request: requestChecksum('cut-sheet', ...asked) };
  const before = await madeBefore(db, workshopId, sheetVersionKeys, keyed);
  if (before) return findCutSheet(db, workshopId, before.sheet_id, 'all');
  const document = await pinPlan(db, workshopId, input.plan);
  const count = await works.count(document.pinned);
  const made = await once(db, workshopId, sheetVersionKeys, keyed, async (transaction) => {
    const sheetId = uuid();
    const scope = scoped(transaction, workshopId);
    await scope.insert('cut_sheets', {
      id: sheetId,
      name,
      purpose,
      latest_status: 'draft',
      updated_at: author.at,
      updated_by: author.personId,
      created_at: author.at,
    });
    const first = { sheetId, number: 1, basedOn: null, document, count, note };
    await addSheetVersion(transaction, author, { ...keyed, ...first });
    await scope.table('cut_sheets').where({ id: sheetId }).update({ latest_number: 1 });
    return { sheet_id: sheetId, number: 1 };
  });
  return findCutSheet(db, workshopId, made.sheet_id, 'all');
}

interface SheetChange {
  readonly name?: string | undefined;
  readonly purpose?: string | undefined;
  readonly archived?: boolean | undefined;
}

/**
 * Changes name or purpose, archives or takes back; what is left out stays. Files of released versions keep the name that they were made under.
 * @throws Refusal `not-found`
 */
export async function changeCutSheet(
  db: Knex,
  author: Author,
  sheetId: string,
  change: SheetChange,
): Promise<CutSheet> {
  const before = await findCutSheet(db, author.workshopId, sheetId, 'all');
  const columns: Record<string, string | Date | null> = {};
  if (change.name !== undefined && change.name !== before.name) columns['name'] = change.name;
  if (change.purpose !== undefined && change.purpose !== before.purpose) columns['purpose'] = change.purpose;
  if (change.archived !== undefined && change.archived !== before.archived) {
    columns['archived_at'] = change.archived ? author.at : null;
  }
  if (Object.keys(columns).length === 0) return before;
  await scoped(db, author.workshopId)
    .table('cut_sheets')
    .where({ id: sheetId })
    .update({ ...columns, updated_at: author.at, updated_by: author.personId });
  return findCutSheet(db, author.workshopId, sheetId, 'all');
}
