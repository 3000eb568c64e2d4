import { execFileSync, spawnSync } from 'node:child_process';
import { StartError } from '../steps.mjs';

/** The system's user and group that a program runs as. */
export interface Account {
  readonly uid: number;
  readonly gid: number;
}

/**
 * Whom the database server runs as: the package's own user where we are root, which the server refuses to be;
 * ourselves (undefined) otherwise.
 */
export function serverAccount(): Account | undefined {
  if (process.getuid?.() !== 0) return undefined;
  const id = (flag: string): number =>
    Number(execFileSync('id', [flag, 'mysql'], { encoding: 'utf8', stdio: 'pipe' }));
  try {
    return { uid: id('-u'), gid: id('-g') };
  } catch (error) {
    throw new StartError(
      'There is no user “mysql” for the database server to run as, and it refuses to run as root.',
      'Run: adduser --system --group --no-create-home mysql',
      error,
    );
  }
}

/** Whether the account may enter the folder, through all those above it. */
export function canEnter(folder: string, account: Account | undefined): boolean {
  return spawnSync('test', ['-d', folder, '-a', '-x', folder], { ...account, stdio: 'ignore' }).status === 0;
}
