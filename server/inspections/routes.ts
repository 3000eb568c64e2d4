import { type Knex } from 'knex';
import { type Person } from '#server/account/person.ts';
import { sheetReachOf } from '#server/cut-sheets/rules.ts';
import { type Handlers } from '#server/http/handlers.ts';
import { type Author } from '#server/sections/rules.ts';
import { addPhoto, photoBytes } from './photos/store.ts';
import { inspectionStatistics } from './statistics.ts';
import { addInspection, answerInspection, findInspection, listInspections } from './store.ts';

function authorOf(call: { person: Person; now: Date }): Author {
  return { workshopId: call.person.workshopId, personId: call.person.id, at: call.now };
}

type InspectionHandlers = Pick<
  Handlers,
  | 'listInspections'
  | 'addInspection'
  | 'getInspection'
  | 'answerInspection'
  | 'inspectionStatistics'
  | 'addPhoto'
  | 'photo'
>;

export function inspectionHandlers(knex: Knex): InspectionHandlers {
  return {
    listInspections: ({ person, query }) =>
      listInspections(knex, person.workshopId, sheetReachOf(person.role), query),
    addInspection: (call) => addInspection(knex, authorOf(call), sheetReachOf(call.person.role), call.body),
    getInspection: ({ person, params }) =>
      findInspection(knex, person.workshopId, sheetReachOf(person.role), params.inspectionId),
    answerInspection: (call) => {
      const reach = sheetReachOf(call.person.role);
      return answerInspection(knex, authorOf(call), reach, call.params.inspectionId, call.body);
    },
    inspectionStatistics: ({ person }) =>
      inspectionStatistics(knex, person.workshopId, sheetReachOf(person.role)),
    addPhoto: (call) => {
      const reach = sheetReachOf(call.person.role);
      return addPhoto(knex, authorOf(call), reach, call.params.inspectionId, call.upload.bytes);
    },
    photo: async ({ person, params }) => {
      const reach = sheetReachOf(person.role);
      const bytes = await photoBytes(knex, person.workshopId, reach, params.photoId);
      return {
        file: { fileName: `${params.photoId}.jpg`, mediaType: 'image/jpeg', bytes },
        inline: true,
      };
    },
  };
}
