import { type Knex } from 'knex';
import { z } from 'zod';
import { type SheetPlan, type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { decodeCursor, encodeCursor, pageOfRows } from '#server/database/cursor.ts';
import { madeBefore, once } from '#server/database/once.ts';
import { scoped } from '#server/database/scoped.ts';
import { Refusal } from '#server/refusal.ts';
import { requestChecksum } from '#server/sections/described.ts';
import { type Author, type Reach, statusesFor } from '#server/sections/rules.ts';
import { canonicalText, type SheetDocument } from '../document.ts';
import { dropSavedSheetDraft } from '../drafts.ts';
import { type SheetWorks } from '../files/works.ts';
import { pinPlan, type PinnedPlan } from '../pin.ts';
import { checkSheetSave } from '../rules.ts';
import { sheetState } from '../state.ts';
import { addSheetVersion, sheetVersionKeys, sheetVersionOf, sheetVersionRows } from './rows.ts';

/**
 * One version.
 * @throws Refusal `not-found` when there is none within reach
 */
export async function findSheetVersion(
  db: Knex,
  workshopId: string,
  sheetId: string,
  number: number,
  reach: Reach,
): Promise<SheetVersion> {
  const row: unknown = await sheetVersionRows(db, workshopId)
    .where({ 'v.sheet_id': sheetId, 'v.number': number })
    .whereIn('v.status', statusesFor(reach))
    .first();
  if (!row) throw new Refusal('not-found');
  return sheetVersionOf(row);
}

const cursorSchema = z.tuple([z.int().min(1)]);

/**
 * Versions of a cut sheet within reach, newest first.
 * @throws Refusal `not-found` for the sheet, `invalid` for a cursor of another list
 */
export async function listSheetVersions(
  db: Knex,
  workshopId: string,
  sheetId: string,
  options: { reach: Reach; cursor?: string | undefined; limit: number },
): Promise<{ items: SheetVersion[]; nextCursor: string | null }> {
  const after = options.cursor === undefined ? null : decodeCursor(options.cursor, cursorSchema)[0];
  await sheetState(db, workshopId, sheetId, { reach: options.reach });
  const query = sheetVersionRows(db, workshopId)
    .where('v.sheet_id', sheetId)
    .whereIn('v.status', statusesFor(options.reach))
    .orderBy('v.number', 'desc')
    .limit(options.limit + 1);
  if (after !== null) query.where('v.number', '<', after);
  const rows: unknown[] = await query;
  const { page, last } = pageOfRows(rows.map(sheetVersionOf), options.limit);
  return { items: [...page], nextCursor: last ? encodeCursor([last.number]) : null };
}

interface VersionInput {
  readonly basedOn: number;
  readonly plan: SheetPlan;
  readonly note: string;
  /** Made by the client once for each version it wants to save; a retry with it saves no second one. */
  readonly key?: string | undefined;
}

/**
 * Saves the next version of a cut sheet, as a draft, whatever its findings are. The author's unsaved plan goes with it when it is the same.
 *
 * @throws Refusal `version-conflict` with the newest version when the base is not the newest any more; `key-reused`, `archived`, `not-found`;
 *   `invalid` for ids that the workshop does not have and for what {@link checkSheetSave} refuses
 */
export async function saveSheetVersion(
  db: Knex,
  works: SheetWorks,
  author: Author,
  sheetId: string,
  input: VersionInput,
): Promise<SheetVersion> {
  const { workshopId } = author;
  const { basedOn, note, key } = input;
  const asked = [author.personId, sheetId.toLowerCase(), basedOn, note, canonicalText(input.plan)];
  const keyed = { key, request: requestChecksum('cut-sheet-version', ...asked) };
  const earlier = await madeBefore(db, workshopId, sheetVersionKeys, keyed);
  if (earlier) return findSheetVersion(db, workshopId, earlier.sheet_id, earlier.number, 'all');
  await sheetState(db, workshopId, sheetId);
  const document = await pinPlan(db, workshopId, input.plan);
  const count = await works.count(document.pinned);
  const made = await once(db, workshopId, sheetVersionKeys, keyed, async (transaction) => {
    const sheet = await sheetState(transaction, workshopId, sheetId, { lock: true });
    const before = await madeBefore(transaction, workshopId, sheetVersionKeys, keyed);
    if (before) return before;
    await refuseUnlessNext(transaction, author, sheet, { basedOn, document, note });
    const number = sheet.latestNumber + 1;
    await addSheetVersion(transaction, author, {
      ...keyed,
      sheetId: sheet.id,
      number,
      basedOn,
      document,
      count,
      note,
    });
    await scoped(transaction, workshopId).table('cut_sheets').where({ id: sheet.id }).update({
      latest_number: number,
      latest_status: 'draft',
      updated_at: author.at,
      updated_by: author.personId,
    });
    await dropSavedSheetDraft(transaction, author, sheet.id, document.plan);
    return { sheet_id: sheet.id, number };
  });
  return findSheetVersion(db, workshopId, made.sheet_id, made.number, 'all');
}

async function refuseUnlessNext(
  db: Knex,
  { workshopId }: Author,
  sheet: Awaited<ReturnType<typeof sheetState>>,
  offered: { readonly basedOn: number; readonly document: PinnedPlan; readonly note: string },
): Promise<void> {
  const row: { document: SheetDocument } | undefined = await scoped(db, workshopId)
    .table('cut_sheet_versions')
    .where({ sheet_id: sheet.id, number: offered.basedOn })
    .first('document');
  if (checkSheetSave({ ...sheet, base: row?.document ?? null }, offered) === 'save') return;
  const latest = await findSheetVersion(db, workshopId, sheet.id, sheet.latestNumber, 'all');
  throw new Refusal('version-conflict', {
    detail: `Version ${latest.number} was saved by ${latest.author.name} in between. Nothing of yours was lost.`,
    members: { basedOn: offered.basedOn, latest },
  });
}
