import { screen, waitFor } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { saveAs } from 'file-saver';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { ExportPanel } from '#client/versions/export-panel.tsx';
import { fakeServer, json, meOf, problem, releasedBy, sectionId, show, versionOf } from './support.tsx';

vi.mock('file-saver', () => ({ saveAs: vi.fn() }));

const folder = `/api/sections/${sectionId}/versions/3`;
const version = versionOf(3, { status: 'released', ...releasedBy });
const head = () => new Response(null, { headers: { 'x-checksum-sha256': 'c0ffee'.padEnd(64, '0') } });

beforeEach(() => vi.mocked(saveAs).mockClear());

async function fileOf(name: string): Promise<Response> {
  const text = '0\nEOF\n';
  const digest = await crypto.subtle.digest('SHA-256', new TextEncoder().encode(text));
  return new Response(text, {
    headers: {
      'content-disposition': `attachment; filename="${name}"`,
      'x-checksum-sha256': Buffer.from(digest).toString('hex'),
    },
  });
}
/** The file name breaks between its parts, so its text is in pieces. */
const named = (name: string) =>
  screen.getByText((_, node) => node?.tagName === 'P' && node.textContent === name);
const download = () => screen.getByRole<HTMLButtonElement>('button', { name: 'Download' });

describe('ExportPanel', () => {
  it('shows file name, extents, points, error and the checksum the server announces', async () => {
    fakeServer({ [`HEAD ${folder}/contour.dxf`]: head });
    show(<ExportPanel version={version} onClose={vi.fn()} />);
    expect(named('heron-outer-panel_v3_220mm.dxf')).toBeTruthy();
    const facts = document.querySelector('dl')?.textContent ?? '';
    expect(facts).toMatch(/Length220\.0\d mm/);
    expect(facts).toMatch(/Height26\.\d\d mm/);
    expect(facts).toMatch(/Points\d{2,4}Arcs0Largest chordal error0\.0\d{3} mm/);
    expect(await screen.findByText('c0ff ee00 0000')).toBeTruthy();
  });

  it('follows the chord, typed in the person’s unit or another', async () => {
    fakeServer({});
    show(<ExportPanel version={version} onClose={vi.fn()} />, { me: meOf('designer', 'inch') });
    const chord = screen.getByLabelText<HTMLInputElement>('Chord');
    await userEvent.clear(chord);
    await userEvent.type(chord, '10{Enter}');
    expect(named('heron-outer-panel_v3_254mm.dxf')).toBeTruthy();
    await userEvent.clear(chord);
    await userEvent.type(chord, '300 mm{Enter}');
    expect(named('heron-outer-panel_v3_300mm.dxf')).toBeTruthy();
  });

  it('saves the file under the server’s name once its bytes are checked, and asked for what was chosen', async () => {
    const requests = fakeServer({
      [`HEAD ${folder}/contour.dxf`]: head,
      [`GET ${folder}/contour.dxf`]: () => fileOf('heron-outer-panel_v3_220mm.dxf'),
    });
    show(<ExportPanel version={version} onClose={vi.fn()} />);
    await userEvent.click(screen.getByLabelText('CAMBER'));
    await userEvent.click(screen.getByLabelText(/Arcs instead/));
    await userEvent.selectOptions(screen.getByLabelText('DXF release'), 'r12');
    await userEvent.click(download());
    expect(await screen.findByText(/Its bytes match their checksum/)).toBeTruthy();
    expect(vi.mocked(saveAs).mock.calls[0]?.[1]).toBe('heron-outer-panel_v3_220mm.dxf');
    const asked = requests.find(({ method }) => method === 'GET')?.url.searchParams;
    expect(Object.fromEntries(asked ?? [])).toEqual({
      chordMm: '220',
      toleranceMm: '0.01',
      release: 'r12',
      layers: 'OUTLINE,CHORD,TEXT',
      arcs: 'true',
    });
  });

  it('saves nothing when the bytes differ, the server refuses or does not answer', async () => {
    const answers = [
      [
        () => new Response('0', { headers: { 'x-checksum-sha256': 'f'.repeat(64) } }),
        /do not match their checksum/,
      ],
      [() => problem(403, 'Not yours to take.'), /Not yours to take\. Nothing was saved/],
      [() => Promise.reject(new TypeError('down')), /cannot be reached.*Nothing was saved/],
    ] as const;
    let answer: () => Response | Promise<Response> = answers[0][0];
    fakeServer({ [`HEAD ${folder}/contour.dxf`]: head, [`GET ${folder}/contour.dxf`]: () => answer() });
    show(<ExportPanel version={version} onClose={vi.fn()} />);
    for (const [next, sentence] of answers) {
      answer = next;
      await userEvent.click(download());
      await waitFor(() => expect(screen.getByRole('alert').textContent).toMatch(sentence));
    }
    expect(saveAs).not.toHaveBeenCalled();
  });

  it('keeps what was typed, says what is wrong with it, and makes no file meanwhile', async () => {
    fakeServer({});
    show(<ExportPanel version={version} onClose={vi.fn()} />);
    await userEvent.click(screen.getByLabelText('dat'));
    const points = screen.getByLabelText<HTMLInputElement>('Points per surface');
    await userEvent.clear(points);
    await userEvent.type(points, '5000');
    expect(await screen.findByText(/whole number from 10 to 1000/)).toBeTruthy();
    expect(points.value).toBe('5000');
    expect(download().disabled).toBe(true);
  });

  it('takes no file while a length cannot be read, and leads to it', async () => {
    const requests = fakeServer({});
    show(<ExportPanel version={version} onClose={vi.fn()} />);
    const chord = screen.getByLabelText<HTMLInputElement>('Chord');
    await userEvent.clear(chord);
    await userEvent.type(chord, '22o');
    await userEvent.click(download());
    expect(requests.filter(({ method }) => method === 'GET')).toEqual([]);
    expect(document.activeElement).toBe(chord);
    expect(chord.value).toBe('22o');
  });

  it('offers a tolerance in mm only where there is a chord in mm', async () => {
    fakeServer({});
    show(<ExportPanel version={version} onClose={vi.fn()} />);
    await userEvent.click(screen.getByLabelText('dat'));
    await userEvent.selectOptions(screen.getByLabelText('Spacing of the points'), 'tolerance');
    expect(screen.queryByLabelText('Points per surface')).toBeNull();
    await userEvent.click(screen.getByLabelText('Unit chord'));
    expect(named('heron-outer-panel_v3_unit.dat')).toBeTruthy();
    expect(screen.queryByLabelText('Spacing of the points')).toBeNull();
    expect(screen.getByLabelText('Points per surface')).toBeTruthy();
    expect(screen.getByText(/fractions of chord and must be scaled/)).toBeTruthy();
  });

  it('says beside the button that a version is not in force, and what to mind at the machine', () => {
    fakeServer({});
    show(<ExportPanel version={versionOf(3)} onClose={vi.fn()} />);
    expect(screen.getByText(/This version is not released/)).toBeTruthy();
    expect(screen.getByText(/cold wire/)).toBeTruthy();
    expect(screen.getByText(/styrene/)).toBeTruthy();
    expect(screen.getByText(/never cut PVC/)).toBeTruthy();
    expect(screen.getByText(/Check units and origin: the file is in mm/)).toBeTruthy();
  });

  it('shows no caution about release for a released version', () => {
    fakeServer({ [`GET ${folder}`]: () => json(version) });
    show(<ExportPanel version={version} onClose={vi.fn()} />);
    expect(screen.queryByText(/do not cut from it/i)).toBeNull();
  });
});
