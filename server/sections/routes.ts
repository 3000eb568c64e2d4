import { type Knex } from 'knex';
import { type Person } from '#server/account/person.ts';
import { type Handlers } from '#server/http/handlers.ts';
import { dropDraft, findDraft, keepDraft } from './drafts/store.ts';
import { findSection, listSections } from './library/store.ts';
import { type Author, reachOf } from './rules.ts';
import { changeSection, createSection } from './store.ts';
import { releaseVersion, withdrawVersion } from './versions/status-store.ts';
import { findVersion, listVersions, saveVersion } from './versions/store.ts';

/** The one who makes a request, as the author of what it changes. */
function authorOf(call: { person: Person; now: Date }): Author {
  return { workshopId: call.person.workshopId, personId: call.person.id, at: call.now };
}

type SectionHandlers = Pick<
  Handlers,
  'listSections' | 'createSection' | 'getSection' | 'changeSection' | 'archiveSection'
>;
type DraftHandlers = Pick<Handlers, 'getDraft' | 'keepDraft' | 'dropDraft'>;
type VersionHandlers = Pick<
  Handlers,
  'listVersions' | 'saveVersion' | 'getVersion' | 'releaseVersion' | 'withdrawVersion'
>;

function libraryHandlers(knex: Knex): SectionHandlers {
  return {
    listSections: ({ person, query }) => listSections(knex, person.workshopId, reachOf(person.role), query),
    createSection: (call) => createSection(knex, authorOf(call), call.body),
    getSection: ({ person, params }) =>
      findSection(knex, person.workshopId, params.sectionId, reachOf(person.role)),
    changeSection: (call) => changeSection(knex, authorOf(call), call.params.sectionId, call.body),
    archiveSection: async (call) => {
      await changeSection(knex, authorOf(call), call.params.sectionId, { archived: true });
    },
  };
}

function draftHandlers(knex: Knex): DraftHandlers {
  return {
    getDraft: (call) => findDraft(knex, authorOf(call), call.params.sectionId),
    keepDraft: (call) => keepDraft(knex, authorOf(call), call.params.sectionId, call.body),
    dropDraft: (call) => dropDraft(knex, authorOf(call), call.params.sectionId),
  };
}

function versionHandlers(knex: Knex): VersionHandlers {
  return {
    listVersions: ({ person, params, query }) =>
      listVersions(knex, person.workshopId, params.sectionId, { ...query, reach: reachOf(person.role) }),
    saveVersion: (call) => saveVersion(knex, authorOf(call), call.params.sectionId, call.body),
    getVersion: ({ person, params }) =>
      findVersion(knex, person.workshopId, params.sectionId, params.number, reachOf(person.role)),
    releaseVersion: (call) =>
      releaseVersion(knex, authorOf(call), call.params.sectionId, call.params.number, call.body.reason),
    withdrawVersion: (call) =>
      withdrawVersion(knex, authorOf(call), call.params.sectionId, call.params.number, call.body.reason),
  };
}

export function sectionHandlers(knex: Knex): SectionHandlers & DraftHandlers & VersionHandlers {
  return { ...libraryHandlers(knex), ...draftHandlers(knex), ...versionHandlers(knex) };
}
