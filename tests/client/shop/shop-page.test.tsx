import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { type Me } from '#server/contracts/people.ts';
import { fakeServer, json, noAnswer, problem } from '#tests/client/support/fake-server.ts';
import { personOf } from '#tests/client/support/samples.ts';
import { openAt, useBrowserParts } from '#tests/client/support/screen.tsx';
import { bench, bow, foam, kerf, oldBow } from './samples.ts';
import '#client/shop/shop-page.tsx';

useBrowserParts();

type Routes = Parameters<typeof fakeServer>[0];
const page = (items: readonly unknown[]) => json({ items, nextCursor: null });

function serve(role: Me['role'], routes: Routes = {}, preferences: Partial<Me['preferences']> = {}) {
  return fakeServer({
    'GET /api/me': () => json(personOf(role, preferences)),
    'GET /api/machines': () => page([bench, bow, oldBow]),
    'GET /api/materials': () => page([foam]),
    'GET /api/kerfs': () => page([kerf]),
    ...routes,
  });
}

const side = (name: string) => screen.findByRole('region', { name });
const field = (label: string) => screen.getByLabelText<HTMLInputElement>(label);

async function retype(label: string, text: string) {
  await userEvent.clear(field(label));
  if (text !== '') await userEvent.type(field(label), text);
}

describe('the shop', () => {
  it('shows machines, materials and kerfs, and those of the archive when asked', async () => {
    serve('builder');
    const view = openAt('/shop');
    expect(await screen.findByRole('link', { name: 'Long bench' })).toBeTruthy();
    const cell = screen.getByRole('link', { name: 'Kerf of Long bench in XPS 32: 0.80 mm' }).closest('td')!;
    expect(cell.textContent).toContain('at 200 mm/min');
    expect(cell.textContent).toContain('◌ default, not measured');
    expect(screen.getByRole('link', { name: 'Kerf of Two-hand bow in XPS 32: none yet' })).toBeTruthy();
    expect(screen.queryByRole('link', { name: 'Old bow' })).toBeNull();
    await userEvent.click(screen.getByRole('checkbox', { name: 'Show the archive (1)' }));
    expect(await screen.findByRole('link', { name: 'Old bow' })).toBeTruthy();
    expect(view.address()).toBe('/shop?archive=1');
  });

  it('speaks inches to whom it should', async () => {
    serve('builder', {}, { units: 'inch' });
    openAt(`/shop?machine=${bench.id}`);
    await side('Long bench');
    expect(field('Between the towers').value).toBe('39.37 in');
    expect(field('Largest feed').value).toBe('39.4 in/min');
  });

  it.each(['designer', 'technician'] as const)('is for a %s to read, not to change', async (role) => {
    serve(role);
    openAt(`/shop?machine=${bench.id}`);
    const facts = await side('Long bench');
    expect(facts.textContent).toContain('Between the towers1000.0 mm');
    expect(facts.textContent).toContain('emergency stop');
    expect(screen.queryAllByRole('textbox')).toEqual([]);
    expect(screen.queryByRole('button', { name: /New|Save|Archive/ })).toBeNull();
    expect(screen.queryByRole('link', { name: /^Kerf of/ })).toBeNull();
    expect(screen.getByText('0.80 mm')).toBeTruthy();
  });

  it('says what is missing, and to whom', async () => {
    const none = {
      'GET /api/machines': () => page([]),
      'GET /api/materials': () => page([]),
      'GET /api/kerfs': () => page([]),
    };
    serve('technician', none);
    openAt('/shop');
    expect(await screen.findByText('No machine yet.')).toBeTruthy();
    expect(screen.getByText('An owner or builder enters what the shop cuts with.')).toBeTruthy();
    expect(screen.getByText(/their kerf stands here/)).toBeTruthy();
  });

  it('offers to try again when a list does not come', async () => {
    let broken = true;
    serve('builder', { 'GET /api/kerfs': () => (broken ? problem(500) : page([kerf])) });
    openAt('/shop');
    const again = await screen.findByRole('button', { name: 'Try again' });
    broken = false;
    await userEvent.click(again);
    expect(await screen.findByRole('link', { name: /^Kerf of Long bench/ })).toBeTruthy();
  });

  it('says when the address leads to nothing', async () => {
    serve('builder');
    openAt(`/shop?machine=${foam.id}`);
    expect(await side('There is no such machine')).toBeTruthy();
  });
});

