import { type Express, type IRouter } from 'express';
import { pino } from 'pino';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { createApp } from '#server/app.ts';
import { type Endpoint } from '#server/contracts/endpoint.ts';
import { endpoints } from '#server/contracts/endpoints.ts';
import { createTestDatabase, type TestDatabase } from '#tests/database.ts';

/** What stands beside the table of endpoints, none of it with data of a workshop. */
const beside = ['GET /api/openapi.json', 'POST /callback/credentials', 'GET /session'];

interface Layer {
  readonly handle: unknown;
  readonly route?: { readonly path: string; readonly stack: readonly { readonly method?: string }[] };
}

function routesOf(router: IRouter): string[] {
  return (router.stack as unknown as Layer[]).flatMap(({ handle, route }) => {
    if (route) {
      const methods = new Set(route.stack.map(({ method }) => method?.toUpperCase()));
      // The route for all methods refuses those that an address does not take.
      return [...methods].filter(Boolean).map((method) => `${String(method)} ${route.path}`);
    }
    const isRouter = typeof handle === 'function' && 'stack' in handle;
    return isRouter ? routesOf(handle as unknown as IRouter) : [];
  });
}

let database: TestDatabase;
let app: Express;
beforeAll(async () => {
  database = await createTestDatabase({ migrated: false });
  app = createApp({
    config: {
      authSecret: 'a secret of tests, long enough',
      publicUrl: 'http://127.0.0.1',
      trustProxy: false,
    },
    knex: database.knex,
    logger: pino({ level: 'silent' }),
    clientFolder: null,
  });
});
afterAll(() => database.drop());

it('the application answers what stands in the table of endpoints, and nothing that the matrices leave out', () => {
  const table = Object.values(endpoints).map(({ method, path }: Endpoint) => `${method} ${path}`);
  expect(routesOf(app.router).sort()).toEqual([...table, ...beside].sort());
});
