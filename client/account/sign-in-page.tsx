import { useQueryClient } from '@tanstack/react-query';
import { useNavigate, useSearchParams } from 'react-router';
import { meQuery } from '#client/api/me.ts';
import { Mark } from '#client/app/mark.tsx';
import { returnPath } from '#client/app/session.tsx';
import SignInForm from './sign-in-form.tsx';

export function Component() {
  const navigate = useNavigate();
  const client = useQueryClient();
  const [search] = useSearchParams();
  const goOn = async () => {
    client.clear();
    await client.fetchQuery(meQuery());
    await navigate(returnPath(search.get('to')), { replace: true });
  };
  return (
    <main className="flex flex-1 flex-col items-center justify-center px-4 py-8">
      <title>Sign in · Ribwright</title>
      <div className="w-full max-w-96 rounded border border-rule bg-sheet p-6 sm:p-8">
        <h1 className="mb-6 flex items-center gap-3 text-xl font-extrabold tracking-tight">
          <Mark className="h-6 w-11" />
          ribwright
        </h1>
        <SignInForm onSignedIn={goOn} />
      </div>
      <p className="mt-4 max-w-96 text-center text-xs text-graphite">
        No account, or the password is lost? The owner of your workshop can help.
      </p>
    </main>
  );
}