describe('the form of a machine', () => {
  it('makes one of another kind and stays with it', async () => {
    const made = { ...bow, id: bench.id.replace(/.$/, '9'), name: 'Kite bow' };
    let items = [bench];
    const server = serve('builder', {
      'GET /api/machines': () => page(items),
      'POST /api/machines': () => {
        items = [bench, made];
        return json(made, 201);
      },
    });
    const view = openAt('/shop');
    await userEvent.click(await screen.findByRole('button', { name: 'New machine' }));
    await userEvent.selectOptions(field('Kind'), 'bow');
    await userEvent.type(field('Name'), 'Kite bow');
    await retype('Free wire', '0.9 m');
    await userEvent.click(screen.getByRole('button', { name: 'Make the machine' }));
    await side('Kite bow');
    expect(server.of('POST', '/api/machines')[0]?.body).toEqual({ name: 'Kite bow', settings: bow.settings });
    expect(view.address()).toBe(`/shop?machine=${made.id}`);
  });

  it('keeps what was typed and says what is wrong, without asking the server', async () => {
    const server = serve('builder');
    openAt(`/shop?machine=${bench.id}`);
    await side('Long bench');
    await retype('Between the towers', 'wide');
    await retype('Feed outside the foam', '2000');
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    await waitFor(() => {
      expect(field('Between the towers').getAttribute('aria-invalid')).toBe('true');
    });
    expect(field('Between the towers').value).toBe('wide');
    await retype('Between the towers', '1200');
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    expect(await screen.findByText(/must not be above the machine’s largest feed/)).toBeTruthy();
    expect(server.of('PATCH', `/api/machines/${bench.id}`)).toEqual([]);
  });

  it('shows the answer of the server at its field, and that nothing was lost without one', async () => {
    let answer = () =>
      problem(422, { errors: [{ path: 'name', message: '“Two-hand bow” is there already.' }] });
    serve('builder', { [`PATCH /api/machines/${bench.id}`]: () => answer() });
    openAt(`/shop?machine=${bench.id}`);
    await side('Long bench');
    await retype('Name', 'Two-hand bow');
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    expect(await screen.findByText('“Two-hand bow” is there already.')).toBeTruthy();
    answer = noAnswer;
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    expect((await screen.findByText(/cannot be reached/)).textContent).toContain('what you typed is kept');
    expect(field('Name').value).toBe('Two-hand bow');
  });

  it('shows what another changed in between, and saves over it only when told to', async () => {
    const theirs = {
      ...bench,
      revision: 4,
      settings: { ...bench.settings, maxFeedMmMin: 900 },
      updatedBy: { ...bench.updatedBy, name: 'Oda Fenlow' },
    };
    const server = serve('builder', {
      [`PATCH /api/machines/${bench.id}`]: ({ body }) =>
        (body as { revision: number }).revision === 4
          ? json({ ...theirs, revision: 5, name: 'Long bench, new' })
          : problem(409, { code: 'revision-conflict', current: theirs }),
    });
    openAt(`/shop?machine=${bench.id}`);
    await side('Long bench');
    await retype('Name', 'Long bench, new');
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    const notice = await screen.findByRole('alert');
    expect(notice.textContent).toContain('Oda Fenlow changed this in between');
    expect(
      within(notice)
        .getAllByRole('listitem')
        .map((one) => one.textContent),
    ).toEqual(['Name: Long bench', 'Largest feed: 900 mm/min']);
    expect(field('Name').value).toBe('Long bench, new');
    await userEvent.click(within(notice).getByRole('button', { name: 'Save mine over it' }));
    expect(await screen.findByText('Saved.')).toBeTruthy();
    const sent = server.of('PATCH', `/api/machines/${bench.id}`).map((one) => one.body);
    expect(sent).toEqual([
      { revision: 1, name: 'Long bench, new', settings: bench.settings },
      { revision: 4, name: 'Long bench, new', settings: bench.settings },
    ]);
  });

  it('archives, and keeps what is typed', async () => {
    const server = serve('builder', {
      [`PATCH /api/machines/${bench.id}`]: () => json({ ...bench, archived: true, revision: 2 }),
    });
    openAt(`/shop?machine=${bench.id}`);
    await side('Long bench');
    await retype('Name', 'Typed');
    await userEvent.click(screen.getByRole('button', { name: 'Archive' }));
    expect(await screen.findByRole('button', { name: 'Take back from the archive' })).toBeTruthy();
    expect(field('Name').value).toBe('Typed');
    expect(server.of('PATCH', `/api/machines/${bench.id}`)[0]?.body).toEqual({ revision: 1, archived: true });
  });

  it('asks before typed values are left', async () => {
    serve('builder');
    const view = openAt(`/shop?machine=${bench.id}`);
    await side('Long bench');
    await retype('Name', 'Typed');
    await userEvent.click(screen.getByRole('link', { name: 'Two-hand bow' }));
    const question = await screen.findByRole('dialog', { name: 'Leave without saving?' });
    await userEvent.click(within(question).getByRole('button', { name: 'Stay here' }));
    expect(field('Name').value).toBe('Typed');
    await userEvent.click(screen.getByRole('button', { name: 'Close' }));
    await userEvent.click(await screen.findByRole('button', { name: 'Leave it unsaved' }));
    await waitFor(() => {
      expect(view.address()).toBe('/shop');
    });
    expect(document.activeElement).toBe(screen.getByRole('link', { name: 'Long bench' }));
  });
});

