import { chmodSync, existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createConnection, type RowDataPacket } from 'mysql2/promise';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { findServers } from '#server/start/mariadb/orphans.ts';
import { startMariadb, type Mariadb } from '#server/start/mariadb/server.ts';
import { findProgram } from '#server/start/processes.mjs';

const home = mkdtempSync(join(tmpdir(), 'mariadb-test-'));
const folder = join(home, 'mariadb');
let server: Mariadb;

const start = async (password = 'first-password'): Promise<void> => {
  const binary = findProgram('mariadbd') ?? '';
  server = await startMariadb({ folder, binary, password, durability: 'safe', rights: 'one database' });
};

async function ask<Row>(statement: string, url = server.url): Promise<Row[]> {
  const connection = await createConnection({ uri: url });
  try {
    const [rows] = await connection.query<RowDataPacket[]>(statement);
    return rows as Row[];
  } finally {
    await connection.end();
  }
}

beforeAll(async () => {
  chmodSync(home, 0o711);
  await start();
});

afterAll(async () => {
  await server.stop();
  rmSync(home, { recursive: true, force: true });
});

describe('the private server', () => {
  it('is new until its first content is kept, and keeps what is written through a kill', async () => {
    expect(server.isNew).toBe(true);
    await ask('CREATE TABLE notes (text VARCHAR(20))');
    server.keep();
    await ask("INSERT INTO notes VALUES ('ribs → tip')");
    process.kill(server.pid, 'SIGKILL');
    await server.ended;
    await start();
    expect(server.isNew).toBe(false);
    expect(await ask('SELECT text FROM notes')).toEqual([{ text: 'ribs → tip' }]);
  });

  it('takes the place of one that a killed start has left running', async () => {
    const left = server;
    await start('second-password');
    expect(server.orphansEnded).toBe(1);
    await left.ended;
    expect(findServers([join(folder, 'data')])).toEqual([server.pid]);
    expect(await ask('SELECT text FROM notes')).toEqual([{ text: 'ribs → tip' }]);
  });

  it('lets nobody in without the password', async () => {
    const port = String(server.port);
    for (const account of [
      'root',
      'mysql',
      'mariadb.sys',
      'ribwright',
      'ribwright:first-password',
      'nobody',
    ]) {
      await expect(ask('SELECT 1', `mysql://${account}@127.0.0.1:${port}/`), account).rejects.toThrow(
        /denied|not allowed/,
      );
    }
  });

  it('leaves the account its own database alone', async () => {
    await expect(ask('SELECT * FROM mysql.global_priv')).rejects.toThrow(/denied/);
    await expect(ask('CREATE DATABASE another')).rejects.toThrow(/denied/);
  });

  it('runs unprivileged, in UTC and with safe writes, and leaves no password in its folder', async () => {
    const [row] = await ask(
      'SELECT @@character_set_server AS charset, @@time_zone AS zone, @@innodb_flush_log_at_trx_commit AS flush, @@bind_address AS address',
    );
    expect(row).toEqual({ charset: 'utf8mb4', zone: '+00:00', flush: 1, address: '127.0.0.1' });
    expect(existsSync(join(folder, 'init.sql'))).toBe(false);
  });
});

describe('a first start that was broken off', () => {
  it('is begun anew by the next', async () => {
    await server.stop();
    rmSync(folder, { recursive: true });
    await start();
    await ask('CREATE TABLE half_made (id INT)');
    process.kill(server.pid, 'SIGKILL');
    await server.ended;
    await start();
    expect(server.isNew).toBe(true);
    expect(await ask('SHOW TABLES')).toEqual([]);
  });
});
