import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { step } from '#server/start/steps.mjs';
import { onStop } from '#server/start/stop.ts';
import { startThrowaway } from '#tests/throwaway.ts';
import { table, type Bench } from './figures.ts';

/** `npm run bench [part of a file's name]`: runs the measurements with a throw-away database and prints their figures. */
export default async function bench({ root }: { readonly root: string }): Promise<void> {
  const folder = join(root, 'tests/bench');
  const wanted = process.argv[3] ?? '';
  const files = readdirSync(folder).filter((name) => name.endsWith('.bench.ts') && name.includes(wanted));
  const stops = onStop(130);
  const server = await step('Starting a throw-away database', startThrowaway);
  stops.add(() => server.remove());
  process.env['TEST_DATABASE_URL'] = server.url;
  let failed = files.length === 0;
  if (failed) console.error('There is nothing to measure under that name.');
  for (const file of files.sort()) {
    try {
      const { default: one } = (await import(pathToFileURL(join(folder, file)).href)) as { default: Bench };
      console.log(`\n${one.name}`);
      for (const line of table(await one.run())) console.log(line);
    } catch (error) {
      failed = true;
      console.error(`\n${file} failed:`, error);
    }
  }
  await stops.stop(failed ? 1 : 0);
}
