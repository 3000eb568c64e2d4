/**
 * The start of everything: `npm start`, `npm run dev`, `npm run bench`, `npm run add-person`. Plain JavaScript without packages, because
 * on a fresh clone there are none; once they are installed the work goes on in TypeScript, in this same process.
 */
import { realpathSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { install } from './install.mjs';
import { explain } from './steps.mjs';

const begun = performance.now();
const root = realpathSync(fileURLToPath(new URL('../..', import.meta.url)));
const works = {
  start: './start.ts',
  dev: './dev.ts',
  bench: '../../tests/bench/run.ts',
  'add-person': './add-person.ts',
};
const mode = process.argv[2] ?? 'start';

try {
  if (!Object.hasOwn(works, mode))
    throw new Error(`There is no “${mode}”: ${Object.keys(works).join(', ')}.`);
  await install(root);
  const { register } = await import('tsx/esm/api');
  register();
  const { default: work } = await import(works[mode]);
  await work({ root, begun, environment: process.env });
} catch (error) {
  explain(error);
  process.exit(1);
}
