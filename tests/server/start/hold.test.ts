import { randomUUID } from 'node:crypto';
import { expect, it } from 'vitest';
import { hold } from '#server/start/hold.mjs';

it('lets one hold a name, and tells the others who does', async () => {
  const name = randomUUID();
  const first = await hold(name, { state: () => ({ address: 'http://127.0.0.1:8000' }) });
  expect(first).toHaveProperty('release');
  expect(await hold(name)).toEqual({ takenBy: { pid: process.pid, address: 'http://127.0.0.1:8000' } });
  expect(await hold(randomUUID())).toHaveProperty('release');
});

it('waits for a holder that is ending', async () => {
  const name = randomUUID();
  const first = await hold(name, { state: () => ({ ending: true }) });
  const second = hold(name, { patient: (other) => other.ending === true });
  if ('release' in first) first.release();
  expect(await second).toHaveProperty('release');
});

it('does not wait for ever', async () => {
  const name = randomUUID();
  await hold(name);
  expect(await hold(name, { patient: () => true, patienceMs: 50 })).toEqual({
    takenBy: { pid: process.pid },
  });
});
