import { screen } from '@testing-library/react';
import { expect, it } from 'vitest';
import { fakeServer, json } from '#tests/client/support/fake-server.ts';
import { personOf, sectionOf } from '#tests/client/support/samples.ts';
import { openAt, useBrowserParts } from '#tests/client/support/screen.tsx';

useBrowserParts({ wide: false });

it('is a list of rows on a narrow screen, with the order as a field', async () => {
  fakeServer({
    'GET /api/me': () => json(personOf('designer')),
    'GET /api/sections': () => json({ items: [sectionOf(1, 'Heron')], nextCursor: null }),
  });
  openAt('/sections');
  expect(await screen.findByRole('link', { name: 'Heron' })).toBeTruthy();
  expect(screen.queryByRole('table')).toBeNull();
  expect(screen.getByRole('combobox', { name: 'Order' })).toBeTruthy();
});
