import { expect, it } from 'vitest';
import { servesFolder } from '#server/start/mariadb/orphans.ts';

const folders = ['/srv/one/data', '/srv/one/data.new'];
const line = (...args: string[]): string => `${args.join('\0')}\0`;

it.each([
  ['our server', line('/usr/sbin/mariadbd', '--no-defaults', '--datadir=/srv/one/data', '--port=4001')],
  ['our server under a bare name', line('mariadbd', '--datadir=/srv/one/data')],
  [
    'our server as it makes the data',
    line('/usr/sbin/mariadbd', '--bootstrap', '--datadir=/srv/one/data.new'),
  ],
  [
    'our server before its tie has handed over',
    line('/usr/bin/setpriv', '--pdeathsig', 'TERM', '--', '/usr/sbin/mariadbd', '--datadir=/srv/one/data'),
  ],
])('takes %s for ours', (_title, commandLine) => {
  expect(servesFolder(commandLine, folders)).toBe(true);
});

it.each([
  ['another checkout’s server', line('/usr/sbin/mariadbd', '--datadir=/srv/two/data')],
  ['one on a folder below', line('/usr/sbin/mariadbd', '--datadir=/srv/one/data/deeper')],
  ['one on a folder of a longer name', line('/usr/sbin/mariadbd', '--datadir=/srv/one/data2')],
  ['the machine’s server', line('/usr/sbin/mariadbd')],
  ['an editor on our folder', line('/usr/bin/vi', 'mariadbd', '--datadir=/srv/one/data')],
  ['a search for it', line('grep', '--datadir=/srv/one/data')],
  [
    'another program tied to its parent',
    line('setpriv', '--pdeathsig', 'TERM', 'sh', '--datadir=/srv/one/data'),
  ],
  ['a process that has ended', ''],
])('leaves %s alone', (_title, commandLine) => {
  expect(servesFolder(commandLine, folders)).toBe(false);
});
