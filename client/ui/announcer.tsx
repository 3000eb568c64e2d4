import { createContext, type ReactNode, useCallback, useContext, useState } from 'react';

const AnnounceContext = createContext<(sentence: string) => void>(() => undefined);

/** Says a sentence to screen readers without moving the focus. */
export function useAnnounce(): (sentence: string) => void {
  return useContext(AnnounceContext);
}

/** Holds the live region. The sentence alternates between two places, so that saying the same twice is heard twice. */
export function Announcer({ children }: { children: ReactNode }) {
  const [said, setSaid] = useState({ sentence: '', turn: 0 });
  const announce = useCallback((sentence: string) => {
    setSaid(({ turn }) => ({ sentence, turn: 1 - turn }));
  }, []);
  return (
    <AnnounceContext value={announce}>
      {children}
      <div className="sr-only" role="status" aria-live="polite">
        <p>{said.turn === 0 ? said.sentence : ''}</p>
        <p>{said.turn === 1 ? said.sentence : ''}</p>
      </div>
    </AnnounceContext>
  );
}
