import { createServer, type Server } from 'node:net';
import { afterEach, expect, it } from 'vitest';
import { freePort, isPortTaken, listenFrom, listenOn } from '#server/start/ports.ts';

const servers: Server[] = [];
function newServer(): Server {
  const server = createServer();
  servers.push(server);
  return server;
}

afterEach(async () => {
  await Promise.all(servers.splice(0).map((server) => new Promise((resolve) => server.close(resolve))));
});

it('takes a later port where the first is taken', async () => {
  const first = await listenOn(newServer(), 0, '127.0.0.1');
  const next = await listenFrom(newServer(), first, '127.0.0.1');
  expect(next).toBeGreaterThan(first);
  expect(next).toBeLessThan(first + 100);
});

it('says when the port asked for is taken', async () => {
  const port = await listenOn(newServer(), 0, '127.0.0.1');
  const error: unknown = await listenOn(newServer(), port, '127.0.0.1').catch((reason: unknown) => reason);
  expect(isPortTaken(error)).toBe(true);
});

it('finds a port that can be listened on', async () => {
  const port = await freePort();
  expect(await listenOn(newServer(), port, '127.0.0.1')).toBe(port);
});
