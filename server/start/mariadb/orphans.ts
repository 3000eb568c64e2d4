import { readdirSync, readFileSync } from 'node:fs';
import { basename } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';

/**
 * Whether a command line, as /proc gives it, is that of a MariaDB server on one of these data folders
 * (also while the program that ties it to its parent has not handed over yet).
 */
export function servesFolder(commandLine: string, dataFolders: readonly string[]): boolean {
  const args = commandLine.split('\0');
  const isServer =
    basename(args[0] ?? '') === 'mariadbd' ||
    (basename(args[0] ?? '') === 'setpriv' && args.some((arg) => basename(arg) === 'mariadbd'));
  return isServer && dataFolders.some((folder) => args.includes(`--datadir=${folder}`));
}

function commandLineOf(pid: string): string {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8');
  } catch {
    return '';
  }
}

/** The processes that serve one of the data folders: our own from a start that was killed, never another's. */
export function findServers(dataFolders: readonly string[]): number[] {
  let entries: string[];
  try {
    entries = readdirSync('/proc');
  } catch {
    return [];
  }
  return entries
    .filter((name) => /^\d+$/.test(name) && servesFolder(commandLineOf(name), dataFolders))
    .map(Number);
}

function signal(pid: number, name: NodeJS.Signals): void {
  try {
    process.kill(pid, name);
  } catch {
    // It ended in between.
  }
}

/**
 * Ends the servers on these data folders: asked first, killed when they have not ended in time, which InnoDB's
 * recovery makes good. Without this a new server would wait half a minute for the files.
 * @returns how many there were
 */
export async function endServers(dataFolders: readonly string[], patienceMs = 15_000): Promise<number> {
  const found = findServers(dataFolders);
  for (const pid of found) signal(pid, 'SIGTERM');
  for (const end = Date.now() + patienceMs; findServers(dataFolders).length > 0;) {
    if (Date.now() > end) for (const pid of findServers(dataFolders)) signal(pid, 'SIGKILL');
    await pause(30);
  }
  return found.length;
}
