import { chmodSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startMariadb } from '#server/start/mariadb/server.ts';
import { canEnter, serverAccount } from '#server/start/mariadb/account.ts';
import { mariadbServer, providePrograms } from '#server/start/packages.ts';
import { longSecret } from '#server/start/secrets.ts';

/** A MariaDB server for one run of tests or measurements. */
interface Throwaway {
  /** With an account that may make and drop databases; the path names a database to start from. */
  readonly url: string;
  /** Ends the server and removes its files. */
  remove(): Promise<void>;
}

const prefix = 'ribwright-test-';

function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error instanceof Error && 'code' in error && error.code === 'EPERM';
  }
}

/** Removes from a folder what killed runs have left there; their servers ended with them. */
export function sweep(folder: string): void {
  for (const name of readdirSync(folder)) {
    const pid = new RegExp(`^${prefix}(\\d+)-`).exec(name)?.[1];
    if (pid !== undefined && !isAlive(Number(pid)))
      rmSync(join(folder, name), { recursive: true, force: true });
  }
}

/** Starts a server on fresh data in the system's folder for temporary files, with fast and unsafe settings. */
export async function startThrowaway(): Promise<Throwaway> {
  const [binary = ''] = await providePrograms([mariadbServer]);
  const folder = canEnter(tmpdir(), serverAccount()) ? tmpdir() : '/tmp';
  sweep(folder);
  const home = mkdtempSync(join(folder, `${prefix}${String(process.pid)}-`));
  // The server's own folder is below; this one lets its account through.
  chmodSync(home, 0o711);
  const server = await startMariadb({
    folder: join(home, 'mariadb'),
    binary,
    password: longSecret(),
    durability: 'throwaway',
    rights: 'all',
  });
  return {
    url: server.url,
    remove: async () => {
      await server.stop();
      rmSync(home, { recursive: true, force: true });
    },
  };
}
