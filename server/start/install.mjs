import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { folderName, hold } from './hold.mjs';
import { run, tied } from './processes.mjs';
import { adviceFor, StartError, step } from './steps.mjs';

/** @param {string} version as in process.versions.node @param {string} needed such as “>=20.19” */
export function isNodeNewEnough(version, needed) {
  const [major, minor] = version.split('.').map(Number);
  const [least, leastMinor = 0] = needed.replace(/^>=/, '').split('.').map(Number);
  return major > least || (major === least && minor >= leastMinor);
}

/**
 * Whether what npm has installed (its hidden lock) is what the lock asks for; packages for other platforms may be absent.
 * @param {{packages: Record<string, {version?: string, optional?: boolean}>}} lock
 * @param {{packages: Record<string, {version?: string}>}} installed
 */
export function isInstalled(lock, installed) {
  return Object.entries(lock.packages).every(([path, wanted]) => {
    const found = installed.packages[path];
    return path === '' || (found === undefined ? wanted.optional === true : found.version === wanted.version);
  });
}

/** @param {string} path */
const readJson = (path) => JSON.parse(readFileSync(path, 'utf8'));

/** @param {string} root */
function upToDate(root, sum) {
  const mark = join(root, 'node_modules/.ribwright-lock');
  if (existsSync(mark) && readFileSync(mark, 'utf8') === sum) return true;
  const installed = join(root, 'node_modules/.package-lock.json');
  if (!existsSync(installed) || !isInstalled(readJson(join(root, 'package-lock.json')), readJson(installed)))
    return false;
  writeFileSync(mark, sum);
  return true;
}

/** @param {string} root */
function npmCi(root) {
  const args = ['ci', '--include=dev', '--no-audit', '--no-fund'];
  const npm = process.env.npm_execpath ?? '';
  const [command, all] = npm.endsWith('npm-cli.js') ? [process.execPath, [npm, ...args]] : ['npm', args];
  return run(...tied(command, all), { cwd: root });
}

/** @param {string} output of an npm that failed: its first lines say what, the rest is its own stack */
function npmFailure(output) {
  const lines = output.split('\n').filter((line) => /^npm (error|ERR!)/.test(line));
  const refused = output.includes('ECONNREFUSED') ? adviceFor('ENOTFOUND') : undefined;
  return new StartError(
    `npm ci failed:\n${(lines.length > 0 ? lines : output.trim().split('\n')).slice(0, 5).join('\n')}`,
    refused ?? adviceFor(output) ?? 'Run npm ci by hand to see all it says.',
  );
}

/**
 * Checks Node's version and installs the packages when they are missing or the lock has changed since.
 * @param {string} root the checkout
 */
export async function install(root) {
  const { engines } = readJson(join(root, 'package.json'));
  if (!isNodeNewEnough(process.versions.node, engines.node)) {
    throw new StartError(
      `Node.js ${process.versions.node} is too old.`,
      `Install Node.js ${engines.node.replace('>=', '')} or newer, and start again.`,
    );
  }
  const mark = () =>
    createHash('sha256')
      .update(readFileSync(join(root, 'package-lock.json')))
      .digest('hex');
  if (upToDate(root, mark())) return;
  await step('Installing the packages (about a minute)', async (note) => {
    const held = await hold(`install-${folderName(root)}`, { patient: () => true, patienceMs: 300_000 });
    if ('takenBy' in held) {
      throw new StartError(
        `Another process (${held.takenBy.pid}) is installing the packages here and does not come to an end.`,
        'End it and start again.',
      );
    }
    try {
      if (upToDate(root, mark())) return note('another process has just installed them');
      const { code, output } = await npmCi(root);
      if (code !== 0) throw npmFailure(output);
      writeFileSync(join(root, 'node_modules/.ribwright-lock'), mark());
    } finally {
      held.release();
    }
  });
}
