import { type ExpressAuthConfig, type Session } from '@auth/express';
import Credentials from '@auth/express/providers/credentials';
import { type Knex } from 'knex';
import { type Logger } from 'pino';
import { signInSchema } from '#server/contracts/people.ts';
import { loggable } from '#server/http/log.ts';
import { isPassword } from './passwords.ts';
import { personByEmail } from './store.ts';

/** How long a session lasts, in seconds; GET /auth/session lengthens it. */
const SESSION_SECONDS = 14 * 24 * 60 * 60;

interface SignedIn {
  readonly id: string;
  readonly epoch: number;
}

/** Who these credentials belong to; null when they are wrong, after the same time whatever is wrong with them. */
async function signedIn(knex: Knex, credentials: unknown): Promise<SignedIn | null> {
  const typed = signInSchema.pick({ email: true, password: true }).loose().safeParse(credentials);
  if (!typed.success) return null;
  const person = await personByEmail(knex, typed.data.email);
  const passes = await isPassword(typed.data.password, person?.passwordHash ?? null);
  return passes && person?.active ? { id: person.id, epoch: person.sessionEpoch } : null;
}

/** Wrong credentials and broken cookies are everyday; Auth.js calls them errors. */
const everyday = new Set(['CredentialsSignin', 'JWTSessionError', 'MissingCSRF']);

/** Auth.js wraps what its callbacks throw. */
function causeOf(error: Error): unknown {
  const cause = error.cause as { err?: unknown } | undefined;
  return cause?.err ?? error;
}

function authLogger(logger: Logger): NonNullable<ExpressAuthConfig['logger']> {
  return {
    error: (error) => {
      if (everyday.has(error.name)) logger.debug({ kind: error.name }, 'sign-in refused');
      else logger.error({ problem: loggable(causeOf(error)) }, 'sign-in failed');
    },
    warn: (code) => logger.debug({ code }, 'sign-in warning'),
    debug: () => undefined,
  };
}

/**
 * Auth.js for e-mail and password. The sealed cookie holds the person's id and session epoch and nothing else; it is
 * httpOnly, sameSite=lax, and secure when the request came by https.
 */
export function signInConfig(options: { knex: Knex; secret: string; logger: Logger }): ExpressAuthConfig {
  return {
    secret: options.secret,
    basePath: '/auth',
    trustHost: true,
    pages: { signIn: '/sign-in', signOut: '/sign-in', error: '/sign-in' },
    session: { strategy: 'jwt', maxAge: SESSION_SECONDS },
    logger: authLogger(options.logger),
    providers: [
      Credentials({
        credentials: { email: { type: 'email' }, password: { type: 'password' } },
        authorize: (credentials) => signedIn(options.knex, credentials),
      }),
    ],
    callbacks: {
      jwt: ({ token, user }) => {
        const fresh = user as SignedIn | undefined;
        if (fresh) return { sub: fresh.id, epoch: fresh.epoch };
        return { sub: token.sub ?? '', epoch: token['epoch'] };
      },
      session: ({ session, token }) =>
        ({ expires: session.expires, personId: token.sub, epoch: token['epoch'] }) as unknown as Session,
    },
  };
}
