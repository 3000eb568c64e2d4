import { beforeEach, describe, expect, it, vi } from 'vitest';
import { type CutLogInput } from '#client/api/cutting-list.ts';
import { OfflineError, ProblemError } from '#client/api/errors.ts';
import { Outbox } from '#client/cutting-list/outbox.ts';

const KEY = 'ribwright.cut-log.somebody';

function logOf(number: number): CutLogInput {
  return {
    sheetId: '0190a5b0-1111-7222-8333-444455556666',
    versionNumber: 1,
    part: 'core',
    action: 'done',
    at: '2026-02-01T09:00:00.000Z',
    key: `3f0e4d5c-1111-4222-8333-${String(number).padStart(12, '0')}`,
  };
}
const refusal = (status: number) =>
  new ProblemError(
    { type: 'about:blank', title: 'No.', status, code: 'refused', detail: 'The sheet is gone.' },
    { retryAfterSeconds: null, body: null },
  );

describe('the outbox', () => {
  let store: Map<string, string>;
  const storage = () => ({
    getItem: (key: string) => store.get(key) ?? null,
    setItem: (key: string, value: string) => void store.set(key, value),
  });
  beforeEach(() => {
    store = new Map();
  });

  it('sends an entry at once and forgets it', async () => {
    const send = vi.fn(() => Promise.resolve());
    const outbox = new Outbox(storage(), KEY, send);
    await outbox.add(logOf(1));
    expect(send).toHaveBeenCalledExactlyOnceWith(logOf(1));
    expect(outbox.snapshot()).toEqual([]);
    expect(store.get(KEY)).toBe('[]');
  });

  it('keeps what gets no answer, over a closed tab too, and sends it later in order, each once', async () => {
    const offline = new Outbox(storage(), KEY, () => Promise.reject(new OfflineError()));
    await offline.add(logOf(1));
    await offline.add(logOf(2));
    expect(offline.snapshot()).toHaveLength(2);
    const sent: string[] = [];
    const later = new Outbox(storage(), KEY, ({ key }) => {
      sent.push(key);
      return Promise.resolve();
    });
    await Promise.all([later.flush(), later.flush()]);
    expect(sent).toEqual([logOf(1).key, logOf(2).key]);
    expect(later.snapshot()).toEqual([]);
  });

  it.each([401, 429, 502, 503])('waits after an answer of %i', async (status) => {
    const outbox = new Outbox(storage(), KEY, () => Promise.reject(refusal(status)));
    await outbox.add(logOf(1));
    expect(outbox.snapshot()).toMatchObject([{ refusal: null }]);
  });

  it('sets a refused entry aside with the reason, sends the next, and drops it when it was read', async () => {
    const outbox = new Outbox(storage(), KEY, ({ key }) =>
      key === logOf(1).key ? Promise.reject(refusal(404)) : Promise.resolve(),
    );
    await outbox.add(logOf(1));
    await outbox.add(logOf(2));
    expect(outbox.snapshot()).toEqual([{ log: logOf(1), refusal: 'The sheet is gone.' }]);
    outbox.dismiss(logOf(1).key);
    expect(outbox.snapshot()).toEqual([]);
  });

  it('begins empty where the store holds nonsense', () => {
    store.set(KEY, '[{"log":{}}]');
    expect(new Outbox(storage(), KEY, () => Promise.resolve()).snapshot()).toEqual([]);
    store.set(KEY, 'no json');
    expect(new Outbox(storage(), KEY, () => Promise.resolve()).snapshot()).toEqual([]);
  });
});
