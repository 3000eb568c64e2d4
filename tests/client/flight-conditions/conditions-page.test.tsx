import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { type Me } from '#server/contracts/people.ts';
import { fakeServer, json, noAnswer, problem } from '#tests/client/support/fake-server.ts';
import { personOf } from '#tests/client/support/samples.ts';
import { openAt, useBrowserParts } from '#tests/client/support/screen.tsx';
import { courier, old, survey } from './samples.ts';
import '#client/flight-conditions/conditions-page.tsx';

useBrowserParts();

const LIST = '/api/flight-conditions';
const page = (items: readonly unknown[]) => json({ items, nextCursor: null });

function serve(role: Me['role'], routes: Parameters<typeof fakeServer>[0] = {}) {
  return fakeServer({
    'GET /api/me': () => json(personOf(role)),
    [`GET ${LIST}`]: () => page([survey, courier, old]),
    ...routes,
  });
}

const at = (id: string) => `/flight-conditions?condition=${id}`;
const side = async (name: string) =>
  (await screen.findByText(name, { selector: 'h2' })).closest<HTMLElement>('section')!;
const field = (label: string) => screen.getByLabelText<HTMLInputElement>(label);
const retype = (label: string, value: string) => fireEvent.change(field(label), { target: { value } });
const press = (name: string) => fireEvent.click(screen.getByText(name, { selector: 'button' }));
const figure = (label: string | RegExp) =>
  screen.getByText(label, { selector: 'dt' }).nextSibling?.textContent;

describe('the flight conditions', () => {
  it('begin with the default, and show the archive when asked', async () => {
    serve('designer');
    const view = openAt('/flight-conditions');
    await side('Survey');
    expect(screen.getByText('Survey', { selector: 'a' }).closest('li')!.textContent).toContain(
      '● default of the workshop',
    );
    expect(screen.getByRole('link', { name: 'Flight' }).getAttribute('aria-current')).toBe('page');
    expect(screen.queryByText('Old', { selector: 'a' })).toBeNull();
    fireEvent.click(field('Show the archive (1)'));
    expect(await screen.findByText('Old', { selector: 'a' })).toBeTruthy();
    expect(view.address()).toBe('/flight-conditions?archive=1');
  });

  it('tell what follows, live, and keep the last figures while the form cannot be read', async () => {
    serve('designer');
    openAt('/flight-conditions');
    await side('Survey');
    // ISO 2533 at sea level: 1.225 kg/m³, ν = 1.4607e-5 m²/s; q = ½·1.225·17²; c_l = 4.2·9.80665/(q·0.576).
    expect(figure('Density')).toBe('1.2250 kg/m³');
    expect(figure('Dynamic pressure')).toBe('177.0 Pa');
    expect(figure('Lift coefficient needed')).toBe('0.404');
    expect(figure('Root, 280.0 mm')).toBe('326\u202f000');
    expect(figure('Mean, 240.0 mm')).toBe('279\u202f000');
    expect(figure('Tip, 200.0 mm')).toBe('233\u202f000');
    expect(figure('Stall, at lift coefficient 1.20')).toBe('9.9 m/s (36 km/h)');
    expect(figure('Critical N of transition')).toBe('9.0');
    retype('Speed', '34');
    expect(figure('Dynamic pressure')).toBe('708.1 Pa');
    expect(figure('Tip, 200.0 mm')).toBe('466\u202f000');
    retype('Speed', '3x');
    expect(screen.getByText(/cannot be read at the moment/)).toBeTruthy();
    expect(figure('Dynamic pressure')).toBe('708.1 Pa');
    retype('Speed', '8');
    expect(screen.getByRole('alert').textContent).toContain('cannot fly level like this');
    retype('At the stall', '2');
    expect(figure('Stall, at lift coefficient 2.00')).toBe('7.6 m/s (28 km/h)');
    expect(screen.queryByRole('alert')).toBeNull();
    retype('At the stall', '0.1');
    expect(screen.getByText('It must be above that of fast flight.')).toBeTruthy();
    expect(figure('Stall, at lift coefficient 2.00')).toBe('7.6 m/s (28 km/h)');
  });

  it('tabulate the Reynolds number over round speeds and chords', async () => {
    serve('designer');
    openAt('/flight-conditions');
    const table = within(await screen.findByRole('table'));
    expect(table.getByRole('columnheader', { name: '16 m/s' })).toBeTruthy();
    const row = table.getByRole('rowheader', { name: '200 mm' }).closest('tr')!;
    const column = table.getAllByRole('columnheader').findIndex((head) => head.textContent === '16 m/s');
    // 16 · 0.2 / 1.4607e-5
    expect(row.children[column]?.textContent).toBe('219');
  });

  it('are for a technician to read, not to change', async () => {
    serve('technician');
    openAt(at(courier.id));
    const facts = await side('Courier');
    expect(facts.textContent).toContain('Wing area0.2600 m²');
    expect(facts.textContent).toContain('Follow local aviation rules.');
    expect(screen.queryByRole('button', { name: /New|Save|Archive|default/ })).toBeNull();
    expect(screen.queryByLabelText('Mass')).toBeNull();
  });

  it('say what is missing, and offer to try again when the list does not come', async () => {
    let answer = () => problem(500);
    serve('technician', { [`GET ${LIST}`]: () => answer() });
    openAt('/flight-conditions');
    const again = await screen.findByRole('button', { name: 'Try again' });
    answer = () => page([]);
    fireEvent.click(again);
    expect(await screen.findByText('No flight condition yet.')).toBeTruthy();
    expect(screen.getByText('An owner or designer enters how the aircraft fly.')).toBeTruthy();
  });

  it('say when the address leads to nothing', async () => {
    serve('technician');
    openAt(at('new'));
    expect(await side('There is no such condition')).toBeTruthy();
  });
});

