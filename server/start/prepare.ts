import { join } from 'node:path';
import type { Knex } from 'knex';
import { readSettings, type Settings } from '../config.ts';
import { alignDemoPassword, demoAddresses } from './demo-accounts.ts';
import { folderName, hold, type Holder } from './hold.mjs';
import { serverAccount } from './mariadb/account.ts';
import { startMariadb, type Mariadb } from './mariadb/server.ts';
import { mariadbServer, providePrograms } from './packages.ts';
import { choosePlace, type Place } from './place.ts';
import { keptSecret, longSecret, readablePassword } from './secrets.ts';
import { assertPortFree, openDatabase } from './serve.ts';
import { StartError, step } from './steps.mjs';
import type { Stops } from './stop.ts';

/** What the launcher hands to each kind of start. */
export interface Launch {
  /** The checkout. */
  readonly root: string;
  /** When the launch began, on the clock of `performance`. */
  readonly begun: number;
  readonly environment: NodeJS.ProcessEnv;
}

/** All that must be there before the application can listen. */
export interface Prepared {
  readonly settings: Settings;
  readonly databaseUrl: string;
  readonly authSecret: string;
  readonly knex: Knex;
  /** Null without the demo workshop. */
  readonly demoPassword: string | null;
  /** Tells a second start in the same place where this one serves. */
  announce(address: string): void;
}

async function holdPlace(folder: string, state: () => Omit<Holder, 'pid'>): Promise<void> {
  const held = await hold(folderName(folder), { state, patient: (other) => other.ending === true });
  if (!('takenBy' in held)) return;
  const { pid, address } = held.takenBy;
  throw new StartError(
    `Ribwright already runs from this folder (process ${String(pid ?? 'unknown')}${address === undefined ? '' : `, ${address}`}).`,
    'Use that one, or end it with Ctrl-C in its terminal and start again.',
  );
}

async function startPrivate(place: Place, stops: Stops): Promise<Mariadb> {
  const [binary = ''] = await providePrograms([mariadbServer]);
  const server = await step('Starting the database', async (note) => {
    if (place.remark !== null) console.log(`  ${place.remark}`);
    const started = await startMariadb({
      folder: join(place.folder, 'mariadb'),
      binary,
      password: keptSecret(place.folder, 'database-password', longSecret),
      durability: 'safe',
      rights: 'one database',
    });
    const before = started.orphansEnded > 0 ? ', after ending the one that a killed start had left' : '';
    note(`MariaDB on port ${String(started.port)}${started.isNew ? ', new' : ''}${before}`);
    return started;
  });
  stops.add(
    () => server.stop(),
    () => {
      server.ask();
    },
  );
  void server.ended.then(() => {
    if (stops.isEnding()) return;
    console.error(
      `\nThe database server has ended by itself; its log is in ${place.folder}/mariadb/error.log.`,
    );
    void stops.stop(1);
  });
  return server;
}

async function fill(knex: Knex, password: string): Promise<void> {
  const { isEmpty, seedDemo } = await import('./demo/seed.ts');
  if (await isEmpty(knex)) return step('Filling in the demo workshop', () => seedDemo(knex, password));
  const changed = await alignDemoPassword(knex, password);
  if (changed.length > 0) console.log(`- The demo accounts have a new password: ${changed.join(', ')}`);
}

/**
 * Brings everything up to the point of listening: settings, database, tables, demo workshop.
 * @throws {ConfigError | StartError} saying what is wrong and what to do
 */
export async function prepare({ root, environment }: Launch, stops: Stops): Promise<Prepared> {
  const settings = readSettings(environment);
  let server: Mariadb | undefined;
  let address: string | undefined;
  await assertPortFree(settings);
  // Chosen when first needed: with everything given there is nothing to keep.
  let chosen: Place | undefined;
  const isPrivate = settings.databaseUrl === null;
  const place = (): Place =>
    (chosen ??= choosePlace(root, settings.dataFolder, isPrivate ? serverAccount() : undefined));
  if (isPrivate) {
    await holdPlace(place().folder, () => ({ ...(address && { address }), ending: stops.isEnding() }));
    server = await startPrivate(place(), stops);
  }
  const databaseUrl = settings.databaseUrl ?? server?.url ?? '';
  const { knex } = await step('Bringing the tables up to date', async (note) => {
    const opened = await openDatabase(databaseUrl);
    note(opened.ran.length === 0 ? 'nothing to do' : `${String(opened.ran.length)} migrations`);
    return opened;
  });
  stops.add(() => knex.destroy());
  const demoPassword = settings.demo
    ? (settings.demoPassword ?? keptSecret(place().folder, 'demo-password', readablePassword))
    : null;
  if (demoPassword !== null) await fill(knex, demoPassword);
  server?.keep();
  return {
    settings,
    databaseUrl,
    authSecret: settings.authSecret ?? keptSecret(place().folder, 'auth-secret', longSecret),
    knex,
    demoPassword,
    announce: (where) => {
      address = where;
    },
  };
}

/** The words at the end of a start. */
export function greet(address: string, begun: number, demoPassword: string | null): void {
  const took = ((performance.now() - begun) / 1000).toFixed(1);
  console.log(`\nRibwright is ready at ${address} (after ${took} s). Ctrl-C ends it.`);
  if (demoPassword === null) return;
  console.log(`\nDemo accounts, all with the password ${demoPassword}`);
  for (const address of demoAddresses) console.log(`  ${address}`);
}
