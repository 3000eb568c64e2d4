import { useQueryClient } from '@tanstack/react-query';
import { lazy, Suspense, useEffect, useState } from 'react';
import { accountEndpoints } from '#server/contracts/account-endpoints.ts';
import { meQuery } from '#client/api/me.ts';
import { onSessionEnd, request } from '#client/api/request.ts';
import { Dialog } from '#client/ui/dialog.tsx';
import { useMe } from './session.tsx';

const SignInForm = lazy(() => import('#client/account/sign-in-form.tsx'));

/**
 * When the session ends under an open screen, asks to sign in again over it: what was typed stays where it is.
 * Another person's sign-in starts afresh, because what is on the screen was not theirs to see.
 */
export function SignInAgain() {
  const client = useQueryClient();
  const me = useMe();
  const [ended, setEnded] = useState(false);
  useEffect(
    () =>
      onSessionEnd(() => {
        setEnded(true);
      }),
    [],
  );
  if (!ended) return null;

  const goOn = async () => {
    const now = await request(accountEndpoints.me);
    if (now.id !== me.id) {
      location.assign('/');
      return;
    }
    client.setQueryData(meQuery().queryKey, now);
    setEnded(false);
    await client.invalidateQueries();
  };
  return (
    <Dialog title="Sign in again" width="narrow" modalOnly onClose={() => undefined}>
      <p className="mb-4">Your session has ended. What is on the screen stays as it is; sign in to go on.</p>
      <Suspense>
        <SignInForm email={me.email} onSignedIn={goOn} />
      </Suspense>
    </Dialog>
  );
}
