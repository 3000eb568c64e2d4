import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { type Asked, fakeServer, json, noAnswer, problem } from '#tests/client/support/fake-server.ts';
import { idOf, personOf, sectionOf } from '#tests/client/support/samples.ts';
import { openAt, useBrowserParts } from '#tests/client/support/screen.tsx';

useBrowserParts();

const designer = { 'GET /api/me': () => json(personOf('designer')) };
const heron = sectionOf(1, 'Heron outer panel');
const fin = sectionOf(2, 'Tail fin', { releasedNumber: 4, latest: { ...heron.latest, status: 'released' } });
const list = (...items: unknown[]) => ({ 'GET /api/sections': () => json({ items, nextCursor: null }) });
const queries = (asked: readonly Asked[]) => asked.map((one) => Object.fromEntries(one.query));

describe('library', () => {
  it('lists sections with what tells them apart, each a link to its sheet', async () => {
    fakeServer({ ...designer, ...list(heron, fin) });
    openAt('/sections');
    const row = (await screen.findByRole('rowheader', { name: /Heron outer panel/ })).closest('tr')!;
    for (const text of ['NACA 2412', '12.0 %', '2.00 %', 'draft', 'v4', 'Ines Varga'])
      expect(within(row).getByText(text)).toBeTruthy();
    expect(row.textContent).toContain('v3 released');
    expect(within(row).getByRole('link').getAttribute('href')).toBe(`/sections/${heron.id}`);
    expect(screen.getByText('2 shown')).toBeTruthy();
  });

  it('shows rows of the true size while the first page is on its way', async () => {
    fakeServer({ ...designer, 'GET /api/sections': () => new Promise<Response>(() => undefined) });
    openAt('/sections');
    const table = await screen.findByRole('table');
    expect(table.getAttribute('aria-busy')).toBe('true');
    expect(within(table).getAllByRole('row')).toHaveLength(9);
  });

  it('offers to make a section where there is none', async () => {
    fakeServer({ ...designer, ...list() });
    openAt('/sections');
    expect(await screen.findByText('No section yet.')).toBeTruthy();
    expect(screen.getAllByRole('button', { name: 'New section' })).toHaveLength(2);
  });

  it('offers to clear the search where nothing matches', async () => {
    const server = fakeServer({
      ...designer,
      'GET /api/sections': ({ query }) =>
        json({ items: query.has('search') ? [] : [heron], nextCursor: null }),
    });
    const view = openAt('/sections?search=gull&kind=cst&sort=name');
    await userEvent.click(await screen.findByRole('button', { name: 'Clear search and filters' }));
    expect(await screen.findByText('Heron outer panel')).toBeTruthy();
    expect(view.address()).toBe('/sections?sort=name');
    expect(screen.getByRole<HTMLInputElement>('searchbox').value).toBe('');
    expect(queries(server.of('GET', '/api/sections'))[0]).toMatchObject({
      search: 'gull',
      kind: 'cst',
      sort: 'name',
    });
  });

  it('says what happened when the list cannot be loaded, and tries again', async () => {
    let ready = false;
    fakeServer({
      ...designer,
      'GET /api/sections': () => (ready ? json({ items: [heron], nextCursor: null }) : noAnswer()),
    });
    openAt('/sections');
    expect((await screen.findByRole('alert')).textContent).toContain('The server cannot be reached.');
    ready = true;
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByText('Heron outer panel')).toBeTruthy();
  });

  it('searches after a pause in typing, and the address carries it', async () => {
    const server = fakeServer({ ...designer, ...list(heron) });
    const view = openAt('/sections');
    await userEvent.type(await screen.findByRole('searchbox'), 'heron ');
    await waitFor(() => {
      expect(view.address()).toBe('/sections?search=heron');
    });
    await waitFor(() => {
      expect(queries(server.of('GET', '/api/sections')).at(-1)).toMatchObject({ search: 'heron' });
    });
    expect(screen.getByRole<HTMLInputElement>('searchbox').value).toBe('heron ');
  });

  it('sorts by a head, turns round on the second press, and says so', async () => {
    const server = fakeServer({ ...designer, ...list(heron) });
    const view = openAt('/sections');
    await screen.findByText('Heron outer panel');
    const head = (name: string) => screen.getByRole('columnheader', { name });
    expect(head('Changed').getAttribute('aria-sort')).toBe('descending');
    await userEvent.click(screen.getByRole('button', { name: 'Name' }));
    expect(head('Name').getAttribute('aria-sort')).toBe('ascending');
    expect(head('Changed').getAttribute('aria-sort')).toBeNull();
    await userEvent.click(screen.getByRole('button', { name: 'Name' }));
    expect(head('Name').getAttribute('aria-sort')).toBe('descending');
    expect(view.address()).toBe('/sections?sort=name&direction=descending');
    expect(queries(server.of('GET', '/api/sections')).at(-1)).toMatchObject({
      sort: 'name',
      direction: 'descending',
    });
  });

  it('adds the next page below and keeps what stands', async () => {
    fakeServer({
      ...designer,
      'GET /api/sections': ({ query }) =>
        json(
          query.get('cursor') === 'page-2'
            ? { items: [fin], nextCursor: null }
            : { items: [heron], nextCursor: 'page-2' },
        ),
    });
    openAt('/sections');
    expect(await screen.findByText('1 shown, there are more')).toBeTruthy();
    await userEvent.click(screen.getByRole('button', { name: 'Show more' }));
    expect(await screen.findByText('Tail fin')).toBeTruthy();
    expect(screen.getByText('Heron outer panel')).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Show more' })).toBeNull();
  });

  it('archives from the menu of a row, and takes it back', async () => {
    let archived = false;
    const path = `/api/sections/${heron.id}`;
    const server = fakeServer({
      ...designer,
      'GET /api/sections': () => json({ items: archived ? [] : [heron], nextCursor: null }),
      [`PATCH ${path}`]: ({ body }) => {
        archived = (body as { archived: boolean }).archived;
        return json({ ...heron, archived });
      },
    });
    openAt('/sections');
    await userEvent.click(await screen.findByRole('button', { name: 'Actions for Heron outer panel' }));
    await userEvent.click(screen.getByRole('menuitem', { name: 'Archive' }));
    expect(await screen.findByText('"Heron outer panel" is archived.')).toBeTruthy();
    await userEvent.click(screen.getByRole('button', { name: 'Undo' }));
    expect(await screen.findByRole('rowheader', { name: /Heron outer panel/ })).toBeTruthy();
    expect(server.of('PATCH', path).map((one) => one.body)).toEqual([
      { archived: true },
      { archived: false },
    ]);
  });

  it('says that a section is as it was when it could not be archived', async () => {
    fakeServer({
      ...designer,
      ...list(heron),
      [`PATCH /api/sections/${heron.id}`]: () => problem(409, { title: 'It is in use.' }),
    });
    openAt('/sections');
    await userEvent.click(await screen.findByRole('button', { name: 'Actions for Heron outer panel' }));
    await userEvent.click(screen.getByRole('menuitem', { name: 'Archive' }));
    expect((await screen.findByRole('alert')).textContent).toBe(
      '"Heron outer panel" is as it was. It is in use.',
    );
  });

  it('asks to sign in again over the screen when the session ends, and goes on where it was', async () => {
    let signedIn = true;
    fakeServer({
      ...designer,
      'GET /api/sections': () => (signedIn ? json({ items: [heron], nextCursor: null }) : problem(401)),
      'GET /auth/csrf': () => json({ csrfToken: 'token-3' }),
      'POST /auth/callback/credentials': () => {
        signedIn = true;
        return json({ url: 'http://localhost/' });
      },
    });
    const view = openAt('/sections');
    await screen.findByText('Heron outer panel');
    signedIn = false;
    await userEvent.selectOptions(screen.getByRole('combobox', { name: 'Status' }), 'draft');
    const dialog = await screen.findByRole('dialog', { name: 'Sign in again' });
    await userEvent.type(await within(dialog).findByLabelText('Password'), 'a long password');
    await userEvent.click(within(dialog).getByRole('button', { name: 'Sign in' }));
    await waitFor(() => {
      expect(screen.queryByRole('dialog')).toBeNull();
    });
    expect(await screen.findByText('Heron outer panel')).toBeTruthy();
    expect(view.address()).toBe('/sections?status=draft');
  });
});

describe('library of a technician', () => {
  it('shows what is released in large rows that lead to the files, and nothing to write with', async () => {
    fakeServer({ 'GET /api/me': () => json(personOf('technician')), ...list(fin) });
    openAt('/sections?status=released');
    const link = await screen.findByRole('link', { name: 'Tail fin' });
    expect(link.getAttribute('href')).toBe(`/sections/${idOf(102)}/versions/4`);
    expect(screen.queryByRole('combobox', { name: 'Status' })).toBeNull();
    expect(screen.queryByRole('button', { name: /New section|Actions/ })).toBeNull();
  });

  it('says so while nothing is released', async () => {
    fakeServer({ 'GET /api/me': () => json(personOf('technician')), ...list() });
    openAt('/sections?status=released');
    expect(await screen.findByText('Nothing is released yet.')).toBeTruthy();
  });
});
