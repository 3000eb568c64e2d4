import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { addPerson } from '#server/start/add-person.ts';
import { prepare } from '#server/start/prepare.ts';
import { type Stops } from '#server/start/stop.ts';
import { createTestDatabase, type TestDatabase } from '#tests/database.ts';

const owner = {
  workshop: 'Fellside',
  role: 'owner',
  name: 'Ada Fell',
  email: 'ada@fellside.example',
} as const;

let database: TestDatabase;
let said: string[];
let ends: (() => unknown)[];
beforeEach(async () => {
  database = await createTestDatabase();
  said = [];
  ends = [];
  vi.spyOn(console, 'log').mockImplementation((line: string) => void said.push(line));
});
afterEach(async () => {
  for (const end of ends) await end();
  await database.drop();
});

function prepared() {
  const stops: Stops = {
    add: (stop) => void ends.push(stop),
    isEnding: () => false,
    stop: () => Promise.reject(new Error('Nothing was to be stopped.')),
    guard: (work) => work(),
  };
  const environment = {
    DATABASE_URL: database.url,
    DEMO: '1',
    DEMO_PASSWORD: 'marsh-reed-heron-7',
    AUTH_SECRET: 'a secret of tests that is longer than thirty-two characters',
  };
  return prepare({ root: '/nowhere', begun: 0, environment }, stops);
}

it('fills the demo into an empty database and tells its password, the next time too', async () => {
  expect((await prepared()).demoPassword).toBe('marsh-reed-heron-7');
  const people: unknown[] = await database.knex('people');
  expect(people).toHaveLength(4);
  expect((await prepared()).demoPassword).toBe('marsh-reed-heron-7');
  expect(await database.knex('people')).toEqual(people);
});

it('promises no demo accounts where the database was begun without them', async () => {
  await addPerson(database.knex, owner, new Date('2026-01-01T00:00:00Z'));
  expect((await prepared()).demoPassword).toBeNull();
  expect(said.join('\n')).toContain('begun without the demo workshop');
  expect(await database.knex('people').pluck('email')).toEqual([owner.email]);
});
