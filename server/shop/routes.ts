import { type Knex } from 'knex';
import { type Person } from '#server/account/person.ts';
import { type Handlers } from '#server/http/handlers.ts';
import { type Author } from '#server/sections/rules.ts';
import { findKerf, listKerfs, putKerf } from './kerfs/store.ts';
import { checkInUse } from './rules.ts';
import { changeItem, createItem, findItem, listItems, machines, materials } from './store.ts';
import { stripFile } from './strips/strip.ts';

function authorOf(call: { person: Person; now: Date }): Author {
  return { workshopId: call.person.workshopId, personId: call.person.id, at: call.now };
}

export function shopHandlers(
  knex: Knex,
): Pick<
  Handlers,
  | 'listMachines'
  | 'createMachine'
  | 'getMachine'
  | 'changeMachine'
  | 'listMaterials'
  | 'createMaterial'
  | 'getMaterial'
  | 'changeMaterial'
  | 'listKerfs'
  | 'putKerf'
  | 'kerfStripFile'
> {
  return {
    listMachines: ({ person }) => listItems(knex, person.workshopId, machines),
    createMachine: (call) => createItem(knex, authorOf(call), machines, call.body),
    getMachine: ({ person, params }) => findItem(knex, person.workshopId, machines, params.machineId),
    changeMachine: (call) => changeItem(knex, authorOf(call), machines, call.params.machineId, call.body),
    listMaterials: ({ person }) => listItems(knex, person.workshopId, materials),
    createMaterial: (call) => createItem(knex, authorOf(call), materials, call.body),
    getMaterial: ({ person, params }) => findItem(knex, person.workshopId, materials, params.materialId),
    changeMaterial: (call) => changeItem(knex, authorOf(call), materials, call.params.materialId, call.body),
    listKerfs: ({ person }) => listKerfs(knex, person.workshopId),
    putKerf: (call) => putKerf(knex, authorOf(call), call.params, call.body),
    kerfStripFile: async ({ person, params }) => {
      const { workshopId } = person;
      const machine = await findItem(knex, workshopId, machines, params.machineId);
      const material = await findItem(knex, workshopId, materials, params.materialId);
      checkInUse(machine, material);
      const kerf = await findKerf(knex, workshopId, params);
      return { file: stripFile(params.name, { machine, material, kerfMm: kerf?.kerfMm ?? 0 }) };
    },
  };
}
