import { type Knex } from 'knex';
import { downloadNameOf } from '#geometry/cutting/files/names.ts';
import { type SheetFile, type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { Refusal } from '#server/refusal.ts';
import { identityOf } from './identity.ts';
import { type MadeFile } from './make.ts';
import { recently } from './recent.ts';
import { checksumOf, storedFile, storedFiles } from './store.ts';
import { type SheetWorks } from './works.ts';

const ARCHIVE = 'all.zip';
/** Enough for the versions that a few people look at; a set of files takes about a megabyte. */
const MOST_KEPT = 6;

/** Finds the files of versions: those of released ones as they are stored, those of drafts made when they are asked for. */
interface HandingOut {
  /** All files with the archive last; none of a draft with errors. */
  list(workshopId: string, version: SheetVersion): Promise<SheetFile[]>;
  /** @throws Refusal `not-found`; `status-conflict` for a draft with errors */
  find(workshopId: string, version: SheetVersion, name: string): Promise<MadeFile>;
}

export function handingOut(db: Knex, works: SheetWorks, publicUrl: string): HandingOut {
  const keepDrafts = recently<readonly MadeFile[]>(MOST_KEPT);
  const keepArchives = recently<MadeFile>(MOST_KEPT);

  function filesOf(workshopId: string, version: SheetVersion): Promise<readonly MadeFile[]> {
    const key = { sheetId: version.sheetId, number: version.number };
    if (version.status !== 'draft') return storedFiles(db, workshopId, key);
    const identity = identityOf(version, publicUrl, null);
    const order = { plan: version.pinned, identity, paper: version.plan.paper };
    return keepDrafts(JSON.stringify(identity), async () => (await works.make(order)).files);
  }

  function archiveOf(version: SheetVersion, files: readonly MadeFile[]): Promise<MadeFile> {
    return keepArchives(files.map(({ bytes }) => checksumOf(bytes)).join(), async () => ({
      name: ARCHIVE,
      part: 'all',
      downloadName: downloadNameOf(
        { sheetName: version.sheetName, versionNumber: version.number },
        version.pinned.panel,
        ARCHIVE,
      ),
      mediaType: 'application/zip',
      bytes: await works.archive(files),
    }));
  }

  return {
    async list(workshopId, version) {
      const files = await filesOf(workshopId, version);
      if (files.length === 0) return [];
      return [...files, await archiveOf(version, files)].map(({ bytes, ...file }) => ({
        ...file,
        bytes: bytes.length,
        checksum: checksumOf(bytes),
      }));
    },

    async find(workshopId, version, name) {
      const isStored = version.status !== 'draft' && name !== ARCHIVE;
      if (isStored) {
        const file = await storedFile(db, workshopId, version, name);
        if (!file) throw new Refusal('not-found');
        return file;
      }
      const files = await filesOf(workshopId, version);
      if (files.length === 0) {
        const detail = 'Findings of this draft are errors; there are no files before they are put right.';
        throw new Refusal('status-conflict', { detail });
      }
      const file =
        name === ARCHIVE ? await archiveOf(version, files) : files.find((one) => one.name === name);
      if (!file) throw new Refusal('not-found');
      return file;
    },
  };
}
