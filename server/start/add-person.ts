import { parseArgs } from 'node:util';
import type { Knex } from 'knex';
import { z } from 'zod';
import { hashPassword } from '../account/passwords.ts';
import { createPerson, createWorkshop, personByEmail, workshopByName } from '../account/store.ts';
import { accountRoles } from '../contracts/permissions.ts';
import { fillShop, shopDefaults } from '../shop/defaults.ts';
import { prepare, type Launch } from './prepare.ts';
import { longSecret, readablePassword } from './secrets.ts';
import { StartError } from './steps.mjs';
import { onStop } from './stop.ts';

const line = (what: string) =>
  z
    .string({ error: `--${what} is missing` })
    .trim()
    .min(1, `--${what} is empty`)
    .max(80, `--${what} holds at most 80 characters`);

const newPersonSchema = z.object({
  workshop: line('workshop'),
  role: z.enum(accountRoles, { error: `--role is one of ${accountRoles.join(', ')}` }),
  name: line('name'),
  email: z.email('--email is the address to sign in with').max(254, '--email is too long'),
});
type NewPerson = z.infer<typeof newPersonSchema>;

const usage = 'npm run add-person -- --workshop "Name" --role owner --name "Name" --email name@place.example';

/**
 * The person that the command line describes.
 * @throws {StartError} naming every option that is missing or wrong
 */
export function readPerson(args: readonly string[]): NewPerson {
  const text = { type: 'string' } as const;
  try {
    const options = { workshop: text, role: text, name: text, email: text };
    const result = newPersonSchema.safeParse(parseArgs({ args: [...args], options }).values);
    if (result.success) return result.data;
    throw new Error(result.error.issues.map(({ message }) => message).join('; '));
  } catch (error) {
    throw new StartError(`${error instanceof Error ? error.message : String(error)}.`, usage, error);
  }
}

/**
 * Gives a person an account; an owner of a workshop that is not there yet opens it, with common machines and materials.
 * @returns the password to hand over
 * @throws {StartError} where the address has an account already, or the workshop has no owner to belong to
 */
export async function addPerson(knex: Knex, person: NewPerson, at: Date): Promise<string> {
  const { workshop, role, name, email } = person;
  if (await personByEmail(knex, email)) {
    throw new StartError(`${email} has an account already.`, 'Take another address.');
  }
  const password = readablePassword();
  const passwordHash = await hashPassword(password);
  await knex.transaction(async (transaction) => {
    const found = await workshopByName(transaction, workshop);
    if (found === null && role !== 'owner') {
      throw new StartError(
        `There is no workshop “${workshop}”.`,
        'Its owner comes first: --role owner opens it.',
      );
    }
    const workshopId = found ?? (await createWorkshop(transaction, { name: workshop, at }));
    const personId = await createPerson(transaction, workshopId, { name, email, role, passwordHash, at });
    if (found === null) await fillShop(transaction, { workshopId, personId, at }, shopDefaults);
  });
  return password;
}

/**
 * The settings of such a start: it does not listen, signs nobody in, and fills nothing in, so it needs neither a free
 * port nor a secret, and leaves the database without the demo.
 */
export function settingsToAdd(environment: NodeJS.ProcessEnv): NodeJS.ProcessEnv {
  return { ...environment, PORT: '', DEMO: '0', AUTH_SECRET: longSecret() };
}

/** `npm run add-person`: an account in the database that `npm start` uses. */
export default async function run(launch: Launch): Promise<void> {
  const person = readPerson(process.argv.slice(3));
  const stops = onStop();
  await stops.guard(async () => {
    const { knex } = await prepare({ ...launch, environment: settingsToAdd(launch.environment) }, stops);
    const password = await addPerson(knex, person, new Date());
    console.log(`\n${person.email} signs in to ${person.workshop} as ${person.role} with ${password}`);
    console.log('The password is shown this once; it can be changed on the account page.');
  });
  await stops.stop(0);
}
