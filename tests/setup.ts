import { setImmediate as turn } from 'node:timers/promises';
import { afterAll, afterEach, beforeAll, beforeEach, expect, vi } from 'vitest';

const rejections: unknown[] = [];
const note = (reason: unknown): void => {
  rejections.push(reason);
};

/**
 * Console errors and warnings and promises that are rejected unheard fail the test that made them, and so does a test
 * without an assertion.
 */
beforeAll(() => {
  process.on('unhandledRejection', note);
});

beforeEach(() => {
  expect.hasAssertions();
  vi.spyOn(console, 'error');
  vi.spyOn(console, 'warn');
});

afterEach(async () => {
  const said = [...vi.mocked(console.error).mock.calls, ...vi.mocked(console.warn).mock.calls];
  vi.restoreAllMocks();
  if (said.length > 0) throw new Error(`The test wrote to the console: ${said.map(String).join(' | ')}`);
  // Node tells of a rejection only once the turn of the event loop is over.
  await turn();
  const unheard = rejections.splice(0);
  if (unheard.length > 0) throw new Error('The test left a rejected promise.', { cause: unheard[0] });
});

afterAll(() => {
  process.off('unhandledRejection', note);
});
