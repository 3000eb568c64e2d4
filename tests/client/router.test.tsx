import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { fakeServer, json, noAnswer, problem } from './support/fake-server.ts';
import { personOf } from './support/samples.ts';
import { openAt, useBrowserParts } from './support/screen.tsx';

useBrowserParts();

const designer = {
  'GET /api/me': () => json(personOf('designer')),
  'GET /api/sections': () => json({ items: [], nextCursor: null }),
};

const emptyDesk = {
  drafts: [],
  recentSections: [],
  outOfTolerance: [],
  unplanned: [],
  sheetsInWork: [],
  staleSheets: [],
};

describe('routes', () => {
  it('lead to the sign-in page with the way back when nobody is signed in', async () => {
    fakeServer({ 'GET /api/me': () => problem(401) });
    const view = openAt('/sections?search=a%20b&sort=name');
    await screen.findByRole('button', { name: 'Sign in' });
    expect(view.address()).toBe(`/sign-in?to=${encodeURIComponent('/sections?search=a%20b&sort=name')}`);
  });

  it('begin at the desk of a designer', async () => {
    fakeServer({ ...designer, 'GET /api/desk': () => json(emptyDesk) });
    const view = openAt('/');
    await screen.findByText('Every measured part is within tolerance or decided.');
    expect(view.address()).toBe('/');
    expect(screen.getByRole('link', { name: 'Desk' }).getAttribute('aria-current')).toBe('page');
  });

  it('say that nothing is at an unknown address, inside the shell', async () => {
    fakeServer(designer);
    openAt('/nowhere');
    expect(await screen.findByRole('heading', { name: 'Nothing is here' })).toBeTruthy();
    expect(screen.getByText('Marrow Fen Works')).toBeTruthy();
  });

  it('say what happened and what was kept when the session cannot be read', async () => {
    fakeServer({ 'GET /api/me': noAnswer });
    openAt('/sections');
    const alert = await screen.findByRole('alert');
    expect(alert.textContent).toContain('The server cannot be reached.');
    expect(alert.textContent).toContain('Saved versions are safe');
  });
});

describe('shell', () => {
  it('lists the keys of the screen on ?', async () => {
    fakeServer(designer);
    openAt('/sections');
    await screen.findByText('No section yet.');
    await userEvent.keyboard('?');
    const dialog = await screen.findByRole('dialog', { name: 'Keys' });
    expect(dialog.textContent).toContain('New section');
  });

  it('does not take a ? that is typed into a field for a key', async () => {
    fakeServer(designer);
    openAt('/sections');
    await userEvent.type(await screen.findByRole('searchbox'), '?');
    expect(screen.queryByRole('dialog')).toBeNull();
  });

  it('signs out to the sign-in page', async () => {
    const server = fakeServer({
      ...designer,
      'GET /auth/csrf': () => json({ csrfToken: 'token-4' }),
      'POST /auth/signout': () => json({ url: 'http://localhost/sign-in' }),
    });
    const view = openAt('/sections');
    await userEvent.click(await screen.findByRole('button', { name: 'Ines Varga' }));
    await userEvent.click(screen.getByRole('menuitem', { name: 'Sign out' }));
    await screen.findByRole('button', { name: 'Sign in' });
    expect(view.address()).toBe('/sign-in');
    expect(server.of('POST', '/auth/signout')).toHaveLength(1);
  });

  it('says so when signing out did not happen', async () => {
    fakeServer({ ...designer, 'GET /auth/csrf': noAnswer });
    openAt('/sections');
    await userEvent.click(await screen.findByRole('button', { name: 'Ines Varga' }));
    await userEvent.click(screen.getByRole('menuitem', { name: 'Sign out' }));
    expect((await screen.findByRole('alert')).textContent).toContain('You are still signed in.');
  });
});
