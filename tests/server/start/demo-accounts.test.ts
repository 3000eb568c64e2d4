import { afterAll, beforeAll, expect, it } from 'vitest';
import { hashPassword, isPassword } from '#server/account/passwords.ts';
import { createPerson, createWorkshop, personByEmail } from '#server/account/store.ts';
import { alignDemoPassword, demoAddresses } from '#server/start/demo-accounts.ts';
import { createTestDatabase, type TestDatabase } from '#tests/database.ts';

let database: TestDatabase;
const at = new Date('2025-01-01T00:00:00Z');
const outsider = 'owner@fellside.example';

beforeAll(async () => {
  database = await createTestDatabase();
  const workshop = await createWorkshop(database.knex, { name: 'Marrowfen', at });
  const passwordHash = await hashPassword('an-older-password');
  for (const email of [...demoAddresses, outsider]) {
    await createPerson(database.knex, workshop, { name: email, email, role: 'owner', passwordHash, at });
  }
});

afterAll(() => database.drop());

const opens = async (email: string, password: string): Promise<boolean> =>
  isPassword(password, (await personByEmail(database.knex, email))?.passwordHash ?? null);

it('gives the demo accounts the password of this start, and nobody else', async () => {
  expect(await alignDemoPassword(database.knex, 'the-new-password')).toEqual(demoAddresses);
  for (const address of demoAddresses) expect(await opens(address, 'the-new-password')).toBe(true);
  expect(await opens(outsider, 'an-older-password')).toBe(true);
});

it('changes nothing where the password is that already', async () => {
  const [first = ''] = demoAddresses;
  const before = await personByEmail(database.knex, first);
  expect(await alignDemoPassword(database.knex, 'the-new-password')).toEqual([]);
  expect(await personByEmail(database.knex, first)).toEqual(before);
});
