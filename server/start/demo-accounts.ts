import type { Knex } from 'knex';
import { hashPassword, isPassword } from '../account/passwords.ts';
import { keepPassword, personByEmail } from '../account/store.ts';
import { demoEmail, demoPeople } from './demo/people.ts';

/** The accounts of the demo workshop, one for each role. */
export const demoAddresses: readonly string[] = demoPeople.map(({ role }) => demoEmail(role));

/**
 * Sees to it that the demo accounts have the password that the start prints, also where they were made under another:
 * DEMO_PASSWORD may have changed since, or the database come from elsewhere.
 * @returns the addresses whose password was set
 */
export async function alignDemoPassword(knex: Knex, password: string): Promise<string[]> {
  const changed = await Promise.all(
    demoAddresses.map(async (address) => {
      const person = await personByEmail(knex, address);
      if (person === null || (await isPassword(password, person.passwordHash))) return [];
      await keepPassword(knex, person, await hashPassword(password));
      return [address];
    }),
  );
  return changed.flat();
}

/** Whether any of the demo accounts is there: a database that was begun without the demo workshop stays without it. */
export async function hasDemoAccounts(knex: Knex): Promise<boolean> {
  const people = await Promise.all(demoAddresses.map((address) => personByEmail(knex, address)));
  return people.some((person) => person !== null);
}
