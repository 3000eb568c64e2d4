import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { beforeEach, expect, test, vi } from 'vitest';
import { type SheetDraft } from '#server/contracts/cut-sheets.ts';
import { valuesOf, withValue } from '#client/cut-sheets/planner/plan-values.ts';
import { bench, bow, foam, kerf } from '#tests/client/shop/samples.ts';
import { type Asked, fakeServer, json, problem } from '#tests/client/support/fake-server.ts';
import { personOf, sectionOf } from '#tests/client/support/samples.ts';
import { openAt, useBrowserParts } from '#tests/client/support/screen.tsx';
import { PLAN, SECTION_VERSION, SHEET, versionOf } from './samples.ts';
// Read before the first test, so that no test waits for a screen's file to be read.
import '#client/cut-sheets/sheet-page.tsx';
import '#client/cut-sheets/planner/planner.tsx';

// There are no workers in jsdom: the plan is worked out in the page.
vi.mock('#client/workers/plan-client.ts', async () => {
  const { workOut } = await import('#client/cut-sheets/views/work-out.ts');
  return { workOutAside: (...input: Parameters<typeof workOut>) => Promise.resolve(workOut(...input)) };
});

useBrowserParts();
// A whole screen each; the machine may be busy with other tests.
vi.setConfig({ testTimeout: 20_000 });
beforeEach(() => {
  // jsdom has no layout to scroll.
  Element.prototype.scrollIntoView = vi.fn();
});

const SHEET_PATH = `/api/cut-sheets/${SHEET.id}`;
const page = (items: readonly unknown[]) => json({ items, nextCursor: null });

function serve({
  draft = null,
  save,
}: { draft?: SheetDraft | null; save?: (asked: Asked) => Response } = {}) {
  const section = `/api/sections/${SECTION_VERSION.sectionId}`;
  return fakeServer({
    'GET /api/me': () => json(personOf('builder')),
    [`GET ${SHEET_PATH}`]: () => json(SHEET),
    [`GET ${SHEET_PATH}/draft`]: () => (draft ? json(draft) : problem(404)),
    [`PUT ${SHEET_PATH}/draft`]: ({ body }) =>
      json({ ...(body as object), updatedAt: '2024-03-03T10:00:00.000Z' }),
    [`DELETE ${SHEET_PATH}/draft`]: () => new Response(null, { status: 204 }),
    [`GET ${SHEET_PATH}/versions/1`]: () => json(versionOf(1)),
    [`GET ${SHEET_PATH}/versions/2`]: () => json(versionOf(2)),
    [`POST ${SHEET_PATH}/versions`]: (asked) => save?.(asked) ?? json(versionOf(2), 201),
    'GET /api/sections': () => page([sectionOf(1, 'Heron outer panel')]),
    [`GET ${section}/versions`]: () => page([SECTION_VERSION]),
    [`GET ${section}/versions/3`]: () => json(SECTION_VERSION),
    'GET /api/machines': () => page([bench, bow]),
    'GET /api/materials': () => page([foam]),
    'GET /api/kerfs': () => page([kerf, { ...kerf, machineId: bow.id, kerfMm: 1.2 }]),
  });
}

/** Looking for roles in a form of this size is slow, so elements are found by their own marks. */
const drawing = () => document.querySelector('svg[aria-label^="Cut sheet Heron left"]');
async function openPlanner() {
  openAt(`/cut-sheets/${SHEET.id}`);
  await waitFor(() => expect(drawing()).not.toBeNull());
}
const button = (text: string | RegExp) => screen.getByText(text, { selector: 'button' });
const labelled = (label: string) => document.querySelector<HTMLElement>(`[aria-label="${label}"]`)!;
const findingOf = (pattern: RegExp) =>
  [...labelled('Findings').querySelectorAll('button')].find(({ textContent }) => pattern.test(textContent));

const fieldAt = (name: string) => document.querySelector<HTMLInputElement>(`[name="${name}"]`)!;
function type(name: string, text: string): void {
  fireEvent.focus(fieldAt(name));
  fireEvent.change(fieldAt(name), { target: { value: text } });
  fireEvent.keyDown(fieldAt(name), { key: 'Enter' });
}

test('shows the plan, what it comes to, and what there is to know of it', async () => {
  serve();
  await openPlanner();
  expect(fieldAt('panel.spanMm').value).toBe('600.0 mm');
  expect(fieldAt('features.0.rootStation').value).toBe('40.0 %');
  expect(findingOf(/^Note\. At the root the skins meet/)).toBeDefined();
  expect(within(labelled('Figures')).getByText(/ g$/)).toBeTruthy();
  expect(screen.getByText(/the emergency stop in reach\.$/)).toBeTruthy();
});

test('a value that cannot be read stays, is kept as it is, dims the drawing, and is undone', async () => {
  const server = serve();
  await openPlanner();
  type('features.0.rootDepthMm', '2 mmm');
  expect(fieldAt('features.0.rootDepthMm').value).toBe('2 mmm');
  expect(fieldAt('features.0.rootDepthMm').getAttribute('aria-invalid')).toBe('true');
  expect(screen.getByText(/^One value is not usable/)).toBeTruthy();
  expect(drawing()?.querySelector('.opacity-40')).not.toBeNull();
  await waitFor(() => expect(server.of('PUT', `${SHEET_PATH}/draft`)).toHaveLength(1));
  expect(server.of('PUT', `${SHEET_PATH}/draft`)[0]?.body).toEqual({
    basedOn: 1,
    values: withValue(valuesOf(PLAN), 'features.0.rootDepthMm', '2 mmm'),
  });
  fireEvent.click(button('Undo'));
  expect(fieldAt('features.0.rootDepthMm').value).toBe('3.00 mm');
  expect(screen.queryByText(/^One value is not usable/)).toBeNull();
});

