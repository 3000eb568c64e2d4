import { type Knex } from 'knex';
import { type Handlers } from '#server/http/handlers.ts';
import { deskOf } from './store.ts';

export function deskHandlers(knex: Knex): Pick<Handlers, 'desk'> {
  return { desk: ({ person }) => deskOf(knex, person) };
}
