import { findProgram, run } from './processes.mjs';
import { adviceFor, StartError, step } from './steps.mjs';

/** A program that Debian provides: the name of the binary and of the package that holds it. */
interface Program {
  readonly binary: string;
  readonly package: string;
}

export const mariadbServer: Program = { binary: 'mariadbd', package: 'mariadb-server' };
export const chromium: Program = { binary: 'chromium', package: 'chromium' };

/** How to become root: by being it, by sudo without a password, or not at all. */
async function asRoot(): Promise<readonly string[] | undefined> {
  if (process.getuid?.() === 0) return ['env'];
  const { code } = await run('sudo', ['-n', 'true']);
  return code === 0 ? ['sudo', '-n', 'env'] : undefined;
}

async function installPackages(names: readonly string[]): Promise<void> {
  const byHand = `Run: sudo apt-get update && sudo apt-get install -y ${names.join(' ')}`;
  const root = findProgram('apt-get') === undefined ? undefined : await asRoot();
  if (root === undefined) {
    throw new StartError(`${names.join(' and ')} must be installed, which takes root’s rights.`, byHand);
  }
  const apt = (...args: string[]) =>
    run(root[0] ?? 'env', [
      ...root.slice(1),
      'DEBIAN_FRONTEND=noninteractive',
      'apt-get',
      '-o',
      'DPkg::Lock::Timeout=120',
      ...args,
    ]);
  // A third-party list that cannot be fetched fails the update; the installation may work all the same.
  const update = await apt('update');
  const { code, output } = await apt('install', '-y', '--no-install-recommends', ...names);
  if (code === 0) return;
  const said = `${update.code === 0 ? '' : update.output}\n${output}`.trim();
  throw new StartError(
    `apt-get install ${names.join(' ')} failed:\n${said.split('\n').slice(-12).join('\n')}`,
    adviceFor(said) ?? byHand,
  );
}

/**
 * The paths of the programs, in their order; those that are missing are installed through apt.
 * @throws {StartError} saying what to run by hand, where that cannot be done
 */
export async function providePrograms(programs: readonly Program[]): Promise<string[]> {
  const missing = programs.filter(({ binary }) => findProgram(binary) === undefined);
  if (missing.length > 0) {
    const names = missing.map((program) => program.package);
    await step(`Installing Debian’s ${names.join(' and ')}`, () => installPackages(names));
  }
  return programs.map((program) => {
    const path = findProgram(program.binary);
    if (path !== undefined) return path;
    throw new StartError(
      `${program.package} is installed, but there is no program ${program.binary}.`,
      `Run: sudo apt-get install --reinstall ${program.package}`,
    );
  });
}
