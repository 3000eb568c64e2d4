/** A start that cannot go on: the message is one sentence, the advice says what to do. */
export class StartError extends Error {
  /**
   * @param {string} message what went wrong
   * @param {string} advice what the reader can do about it
   * @param {unknown} [cause] the error behind it
   */
  constructor(message, advice, cause) {
    super(message, { cause });
    this.name = 'StartError';
    this.advice = advice;
  }
}

/** Known causes: what their text looks like, and what helps. The first that fits counts. */
const causes = [
  [
    /log_bin_trust_function_creators/i,
    'Its binary log is on: set log_bin_trust_function_creators=1 on that MariaDB server, and start again.',
  ],
  [
    /command denied to user/i,
    'The database account lacks a right: GRANT ALL PRIVILEGES on this database gives what is needed, TRIGGER among it.',
  ],
  [
    /ENOSPC|no space left|disk full|errcode: 28|error:? 28/i,
    'The disk is full: free at least 1 GB and start again.',
  ],
  [/EDQUOT/, 'The disk quota is used up: free at least 1 GB and start again.'],
  [
    /EADDRINUSE/,
    'The port is taken: end the program that holds it, or set PORT to a free one, such as PORT=8080 npm start.',
  ],
  [
    /ENOTFOUND|EAI_AGAIN|ECONNRESET|ETIMEDOUT|ENETUNREACH|ERR_SOCKET_TIMEOUT|EIDLETIMEOUT|temporary failure resolving|could not connect|could not resolve|failed to fetch/i,
    'The package server is out of reach: check the network and the proxy settings, and start again.',
  ],
  [/EUSAGE|in sync/, 'package.json and package-lock.json disagree: run npm install, and start again.'],
  [
    /could not get lock|unable to lock the administration/i,
    'Another installation is running: wait for it to end.',
  ],
  [
    /EACCES|EPERM|EROFS|permission denied|errcode: 13|read-only file system/i,
    'No permission: start as the owner of this folder, and check that it may be written to.',
  ],
  [/ECONNREFUSED/, 'Nothing answers there: check that the server runs and that the address is right.'],
];

/**
 * The advice that fits an error, by its code and text.
 * @param {unknown} error
 * @returns {string | undefined}
 */
export function adviceFor(error) {
  const text = error instanceof Error ? `${error.code ?? ''} ${error.message}` : String(error);
  return causes.find(([pattern]) => pattern.test(text))?.[1];
}

const seconds = (since) => `${((performance.now() - since) / 1000).toFixed(1)} s`;

/**
 * Runs one step of the start: says what it does, then how long it took.
 * @template T
 * @param {string} title
 * @param {(note: (text: string) => void) => Promise<T> | T} work may replace the words printed at its end
 * @returns {Promise<T>}
 */
export async function step(title, work) {
  const begun = performance.now();
  let done = 'done';
  console.log(`- ${title} …`);
  try {
    const result = await work((text) => {
      done = text;
    });
    console.log(`  ${done} (${seconds(begun)})`);
    return result;
  } catch (error) {
    console.log(`  failed (${seconds(begun)})`);
    throw error;
  }
}

/**
 * Prints why the start failed and what to do: an error's own `advice`, or what is known about its like.
 * @param {unknown} error
 */
export function explain(error) {
  const known = typeof error?.advice === 'string';
  const advice = known ? error.advice : adviceFor(error);
  // Without advice, where it happened is the best help; the stack begins with the message.
  const what = (advice === undefined && error?.stack) || (error?.message ?? String(error));
  console.error(known ? `\n${what}` : `\nThe start failed: ${what}`);
  if (advice !== undefined) console.error(advice);
}
