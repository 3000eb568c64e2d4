import { useEffect, useState } from 'react';
import { Outlet, ScrollRestoration } from 'react-router';
import { Announcer } from '#client/ui/announcer.tsx';
import { KeysDialog } from './keys-dialog.tsx';
import { KeysProvider, useHotkey } from './keys.tsx';
import { useOnline } from './online.ts';
import { useMe } from './session.tsx';
import { SignInAgain } from './sign-in-again.tsx';
import { showTheme } from './theme.ts';
import { TopBar } from './top-bar.tsx';

/** What stands around every screen of a signed-in person. */
export function Shell() {
  return (
    <KeysProvider>
      <Announcer>
        <Frame />
      </Announcer>
    </KeysProvider>
  );
}

function Frame() {
  const [showsKeys, setShowsKeys] = useState(false);
  const { theme } = useMe().preferences;
  useEffect(() => {
    showTheme(theme);
  }, [theme]);
  useHotkey('?', () => {
    setShowsKeys(true);
  });
  return (
    <>
      <a
        href="#main"
        className="sr-only focus:not-sr-only focus:fixed focus:top-1 focus:left-1 focus:z-50 focus:bg-sheet focus:px-3 focus:py-2"
      >
        Skip to the screen
      </a>
      <TopBar
        onShowKeys={() => {
          setShowsKeys(true);
        }}
      />
      <OfflineNote />
      <main id="main" tabIndex={-1} className="flex min-h-0 flex-1 flex-col outline-none">
        <Outlet />
      </main>
      {showsKeys && (
        <KeysDialog
          onClose={() => {
            setShowsKeys(false);
          }}
        />
      )}
      <SignInAgain />
      <ScrollRestoration />
    </>
  );
}

/** Lies over the lower edge and lets presses through, so that nothing moves when the network goes. */
function OfflineNote() {
  if (useOnline()) return null;
  return (
    <p
      role="status"
      className="pointer-events-none fixed inset-x-3 bottom-3 z-30 mx-auto w-fit rounded border border-amber bg-sheet px-3 py-1.5 text-xs text-amber print:hidden"
    >
      No network. Drafts are sent by themselves when it is back; anything else has to be tried again then.
    </p>
  );
}
