import { spawnSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { connect } from '#server/database/connect.ts';
import { createTestDatabase } from '#tests/database.ts';
import { sweep } from '#tests/throwaway.ts';

describe('createTestDatabase', () => {
  it('makes databases of their own, with all tables, and removes them', async () => {
    const [one, other] = await Promise.all([createTestDatabase(), createTestDatabase()]);
    await one.knex('workshops').insert({ id: crypto.randomUUID(), name: 'One', created_at: new Date(0) });
    expect(await one.knex('workshops').pluck('name')).toEqual(['One']);
    expect(await other.knex('workshops').pluck('name')).toEqual([]);
    await one.drop();
    const again = connect(one.url);
    await expect(again.raw('SELECT 1')).rejects.toThrow(/Unknown database/);
    await again.destroy();
    await other.drop();
  });

  it('leaves the tables to be made by the test, where asked', async () => {
    const { knex, drop } = await createTestDatabase({ migrated: false });
    expect((await knex.raw('SHOW TABLES'))[0]).toEqual([]);
    await drop();
  });
});

describe('sweep', () => {
  it('removes what dead runs have left, and nothing else', () => {
    const folder = mkdtempSync(join(tmpdir(), 'sweep-'));
    const dead = spawnSync('true').pid;
    const kept = [`ribwright-test-${String(process.pid)}-abc`, 'ribwright-test-results', 'other'];
    for (const name of [...kept, `ribwright-test-${String(dead)}-abc`])
      mkdirSync(join(folder, name, 'mariadb'), { recursive: true });
    sweep(folder);
    expect(readdirSync(folder).sort()).toEqual(kept.sort());
    rmSync(folder, { recursive: true });
  });
});
