import { spawn } from 'node:child_process';
import { accessSync, constants } from 'node:fs';
import { delimiter, join } from 'node:path';

/** Where programs lie that an ordinary user's PATH leaves out. */
const moreFolders = ['/usr/local/sbin', '/usr/local/bin', '/usr/sbin', '/usr/bin', '/sbin', '/bin'];

/**
 * The path of an installed program.
 * @param {string} name
 * @returns {string | undefined}
 */
export function findProgram(name) {
  const folders = [...(process.env.PATH ?? '').split(delimiter), ...moreFolders];
  return folders
    .filter((folder) => folder !== '')
    .map((folder) => join(folder, name))
    .find((path) => {
      try {
        accessSync(path, constants.X_OK);
        return true;
      } catch {
        return false;
      }
    });
}

/**
 * The command line that runs a program so that the kernel ends it (SIGTERM) when this process dies, even by SIGKILL.
 * Without util-linux' setpriv the program runs untied.
 * @param {string} command
 * @param {readonly string[]} args
 * @returns {[string, string[]]}
 */
export function tied(command, args) {
  const setpriv = findProgram('setpriv');
  return setpriv === undefined
    ? [command, [...args]]
    : [setpriv, ['--pdeathsig', 'TERM', '--', command, ...args]];
}

/**
 * Runs a program to its end and collects what it prints.
 * @param {string} command
 * @param {readonly string[]} args
 * @param {import('node:child_process').SpawnOptions} [options]
 * @returns {Promise<{code: number, output: string}>} code 127 where there is no such program
 */
export function run(command, args, options = {}) {
  return new Promise((resolve) => {
    const child = spawn(command, args, { ...options, stdio: ['ignore', 'pipe', 'pipe'] });
    let output = '';
    child.stdout.on('data', (data) => (output += data));
    child.stderr.on('data', (data) => (output += data));
    child.on('error', (error) => resolve({ code: 127, output: `${error.code}: ${error.message}` }));
    child.on('close', (code) => resolve({ code: code ?? 1, output }));
  });
}
