import { type Knex } from 'knex';
import { type Person } from '#server/account/person.ts';
import { type cutSheetEndpoints } from '#server/contracts/cut-sheet-endpoints.ts';
import { type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { checkDownload } from '#server/exports/rules.ts';
import { type Handlers } from '#server/http/handlers.ts';
import { type Author } from '#server/sections/rules.ts';
import { dropSheetDraft, findSheetDraft, keepSheetDraft } from './drafts.ts';
import { listSheetDownloads, recordSheetDownload } from './files/downloads.ts';
import { handingOut } from './files/handing-out.ts';
import { type SheetWorks } from './files/works.ts';
import { findCutSheet, listCutSheets } from './list/store.ts';
import { sheetReachOf } from './rules.ts';
import { sheetState } from './state.ts';
import { changeCutSheet, createCutSheet } from './store.ts';
import { releaseSheetVersion, withdrawSheetVersion } from './versions/status-store.ts';
import { findSheetVersion, listSheetVersions, saveSheetVersion } from './versions/store.ts';

/** The one who makes a request, as the author of what it changes. */
function authorOf(call: { person: Person; now: Date }): Author {
  return { workshopId: call.person.workshopId, personId: call.person.id, at: call.now };
}

/** A version within reach of the one who asks. */
function versionOf(
  knex: Knex,
  { person, params }: { person: Person; params: { readonly sheetId: string; readonly number: number } },
): Promise<SheetVersion> {
  const reach = sheetReachOf(person.role);
  return findSheetVersion(knex, person.workshopId, params.sheetId, params.number, reach);
}

interface Surroundings {
  readonly knex: Knex;
  readonly works: SheetWorks;
  /** The address under which people reach the program. */
  readonly publicUrl: string;
}

type SheetHandlers = Pick<Handlers, 'listCutSheets' | 'createCutSheet' | 'getCutSheet' | 'changeCutSheet'>;
type DraftHandlers = Pick<Handlers, 'getSheetDraft' | 'keepSheetDraft' | 'dropSheetDraft'>;
type VersionHandlers = Pick<
  Handlers,
  | 'listSheetVersions'
  | 'saveSheetVersion'
  | 'getSheetVersion'
  | 'releaseSheetVersion'
  | 'withdrawSheetVersion'
>;
type FileHandlers = Pick<Handlers, 'listSheetFiles' | 'sheetFile' | 'listSheetDownloads'>;

function sheetHandlers({ knex, works }: Surroundings): SheetHandlers {
  return {
    listCutSheets: ({ person, query }) =>
      listCutSheets(knex, person.workshopId, sheetReachOf(person.role), query),
    createCutSheet: (call) => createCutSheet(knex, works, authorOf(call), call.body),
    getCutSheet: ({ person, params }) =>
      findCutSheet(knex, person.workshopId, params.sheetId, sheetReachOf(person.role)),
    changeCutSheet: (call) => changeCutSheet(knex, authorOf(call), call.params.sheetId, call.body),
  };
}

function draftHandlers({ knex }: Surroundings): DraftHandlers {
  return {
    getSheetDraft: (call) => findSheetDraft(knex, authorOf(call), call.params.sheetId),
    keepSheetDraft: (call) => keepSheetDraft(knex, authorOf(call), call.params.sheetId, call.body),
    dropSheetDraft: (call) => dropSheetDraft(knex, authorOf(call), call.params.sheetId),
  };
}

function versionHandlers({ knex, works, publicUrl }: Surroundings): VersionHandlers {
  return {
    listSheetVersions: ({ person, params, query }) =>
      listSheetVersions(knex, person.workshopId, params.sheetId, {
        ...query,
        reach: sheetReachOf(person.role),
      }),
    saveSheetVersion: (call) => saveSheetVersion(knex, works, authorOf(call), call.params.sheetId, call.body),
    getSheetVersion: (call) => versionOf(knex, call),
    releaseSheetVersion: (call) =>
      releaseSheetVersion(knex, works, authorOf(call), {
        ...call.params,
        reason: call.body.reason,
        names: { person: call.person.name, workshop: call.person.workshopName, publicUrl },
      }),
    withdrawSheetVersion: (call) => withdrawSheetVersion(knex, authorOf(call), call.params, call.body.reason),
  };
}

function fileHandlers({ knex, works, publicUrl }: Surroundings): FileHandlers {
  const files = handingOut(knex, works, publicUrl);
  return {
    listSheetFiles: async (call) => {
      const version = await versionOf(knex, call);
      return { items: await files.list(call.person, version) };
    },
    sheetFile: async (call) => {
      const { person, params } = call;
      const version = await versionOf(knex, call);
      const sheet = await sheetState(knex, person.workshopId, version.sheetId);
      checkDownload(person.role, version, sheet.releasedNumber, 'cut sheet');
      const { downloadName: fileName, mediaType, bytes } = await files.find(person, version, params.name);
      return {
        file: { fileName, mediaType, bytes },
        record: (checksum) => recordSheetDownload(knex, authorOf(call), { ...params, fileName, checksum }),
      };
    },
    listSheetDownloads: async (call) => {
      const version = await versionOf(knex, call);
      return listSheetDownloads(knex, call.person.workshopId, version, call.query);
    },
  };
}

export function cutSheetHandlers(around: Surroundings): Pick<Handlers, keyof typeof cutSheetEndpoints> {
  return {
    ...sheetHandlers(around),
    ...draftHandlers(around),
    ...versionHandlers(around),
    ...fileHandlers(around),
  };
}
