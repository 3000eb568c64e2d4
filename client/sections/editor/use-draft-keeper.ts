import { useEffect, useState, useSyncExternalStore } from 'react';
import { sectionEndpoints } from '#server/contracts/section-endpoints.ts';
import { OfflineError, ProblemError } from '#client/api/request.ts';
import { type DraftInput, keepDraft } from '#client/api/sections.ts';
import { useMe } from '#client/app/session.tsx';
import { DraftKeeper, type KeeperPorts, type KeeperState, type SendResult } from './draft-keeper.ts';
import { type DraftMirror, draftMirror } from './draft-mirror.ts';

/** The mirror of the signed-in person for a section. */
export function useDraftMirror(sectionId: string): DraftMirror {
  const { id } = useMe();
  const [mirror] = useState(() => draftMirror(localStorage, id, sectionId));
  return mirror;
}

/** Keeps the draft of a section for as long as its editor is open. */
export function useDraftKeeper(sectionId: string, mirror: DraftMirror): readonly [DraftKeeper, KeeperState] {
  return useKeeper<DraftInput>(mirror, {
    keep: (draft) => keepDraft(sectionId, draft),
    address: sectionEndpoints.keepDraft.path.replace(':sectionId', sectionId),
  });
}

interface Keeping<Draft> {
  /** Keeps the draft on the server. */
  readonly keep: (draft: Draft) => Promise<unknown>;
  /** Where a draft is put while the page goes away. */
  readonly address: string;
}

/** Keeps unsaved work for as long as its screen is open; `mirror` and `keeping` of the first call are used. */
export function useKeeper<Draft>(
  mirror: KeeperPorts<Draft>['mirror'],
  keeping: Keeping<Draft>,
): readonly [DraftKeeper<Draft>, KeeperState] {
  const [keeper] = useState(
    () =>
      new DraftKeeper<Draft>({
        send: (draft) => sent(keeping.keep(draft)),
        sendLast: (draft) => {
          sendLast(keeping.address, draft);
        },
        mirror,
        now: () => Date.now(),
        after: (ms, action) => {
          const timer = setTimeout(action, ms);
          return () => {
            clearTimeout(timer);
          };
        },
      }),
  );
  const state = useSyncExternalStore(keeper.subscribe, keeper.state);
  useEffect(() => {
    const leave = () => {
      keeper.leave();
    };
    const hide = () => {
      if (document.visibilityState === 'hidden') keeper.flush();
    };
    const back = () => {
      keeper.flush();
    };
    window.addEventListener('pagehide', leave);
    window.addEventListener('online', back);
    document.addEventListener('visibilitychange', hide);
    return () => {
      window.removeEventListener('pagehide', leave);
      window.removeEventListener('online', back);
      document.removeEventListener('visibilitychange', hide);
      // To another screen of the application: hand over what is left without waiting.
      keeper.flush();
      keeper.stop();
    };
  }, [keeper]);
  return [keeper, state];
}

async function sent(keeping: Promise<unknown>): Promise<SendResult> {
  try {
    await keeping;
    return { kind: 'kept' };
  } catch (error) {
    if (error instanceof OfflineError) return { kind: 'failed', offline: true };
    if (error instanceof ProblemError && isFinal(error.status))
      return { kind: 'refused', reason: error.message };
    return { kind: 'failed', offline: false };
  }
}

/** Refusals that trying again would not change; a lost session or a busy server would. */
function isFinal(status: number): boolean {
  return status >= 400 && status < 500 && ![401, 408, 429].includes(status);
}

/** A request that outlives the page (fetch with keepalive carries up to 64 kB; a draft has a few). */
function sendLast(address: string, draft: unknown): void {
  void fetch(address, {
    method: 'PUT',
    keepalive: true,
    credentials: 'same-origin',
    headers: { 'content-type': 'application/json', accept: 'application/json' },
    body: JSON.stringify(draft),
  }).catch(() => undefined);
}
