import { type ExpressAuthConfig, getSession } from '@auth/express';
import { type Request } from 'express';
import { type Knex } from 'knex';
import { z } from 'zod';
import { idSchema } from '#server/contracts/common.ts';
import { sessionHolds } from './rules.ts';
import { type Person } from './person.ts';
import { personById } from './store.ts';

const claimSchema = z.object({ personId: idSchema, epoch: z.int() });

/** Finds out who makes a request; null for nobody. Asks the database each time, so that an ended session ends at once. */
export type Authenticate = (request: Request) => Promise<Person | null>;

export function authenticator(knex: Knex, config: ExpressAuthConfig): Authenticate {
  return async (request) => {
    if (!request.headers.cookie?.includes('session-token')) return null;
    const claim = claimSchema.safeParse(await getSession(request, config));
    if (!claim.success) return null;
    const person = await personById(knex, claim.data.personId);
    return sessionHolds(claim.data, person) ? person : null;
  };
}
