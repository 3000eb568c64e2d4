import { expect, it } from 'vitest';
import { initStatements, serverOptions } from '#server/start/mariadb/options.ts';

it('listens on loopback alone, without a socket file and without the machine’s configuration', () => {
  const options = serverOptions({ folder: '/srv/one', port: 4001, durability: 'safe' });
  expect(options[0]).toBe('--no-defaults');
  expect(options).toEqual(expect.arrayContaining(['--bind-address=127.0.0.1', '--port=4001', '--socket=']));
});

it('keeps every acknowledged write through a power cut, except for tests', () => {
  const flush = (durability: 'safe' | 'throwaway'): string | undefined =>
    serverOptions({ folder: '/srv/one', port: 4001, durability }).find((option) =>
      option.includes('flush-log'),
    );
  expect(flush('safe')).toBe('--innodb-flush-log-at-trx-commit=1');
  expect(flush('throwaway')).toBe('--innodb-flush-log-at-trx-commit=0');
});

it('gives the account its one database and no more', () => {
  const grants = initStatements('a-b_C1', 'one database')
    .split('\n')
    .filter((line) => line.startsWith('GRANT'));
  expect(grants).toEqual(["GRANT ALL ON ribwright.* TO 'ribwright'@'127.0.0.1';"]);
});

it('refuses a password that would need quoting', () => {
  expect(() => initStatements("a'; DROP USER root; --", 'all')).toThrow('quoting');
});
