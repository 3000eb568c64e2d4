import { type Knex } from 'knex';
import { type Person } from '#server/account/person.ts';
import { type Handlers } from '#server/http/handlers.ts';
import { type Author } from '#server/sections/rules.ts';
import { listKerfs, putKerf } from './kerfs/store.ts';
import { changeItem, createItem, findItem, listItems, machines, materials } from './store.ts';

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
  };
}
