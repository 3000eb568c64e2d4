import type { Knex } from 'knex';
import { addressOf, defaultPort, readSettings, type Settings } from '../config.ts';
import { alignDemoPassword, demoAddresses, hasDemoAccounts } from './demo-accounts.ts';
import type { Holder } from './hold.mjs';
import { startOwnDatabase } from './own-database.ts';
import { choosePlace } from './place.ts';
import { keptSecret, longSecret, readablePassword } from './secrets.ts';
import { assertPortFree, openDatabase } from './serve.ts';
import { step } from './steps.mjs';
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
interface Prepared {
  readonly settings: Settings;
  readonly databaseUrl: string;
  readonly authSecret: string;
  readonly knex: Knex;
  /** Null without the demo workshop. */
  readonly demoPassword: string | null;
  /** Tells a second start in the same place where this one serves. */
  announce(address: string): void;
}

/** Where people will reach the program, as far as it is known before it listens. */
function expectedUrl({ publicUrl, host, port }: Settings): string {
  return publicUrl ?? addressOf(host, port ?? defaultPort);
}

/** Fills an empty database. Returns whether the demo workshop is there now. */
async function fill(knex: Knex, password: string, publicUrl: string): Promise<boolean> {
  const { isEmpty, seedDemo } = await import('./demo/seed.ts');
  if (await isEmpty(knex)) {
    await step('Filling in the demo workshop', () => seedDemo(knex, password, new Date(), publicUrl));
    return true;
  }
  if (!(await hasDemoAccounts(knex))) {
    console.log('- The database was begun without the demo workshop, and stays so');
    return false;
  }
  const changed = await alignDemoPassword(knex, password);
  if (changed.length > 0) console.log(`- The demo accounts have a new password: ${changed.join(', ')}`);
  return true;
}

/**
 * Brings everything up to the point of listening: settings, database, tables, demo workshop.
 * @throws {ConfigError | StartError} saying what is wrong and what to do
 */
export async function prepare({ root, environment }: Launch, stops: Stops): Promise<Prepared> {
  const settings = readSettings(environment);
  await assertPortFree(settings);
  let address: string | undefined;
  const state = (): Omit<Holder, 'pid'> => ({ ...(address && { address }), ending: stops.isEnding() });
  const own =
    settings.databaseUrl === null ? await startOwnDatabase(root, settings, stops, state) : undefined;
  const databaseUrl = settings.databaseUrl ?? own?.server.url ?? '';
  // Needed only where something is to be made and kept: with everything given, nothing is.
  const keepsSecrets = settings.authSecret === null || (settings.demo && settings.demoPassword === null);
  const place = own?.place ?? (keepsSecrets ? choosePlace(root, settings.dataFolder, undefined) : undefined);
  const kept = (name: string, make: () => string): string => keptSecret(place?.folder ?? '', name, make);
  const { knex } = await step('Bringing the tables up to date', async (note) => {
    const opened = await openDatabase(databaseUrl);
    note(opened.ran.length === 0 ? 'nothing to do' : `${String(opened.ran.length)} migrations`);
    return opened;
  });
  stops.add(() => knex.destroy());
  const wanted = settings.demo ? (settings.demoPassword ?? kept('demo-password', readablePassword)) : null;
  const demoPassword = wanted !== null && (await fill(knex, wanted, expectedUrl(settings))) ? wanted : null;
  own?.server.keep();
  return {
    settings,
    databaseUrl,
    authSecret: settings.authSecret ?? kept('auth-secret', longSecret),
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
