import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { fakeServer, json, problem } from '#tests/client/support/fake-server.ts';
import { personOf } from '#tests/client/support/samples.ts';
import { openAt, useBrowserParts } from '#tests/client/support/screen.tsx';

useBrowserParts();

const me = personOf('builder');

async function typePasswords(current: string, next: string, again = next) {
  await userEvent.type(await screen.findByLabelText('Password now'), current);
  await userEvent.type(screen.getByLabelText('New password'), next);
  await userEvent.type(screen.getByLabelText('New password again'), again);
  await userEvent.click(screen.getByRole('button', { name: 'Change the password' }));
}

describe('account page', () => {
  it('shows the person and keeps a choice of unit and theme', async () => {
    let now = me;
    const server = fakeServer({
      'GET /api/me': () => json(now),
      'PATCH /api/me/preferences': ({ body }) => {
        now = { ...now, preferences: { ...now.preferences, ...(body as object) } };
        return json(now);
      },
    });
    openAt('/account');
    expect(await screen.findByText('builder@marrowfen.example')).toBeTruthy();
    await userEvent.click(screen.getByRole('radio', { name: 'inch' }));
    await userEvent.click(screen.getByRole('radio', { name: 'Night' }));
    await waitFor(() => {
      expect(server.of('PATCH', '/api/me/preferences').map((one) => one.body)).toEqual([
        { units: 'inch' },
        { theme: 'night' },
      ]);
    });
    expect(document.documentElement.dataset['theme']).toBe('night');
    expect(localStorage.getItem('ribwright.theme')).toBe('night');
    expect(screen.getByRole<HTMLInputElement>('radio', { name: 'inch' }).checked).toBe(true);
  });

  it('says when a choice could not be kept', async () => {
    fakeServer({ 'GET /api/me': () => json(me), 'PATCH /api/me/preferences': () => problem(503) });
    openAt('/account');
    await userEvent.click(await screen.findByRole('radio', { name: 'inch' }));
    expect((await screen.findByRole('alert')).textContent).toContain('The choice was not kept.');
    expect(screen.getByRole<HTMLInputElement>('radio', { name: 'mm' }).checked).toBe(true);
  });

  it('refuses a short password and two that differ without asking the server', async () => {
    const server = fakeServer({ 'GET /api/me': () => json(me) });
    openAt('/account');
    await typePasswords('the one before', 'short', 'shorter');
    expect(await screen.findByText('A password has at least 10 characters.')).toBeTruthy();
    expect(server.of('POST', '/api/me/password')).toEqual([]);
  });

  it('shows a wrong present password at its field', async () => {
    fakeServer({
      'GET /api/me': () => json(me),
      'POST /api/me/password': () =>
        problem(422, { errors: [{ path: 'current', message: 'This is not your present password.' }] }),
    });
    openAt('/account');
    await typePasswords('not the one', 'a new long password');
    expect(await screen.findByText('This is not your present password.')).toBeTruthy();
    expect(screen.getByLabelText('Password now').getAttribute('aria-invalid')).toBe('true');
  });

  it('signs in again with the new password, because the change ended every session', async () => {
    const server = fakeServer({
      'GET /api/me': () => json(me),
      'POST /api/me/password': () => new Response(null, { status: 204 }),
      'GET /auth/csrf': () => json({ csrfToken: 'token-2' }),
      'POST /auth/callback/credentials': () => json({ url: 'http://localhost/' }),
    });
    openAt('/account');
    await typePasswords('the one before', 'a new long password');
    expect(await screen.findByText('The password is changed. Every other session has ended.')).toBeTruthy();
    expect(server.of('POST', '/auth/callback/credentials')[0]?.body).toMatchObject({
      email: me.email,
      password: 'a new long password',
    });
  });
});
