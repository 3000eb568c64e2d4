import { createHash } from 'node:crypto';
import { readFileSync, statSync } from 'node:fs';
import { connect, createServer } from 'node:net';

/**
 * The name that a folder goes by on this machine: from its path and from the folder itself, so that two containers
 * with the same path do not collide.
 * @param {string} folder
 */
export function folderName(folder) {
  const { dev, ino } = statSync(folder);
  return createHash('sha256').update(`${folder}\n${dev}\n${ino}`).digest('hex').slice(0, 16);
}

/** @param {string} address */
function ask(address) {
  return new Promise((resolve) => {
    let answer = '';
    const socket = connect({ path: address });
    socket.setTimeout(1000, () => socket.destroy());
    socket.on('data', (data) => (answer += data));
    socket.on('error', () => undefined);
    socket.on('close', () => {
      try {
        resolve(JSON.parse(answer));
      } catch {
        resolve(undefined);
      }
    });
  });
}

/** @param {string} address @param {() => object} state */
function listen(address, state) {
  return new Promise((resolve, reject) => {
    const server = createServer((socket) => {
      socket.on('error', () => undefined);
      socket.end(JSON.stringify({ pid: process.pid, ...state() }));
    });
    server.once('error', reject);
    server.listen({ path: address }, () => {
      server.unref();
      resolve(server);
    });
  });
}

/**
 * Takes a name that only one process may hold at a time. It is a socket in Linux' abstract name space, which the
 * kernel lets go with the process however that ends: nothing stale is left to be cleaned up.
 * @param {string} name
 * @param {object} [options]
 * @param {() => object} [options.state] what to tell those who find the name taken
 * @param {(other: {pid?: number, address?: string, ending?: boolean}) => boolean} [options.patient] whether to wait for that holder
 * @param {number} [options.patienceMs] for how long
 * @returns {Promise<{release(): void} | {takenBy: {pid?: number, address?: string, ending?: boolean}}>}
 */
export async function hold(name, { state = () => ({}), patient = () => false, patienceMs = 30_000 } = {}) {
  const address = `\0ribwright-${name}`;
  const begun = Date.now();
  for (;;) {
    try {
      const server = await listen(address, state);
      return { release: () => server.close() };
    } catch (error) {
      if (error.code !== 'EADDRINUSE') throw error;
      const other = await ask(address);
      // No answer: it has just let go, or is too busy; which, the next attempts tell.
      const silent = other === undefined && Date.now() < begun + 2000;
      if (!silent && (Date.now() > begun + patienceMs || !patient(other ?? {})))
        return { takenBy: other ?? {} };
      await new Promise((resolve) => setTimeout(resolve, 100));
    }
  }
}

/** @param {number | string} pid @returns {{name: string, parent: number, born: string} | undefined} */
function processAt(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8')
      .replace(/^.*\) /s, '')
      .split(' ');
    // Killed, and not yet taken note of by its parent.
    if (stat[0] === 'Z' || stat[0] === 'X') return undefined;
    return { name: readFileSync(`/proc/${pid}/cmdline`, 'utf8'), parent: Number(stat[1]), born: stat[19] };
  } catch {
    return undefined;
  }
}

/**
 * Finds the npm that started this process, if one did, and tells whether it is gone: it passes signals on, so it was
 * killed, and without a look at it the program would live on unseen.
 * @returns {() => boolean}
 */
export function npmWatch() {
  if (process.env.npm_lifecycle_event === undefined) return () => false;
  for (let pid = process.ppid, up = 0; pid > 1 && up < 4; up += 1) {
    const found = processAt(pid);
    if (found === undefined) break;
    if (/^npm\b|\bnpm(-cli\.js)?\0/.test(found.name)) return () => processAt(pid)?.born !== found.born;
    pid = found.parent;
  }
  return () => false;
}
