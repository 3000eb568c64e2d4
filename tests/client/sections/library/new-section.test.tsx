import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { sectionCreateSchema } from '#server/contracts/sections.ts';
import { fakeServer, json, noAnswer, problem } from '#tests/client/support/fake-server.ts';
import { personOf, sectionOf } from '#tests/client/support/samples.ts';
import { openAt, useBrowserParts } from '#tests/client/support/screen.tsx';

useBrowserParts();

const made = sectionOf(9, 'Gull wing');
const base = {
  'GET /api/me': () => json(personOf('designer')),
  'GET /api/sections': () => json({ items: [], nextCursor: null }),
};

async function openDialog() {
  const view = openAt('/sections');
  await userEvent.click((await screen.findAllByRole('button', { name: 'New section' }))[0]!);
  const dialog = await screen.findByRole('dialog', { name: 'New section' });
  return {
    view,
    dialog,
    field: (name: string) => within(dialog).getByRole<HTMLInputElement>('textbox', { name }),
  };
}
const send = () => userEvent.click(screen.getByRole('button', { name: 'Make the section' }));

describe('new section', () => {
  it('makes the typed designation and goes to its sheet', async () => {
    const server = fakeServer({ ...base, 'POST /api/sections': () => json(made, 201) });
    const { view, field } = await openDialog();
    await userEvent.type(field('Name'), 'Gull wing');
    await userEvent.clear(field('4-digit designation'));
    await userEvent.type(field('4-digit designation'), 'naca 4415');
    expect(screen.getByText('NACA 4415')).toBeTruthy();
    await send();
    await waitFor(() => {
      expect(view.address()).toBe(`/sections/${made.id}`);
    });
    const body = sectionCreateSchema.parse(server.of('POST', '/api/sections')[0]?.body);
    expect(body).toMatchObject({
      name: 'Gull wing',
      shape: {
        kind: 'naca4',
        maxCamber: 0.04,
        maxCamberPosition: 0.4,
        maxThickness: 0.15,
        trailingEdge: 'open',
      },
    });
  });

  it('names the field that is missing or out of range, and asks nothing of the server', async () => {
    const server = fakeServer(base);
    const { field } = await openDialog();
    await send();
    expect(await screen.findByText('Give the section a name.')).toBeTruthy();
    await userEvent.type(field('Name'), 'Thick');
    await userEvent.clear(field('4-digit designation'));
    await userEvent.type(field('4-digit designation'), '2490');
    await send();
    expect(
      await within(field('4-digit designation').parentElement!).findByText(
        /the last two are a thickness of 01 to 40/,
      ),
    ).toBeTruthy();
    expect(server.of('POST', '/api/sections')).toEqual([]);
  });

  it('fits a free form of the chosen order to the designation', async () => {
    const server = fakeServer({ ...base, 'POST /api/sections': () => json(made, 201) });
    const { dialog, field } = await openDialog();
    await userEvent.type(field('Name'), 'Gull wing');
    await userEvent.click(within(dialog).getByRole('radio', { name: 'Free form' }));
    await userEvent.selectOptions(
      within(dialog).getByRole('combobox', { name: 'Order of both surfaces' }),
      '6',
    );
    await send();
    await waitFor(() => {
      expect(server.of('POST', '/api/sections')).toHaveLength(1);
    });
    const { shape } = sectionCreateSchema.parse(server.of('POST', '/api/sections')[0]?.body);
    expect(shape.kind === 'cst' ? [shape.upper.length, shape.lower.length] : shape.kind).toEqual([7, 7]);
  });

  it('keeps what was typed when there is no answer, and sends the same key again', async () => {
    let reachable = false;
    const server = fakeServer({
      ...base,
      'POST /api/sections': () => (reachable ? json(made, 201) : noAnswer()),
    });
    const { view, field } = await openDialog();
    await userEvent.type(field('Name'), 'Gull wing');
    await send();
    expect((await screen.findByRole('alert')).textContent).toContain(
      'The section was not made; what you typed is kept.',
    );
    expect(field('Name').value).toBe('Gull wing');
    reachable = true;
    await send();
    await waitFor(() => {
      expect(view.address()).toBe(`/sections/${made.id}`);
    });
    const [first, second] = server
      .of('POST', '/api/sections')
      .map((one) => (one.body as { key: string }).key);
    expect(second).toBe(first);
  });

  it('takes a new key when what is sent has changed', async () => {
    const server = fakeServer({
      ...base,
      'POST /api/sections': () => problem(422, { errors: [{ path: 'name', message: 'The name is taken.' }] }),
    });
    const { field } = await openDialog();
    await userEvent.type(field('Name'), 'Gull');
    await send();
    expect(await screen.findByText('The name is taken.')).toBeTruthy();
    await userEvent.type(field('Name'), ' wing');
    await send();
    await waitFor(() => {
      expect(server.of('POST', '/api/sections')).toHaveLength(2);
    });
    const keys = server.of('POST', '/api/sections').map((one) => (one.body as { key: string }).key);
    expect(new Set(keys).size).toBe(2);
  });
});
