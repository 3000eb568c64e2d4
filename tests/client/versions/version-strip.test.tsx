import { screen, waitFor, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { VersionStrip } from '#client/versions/version-strip.tsx';
import { fakeServer, json, meOf, problem, releasedBy, sectionId, show, versionOf } from './support.tsx';

const list = `GET /api/sections/${sectionId}/versions`;
const three = [
  versionOf(3, { status: 'released', ...releasedBy }),
  versionOf(2, { status: 'superseded', ...releasedBy }),
  versionOf(1),
];

function strip(changes: Partial<Parameters<typeof VersionStrip>[0]> = {}) {
  const calls = { onGhost: vi.fn(), onOpen: vi.fn(), onRestore: vi.fn() };
  const node = (
    <VersionStrip sectionId={sectionId} draftShape={null} basedOn={3} ghost={null} {...calls} {...changes} />
  );
  return { calls, node };
}
const opens = () => screen.getAllByRole('button', { name: /^v\d/ });

describe('VersionStrip', () => {
  it('shows the versions oldest first with status, note and author, and the draft at the end', async () => {
    fakeServer({ [list]: () => json({ items: three, nextCursor: null }) });
    show(strip({ draftShape: versionOf(1).shape }).node);
    await screen.findByRole('button', { name: /v3/ });
    expect(opens().map((button) => button.textContent)).toEqual([
      expect.stringMatching(/^v1\s*draft/),
      expect.stringMatching(/^v2\s*superseded/),
      expect.stringMatching(/^v3\s*released.*Note of version 3.*Ines Aldam/),
    ]);
    const items = screen.getAllByRole('listitem');
    expect(items.at(-1)?.textContent).toMatch(/draft.*on v3.*not saved as a version/);
    expect(items.at(-1)?.getAttribute('aria-current')).toBe('true');
  });

  it('marks the version on the sheet when there is no draft', async () => {
    fakeServer({ [list]: () => json({ items: three, nextCursor: null }) });
    show(strip({ basedOn: 2 }).node);
    const item = (await screen.findByRole('button', { name: /^v2/ })).closest('li');
    expect(item?.getAttribute('aria-current')).toBe('true');
    expect(document.querySelectorAll('[aria-current]')).toHaveLength(1);
  });

  it('moves by arrow keys, opens with Enter and is one stop of the Tab key per control', async () => {
    fakeServer({ [list]: () => json({ items: three, nextCursor: null }) });
    const { node, calls } = strip();
    show(node);
    const keys = userEvent.setup();
    await screen.findByRole('button', { name: /^v3/ });
    await keys.tab();
    expect(document.activeElement?.textContent).toMatch(/^v3/);
    await keys.keyboard('{ArrowLeft}{Enter}');
    expect(calls.onOpen).toHaveBeenLastCalledWith(2);
    await keys.tab();
    expect(document.activeElement).toBe(screen.getByRole('button', { name: 'overlay version 2' }));
    await keys.keyboard('{Home}{Enter}');
    expect(calls.onGhost).toHaveBeenLastCalledWith(1);
    await keys.tab();
    await keys.keyboard('{Enter}');
    expect(calls.onRestore).toHaveBeenCalledWith(expect.objectContaining({ number: 1 }));
  });

  it('takes the ghost away when its overlay is pressed again', async () => {
    fakeServer({ [list]: () => json({ items: three, nextCursor: null }) });
    const { node, calls } = strip({ ghost: 2 });
    show(node);
    const overlay = await screen.findByRole('button', { name: 'overlay version 2', pressed: true });
    await userEvent.click(overlay);
    expect(calls.onGhost).toHaveBeenCalledWith(null);
  });

  it('offers no restore to who may not write', async () => {
    fakeServer({ [list]: () => json({ items: three, nextCursor: null }) });
    show(strip().node, { me: meOf('builder') });
    await screen.findByRole('button', { name: /^v3/ });
    expect(screen.queryByRole('button', { name: /restore/ })).toBeNull();
  });

  it('brings in older versions before the ones shown, by button or by the left arrow', async () => {
    fakeServer({
      [list]: (url) =>
        url.searchParams.get('cursor') === 'older'
          ? json({ items: [three[2]], nextCursor: null })
          : json({ items: three.slice(0, 2), nextCursor: 'older' }),
    });
    show(strip().node);
    const keys = userEvent.setup();
    (await screen.findByRole('button', { name: /^v2/ })).focus();
    expect(screen.getByRole('button', { name: 'Older versions' })).toBeTruthy();
    await keys.keyboard('{ArrowLeft}');
    await waitFor(() => expect(opens()).toHaveLength(3));
    expect(opens()[0]?.textContent).toMatch(/^v1/);
    expect(screen.queryByRole('button', { name: 'Older versions' })).toBeNull();
  });

  it('says what went wrong and tries again', async () => {
    let failing = true;
    fakeServer({
      [list]: () => (failing ? problem(503, 'Not ready') : json({ items: three, nextCursor: null })),
    });
    show(strip().node);
    const alert = await screen.findByRole('alert');
    failing = false;
    await userEvent.click(within(alert).getByRole('button', { name: 'Try again' }));
    expect(await screen.findByRole('button', { name: /^v3/ })).toBeTruthy();
  });

  it('has a place for no versions at all', async () => {
    fakeServer({ [list]: () => json({ items: [], nextCursor: null }) });
    show(strip().node);
    expect(await screen.findByText('No version to show yet.')).toBeTruthy();
  });
});
