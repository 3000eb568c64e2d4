import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { fakeServer, json, noAnswer, problem } from '#tests/client/support/fake-server.ts';
import { personOf } from '#tests/client/support/samples.ts';
import { openAt, useBrowserParts } from '#tests/client/support/screen.tsx';

useBrowserParts();

const csrf = { 'GET /auth/csrf': () => json({ csrfToken: 'token-1' }) };
const post = 'POST /auth/callback/credentials';
const answer = (search: string) => () => json({ url: `http://localhost/sign-in${search}` });

async function signIn(email = 'designer@marrowfen.example', password = 'a long password') {
  await userEvent.type(await screen.findByLabelText('E-mail'), email);
  await userEvent.type(screen.getByLabelText('Password'), password);
  await userEvent.click(screen.getByRole('button', { name: 'Sign in' }));
}
const alert = async () => (await screen.findByRole('alert')).textContent;

describe('signing in', () => {
  it('says what is missing before asking the server', async () => {
    const server = fakeServer({});
    openAt('/sign-in');
    await userEvent.click(await screen.findByRole('button', { name: 'Sign in' }));
    expect(await screen.findByText('Type the e-mail address of your account.')).toBeTruthy();
    expect(screen.getByText('Type your password.')).toBeTruthy();
    expect(server.asked).toEqual([]);
  });

  it('sends the form with the token and returns to where one came from', async () => {
    let signedIn = false;
    const server = fakeServer({
      ...csrf,
      [post]: () => {
        signedIn = true;
        return json({ url: 'http://localhost/' });
      },
      'GET /api/me': () => (signedIn ? json(personOf('designer')) : problem(401)),
      'GET /api/sections': () => json({ items: [], nextCursor: null }),
    });
    const view = openAt('/sections?kind=cst');
    await signIn();
    await waitFor(() => {
      expect(view.address()).toBe('/sections?kind=cst');
    });
    const [sent] = server.of('POST', '/auth/callback/credentials');
    expect(sent?.body).toMatchObject({
      email: 'designer@marrowfen.example',
      password: 'a long password',
      csrfToken: 'token-1',
    });
    expect(sent?.headers.get('x-auth-return-redirect')).toBe('1');
  });

  it('says that address or password is wrong, and keeps the address', async () => {
    fakeServer({ ...csrf, [post]: answer('?error=CredentialsSignin&code=credentials') });
    openAt('/sign-in');
    await signIn();
    expect(await alert()).toBe('The e-mail address or the password is wrong.');
    expect(screen.getByLabelText<HTMLInputElement>('E-mail').value).toBe('designer@marrowfen.example');
  });

  it.each([
    [{ 'retry-after': '64' }, 'Too many attempts. Wait 64 seconds, then try again.'],
    [{ 'retry-after': '900' }, 'Too many attempts. Wait 15 minutes, then try again.'],
    [{}, 'Too many attempts. Wait a few minutes, then try again.'],
  ])('says how long to wait after too many attempts (%j)', async (headers, sentence) => {
    fakeServer({ ...csrf, [post]: () => problem(429, {}, headers) });
    openAt('/sign-in');
    await signIn();
    expect(await alert()).toBe(sentence);
  });

  it('tells a server out of reach from a wrong password', async () => {
    fakeServer({ 'GET /auth/csrf': noAnswer });
    openAt('/sign-in');
    await signIn();
    expect(await alert()).toBe(
      'The server cannot be reached. Check the network of this device, then try again.',
    );
  });

  it('does not blame the password when the service fails', async () => {
    fakeServer({ ...csrf, [post]: answer('?error=Configuration') });
    openAt('/sign-in');
    await signIn();
    expect(await alert()).toBe('Signing in does not work at the moment. Try again shortly.');
  });
});
