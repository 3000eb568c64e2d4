import { afterEach, beforeEach, expect, vi } from 'vitest';

/** Console errors and warnings fail the test that made them, and so does a test without an assertion. */
beforeEach(() => {
  expect.hasAssertions();
  vi.spyOn(console, 'error');
  vi.spyOn(console, 'warn');
});

afterEach(() => {
  const said = [...vi.mocked(console.error).mock.calls, ...vi.mocked(console.warn).mock.calls];
  vi.restoreAllMocks();
  if (said.length > 0) throw new Error(`The test wrote to the console: ${said.map(String).join(' | ')}`);
});
