import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { clientServer } from '#server/start/client-server.ts';
import { freePort } from '#server/start/ports.ts';
import { signIn, startApp, type TestApp } from './app.ts';

const root = fileURLToPath(new URL('../..', import.meta.url));

let app: TestApp;
let vite: Awaited<ReturnType<typeof clientServer>>;
let origin: string;

beforeAll(async () => {
  app = await startApp();
  const port = await freePort();
  origin = `http://127.0.0.1:${String(port)}`;
  vite = await clientServer({
    root,
    target: app.origin,
    host: '127.0.0.1',
    port,
    strictPort: true,
    ready: () => Promise.resolve(),
    cacheFolder: '.build/vite-browser-tests',
  });
  await vite.listen();
});
afterAll(async () => {
  await vite.close();
  await app.stop();
});

it('loads from its sources, signs in, and takes a changed module without loading anew', async () => {
  const visit = await app.open({ origin });
  const { page } = visit;
  await signIn(page, 'designer');
  await page.getByText('Marsh 2412').first().waitFor();
  await page.evaluate(() => document.body.setAttribute('data-loaded', 'once'));
  const updated = page.waitForEvent('console', (message) =>
    message.text().includes('hot updated: /app/top-bar.tsx'),
  );
  vite.watcher.emit('change', join(root, 'client/app/top-bar.tsx'));
  await updated;
  expect(await page.locator('body').getAttribute('data-loaded')).toBe('once');
  await visit.close();
});
