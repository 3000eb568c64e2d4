import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { promisify, stripVTControlCharacters } from 'node:util';
import { brotliCompress } from 'node:zlib';
import { folderName, hold } from './hold.mjs';
import { StartError, step } from './steps.mjs';

/** At zlib's own quality for brotli, the highest. */
const compress = promisify(brotliCompress);

/** What the built client depends on. */
const sources = [
  'client',
  'geometry',
  'server/contracts',
  'server/start/client-build.ts',
  'public',
  'vite.config.ts',
  'tsconfig.json',
  'package.json',
  'package-lock.json',
];

function filesUnder(root: string, path: string): string[] {
  const full = join(root, path);
  if (!existsSync(full)) return [];
  if (!statSync(full).isDirectory()) return [path];
  return readdirSync(full).flatMap((name) => filesUnder(root, join(path, name)));
}

/** The sum over the names and contents of all files under these paths: another when any of them changes. */
export function sumOf(root: string, paths: readonly string[] = sources): string {
  const sum = createHash('sha256');
  const files = paths.flatMap((path) => filesUnder(root, path)).sort();
  for (const file of files) {
    const content = readFileSync(join(root, file));
    sum.update(`${file}\0${String(content.length)}\0`).update(content);
  }
  return sum.digest('hex');
}

/** Whether the client was built from these very sources. */
export function isBuilt(root: string, sum: string): boolean {
  const mark = join(root, '.build/client.sum');
  return (
    existsSync(join(root, '.build/client/index.html')) &&
    existsSync(mark) &&
    readFileSync(mark, 'utf8') === sum
  );
}

async function build(root: string): Promise<void> {
  const { build: viteBuild } = await import('vite');
  await viteBuild({
    root: join(root, 'client'),
    configFile: join(root, 'vite.config.ts'),
    mode: 'production',
    logLevel: 'silent',
    build: { outDir: join(root, '.build/client.new'), emptyOutDir: true },
  });
  await compressAssets(join(root, '.build/client.new/assets'));
}

/** Lays the brotli form beside each script and style: smaller than what can be made while somebody waits for it. */
async function compressAssets(folder: string): Promise<void> {
  const names = readdirSync(folder).filter((name) => /\.(?:js|css)$/.test(name));
  await Promise.all(
    names.map(async (name) => {
      const file = join(folder, name);
      writeFileSync(`${file}.br`, await compress(readFileSync(file)));
    }),
  );
}

/** Puts the new build in the old one's place, so that a build that breaks off leaves that whole. */
function exchange(root: string, sum: string): void {
  const mark = join(root, '.build/client.sum');
  rmSync(mark, { force: true });
  rmSync(join(root, '.build/client'), { recursive: true, force: true });
  renameSync(join(root, '.build/client.new'), join(root, '.build/client'));
  writeFileSync(mark, sum);
}

/**
 * Builds the client unless it is built from the same sources already.
 * @returns the folder to serve
 */
export async function buildClient(root: string): Promise<string> {
  const folder = join(root, '.build/client');
  const sum = sumOf(root);
  if (isBuilt(root, sum)) return folder;
  const held = await hold(`build-${folderName(root)}`, { patient: () => true, patienceMs: 300_000 });
  if ('takenBy' in held)
    throw new StartError('Another process builds the client and does not end.', 'End it and start again.');
  try {
    if (!isBuilt(root, sum)) await buildAnew(root, sum);
  } finally {
    held.release();
  }
  return folder;
}

async function buildAnew(root: string, sum: string): Promise<void> {
  await step('Building the client', async () => {
    // React's development build would be taken in otherwise.
    const environment = process.env['NODE_ENV'];
    process.env['NODE_ENV'] = 'production';
    try {
      await build(root);
      exchange(root, sum);
    } catch (error) {
      const text = stripVTControlCharacters(error instanceof Error ? error.message : String(error));
      throw new StartError(
        `The client could not be built:\n${text.split('\n').slice(0, 30).join('\n')}`,
        'Set right what the message names, and start again.',
        error,
      );
    } finally {
      if (environment === undefined) delete process.env['NODE_ENV'];
      else process.env['NODE_ENV'] = environment;
    }
  });
}
