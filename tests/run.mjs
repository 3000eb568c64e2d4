/**
 * `npm test`: set-up, lint, types and every test. Plain JavaScript without packages, because on a fresh clone there
 * are none. The last line reads “N passed, N failed” and nothing else counts as success.
 */
import { realpathSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { install } from '../server/start/install.mjs';
import { explain } from '../server/start/steps.mjs';

const root = realpathSync(fileURLToPath(new URL('..', import.meta.url)));

try {
  await install(root);
  const { register } = await import('tsx/esm/api');
  register();
  const { runAll } = await import('./run-all.ts');
  const { passed, failed } = await runAll(root, process.argv.slice(2));
  console.log(`${passed} passed, ${failed} failed`);
  process.exitCode = failed > 0 ? 1 : 0;
} catch (error) {
  explain(error);
  console.log('0 passed, 1 failed');
  process.exitCode = 1;
}
