import { screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { expect, test } from 'vitest';
import '#client/compare/compare-page.tsx';
import { fakeServer, json, problem } from '#tests/client/support/fake-server.ts';
import { personOf, sectionOf } from '#tests/client/support/samples.ts';
import { openAt, useBrowserParts } from '#tests/client/support/screen.tsx';
import { naca4, SECTION, versionOf } from './samples.ts';

useBrowserParts();

const PATH = `/api/sections/${SECTION}/versions`;

function serve() {
  const versions = [1, 2, 3].map((number) => versionOf(number, naca4(0.1 + number / 100, 0)));
  return fakeServer({
    'GET /api/me': () => json(personOf('designer')),
    'GET /api/sections': () => json({ items: [sectionOf(1, 'Heron outer panel')], nextCursor: null }),
    [`GET ${PATH}`]: () => json({ items: versions, nextCursor: null }),
    ...Object.fromEntries(versions.map((version) => [`GET ${PATH}/${version.number}`, () => json(version)])),
    [`GET ${PATH}/9`]: () => problem(404),
  });
}

test('nothing chosen: two versions are chosen by name, and the address has them', async () => {
  serve();
  const { address } = openAt('/compare');
  expect(await screen.findByText('Choose two versions.')).toBeTruthy();
  for (const name of [/^v1/, /^v2/]) {
    await userEvent.click(screen.getByRole('button', { name: 'Add a version…' }));
    await userEvent.click(await screen.findByRole('button', { name: /^Heron outer panel/ }));
    await userEvent.click(await screen.findByRole('button', { name }));
  }
  expect(address()).toBe(`/compare?v=${SECTION}.1,${SECTION}.2`);
  expect(
    await screen.findByRole('img', { name: /Heron outer panel v1, Heron outer panel v2 laid on each other/ }),
  ).toBeTruthy();
  const table = screen.getByRole('region', { name: 'Values side by side' });
  expect(
    within(table).getByRole('row', { name: /^Largest thickness 24\.21 mm 26\.41 mm ?\+2\.20 mm$/ }),
  ).toBeTruthy();
});

test('a version that cannot be seen is said, and the others stay and change places', async () => {
  serve();
  const { address } = openAt(`/compare?v=${SECTION}.9,${SECTION}.2,${SECTION}.3,bad&chord=100`);
  expect(await screen.findByText(/^Version 9: not found, or not for you to see/)).toBeTruthy();
  expect(screen.getByText('“bad” names no version: left out.')).toBeTruthy();
  expect(screen.getByRole('columnheader', { name: /^2 Heron outer panel v2.*the reference$/ })).toBeTruthy();
  await userEvent.click(screen.getByRole('button', { name: 'Remove entry 1, v9' }));
  await userEvent.click(screen.getByRole('button', { name: 'Make Heron outer panel v3 the reference' }));
  expect(address()).toBe(`/compare?v=${SECTION}.3,${SECTION}.2&chord=100`);
  expect(screen.getByRole('columnheader', { name: /^1 Heron outer panel v3.*the reference$/ })).toBeTruthy();
});
