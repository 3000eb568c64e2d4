import { type KeeperState } from './draft-keeper.ts';

/** "2 s", "3 min", "2 h". */
export function ago(ms: number): string {
  const seconds = Math.max(0, Math.round(ms / 1000));
  if (seconds < 60) return `${seconds} s`;
  const minutes = Math.round(seconds / 60);
  return minutes < 60 ? `${minutes} min` : `${Math.round(minutes / 60)} h`;
}

/** How it stands with the draft, in words: "draft on version 3, kept 2 s ago". */
export function draftWords(dirty: boolean, basedOn: number, keeper: KeeperState, now: number): string {
  const trouble = troubleWords(keeper);
  if (!dirty)
    return trouble === null ? `version ${basedOn}, no unsaved changes` : `version ${basedOn}, ${trouble}`;
  const draft = `draft on version ${basedOn}`;
  if (trouble !== null) return `${draft}, ${trouble}`;
  switch (keeper.step) {
    case 'kept':
      return `${draft}, kept ${ago(now - keeper.at)} ago`;
    case 'waiting':
    case 'sending':
      return `${draft}, keeping…`;
    default:
      return draft;
  }
}

function troubleWords(keeper: KeeperState): string | null {
  if (keeper.step === 'retrying') {
    return keeper.offline ? 'not kept: offline, trying again' : 'not kept yet, trying again';
  }
  return keeper.step === 'refused' ? `not kept: ${keeper.reason}` : null;
}
