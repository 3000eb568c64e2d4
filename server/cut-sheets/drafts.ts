import { type Knex } from 'knex';
import { type SheetDraft, type SheetPlan } from '#server/contracts/cut-sheets.ts';
import { scoped } from '#server/database/scoped.ts';
import { inTransaction } from '#server/database/transaction.ts';
import { Refusal } from '#server/refusal.ts';
import { type Author, checkBase } from '#server/sections/rules.ts';
import { canonicalText } from './document.ts';
import { sheetState } from './state.ts';

interface Row {
  based_on: number;
  form: SheetDraft['values'];
  updated_at: Date;
}

type Owner = Pick<Author, 'workshopId' | 'personId'>;

function ownDraft(db: Knex, owner: Owner, sheetId: string): Knex.QueryBuilder {
  return scoped(db, owner.workshopId)
    .table('cut_sheet_drafts')
    .where({ sheet_id: sheetId, person_id: owner.personId });
}

/**
 * A person's unsaved plan.
 * @throws Refusal `not-found` when there is none
 */
export async function findSheetDraft(db: Knex, owner: Owner, sheetId: string): Promise<SheetDraft> {
  const row: Row | undefined = await ownDraft(db, owner, sheetId).first();
  if (!row)
    throw new Refusal('not-found', { detail: 'There is no unsaved work of yours on this cut sheet.' });
  return { basedOn: row.based_on, values: row.form, updatedAt: row.updated_at.toISOString() };
}

/**
 * Keeps a person's unsaved plan as it stands, wrong values too; what was kept before is replaced.
 * @throws Refusal `not-found` for the sheet, `invalid` naming `basedOn` when there is no such version
 */
export async function keepSheetDraft(
  db: Knex,
  author: Author,
  sheetId: string,
  draft: Omit<SheetDraft, 'updatedAt'>,
): Promise<SheetDraft> {
  const sheet = await sheetState(db, author.workshopId, sheetId);
  checkBase(draft.basedOn, sheet.latestNumber);
  await inTransaction(db, (transaction) =>
    scoped(transaction, author.workshopId)
      .insert('cut_sheet_drafts', {
        sheet_id: sheet.id,
        person_id: author.personId,
        based_on: draft.basedOn,
        form: JSON.stringify(draft.values),
        updated_at: author.at,
      })
      .onConflict(['workshop_id', 'sheet_id', 'person_id'])
      .merge(),
  );
  return { ...draft, updatedAt: author.at.toISOString() };
}

/**
 * Discards a person's unsaved plan; none is as good as discarded.
 * @throws Refusal `not-found` for the sheet
 */
export async function dropSheetDraft(db: Knex, owner: Owner, sheetId: string): Promise<void> {
  const sheet = await sheetState(db, owner.workshopId, sheetId);
  await ownDraft(db, owner, sheet.id).delete();
}

/** Discards the author's unsaved plan when it holds nothing beyond what was just saved. */
export async function dropSavedSheetDraft(
  db: Knex,
  owner: Owner,
  sheetId: string,
  saved: SheetPlan,
): Promise<void> {
  const row: Row | undefined = await ownDraft(db, owner, sheetId).forUpdate().first();
  if (row && canonicalText(row.form) === canonicalText(saved)) await ownDraft(db, owner, sheetId).delete();
}
