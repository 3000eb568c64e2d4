/** What MariaDB, its driver and the pool say, in our own terms; nothing else in the program knows their codes. */

const busy = new Set(['ER_LOCK_DEADLOCK', 'ER_LOCK_WAIT_TIMEOUT', 'ER_CHECKREAD']);

const away = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'EPIPE',
  'ETIMEDOUT',
  'EHOSTUNREACH',
  'ENETUNREACH',
  'ENOENT',
  'ENOTFOUND',
  'EAI_AGAIN',
  'PROTOCOL_CONNECTION_LOST',
  'ER_CON_COUNT_ERROR',
  'ER_TOO_MANY_USER_CONNECTIONS',
  'ER_SERVER_SHUTDOWN',
  'ER_NORMAL_SHUTDOWN',
  'ER_CONNECTION_KILLED',
  'ER_QUERY_INTERRUPTED',
  'ER_OPTION_PREVENTS_STATEMENT',
  'ER_DISK_FULL',
  'ER_RECORD_FILE_FULL',
]);

function codeOf(error: unknown): string {
  if (!(error instanceof Error) || !('code' in error)) return '';
  return String(error.code);
}

/** Two writers got in each other's way; the same transaction can be tried again. */
export function isLockConflict(error: unknown): boolean {
  return busy.has(codeOf(error));
}

/** The database cannot be reached or cannot work at the moment; later it may. */
export function isUnavailable(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  const poolIsDry = error.name === 'KnexTimeoutError' || error.message === 'aborted';
  const closed = error.message.includes('closed state') || error.message === 'Unable to acquire a connection';
  return poolIsDry || closed || away.has(codeOf(error));
}

/** A unique key of that name already holds this value. */
export function isDuplicate(error: unknown, keyName: string): boolean {
  return codeOf(error) === 'ER_DUP_ENTRY' && (error as Error).message.includes(`'${keyName}'`);
}
