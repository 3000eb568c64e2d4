import { type Knex } from 'knex';
import { sheetReachOf } from '#server/cut-sheets/rules.ts';
import { type Handlers } from '#server/http/handlers.ts';
import { checkFile } from './file-check/store.ts';
import { listCutLogs, logCut } from './logs/store.ts';
import { cuttingList } from './store.ts';

type CuttingListHandlers = Pick<Handlers, 'cuttingList' | 'checkFile' | 'listCutLogs' | 'logCut'>;

export function cuttingListHandlers(knex: Knex): CuttingListHandlers {
  return {
    cuttingList: ({ person }) => cuttingList(knex, person.workshopId),
    checkFile: ({ person, query }) => checkFile(knex, person.workshopId, sheetReachOf(person.role), query),
    listCutLogs: ({ person, query }) =>
      listCutLogs(knex, person.workshopId, sheetReachOf(person.role), query),
    logCut: ({ person, now, body }) => {
      const author = { workshopId: person.workshopId, personId: person.id, at: now };
      return logCut(knex, author, sheetReachOf(person.role), body);
    },
  };
}
