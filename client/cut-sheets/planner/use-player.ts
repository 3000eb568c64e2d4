import { useEffect, useEffectEvent, useMemo, useReducer } from 'react';
import { useMedia } from '#client/app/media.ts';
import { type CutModel } from '../views/plan-model.ts';
import { partTimes, positionAt } from '../views/wire-position.ts';
import { reducePlayer, startPlayer } from './player.ts';

/** A frame never counts for more: a page that slept does not jump. */
const LONGEST_FRAME_S = 0.1;

/**
 * The wire's run along a cut. Who wants no motion gets steps from part to part instead of a run.
 * @param cut null while there is none; then the wire stays where it was
 */
export function usePlayer(cut: CutModel | null) {
  const calm = useMedia('(prefers-reduced-motion: reduce)');
  const [player, dispatch] = useReducer(reducePlayer, startPlayer(0));
  if (cut && cut.totalSeconds !== player.totalSeconds)
    dispatch({ type: 'load', totalSeconds: cut.totalSeconds });
  useFrames(player.playing, (clockSeconds) => {
    dispatch({ type: 'tick', clockSeconds: Math.min(LONGEST_FRAME_S, clockSeconds) });
  });
  const position = useMemo(() => (cut ? positionAt(cut, player.seconds) : null), [cut, player.seconds]);
  const toggle = () => {
    if (!cut) return;
    if (calm) dispatch({ type: 'step', by: 1, times: [...partTimes(cut), cut.totalSeconds] });
    else dispatch({ type: 'toggle' });
  };
  useSpaceBar(toggle);
  return { player, position, calm, toggle, dispatch };
}

function useFrames(running: boolean, onFrame: (seconds: number) => void): void {
  const frame = useEffectEvent(onFrame);
  useEffect(() => {
    if (!running) return;
    let last = performance.now();
    let handle = requestAnimationFrame(function next(now) {
      frame((now - last) / 1000);
      last = now;
      handle = requestAnimationFrame(next);
    });
    return () => cancelAnimationFrame(handle);
  }, [running]);
}

const TAKERS = 'input, textarea, select, button, a, summary, dialog, [role="button"], [role="slider"]';

/** The space bar, where nothing else takes it. Heard before the sheet, which would move the paper with it. */
function useSpaceBar(action: () => void): void {
  const press = useEffectEvent((event: KeyboardEvent) => {
    if (event.key !== ' ' || event.ctrlKey || event.metaKey || event.altKey || event.defaultPrevented) return;
    if (event.target instanceof Element && event.target.closest(TAKERS) !== null) return;
    if (document.querySelector('dialog[open]')) return;
    event.preventDefault();
    if (!event.repeat) action();
  });
  useEffect(() => {
    document.addEventListener('keydown', press);
    return () => document.removeEventListener('keydown', press);
  }, []);
}