test('an error is found at once; pressing it shows its place and goes to its field', async () => {
  serve();
  await openPlanner();
  type('features.0.rootDepthMm', '60');
  await waitFor(() => expect(findingOf(/^Error\. The slot “Cap”/)).toBeDefined());
  const error = findingOf(/^Error\. The slot “Cap”/)!;
  fireEvent.click(error);
  expect(document.activeElement).toBe(fieldAt('features.0.rootDepthMm'));
  expect(fieldAt('features.0.rootDepthMm').closest('details')?.open).toBe(true);
  expect(screen.getByTestId('highlight').querySelectorAll('circle')).toHaveLength(1);
  fireEvent.click(error);
  expect(screen.queryByTestId('highlight')).toBeNull();
});

test('another machine brings its kerf, and a hand bow runs no wire', async () => {
  serve();
  await openPlanner();
  fireEvent.change(fieldAt('machineId'), { target: { value: bow.id } });
  expect(fieldAt('kerfMm.root').value).toBe('1.20 mm');
  expect(fieldAt('kerfMm.tip').value).toBe('1.20 mm');
  await screen.findByText(/^No wire runs/);
});

test('features are added, moved and removed, each a step to undo', async () => {
  serve();
  await openPlanner();
  fireEvent.click(labelled('Add a feature'));
  fireEvent.click(button('Tube with its entry slit'));
  expect(fieldAt('features.1.diameterMm').value).toBe('6.00 mm');
  fireEvent.click(labelled('Move Tube 2 up'));
  expect(fieldAt('features.0.diameterMm').value).toBe('6.00 mm');
  expect(fieldAt('features.1.name').value).toBe('Cap');
  fireEvent.click(button('Remove tube 1'));
  expect(fieldAt('features.0.name').value).toBe('Cap');
  for (let i = 0; i < 3; i++) fireEvent.click(button('Undo'));
  expect(fieldAt('features.0.name').value).toBe('Cap');
  expect(fieldAt('features.1.name')).toBeNull();
});

test('a save that met another one shows what differs, and goes on top with all that was typed', async () => {
  const latest = versionOf(2, { plan: { ...PLAN, quantity: 5 } });
  const server = serve({
    save: ({ body }) =>
      (body as { basedOn: number }).basedOn === 1
        ? problem(409, { code: 'version-conflict', basedOn: 1, latest })
        : json(versionOf(3, { plan: { ...PLAN, panel: { ...PLAN.panel, spanMm: 610 } } }), 201),
  });
  await openPlanner();
  type('panel.spanMm', '600 + 10');
  fireEvent.click(button('Save as version 2'));
  fireEvent.change(await screen.findByLabelText(/^What changed/), { target: { value: 'Longer' } });
  fireEvent.click(button('Save version 2'));
  await screen.findByText('Version 2 came in between');
  const rows = [...document.querySelectorAll('dialog tr')].map((row) => row.textContent);
  expect(rows).toEqual(['ValueVersion 2Your plan', 'panel, span (mm)600610', 'quantity52']);
  fireEvent.click(button('Save on top of version 2'));
  await screen.findByText('version 3, no unsaved changes');
  expect(server.of('POST', `${SHEET_PATH}/versions`).at(-1)?.body).toMatchObject({
    basedOn: 2,
    note: 'Longer',
    plan: { panel: { spanMm: 610 }, quantity: 2 },
  });
});

test('the unsaved plan of the server is opened; saving it wrong goes to the wrong field', async () => {
  const values = { ...withValue(valuesOf(PLAN), 'panel.washoutDeg', 90) };
  const server = serve({ draft: { basedOn: 1, values, updatedAt: '2024-03-03T10:00:00.000Z' } });
  await openPlanner();
  expect(fieldAt('panel.washoutDeg').value).toBe('90.00°');
  fireEvent.click(button('Save as version 2'));
  expect(document.activeElement).toBe(fieldAt('panel.washoutDeg'));
  expect(document.querySelector('dialog')).toBeNull();
  expect(server.of('POST', `${SHEET_PATH}/versions`)).toEqual([]);
});

test('the wire is stepped along the cut from the slider', async () => {
  serve();
  await openPlanner();
  const slider = labelled('Time of the cut');
  expect(slider.getAttribute('aria-valuetext')).toContain('Travel');
  for (let i = 0; i < 5; i++) fireEvent.keyDown(slider, { key: 'ArrowRight' });
  expect(slider.getAttribute('aria-valuetext')).toContain('Lead in');
  for (let i = 0; i < 3; i++) fireEvent.keyDown(slider, { key: 'ArrowRight' });
  expect(slider.getAttribute('aria-valuetext')).toContain('Upper surface');
  fireEvent.keyDown(slider, { key: 'PageUp' });
  expect(slider.getAttribute('aria-valuetext')).toContain('Slot: Cap');
  for (let i = 0; i < 2; i++) fireEvent.keyDown(slider, { key: 'PageDown' });
  expect(slider.getAttribute('aria-valuetext')).toMatch(/^0 s/);
});
