import express, { type RequestHandler, type Response, Router } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { type Knex } from 'knex';
import { Refusal } from '#server/refusal.ts';
import { type AttemptLimit } from './attempt-limit.ts';
import { type Authenticate } from './session.ts';
import { canonicalEmail } from './store.ts';

/** Failed sign-ins from one network address, whatever the account. */
const ADDRESS_LIMIT = { limit: 100, windowMs: 15 * 60_000 };

/** An account as seen from one network address (of IPv6, the network that one customer gets). */
export function subjectOf(ip: string | undefined, account: string): string {
  return `${ipKeyGenerator(ip ?? '')} ${account}`;
}

export function tooMany(waitMs: number): Refusal {
  const retryAfterSeconds = Math.max(1, Math.ceil(waitMs / 1000));
  return new Refusal('too-many', { detail: `Try again in ${retryAfterSeconds} s.`, retryAfterSeconds });
}

/** Auth.js tells success by the cookie it sets. */
function hasSignedIn(response: Response): boolean {
  return [response.getHeader('set-cookie') ?? []]
    .flat()
    .some((cookie) => /session-token=[^;]/.test(String(cookie)));
}

function limitAddress(): RequestHandler {
  return rateLimit({
    ...ADDRESS_LIMIT,
    standardHeaders: false,
    legacyHeaders: false,
    skipSuccessfulRequests: true,
    requestWasSuccessful: (_request, response) => hasSignedIn(response),
    keyGenerator: (request) => ipKeyGenerator(request.ip ?? ''),
    handler: (_request, _response, next) => next(tooMany(ADDRESS_LIMIT.windowMs)),
  });
}

function limitAccount(attempts: AttemptLimit): RequestHandler {
  return (request, response, next) => {
    const body = request.body as { email?: unknown } | undefined;
    const email = typeof body?.email === 'string' ? canonicalEmail(body.email).slice(0, 254) : '';
    const subject = subjectOf(request.ip, email);
    const wait = attempts.begin(subject);
    if (wait > 0) return next(tooMany(wait));
    response.on('finish', () => {
      if (hasSignedIn(response)) attempts.succeed(subject);
    });
    next();
  };
}

/** Auth.js would take an absent database for a wrong configuration, and an ended session for a lasting one. */
function requireDatabase(knex: Knex): RequestHandler {
  return async (_request, _response, next) => {
    await knex.raw('SELECT 1');
    next();
  };
}

/** What of Auth.js is in use; its own pages and the rest of its addresses are not. */
const inUse = new Set(['GET /csrf', 'GET /session', 'POST /callback/credentials', 'POST /signout']);

/** What goes before Auth.js at `/auth`: limits, and the checks against the database that it cannot make. */
export function beforeAuth(options: {
  knex: Knex;
  attempts: AttemptLimit;
  authenticate: Authenticate;
}): Router {
  const router = Router();
  router.use((request, response, next) => {
    response.setHeader('Cache-Control', 'private, no-store');
    next(inUse.has(`${request.method} ${request.path}`) ? undefined : new Refusal('not-found'));
  });
  router.post(
    '/callback/credentials',
    express.json({ limit: '8kb' }),
    express.urlencoded({ extended: false, limit: '8kb' }),
    limitAddress(),
    limitAccount(options.attempts),
    requireDatabase(options.knex),
  );
  router.get('/session', async (request, response, next) => {
    if ((await options.authenticate(request)) !== null) return next();
    response.json(null);
  });
  return router;
}
