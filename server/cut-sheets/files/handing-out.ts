import { type Knex } from 'knex';
import { downloadNameOf } from '#geometry/cutting/files/names.ts';
import { type Person } from '#server/account/person.ts';
import { type SheetFile, type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { Refusal } from '#server/refusal.ts';
import { type MadeFile } from './make.ts';
import { orderOf } from './order.ts';
import { recently } from './recent.ts';
import { checksumOf, storedFile, storedFiles } from './store.ts';
import { type SheetWorks } from './works.ts';

const ARCHIVE = 'all.zip';
/** Enough for the versions that a few people look at; a set of files takes about a megabyte. */
const MOST_KEPT = 6;

type Asking = Pick<Person, 'workshopId' | 'workshopName' | 'name'>;

/** Finds the files of versions: those of released ones as they are stored, those of drafts made when they are asked for. */
interface HandingOut {
  /** All files with the archive last; none of a draft with errors. */
  list(person: Asking, version: SheetVersion): Promise<SheetFile[]>;
  /** @throws Refusal `not-found`; `status-conflict` for a draft with errors */
  find(person: Asking, version: SheetVersion, name: string): Promise<MadeFile>;
}

export function handingOut(db: Knex, works: SheetWorks, publicUrl: string): HandingOut {
  const keepDrafts = recently<readonly MadeFile[]>(MOST_KEPT);
  const keepArchives = recently<Uint8Array>(MOST_KEPT);

  function filesOf(person: Asking, version: SheetVersion): Promise<readonly MadeFile[]> {
    if (version.status !== 'draft') return storedFiles(db, person.workshopId, version);
    const names = { person: person.name, workshop: person.workshopName, publicUrl };
    const order = orderOf(version, names, null);
    // The checksum in the identity stands for the plan.
    const key = JSON.stringify([order.identity, order.owner]);
    return keepDrafts(key, async () => (await works.make(order)).files);
  }

  async function archiveOf(version: SheetVersion, files: readonly MadeFile[]): Promise<MadeFile> {
    const { sheetName, number: versionNumber, pinned } = version;
    return {
      name: ARCHIVE,
      part: 'all',
      downloadName: downloadNameOf({ sheetName, versionNumber }, pinned.panel, ARCHIVE),
      mediaType: 'application/zip',
      bytes: await keepArchives(files.map(({ bytes }) => checksumOf(bytes)).join(), () =>
        works.archive(files),
      ),
    };
  }

  return {
    async list(person, version) {
      const files = await filesOf(person, version);
      if (files.length === 0) return [];
      return [...files, await archiveOf(version, files)].map(({ bytes, ...file }) => ({
        ...file,
        bytes: bytes.length,
        checksum: checksumOf(bytes),
      }));
    },

    async find(person, version, name) {
      const isStored = version.status !== 'draft' && name !== ARCHIVE;
      if (isStored) {
        const file = await storedFile(db, person.workshopId, version, name);
        if (!file) throw new Refusal('not-found');
        return file;
      }
      const files = await filesOf(person, version);
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
