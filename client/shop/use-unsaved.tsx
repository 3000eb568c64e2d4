import { type ReactNode, useRef } from 'react';
import { useBeforeUnload, useBlocker } from 'react-router';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';

/**
 * Asks before typed values are left behind, on the way to another place of the program or away from it.
 * `release` lets the next step pass, after a save.
 */
export function useUnsaved(unsaved: boolean): { question: ReactNode; release: () => void } {
  const released = useRef(false);
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      unsaved &&
      !released.current &&
      currentLocation.pathname + currentLocation.search !== nextLocation.pathname + nextLocation.search,
  );
  useBeforeUnload((event) => {
    if (unsaved && !released.current) event.preventDefault();
  });
  const question = blocker.state === 'blocked' && (
    <Dialog
      title="Leave without saving?"
      width="narrow"
      onClose={blocker.reset}
      actions={
        <>
          <Button onClick={blocker.proceed}>Leave it unsaved</Button>
          <Button variant="primary" onClick={blocker.reset}>
            Stay here
          </Button>
        </>
      }
    >
      <p>What you typed here is not saved yet.</p>
    </Dialog>
  );
  return {
    question,
    release: () => {
      released.current = true;
    },
  };
}
