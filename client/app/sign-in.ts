import { OfflineError, problemOf, ProblemError, send } from '#client/api/request.ts';

type SignInRefusal = 'wrong' | 'too-many' | 'unavailable';

/** Why a sign-in did not happen, apart from having no answer at all (OfflineError). */
export class SignInError extends Error {
  override readonly name = 'SignInError';
  readonly refusal: SignInRefusal;
  readonly retryAfterSeconds: number | null;

  constructor(refusal: SignInRefusal, retryAfterSeconds: number | null = null) {
    super(refusal);
    this.refusal = refusal;
    this.retryAfterSeconds = retryAfterSeconds;
  }
}

/** Signs in with e-mail and password; the session is a cookie that no script can read. Throws SignInError or OfflineError. */
export async function signIn(email: string, password: string): Promise<void> {
  try {
    const outcome = await postToAuth('/auth/callback/credentials', { email, password });
    if (outcome !== null) throw new SignInError(outcome === 'CredentialsSignin' ? 'wrong' : 'unavailable');
  } catch (error) {
    if (!(error instanceof ProblemError)) throw error;
    if (error.status === 429) throw new SignInError('too-many', error.retryAfterSeconds);
    throw new SignInError(error.status === 401 ? 'wrong' : 'unavailable', error.retryAfterSeconds);
  }
}

/** Ends the session of this browser. Throws OfflineError or ProblemError when the server did not do it. */
export async function signOut(): Promise<void> {
  await postToAuth('/auth/signout', {});
}

/**
 * A form post to the sign-in service with the token that proves it came from this page. It always answers 200: a
 * failure is the `error` of the returned address. Returns that error, or null.
 */
async function postToAuth(path: string, fields: Readonly<Record<string, string>>): Promise<string | null> {
  const csrfToken = await fetchCsrfToken();
  const response = await send(path, {
    method: 'POST',
    headers: { 'content-type': 'application/x-www-form-urlencoded', 'x-auth-return-redirect': '1' },
    body: new URLSearchParams({ ...fields, csrfToken, callbackUrl: location.origin }),
  });
  if (!response.ok) throw await problemOf(response);
  const answer: unknown = await response.json();
  const address = typeof answer === 'object' && answer !== null && 'url' in answer ? answer.url : null;
  if (typeof address !== 'string') return 'unknown';
  return new URL(address, location.origin).searchParams.get('error');
}

async function fetchCsrfToken(): Promise<string> {
  const response = await send('/auth/csrf', { headers: { accept: 'application/json' } });
  if (!response.ok) throw await problemOf(response);
  const answer: unknown = await response.json();
  if (
    typeof answer === 'object' &&
    answer !== null &&
    'csrfToken' in answer &&
    typeof answer.csrfToken === 'string'
  ) {
    return answer.csrfToken;
  }
  throw new OfflineError();
}
