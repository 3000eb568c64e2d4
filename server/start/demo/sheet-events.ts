import { type Knex } from 'knex';
import { keepSheetDraft } from '#server/cut-sheets/drafts.ts';
import { recordSheetDownload } from '#server/cut-sheets/files/downloads.ts';
import { type SheetNames } from '#server/cut-sheets/files/order.ts';
import { checksumOf, storedFile } from '#server/cut-sheets/files/store.ts';
import { worksInPlace } from '#server/cut-sheets/files/works.ts';
import { createCutSheet } from '#server/cut-sheets/store.ts';
import { releaseSheetVersion, withdrawSheetVersion } from '#server/cut-sheets/versions/status-store.ts';
import { saveSheetVersion } from '#server/cut-sheets/versions/store.ts';
import { type Author } from '#server/sections/rules.ts';
import { type Ids, planWithIds, type SheetHistory, type SheetStep } from './sheet-histories.ts';

/** A cut sheet as far as its history has come. */
interface Sheet {
  id: string;
  newest: number;
}

/**
 * Takes the steps of a cut sheet, through the same stores that people use; files are made on the spot, because nobody is served yet.
 * @returns what takes one step; it is called in order
 */
export function sheetLife(
  db: Knex,
  { name, purpose }: SheetHistory,
  ids: Ids,
): (step: SheetStep, author: Author, names: SheetNames) => Promise<void> {
  const sheet: Sheet = { id: '', newest: 0 };
  return async (step, author, names) => {
    switch (step.did) {
      case 'save':
        return save(step, author);
      case 'release': {
        const { version: number, reason } = step;
        await releaseSheetVersion(db, worksInPlace, author, { sheetId: sheet.id, number, reason, names });
        return;
      }
      case 'withdraw':
        await withdrawSheetVersion(db, author, { sheetId: sheet.id, number: step.version }, step.reason);
        return;
      case 'take file':
        return takeFile(db, author, { sheetId: sheet.id, number: step.version }, step.name);
      case 'keep draft': {
        const draft = { basedOn: sheet.newest, values: { ...planWithIds(step.plan, ids) } };
        await keepSheetDraft(db, author, sheet.id, draft);
      }
    }
  };

  async function save(step: SheetStep & { readonly did: 'save' }, author: Author): Promise<void> {
    const given = { plan: planWithIds(step.plan, ids), note: step.note };
    if (sheet.newest === 0) {
      sheet.id = (await createCutSheet(db, worksInPlace, author, { name, purpose, ...given })).id;
    } else {
      await saveSheetVersion(db, worksInPlace, author, sheet.id, { basedOn: sheet.newest, ...given });
    }
    sheet.newest += 1;
  }
}

async function takeFile(
  db: Knex,
  author: Author,
  version: { readonly sheetId: string; readonly number: number },
  name: string,
): Promise<void> {
  const file = await storedFile(db, author.workshopId, version, name);
  if (!file) throw new Error(`The demo takes ${name}, which the version does not have.`);
  const { downloadName: fileName, bytes } = file;
  await recordSheetDownload(db, author, { ...version, name, fileName, checksum: checksumOf(bytes) });
}
