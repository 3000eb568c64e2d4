import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useMemo, useSyncExternalStore } from 'react';
import { cuttingListQuery, sendCutLog } from '#client/api/cutting-list.ts';
import { useMe } from '#client/app/session.tsx';
import { Outbox } from './outbox.ts';

const AGAIN_MS = 10_000;

/** The signed-in person's entries on their way; sent again when the network is back, and every ten seconds while any wait. */
export function useOutbox() {
  const { id } = useMe();
  const client = useQueryClient();
  const outbox = useMemo(
    () =>
      new Outbox(localStorage, `ribwright.cut-log.${id}`, async (log) => {
        await sendCutLog(log);
        await client.invalidateQueries({ queryKey: cuttingListQuery().queryKey });
        await client.invalidateQueries({ queryKey: ['cut-sheets'] });
      }),
    [client, id],
  );
  const entries = useSyncExternalStore(outbox.subscribe, outbox.snapshot);
  const waits = entries.some(({ refusal }) => refusal === null);
  useEffect(() => {
    if (!waits) return;
    const flush = () => void outbox.flush();
    flush();
    const timer = setInterval(flush, AGAIN_MS);
    window.addEventListener('online', flush);
    return () => {
      clearInterval(timer);
      window.removeEventListener('online', flush);
    };
  }, [outbox, waits]);
  return { outbox, entries };
}
