import { readFileSync } from 'node:fs';
import { constants } from 'node:zlib';
import { ExpressAuth } from '@auth/express';
import compression from 'compression';
import express, { type Express } from 'express';
import { type Knex } from 'knex';
import { type Logger } from 'pino';
import { accountHandlers } from './account/routes.ts';
import { AttemptLimit } from './account/attempt-limit.ts';
import { beforeAuth } from './account/auth-routes.ts';
import { authenticator } from './account/session.ts';
import { signInConfig } from './account/sign-in.ts';
import { type Config } from './config.ts';
import { threadedWorks } from './cut-sheets/files/threaded-works.ts';
import { type SheetWorks } from './cut-sheets/files/works.ts';
import { cutSheetHandlers } from './cut-sheets/routes.ts';
import { cuttingListHandlers } from './cutting-list/routes.ts';
import { deskHandlers } from './desk/routes.ts';
import { exportHandlers } from './exports/routes.ts';
import { flightConditionHandlers } from './flight-conditions/routes.ts';
import { clientFiles } from './http/client-files.ts';
import { healthHandlers } from './http/health.ts';
import { requestLog } from './http/log.ts';
import { problemHandler } from './http/problem.ts';
import { apiRoutes } from './http/register.ts';
import { sameSiteOnly } from './http/same-site.ts';
import { believeProxiesOnlyIf, securityHeaders } from './http/security.ts';
import { inspectionHandlers } from './inspections/routes.ts';
import { openApiDocument } from './openapi.ts';
import { Refusal } from './refusal.ts';
import { sectionHandlers } from './sections/routes.ts';
import { shopHandlers } from './shop/routes.ts';

/** What the application is made of; nothing else is read from the environment. */
interface AppDependencies {
  readonly config: Pick<Config, 'authSecret' | 'publicUrl' | 'trustProxy'>;
  readonly knex: Knex;
  readonly logger: Logger;
  /** The built client; null where something else serves it. */
  readonly clientFolder: string | null;
  /** Where plans are worked out and files made; a thread of the application's own when it is not given. */
  readonly works?: SheetWorks | undefined;
}

/** The middleware's own level, 4, makes the first load larger than gzip would; 6 makes it smaller at little cost. */
const brotli = { params: { [constants.BROTLI_PARAM_QUALITY]: 6 } };

const packageFile = new URL('../package.json', import.meta.url);
const { version } = JSON.parse(readFileSync(packageFile, 'utf8')) as { version: string };

/** Makes the application: API under /api, sign-in under /auth, the client for everything else. Starts nothing. */
export function createApp({ config, knex, logger, clientFolder, works }: AppDependencies): Express {
  const attempts = new AttemptLimit();
  const auth = signInConfig({ knex, secret: config.authSecret, logger });
  const authenticate = authenticator(knex, auth);
  const handlers = {
    ...healthHandlers(knex, version),
    ...accountHandlers(knex, attempts),
    ...sectionHandlers(knex),
    ...exportHandlers(knex),
    ...shopHandlers(knex),
    ...cuttingListHandlers(knex),
    ...inspectionHandlers(knex),
    ...deskHandlers(knex),
    ...flightConditionHandlers(knex),
    ...cutSheetHandlers({ knex, works: works ?? threadedWorks(), publicUrl: config.publicUrl }),
  };
  const document = JSON.stringify(openApiDocument(version));

  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustProxy);
  app.set('query parser', 'simple');
  app.use(requestLog(logger));
  app.use(securityHeaders(config.publicUrl.startsWith('https:')));
  app.use(believeProxiesOnlyIf(config.trustProxy !== false));
  app.use(compression({ brotli }));
  app.use(['/api', '/auth'], sameSiteOnly);
  app.use('/auth', beforeAuth({ knex, attempts, authenticate }), ExpressAuth(auth));
  app.get('/api/openapi.json', (_request, response) => {
    response.type('application/json').setHeader('Cache-Control', 'no-cache').send(document);
  });
  app.use(apiRoutes(handlers, authenticate));
  app.use(['/api', '/auth'], () => {
    throw new Refusal('not-found');
  });
  if (clientFolder !== null) app.use(clientFiles(clientFolder));
  app.use(() => {
    throw new Refusal('not-found');
  });
  app.use(problemHandler);
  return app;
}
