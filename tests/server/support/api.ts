import { createServer } from 'node:http';
import { type AddressInfo } from 'node:net';
import { pino } from 'pino';
import { createApp } from '#server/app.ts';
import { type AccountRole } from '#server/account/person.ts';
import { hashPassword } from '#server/account/passwords.ts';
import { createPerson, createWorkshop } from '#server/account/store.ts';
import { accountRoles } from '#server/contracts/permissions.ts';
import { type SheetWorks } from '#server/cut-sheets/files/works.ts';
import { type Author } from '#server/sections/rules.ts';
import { createTestDatabase, type TestDatabase } from '#tests/database.ts';
import { Client } from './client.ts';

export const password = 'a long enough password';

/** Workshop with one person of each role; e-mail addresses are role@name.example. */
export interface TestWorkshop {
  readonly id: string;
  readonly name: string;
  readonly people: Readonly<Record<AccountRole, string>>;
  author(role: AccountRole, at?: Date): Author;
  email(role: AccountRole): string;
}

export interface TestApi extends TestDatabase {
  readonly origin: string;
  /** Lines that the server logged as errors; a test that expects none can say so. */
  readonly errors: string[];
  addWorkshop(name: string): Promise<TestWorkshop>;
  anonymous(): Client;
  signIn(workshop: TestWorkshop, role: AccountRole): Promise<Client>;
  close(): Promise<void>;
}

/** The application on a port of its own, over a database of its own. */
export async function startApi(
  options: {
    publicUrl?: string;
    trustProxy?: false | number;
    clientFolder?: string | null;
    database?: TestDatabase;
    works?: SheetWorks;
  } = {},
): Promise<TestApi> {
  const database = options.database ?? (await createTestDatabase());
  const errors: string[] = [];
  const logger = pino({ level: 'error' }, { write: (line: string) => void errors.push(line) });
  const server = createServer(
    createApp({
      config: {
        authSecret: 'a secret of tests that is longer than thirty-two characters',
        publicUrl: options.publicUrl ?? 'http://127.0.0.1',
        trustProxy: options.trustProxy ?? false,
      },
      knex: database.knex,
      logger,
      clientFolder: options.clientFolder ?? null,
      works: options.works,
    }),
  );
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const origin = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const passwordHash = await hashPassword(password);
  return {
    ...database,
    origin,
    errors,
    anonymous: () => new Client(origin),
    addWorkshop: (name) => addWorkshop(database, name, passwordHash),
    signIn: async (workshop, role) => {
      const client = new Client(origin);
      await client.signIn(workshop.email(role), password);
      return client;
    },
    close: async () => {
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
      await database.drop();
    },
  };
}

async function addWorkshop(
  { knex }: TestDatabase,
  name: string,
  passwordHash: string,
): Promise<TestWorkshop> {
  const at = new Date('2026-01-05T08:00:00.000Z');
  const id = await createWorkshop(knex, { name, at });
  const email = (role: AccountRole) => `${role}@${name}.example`;
  const people = {} as Record<AccountRole, string>;
  for (const role of accountRoles) {
    const input = { name: `${role} of ${name}`, email: email(role), role, passwordHash, at };
    people[role] = await createPerson(knex, id, input);
  }
  return {
    id,
    name,
    people,
    email,
    author: (role, when = at) => ({ workshopId: id, personId: people[role], at: when }),
  };
}
