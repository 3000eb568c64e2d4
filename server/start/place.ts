import { createHash } from 'node:crypto';
import { chmodSync, existsSync, mkdirSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { canEnter, type Account } from './mariadb/account.ts';
import { StartError } from './steps.mjs';

/** Where a start keeps its database and secrets. */
export interface Place {
  readonly folder: string;
  /** Why it is not the usual folder, for the reader. */
  readonly remark: string | null;
}

/** The folder used in place of .data where the server's account cannot come to that; one for each checkout. */
export function farFolder(root: string): string {
  return `/var/lib/ribwright-${createHash('sha256').update(root).digest('hex').slice(0, 12)}`;
}

function prepare(folder: string): string {
  mkdirSync(folder, { recursive: true });
  // Others may pass through to the database's own folder, which is closed to them, but not look around.
  chmodSync(folder, 0o711);
  return folder;
}

/** What decides between the checkout's folder and the far one. */
interface Circumstances {
  /** DATA_DIR names the folder. */
  readonly isGiven: boolean;
  readonly canEnterNear: boolean;
  readonly nearHasData: boolean;
  readonly farHasData: boolean;
}

/** The decision of `choosePlace`; null where neither will do. */
export function nearOrFar(circumstances: Circumstances): 'near' | 'far' | null {
  const { isGiven, canEnterNear, nearHasData, farHasData } = circumstances;
  if (!isGiven && farHasData) return 'far';
  if (canEnterNear) return 'near';
  return isGiven || nearHasData ? null : 'far';
}

/**
 * Chooses the folder: DATA_DIR, else .data in the checkout, else (where the server's account cannot enter that, as
 * below a closed home folder) one under /var/lib. Data once made are never left behind for a new place.
 * @throws {StartError} where a folder with data, or the one asked for, can't be entered
 */
export function choosePlace(root: string, given: string | null, account: Account | undefined): Place {
  const near = prepare(resolve(root, given ?? '.data'));
  const far = farFolder(root);
  const choice = nearOrFar({
    isGiven: given !== null,
    canEnterNear: canEnter(near, account),
    nearHasData: existsSync(join(near, 'mariadb', 'data')),
    farHasData: existsSync(join(far, 'mariadb', 'data')),
  });
  if (choice === 'near') return { folder: near, remark: null };
  if (choice === 'far') {
    const remark = `The user “mysql” cannot enter this checkout, so the data are under ${far}.`;
    return { folder: prepare(far), remark };
  }
  throw new StartError(
    `The database server runs as the user “mysql”, who cannot enter ${near}.`,
    'Let others pass through the folders above it (chmod o+x), or set DATA_DIR to another folder.',
  );
}
