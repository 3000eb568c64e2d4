import { type Knex } from 'knex';
import { type Person } from '#server/account/person.ts';
import { type Handlers } from '#server/http/handlers.ts';
import { type Author } from '#server/sections/rules.ts';
import { changeCondition, createCondition, findCondition, listConditions, setDefault } from './store.ts';

function authorOf(call: { person: Person; now: Date }): Author {
  return { workshopId: call.person.workshopId, personId: call.person.id, at: call.now };
}

export function flightConditionHandlers(
  knex: Knex,
): Pick<
  Handlers,
  | 'listFlightConditions'
  | 'createFlightCondition'
  | 'getFlightCondition'
  | 'changeFlightCondition'
  | 'setDefaultFlightCondition'
> {
  return {
    listFlightConditions: ({ person }) => listConditions(knex, person.workshopId),
    createFlightCondition: (call) => createCondition(knex, authorOf(call), call.body),
    getFlightCondition: ({ person, params }) => findCondition(knex, person.workshopId, params.conditionId),
    changeFlightCondition: (call) =>
      changeCondition(knex, authorOf(call), call.params.conditionId, call.body),
    setDefaultFlightCondition: ({ person, params }) =>
      setDefault(knex, person.workshopId, params.conditionId),
  };
}