describe('the form of a kerf', () => {
  const path = `/api/machines/${bench.id}/kerfs/${foam.id}`;

  it('turns a default into a measurement of a day', async () => {
    const server = serve('builder', {
      [`PUT ${path}`]: () =>
        json({ ...kerf, kerfMm: 0.94, isDefault: false, measuredOn: '2026-02-03', revision: 2 }),
    });
    openAt('/shop');
    await userEvent.click(await screen.findByRole('link', { name: /^Kerf of Long bench in XPS 32/ }));
    await side('Kerf: Long bench');
    await retype('Kerf', '0.94');
    await userEvent.selectOptions(field('Where it comes from'), 'measured');
    await userEvent.clear(field('Measured on'));
    await userEvent.type(field('Measured on'), '2026-02-03');
    await userEvent.click(screen.getByRole('button', { name: 'Save the kerf' }));
    expect(await screen.findByText('Saved.')).toBeTruthy();
    expect(server.of('PUT', path)[0]?.body).toEqual({
      kerfMm: 0.94,
      speedMmMin: 200,
      measuredOn: '2026-02-03',
      revision: 1,
    });
  });

  it('asks a bow for no speed, and names what is missing', async () => {
    const server = serve('owner');
    openAt(`/shop?machine=${bow.id}&material=${foam.id}`);
    await side('Kerf: Two-hand bow');
    expect(screen.queryByLabelText(/speed/)).toBeNull();
    await userEvent.click(screen.getByRole('button', { name: 'Save the kerf' }));
    expect(await screen.findByText(/Type a number, such as/)).toBeTruthy();
    await userEvent.type(field('Kerf'), '7');
    await userEvent.click(screen.getByRole('button', { name: 'Save the kerf' }));
    expect(await screen.findByText('The kerf must be between 0.01 and 6 mm.')).toBeTruthy();
    expect(server.of('PUT', `/api/machines/${bow.id}/kerfs/${foam.id}`)).toEqual([]);
  });

  it('shows another measurement in between, and takes it when told to', async () => {
    const theirs = { ...kerf, kerfMm: 1.1, isDefault: false, measuredOn: '2026-02-02', revision: 2 };
    serve('builder', {
      [`PUT ${path}`]: () => problem(409, { code: 'revision-conflict', current: theirs }),
    });
    openAt(`/shop?machine=${bench.id}&material=${foam.id}`);
    await side('Kerf: Long bench');
    await retype('Kerf', '0.9 mm');
    await userEvent.click(screen.getByRole('button', { name: 'Save the kerf' }));
    const notice = await screen.findByRole('alert');
    expect(notice.textContent).toContain('1.10 mm, at 200 mm/min, measured on 2026-02-02');
    expect(field('Kerf').value).toBe('0.9 mm');
    await userEvent.click(within(notice).getByRole('button', { name: 'Take what is there' }));
    expect(field('Kerf').value).toBe('1.10 mm');
    expect(field('Measured on').value).toBe('2026-02-02');
  });
});