describe('the form of a flight condition', () => {
  it('makes one and stays with it', async () => {
    const made = { ...courier, id: courier.id.replace(/.$/, '9'), name: 'Kite' };
    let items = [survey];
    const server = serve('designer', {
      [`GET ${LIST}`]: () => page(items),
      [`POST ${LIST}`]: () => {
        items = [survey, made];
        return json(made, 201);
      },
    });
    const view = openAt('/flight-conditions');
    await screen.findByText('Survey', { selector: 'a' });
    press('New');
    await side('New flight condition');
    retype('Name', 'Kite');
    retype('Wing given by', 'area');
    retype('Wing area', '26 dm²');
    retype('Surface', 'forced');
    retype('Transition, upper', '5');
    press('Make the condition');
    await side('Kite');
    expect(server.of('POST', LIST)[0]?.body).toEqual({
      name: 'Kite',
      settings: {
        ...survey.settings,
        wing: { kind: 'area', areaM2: 0.26 },
        surface: { turbulencePercent: 0.07, tripUpper: 0.05, tripLower: null },
      },
    });
    expect(view.address()).toBe(at(made.id));
  });

  it('keeps what was typed, says what is wrong, and that nothing was lost without an answer', async () => {
    const server = serve('designer', { [`PATCH ${LIST}/${courier.id}`]: noAnswer });
    openAt(at(courier.id));
    await side('Courier');
    retype('Mass', '600');
    press('Save');
    expect(await screen.findByText('Mass must be between 0.02 and 500 kg.')).toBeTruthy();
    expect(server.of('PATCH', `${LIST}/${courier.id}`)).toEqual([]);
    retype('Mass', '2.2');
    press('Save');
    expect((await screen.findByText(/cannot be reached/)).textContent).toContain('what you typed is kept');
    expect(field('Mass').value).toBe('2.2');
  });

  it('shows what another changed in between, and saves over it only when told to', async () => {
    const theirs = { ...courier, revision: 4, settings: { ...courier.settings, massKg: 2.5 } };
    const mine = { ...courier.settings, rootChordMm: 230 };
    const server = serve('designer', {
      [`PATCH ${LIST}/${courier.id}`]: ({ body }) =>
        (body as { revision: number }).revision === 4
          ? json({ ...theirs, revision: 5, settings: mine })
          : problem(409, { code: 'revision-conflict', current: theirs }),
    });
    openAt(at(courier.id));
    await side('Courier');
    retype('Root chord', '230');
    press('Save');
    const notice = await screen.findByRole('alert');
    const items = within(notice).getAllByRole('listitem');
    expect(items.map((one) => one.textContent)).toEqual(['Mass: 2.500 kg', 'Root chord: 220.0 mm']);
    press('Save mine over it');
    expect(await screen.findByText('Saved.')).toBeTruthy();
    const sent = server.of('PATCH', `${LIST}/${courier.id}`).map(({ body }) => body);
    expect(sent).toEqual([
      { revision: 1, name: 'Courier', settings: mine },
      { revision: 4, name: 'Courier', settings: mine },
    ]);
  });

  it('makes another one the default, and does not let the default go', async () => {
    let items = [survey, courier];
    const server = serve('designer', {
      [`GET ${LIST}`]: () => page(items),
      [`POST ${LIST}/${courier.id}/default`]: () => {
        items = [
          { ...courier, isDefault: true },
          { ...survey, isDefault: false },
        ];
        return json(items[0]);
      },
    });
    openAt(at(courier.id));
    await side('Courier');
    retype('Mass', '2.2');
    press('Make it the default');
    expect(await screen.findByText('The default stays in use until another one is it.')).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Archive' })).toBeNull();
    expect(field('Mass').value).toBe('2.2');
    expect(server.of('POST', `${LIST}/${courier.id}/default`)).toHaveLength(1);
  });

  it('drops what was typed into the default when it is left unsaved', async () => {
    serve('designer');
    openAt(at(survey.id));
    await side('Survey');
    retype('Mass', '9');
    press('Close');
    await screen.findByText('Leave it unsaved');
    press('Leave it unsaved');
    await waitFor(() => {
      expect(field('Mass').value).toBe('4.200 kg');
    });
  });

  it('asks before typed values are left, and gives the focus back', async () => {
    serve('designer');
    const view = openAt(at(courier.id));
    await side('Courier');
    retype('Name', 'Typed');
    press('Close');
    await screen.findByText('Leave it unsaved');
    press('Leave it unsaved');
    await waitFor(() => {
      expect(view.address()).toBe('/flight-conditions');
    });
    expect(document.activeElement).toBe(screen.getByText('Courier', { selector: 'a' }));
  });
});
