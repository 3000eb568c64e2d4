/** How much a power cut may cost: nothing, or everything, for tests that throw the data away. */
export type Durability = 'safe' | 'throwaway';

/** What the account of the program may do: own its one database, or make and drop databases, for tests. */
export type Rights = 'one database' | 'all';

export const accountName = 'ribwright';
export const databaseName = 'ribwright';
const collation = 'utf8mb4_unicode_520_ci';

const durabilityOptions: Readonly<Record<Durability, readonly string[]>> = {
  safe: ['--innodb-flush-log-at-trx-commit=1', '--innodb-doublewrite=1', '--innodb-buffer-pool-size=256M'],
  throwaway: [
    '--innodb-flush-log-at-trx-commit=0',
    '--innodb-doublewrite=0',
    '--innodb-flush-method=nosync',
    '--innodb-buffer-pool-size=256M',
  ],
};

/** The server's command line: loopback TCP with a password only, no socket file, no configuration of the machine's. */
export function serverOptions(options: {
  readonly folder: string;
  readonly port: number;
  readonly durability: Durability;
}): string[] {
  const { folder, port, durability } = options;
  return [
    '--no-defaults',
    `--datadir=${folder}/data`,
    `--pid-file=${folder}/mariadbd.pid`,
    `--log-error=${folder}/error.log`,
    `--init-file=${folder}/init.sql`,
    '--socket=',
    '--bind-address=127.0.0.1',
    `--port=${String(port)}`,
    '--skip-name-resolve',
    '--skip-log-bin',
    '--local-infile=0',
    '--character-set-server=utf8mb4',
    `--collation-server=${collation}`,
    '--default-time-zone=+00:00',
    '--max-allowed-packet=32M',
    ...durabilityOptions[durability],
  ];
}

/**
 * The statements that the server runs before it takes connections: our one account, at loopback only, with this
 * password. The administrator's accounts of a fresh data folder can come in through a socket alone, and there is none.
 */
export function initStatements(password: string, rights: Rights): string {
  if (!/^[\w-]+$/.test(password)) throw new Error('The database password has characters that need quoting.');
  const account = `'${accountName}'@'127.0.0.1'`;
  return [
    `CREATE DATABASE IF NOT EXISTS ${databaseName} CHARACTER SET utf8mb4 COLLATE ${collation};`,
    `CREATE USER IF NOT EXISTS ${account} IDENTIFIED BY '${password}';`,
    `ALTER USER ${account} IDENTIFIED BY '${password}';`,
    `GRANT ALL ON ${rights === 'all' ? '*' : databaseName}.* TO ${account};`,
    '',
  ].join('\n');
}
