import { type KeyboardEvent } from 'react';

const steps: Readonly<Record<string, (index: number, last: number) => number>> = {
  ArrowLeft: (index) => index - 1,
  ArrowRight: (index) => index + 1,
  Home: () => 0,
  End: (_index, last) => last,
};

/**
 * Arrow keys in the strip move the focus to the same control of the neighbouring card.
 * Returns the version number of the card moved to, or null when the key moved nothing;
 * `onBeforeFirst` is called when the move leads past the oldest card shown.
 */
export function moveFocus(event: KeyboardEvent<HTMLElement>, onBeforeFirst: () => void): number | null {
  const step = steps[event.key];
  const control = (event.target as HTMLElement).closest<HTMLElement>('[data-control]');
  if (!step || !control || event.ctrlKey || event.metaKey || event.altKey) return null;
  event.preventDefault();
  const kind = control.dataset.control ?? 'open';
  const peers = [...event.currentTarget.querySelectorAll<HTMLElement>(`[data-control="${kind}"]`)];
  const wanted = step(peers.indexOf(control), peers.length - 1);
  if (wanted < 0) onBeforeFirst();
  const next = peers[wanted];
  if (!next) return null;
  next.focus();
  next.scrollIntoView?.({ block: 'nearest', inline: 'nearest' });
  return Number(next.closest('li')?.querySelector<HTMLElement>('[data-number]')?.dataset.number);
}
