/**
 * The server as a process of its own, with a database that is there already: settings, database, application, listen,
 * graceful stop. `npm start` does the same in its own process, with the preparations of a first run.
 */
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ConfigError, readSettings } from './config.ts';
import { openDatabase, serve } from './start/serve.ts';
import { onStop, type Stops } from './start/stop.ts';

async function main(stops: Stops): Promise<void> {
  const settings = readSettings(process.env);
  const { databaseUrl, authSecret } = settings;
  if (databaseUrl === null || authSecret === null) {
    throw new ConfigError(
      Object.entries({ DATABASE_URL: databaseUrl, AUTH_SECRET: authSecret })
        .filter(([, value]) => value === null)
        .map(([name]) => ({ name, message: 'must be given here; only npm start makes its own' })),
    );
  }
  const { knex } = await openDatabase(databaseUrl);
  stops.add(() => knex.destroy());
  const built = join(fileURLToPath(new URL('..', import.meta.url)), '.build/client');
  const clientFolder = process.send === undefined && existsSync(built) ? built : null;
  const running = await serve({ settings, databaseUrl, authSecret, knex, clientFolder });
  stops.add(() => running.stop());
  process.send?.({ listening: running.port });
}

const stops = onStop();
void stops.guard(() => main(stops));
