import { join } from 'node:path';
import type { Settings } from '../config.ts';
import { folderName, hold, type Holder } from './hold.mjs';
import { serverAccount } from './mariadb/account.ts';
import { startMariadb, type Mariadb } from './mariadb/server.ts';
import { mariadbServer, providePrograms } from './packages.ts';
import { choosePlace, type Place } from './place.ts';
import { keptSecret, longSecret } from './secrets.ts';
import { StartError, step } from './steps.mjs';
import type { Stops } from './stop.ts';

async function holdPlace(folder: string, state: () => Omit<Holder, 'pid'>): Promise<void> {
  const held = await hold(folderName(folder), { state, patient: (other) => other.ending === true });
  if (!('takenBy' in held)) return;
  const { pid, address } = held.takenBy;
  throw new StartError(
    `Ribwright already runs from this folder (process ${String(pid ?? 'unknown')}${address === undefined ? '' : `, ${address}`}).`,
    'Use that one, or end it with Ctrl-C in its terminal and start again.',
  );
}

function start(place: Place, binary: string): Promise<Mariadb> {
  return step('Starting the database', async (note) => {
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
}

function watch(server: Mariadb, place: Place, stops: Stops): void {
  stops.add(
    () => server.stop(),
    () => {
      server.ask();
    },
  );
  void server.ended.then(() => {
    if (stops.isEnding()) return;
    console.error(`\nThe database server has ended by itself; its log is ${place.folder}/mariadb/error.log.`);
    void stops.stop(1);
  });
}

/**
 * Starts the private database server of this checkout, installing MariaDB first where there is none.
 * @param state what to tell a second start in the same place
 * @throws {StartError} where one runs already, or it cannot be started
 */
export async function startOwnDatabase(
  root: string,
  settings: Settings,
  stops: Stops,
  state: () => Omit<Holder, 'pid'>,
): Promise<{ readonly server: Mariadb; readonly place: Place }> {
  // First of all: the account that it runs as comes with the package.
  const [binary = ''] = await providePrograms([mariadbServer]);
  const place = choosePlace(root, settings.dataFolder, serverAccount());
  await holdPlace(place.folder, state);
  const server = await start(place, binary);
  watch(server, place, stops);
  return { server, place };
}
