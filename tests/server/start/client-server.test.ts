import { createServer, type Server } from 'node:http';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { clientServer, isClientFile } from '#server/start/client-server.ts';
import { freePort, listenOn } from '#server/start/ports.ts';

const root = fileURLToPath(new URL('../../..', import.meta.url));

describe('the client in development', () => {
  let application: Server;
  let vite: Awaited<ReturnType<typeof clientServer>>;
  let origin: string;
  let ready = Promise.resolve();

  beforeAll(async () => {
    application = createServer((request, response) => response.end(`application: ${request.url ?? ''}`));
    const target = `http://127.0.0.1:${String(await listenOn(application, 0, '127.0.0.1'))}`;
    const port = await freePort();
    vite = await clientServer({
      root,
      target,
      host: '127.0.0.1',
      port,
      strictPort: true,
      ready: () => ready,
      cacheFolder: '.build/vite-server-tests',
    });
    await vite.listen();
    origin = `http://127.0.0.1:${String(port)}`;
  });
  afterAll(async () => {
    await vite.close();
    await new Promise((resolve) => application.close(resolve));
  });

  const bodyOf = async (path: string) => (await fetch(origin + path)).text();

  it.each(['/api/me', '/api/sections?search=me.ts', '/auth/csrf', '/api/openapi.json'])(
    'passes %s on to the application',
    async (path) => {
      expect(await bodyOf(path)).toBe(`application: ${path}`);
    },
  );

  it.each(['/api/me.ts', '/api/sections.ts?t=1790000000000', '/api/request.ts'])(
    'serves the client’s own module %s',
    async (path) => {
      const answer = await fetch(origin + path);
      expect(answer.headers.get('content-type')).toContain('javascript');
      expect(await answer.text()).toMatch(/\bexport\b/);
    },
  );

  it('serves the page at any address of a screen', async () => {
    const answer = await fetch(`${origin}/sections`, { headers: { accept: 'text/html' } });
    expect(await answer.text()).toContain('/main.tsx');
  });

  it('lets the application’s requests wait while that restarts, and no others', async () => {
    let restarted = (): void => undefined;
    ready = new Promise((resolve) => (restarted = resolve));
    let answered = false;
    const waiting = bodyOf('/api/me').finally(() => (answered = true));
    expect(await bodyOf('/api/me.ts')).toMatch(/\bexport\b/);
    expect(answered).toBe(false);
    restarted();
    expect(await waiting).toBe('application: /api/me');
  });
});

describe('a file of the client', () => {
  const folder = `${root}client`;
  it.each([
    ['/api/me.ts', true],
    ['/api/me.ts?v=1#there', true],
    ['/api/me', false],
    ['/api', false],
    ['/api/../../package.json', false],
    ['/api/%2e%2e/%2e%2e/package.json', false],
  ])('%s: %s', (url, expected) => {
    expect(isClientFile(folder, url)).toBe(expected);
  });
});
