import { cleanup, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { Route, Routes, useLocation } from 'react-router';
import { describe, expect, it } from 'vitest';
import { type Me } from '#server/contracts/people.ts';
import { type Section, type SectionVersion } from '#server/contracts/sections.ts';
import { Component } from '#client/versions/version-page.tsx';
import {
  fakeServer,
  json,
  meOf,
  problem,
  releasedBy,
  sectionId,
  sectionOf,
  show,
  versionOf,
} from './support.tsx';

const sectionPath = `/api/sections/${sectionId}`;

/** In the words of the machine's own locale. */
const DAY = new Intl.DateTimeFormat(undefined, { day: 'numeric', month: 'short', year: 'numeric' }).format(
  new Date(releasedBy.statusAt),
);

function Address() {
  const { pathname, search } = useLocation();
  return <output>{`${pathname}${search}`}</output>;
}

function open(
  version: SectionVersion | Response,
  {
    section = sectionOf(),
    me = meOf('designer'),
    number = '2',
    search = '',
  }: {
    section?: Section | Response;
    me?: Me;
    number?: string;
    search?: string;
  } = {},
) {
  fakeServer({
    [`GET ${sectionPath}`]: () => (section instanceof Response ? section : json(section)),
    [`GET ${sectionPath}/versions/${number}`]: () => (version instanceof Response ? version : json(version)),
    [`GET ${sectionPath}/versions/${number}/downloads`]: () => json({ items: [], nextCursor: null }),
  });
  const routes = (
    <>
      <Routes>
        <Route path="/sections/:sectionId/versions/:number" element={<Component />} />
      </Routes>
      <Address />
    </>
  );
  show(routes, { me, at: `/sections/${sectionId}/versions/${number}${search}` });
}

const superseded = versionOf(2, {
  status: 'superseded',
  statusReason: 'Superseded by version 3.',
  ...releasedBy,
});

describe('the version page', () => {
  it('shows values, measures, note, author and the whole checksum', async () => {
    open(versionOf(2));
    expect(await screen.findByRole('heading', { level: 1, name: 'Heron outer panel v2' })).toBeTruthy();
    expect(screen.getByText('Note of version 2')).toBeTruthy();
    expect(screen.getByText('ab'.repeat(32))).toBeTruthy();
    const measured = screen.getByRole('region', { name: 'Measured on the contour' }).textContent;
    expect(measured).toMatch(/Largest thickness26\.4\d mm at 29\.9 %/);
    expect(measured).toMatch(/Edge gap0\.55 mm/);
    expect(screen.getByRole('region', { name: 'Shape' }).textContent).toMatch(
      /Camber2\.00 %.*Thickness12\.00 %/,
    );
    expect(screen.getByRole('img', { name: /Drawing sheet of Heron outer panel/ })).toBeTruthy();
    expect(await screen.findByText('Nobody has taken a file of this version yet.')).toBeTruthy();
  });

  it('leads from a superseded version to the one in force', async () => {
    open(superseded);
    const link = await screen.findByRole('link', { name: 'Version 3' });
    expect(link.getAttribute('href')).toBe(`/sections/${sectionId}/versions/3`);
    expect(link.closest('p')?.textContent).toBe(
      `Superseded on ${DAY}: do not cut from this version any more. Version 3 is in force.`,
    );
    expect(screen.queryByRole('button', { name: 'Release…' })).toBeNull();
  });

  it('says why a version was withdrawn and that none is in force', async () => {
    const withdrawn = versionOf(2, { status: 'withdrawn', statusReason: 'Spar tube clashes', ...releasedBy });
    open(withdrawn, { section: sectionOf({ releasedNumber: null }) });
    const sentence = await screen.findByText(/No version of this section is in force/);
    expect(sentence.textContent).toContain(
      `Withdrawn on ${DAY} by Ines Aldam: do not cut it. Spar tube clashes.`,
    );
  });

  it('offers release of a draft and withdrawal of a release to those who may', async () => {
    open(versionOf(2));
    await userEvent.click(await screen.findByRole('button', { name: 'Release…' }));
    expect(screen.getByRole('dialog', { name: 'Release version 2' })).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Withdraw…' })).toBeNull();
  });

  it('offers a technician the file and nothing else', async () => {
    open(versionOf(2, { status: 'released', ...releasedBy }), {
      me: meOf('technician'),
      section: sectionOf({ releasedNumber: 2 }),
    });
    expect(await screen.findByRole('button', { name: 'Export…' })).toBeTruthy();
    expect(screen.queryByRole('button', { name: /Release|Withdraw/ })).toBeNull();
    expect(screen.queryByRole('region', { name: 'Downloads' })).toBeNull();
  });

  it('leads a technician from a version out of reach to the one in force', async () => {
    open(problem(404, 'Not found'), { me: meOf('technician') });
    const link = await screen.findByRole('link', { name: 'Version 3, in force' });
    expect(link.getAttribute('href')).toBe(`/sections/${sectionId}/versions/3`);
    expect(screen.getByText('There is no version 2 to show here.')).toBeTruthy();
  });

  it('leads to the section only who can see it', async () => {
    const withdrawn = versionOf(2, { status: 'withdrawn', statusReason: 'Too thin', ...releasedBy });
    open(withdrawn, { me: meOf('technician'), section: problem(404, 'Not found') });
    await screen.findByText(/No version of this section is in force/);
    expect(screen.getByRole('heading', { level: 1, name: 'Heron outer panel v2' })).toBeTruthy();
    expect(screen.queryAllByRole('link')).toEqual([]);
    cleanup();
    open(superseded, { me: meOf('technician') });
    const link = await screen.findByRole('link', { name: 'Heron outer panel' });
    expect(link.getAttribute('href')).toBe(`/sections/${sectionId}`);
    cleanup();
    open(withdrawn, { section: sectionOf({ releasedNumber: null }) });
    expect(await screen.findByRole('link', { name: 'Heron outer panel' })).toBeTruthy();
  });

  it('does not ask the server for a number that cannot be one', async () => {
    open(versionOf(2), { number: 'x' });
    expect(await screen.findByText('There is no such version.')).toBeTruthy();
  });

  it('offers to try again when the server is not ready', async () => {
    open(problem(503, 'Not ready'));
    const alert = await screen.findByRole('alert');
    expect(within(alert).getByRole('button', { name: 'Try again' })).toBeTruthy();
  });

  it('keeps the chord in the address, draws with it and starts the export from it', async () => {
    open(versionOf(2), { search: '?chord=150' });
    const chord = await screen.findByLabelText<HTMLInputElement>('Chord shown');
    expect(chord.value).toBe('150.00 mm');
    await userEvent.clear(chord);
    await userEvent.type(chord, '300{Enter}');
    expect(screen.getByText(/versions\/2\?chord=300$/)).toBeTruthy();
    expect(screen.getByText(/36\.0\d mm at 29\.9 %/)).toBeTruthy();
    await userEvent.click(screen.getByRole('button', { name: 'Export…' }));
    expect(screen.getByRole('dialog').textContent).toContain('heron-outer-panel_v2_300mm.dxf');
  });

  it('shows the weights of a free-form shape', async () => {
    const shape = {
      kind: 'cst',
      upper: [0.17, 0.16, 0.15],
      lower: [-0.12, -0.05, -0.04],
      n1: 0.5,
      n2: 1,
      trailingEdgeGap: 0.003,
    } as const;
    open(
      versionOf(2, {
        shape: { ...shape, upper: [...shape.upper], lower: [...shape.lower] },
        description: 'CST order 2/2',
      }),
    );
    const table = await screen.findByRole('table', { name: /Weights/ });
    expect(
      within(table)
        .getAllByRole('row')
        .map((row) => row.textContent),
    ).toEqual(['Weightupperlower', '00.1700-0.1200', '10.1600-0.0500', '20.1500-0.0400']);
  });
});
