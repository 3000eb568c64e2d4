import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { chromium, mariadbServer, providePrograms } from '#server/start/packages.ts';
import { run, tied } from '#server/start/processes.mjs';
import { step } from '#server/start/steps.mjs';
import { onStop } from '#server/start/stop.ts';
import { countReport, reportSchema, sumOfCounts, type Count, type Report } from './report.ts';
import { startThrowaway } from './throwaway.ts';

/** The projects of the Vitest configuration, each with the files of tests/ that are its own. */
const projects = {
  geometry: /^(?:geometry|reference|structure)\//,
  'client-logic': /^client\/.*\.ts$/,
  client: /^client\/.*\.tsx$/,
  start: /^server\/start\//,
  server: /^server\/(?!start\/)/,
  browser: /^browser\//,
} as const;

type Project = keyof typeof projects;

/** Paths of all test files below tests/. */
function allTestFiles(root: string): string[] {
  return readdirSync(join(root, 'tests'), { recursive: true, encoding: 'utf8' }).filter((name) =>
    /\.(test|spec)\.\w+$/.test(name),
  );
}

function testFiles(root: string, project: Project): string[] {
  return allTestFiles(root)
    .filter((name) => projects[project].test(name))
    .map((name) => join(root, 'tests', name));
}

/** Test files that lie in no project's folder and would never be run. */
function strayFiles(root: string): Count {
  const owners = Object.values(projects);
  const stray = allTestFiles(root).filter((name) => !owners.some((own) => own.test(name)));
  return {
    passed: 0,
    failed: stray.length,
    reasons: stray.map((name) => `tests/${name}: in no project's folder`),
  };
}

function readReport(path: string): Report | undefined {
  return existsSync(path) ? reportSchema.parse(JSON.parse(readFileSync(path, 'utf8'))) : undefined;
}

/** Runs Vitest with its output passed through. */
async function vitest(
  root: string,
  name: string,
  args: readonly string[],
  expected: readonly string[],
): Promise<Count> {
  const report = join(root, '.build', `tests-${name}.json`);
  mkdirSync(join(root, '.build'), { recursive: true });
  rmSync(report, { force: true });
  const options = ['--config', '.config/vitest.config.ts', '--reporter=default', '--reporter=json'];
  const command = [
    'node_modules/vitest/vitest.mjs',
    'run',
    ...options,
    `--outputFile.json=${report}`,
    ...args,
  ];
  const child = spawn(...tied(process.execPath, command), {
    cwd: root,
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  const code = await new Promise<number>((resolve) => {
    child.once('error', () => {
      resolve(1);
    });
    child.once('exit', (exitCode) => {
      resolve(exitCode ?? 1);
    });
  });
  return countReport(readReport(report), code, expected);
}

function vitestProjects(root: string, names: readonly Project[]): Promise<Count> {
  const empty = names.filter((name) => testFiles(root, name).length === 0);
  const expected = names.flatMap((name) => testFiles(root, name));
  const args = names.filter((name) => !empty.includes(name)).flatMap((name) => ['--project', name]);
  const missing: Count = {
    passed: 0,
    failed: empty.length,
    reasons: empty.map((name) => `The project ${name} has no tests`),
  };
  if (args.length === 0) return Promise.resolve(missing);
  return vitest(root, names.join('-'), args, expected).then((count) => sumOfCounts([missing, count]));
}

/** Runs one of package.json's scripts and counts it as one; its output is shown at the end if it fails. */
async function script(root: string, name: string): Promise<Count> {
  const begun = performance.now();
  const { code, output } = await run(...tied('npm', ['run', '--silent', name]), { cwd: root });
  const took = ((performance.now() - begun) / 1000).toFixed(1);
  console.log(`- npm run ${name}: ${code === 0 ? 'passed' : 'failed'} (${took} s)`);
  if (code === 0) return { passed: 1, failed: 0, reasons: [] };
  return { passed: 0, failed: 1, reasons: [`npm run ${name} failed:\n${output.trim()}`] };
}

/** All that needs no browser. */
const FAST = ['geometry', 'client-logic', 'client', 'start', 'server'] as const;

async function checkAll(root: string): Promise<Count> {
  // The browser tests wait for real time to pass, so nothing else competes with them.
  const scripts = script(root, 'types').then(async (types) =>
    sumOfCounts([types, await script(root, 'lint')]),
  );
  const fast = await vitestProjects(root, FAST);
  const checked = await scripts;
  return sumOfCounts([strayFiles(root), checked, fast, await vitestProjects(root, ['browser'])]);
}

/**
 * Sets up what the tests need, runs everything, and removes it again. With arguments for Vitest, only Vitest with these.
 * @returns the numbers for the last line
 */
export async function runAll(root: string, args: readonly string[]): Promise<Count> {
  const begun = performance.now();
  const stops = onStop(130);
  await providePrograms([mariadbServer, chromium]);
  const server = await step('Starting a throw-away database', startThrowaway);
  stops.add(() => server.remove());
  process.env['TEST_DATABASE_URL'] = server.url;
  try {
    const count = args.length > 0 ? await vitest(root, 'chosen', args, []) : await checkAll(root);
    for (const reason of count.reasons) console.log(`\n${reason}`);
    console.log(`\nAll of it took ${((performance.now() - begun) / 1000).toFixed(0)} s.`);
    return count;
  } finally {
    if (!stops.isEnding()) await server.remove();
  }
}
