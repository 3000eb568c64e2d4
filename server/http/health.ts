import { type Knex } from 'knex';
import { type Handlers } from './handlers.ts';

export function healthHandlers(knex: Knex, version: string): Pick<Handlers, 'health'> {
  return {
    health: async ({ response, request }) => {
      try {
        await knex.raw('SELECT 1');
        return { status: 'ok', database: 'ok', version };
      } catch (error) {
        request.log.error({ err: error }, 'database unavailable');
        response.status(503).setHeader('Retry-After', '5');
        return { status: 'unavailable', database: 'unavailable', version };
      }
    },
  };
}
