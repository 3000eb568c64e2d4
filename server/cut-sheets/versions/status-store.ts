import { type Knex } from 'knex';
import { type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { scoped } from '#server/database/scoped.ts';
import { inTransaction } from '#server/database/transaction.ts';
import { Refusal } from '#server/refusal.ts';
import { archived, type Author, checkTransition } from '#server/sections/rules.ts';
import { orderOf, type SheetNames } from '../files/order.ts';
import { type MadeFile } from '../files/make.ts';
import { storeFiles } from '../files/store.ts';
import { type SheetWorks } from '../files/works.ts';
import { checkFindings, checkSources } from '../rules.ts';
import { sheetState } from '../state.ts';
import { findSheetVersion } from './store.ts';

interface VersionKey {
  readonly sheetId: string;
  readonly number: number;
}

async function setStatus(
  db: Knex,
  author: Author,
  { sheetId, number }: VersionKey,
  to: { readonly status: VersionStatus; readonly reason: string },
): Promise<void> {
  const scope = scoped(db, author.workshopId);
  await scope.table('cut_sheet_versions').where({ sheet_id: sheetId, number }).update({
    status: to.status,
    status_reason: to.reason,
    status_by: author.personId,
    status_at: author.at,
  });
  await scope
    .table('cut_sheets')
    .where({ id: sheetId })
    .update({ updated_at: author.at, updated_by: author.personId });
  await scope
    .table('cut_sheets')
    .where({ id: sheetId, latest_number: number })
    .update({ latest_status: to.status });
}

/** Keeps the section versions behind a sheet from changing their status until the transaction ends. */
async function holdSources(db: Knex, workshopId: string, { plan }: SheetVersion): Promise<void> {
  for (const { sectionId, versionNumber } of [plan.panel.root, plan.panel.tip]) {
    await scoped(db, workshopId)
      .table('section_versions')
      .where({ section_id: sectionId, number: versionNumber })
      .forShare()
      .first('id');
  }
}

interface ReleaseInput extends VersionKey {
  readonly reason: string;
  readonly names: SheetNames;
}

/**
 * Releases a draft: makes all its files and stores them in the same moment in which the version released before is superseded.
 * @throws Refusal `not-found`, `archived`; `status-conflict` when the version is not a draft, a section version behind it is not released, or the
 *   sheet was renamed meanwhile; `invalid` with the findings that are errors. Nothing is changed then.
 */
export async function releaseSheetVersion(
  db: Knex,
  works: SheetWorks,
  author: Author,
  { sheetId, number, reason, names }: ReleaseInput,
): Promise<SheetVersion> {
  const { workshopId } = author;
  const checked = async (on: Knex, lock: boolean) => {
    const sheet = await sheetState(on, workshopId, sheetId, { lock });
    const version = await findSheetVersion(on, workshopId, sheet.id, number, 'all');
    if (sheet.archived) throw archived('cut sheet');
    checkTransition(number, version.status, 'released', 'plan');
    checkSources(version.root, version.tip);
    return { sheet, version };
  };
  const { version } = await checked(db, false);
  const made = await works.make(orderOf(version, names, author.at));
  checkFindings(made.findings, version.parts);
  await inTransaction(db, async (transaction) => {
    await holdSources(transaction, workshopId, version);
    const { sheet, version: now } = await checked(transaction, true);
    if (now.sheetName !== version.sheetName) {
      throw new Refusal('status-conflict', {
        detail: 'The sheet was renamed while its files were made. Release it again.',
      });
    }
    if (sheet.releasedNumber !== null) {
      const before = { sheetId: sheet.id, number: sheet.releasedNumber };
      const superseded = { status: 'superseded', reason: `Superseded by version ${number}.` } as const;
      await setStatus(transaction, author, before, superseded);
    }
    await putInForce(transaction, author, { sheetId: sheet.id, number }, made.files, reason);
  });
  return findSheetVersion(db, workshopId, sheetId, number, 'all');
}

async function putInForce(
  db: Knex,
  author: Author,
  version: VersionKey,
  files: readonly MadeFile[],
  reason: string,
): Promise<void> {
  await storeFiles(db, author.workshopId, version, files);
  await setStatus(db, author, version, { status: 'released', reason });
  await scoped(db, author.workshopId)
    .table('cut_sheets')
    .where({ id: version.sheetId })
    .update({
      released_number: version.number,
      released_at: author.at,
      released_by: author.personId,
      released_count: db.raw('released_count + 1'),
    });
}

/**
 * Withdraws the released version; none is released then, until another is.
 * @throws Refusal `not-found`, or `status-conflict` when the version is not the released one
 */
export async function withdrawSheetVersion(
  db: Knex,
  author: Author,
  { sheetId, number }: VersionKey,
  reason: string,
): Promise<SheetVersion> {
  await inTransaction(db, async (transaction) => {
    const sheet = await sheetState(transaction, author.workshopId, sheetId, { lock: true });
    const version = await findSheetVersion(transaction, author.workshopId, sheet.id, number, 'all');
    checkTransition(number, version.status, 'withdrawn', 'plan');
    await scoped(transaction, author.workshopId)
      .table('cut_sheets')
      .where({ id: sheet.id })
      .update({ released_number: null, released_at: null, released_by: null });
    await setStatus(transaction, author, { sheetId: sheet.id, number }, { status: 'withdrawn', reason });
  });
  return findSheetVersion(db, author.workshopId, sheetId, number, 'all');
}
