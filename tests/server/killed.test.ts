import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { hashPassword } from '#server/account/passwords.ts';
import { createPerson, createWorkshop } from '#server/account/store.ts';
import { freePort } from '#server/start/ports.ts';
import { tied } from '#server/start/processes.mjs';
import { createTestDatabase, type TestDatabase } from '#tests/database.ts';
import { Client } from './support/client.ts';
import { cst, naca4 } from './support/shapes.ts';

const root = fileURLToPath(new URL('../..', import.meta.url));
const email = 'designer@marsh.example';
const password = 'a long enough password';

let database: TestDatabase;
let port: number;
let server: ChildProcess | undefined;

beforeAll(async () => {
  database = await createTestDatabase();
  port = await freePort();
  const at = new Date('2026-01-05T08:00:00.000Z');
  const workshopId = await createWorkshop(database.knex, { name: 'marsh', at });
  const passwordHash = await hashPassword(password);
  await createPerson(database.knex, workshopId, { name: 'D', email, role: 'designer', passwordHash, at });
});
afterAll(async () => {
  await kill();
  await database.drop();
});

/** The program in a process of its own; resolves when it listens. */
async function start(): Promise<void> {
  server = spawn(...tied(process.execPath, ['--import', 'tsx', 'server/main.ts']), {
    cwd: root,
    env: {
      ...process.env,
      NODE_ENV: 'production',
      PORT: String(port),
      DATABASE_URL: database.url,
      AUTH_SECRET: 'a secret of tests that is longer than thirty-two characters',
      LOG_LEVEL: 'error',
    },
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
  });
  await once(server, 'message');
}

async function kill(): Promise<void> {
  if (server === undefined || server.exitCode !== null || server.signalCode !== null) return;
  server.kill('SIGKILL');
  await once(server, 'exit');
}

it('a killed server loses no session, no unsaved work and no version, and a retry saves once', async () => {
  await start();
  const designer = new Client(`http://127.0.0.1:${String(port)}`);
  await designer.signIn(email, password);
  const { reply: section } = await designer.call('createSection', {
    body: { name: 'Marsh 2412', shape: naca4() },
  });
  const params = { sectionId: section.id };
  const version = { basedOn: 1, shape: naca4({ maxThickness: 0.13 }), note: 'thicker', key: section.id };
  const saved = await designer.call('saveVersion', { params, body: version });
  expect(saved.status).toBe(201);
  const work = { basedOn: 2, shape: cst(), chordMm: 211 };
  expect((await designer.call('keepDraft', { params, body: work })).status).toBe(200);

  await kill();
  await expect(designer.call('health')).rejects.toThrow();
  await start();

  expect((await designer.call('getDraft', { params })).reply).toMatchObject(work);
  const again = await designer.call('saveVersion', { params, body: version });
  expect(again.reply.id).toBe(saved.reply.id);
  expect((await designer.call('listVersions', { params })).reply.items.map((one) => one.number)).toEqual([
    2, 1,
  ]);
});
