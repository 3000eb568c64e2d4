import { fileURLToPath } from 'node:url';
import { buildClient } from '#server/start/client-build.ts';
import { chromium, providePrograms } from '#server/start/packages.ts';
import { seedDemoOnce } from './browser/demo-database.ts';

/** Before the browser tests: Chromium (TEST_CHROMIUM names its path), the built client (TEST_CLIENT its folder), the demo workshop. */
export default async function setupBrowser(): Promise<() => Promise<void>> {
  const root = fileURLToPath(new URL('..', import.meta.url)).replace(/\/$/, '');
  const [path = ''] = await providePrograms([chromium]);
  process.env['TEST_CHROMIUM'] = path;
  process.env['TEST_CLIENT'] = await buildClient(root);
  const demo = await seedDemoOnce();
  return () => demo.drop();
}
