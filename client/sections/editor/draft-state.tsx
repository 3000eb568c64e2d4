import { useEffect, useState } from 'react';
import { StatusGlyph } from '#client/ui/status-mark.tsx';
import { type KeeperState } from './draft-keeper.ts';
import { draftWords } from './draft-words.ts';

/** How it stands with the draft; the time since it was kept counts on by itself. */
export function DraftState({
  dirty,
  basedOn,
  keeper,
}: {
  dirty: boolean;
  basedOn: number;
  keeper: KeeperState;
}) {
  const now = useNow(keeper.step === 'kept' && dirty);
  const inTrouble = keeper.step === 'retrying' || keeper.step === 'refused';
  const words = draftWords(dirty, basedOn, keeper, now);
  return (
    <p
      className={`flex max-w-full shrink-0 items-baseline gap-1.5 ${inTrouble ? 'text-brick' : dirty ? 'text-amber' : 'text-graphite'}`}
    >
      {dirty && <StatusGlyph status="draft" className="size-[0.8em] translate-y-px" />}
      <span className="min-w-0 truncate" title={words}>
        {words}
      </span>
    </p>
  );
}

function useNow(ticking: boolean): number {
  const [now, setNow] = useState(() => Date.now());
  useEffect(() => {
    if (!ticking) return;
    const tick = () => {
      setNow(Date.now());
    };
    const first = setTimeout(tick, 0);
    const timer = setInterval(tick, 1000);
    return () => {
      clearTimeout(first);
      clearInterval(timer);
    };
  }, [ticking]);
  return now;
}
