import { createHash } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { startApi, type TestApi, type TestWorkshop } from '../support/api.ts';
import { type Client } from '../support/client.ts';
import { makeSection } from '../support/requests.ts';
import { naca4 } from '../support/shapes.ts';

let api: TestApi;
let marsh: TestWorkshop;
let designer: Client;
let builder: Client;
let technician: Client;
let sectionId: string;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  designer = await api.signIn(marsh, 'designer');
  builder = await api.signIn(marsh, 'builder');
  technician = await api.signIn(marsh, 'technician');
});
afterAll(() => api.close());
beforeEach(async () => {
  sectionId = await makeSection(api, marsh);
});

const of = (number: number) => ({ sectionId, number });
const sum = (text: string) => createHash('sha256').update(text, 'utf8').digest('hex');
const records = () => api.knex('downloads').where({ section_id: sectionId });

describe('a cut file', () => {
  it.each([
    ['datFile', {}, 'marsh-2412_v1_unit.dat', 'text/plain; charset=utf-8'],
    ['datFile', { chordMm: 220, newline: 'crlf' }, 'marsh-2412_v1_220mm.dat', 'text/plain; charset=utf-8'],
    ['dxfFile', { chordMm: 220 }, 'marsh-2412_v1_220mm.dxf', 'image/vnd.dxf'],
    ['dxfFile', { chordMm: 220, release: 'r12', arcs: true }, 'marsh-2412_v1_220mm.dxf', 'image/vnd.dxf'],
    ['svgFile', { chordMm: 180.5, layers: 'OUTLINE' }, /^marsh-2412_v1_180[._-]5mm\.svg$/, 'image/svg+xml'],
  ] as const)('%s %j has its name, type and sum', async (name, query, fileName, type) => {
    const answer = await technician.call(name, { params: of(1), query });
    expect(answer.status).toBe(200);
    const [, given] =
      /^attachment; filename="?([^"]+)"?$/.exec(answer.headers.get('content-disposition') ?? '') ?? [];
    expect(given).toMatch(fileName);
    expect(answer.headers.get('content-type')).toBe(type);
    const checksum = sum(answer.text);
    expect(answer.headers.get('x-checksum-sha256')).toBe(checksum);
    expect(answer.headers.get('etag')).toBe(`"${checksum}"`);
    expect(answer.headers.get('content-length')).toBe(String(Buffer.byteLength(answer.text)));
    expect(answer.headers.get('cache-control')).toBe('private, no-cache, no-transform');
  });

  it('is the same byte for byte each time, and says its name, version and checksum', async () => {
    const [one, other] = [
      await technician.call('dxfFile', { params: of(1), query: { chordMm: 220 } }),
      await builder.call('dxfFile', { params: of(1), query: { chordMm: 220 } }),
    ];
    expect(one.text).toBe(other.text);
    const { checksum } = (await technician.call('getVersion', { params: of(1) })).reply;
    for (const said of ['Marsh 2412 v1', 'NACA 2412', checksum.slice(0, 12)])
      expect(one.text).toContain(said);
  });

  it('is recorded each time it is sent: who, when, which file with which options and sum', async () => {
    const before = Date.now();
    const first = await technician.call('dxfFile', { params: of(1), query: { chordMm: 220 } });
    await builder.call('datFile', { params: of(1) });
    const list = await designer.call('listDownloads', { params: of(1) });
    expect(list.reply.items).toMatchObject([
      {
        person: { id: marsh.people.builder, name: 'builder of marsh' },
        fileName: 'marsh-2412_v1_unit.dat',
        format: 'dat',
      },
      {
        person: { id: marsh.people.technician },
        fileName: 'marsh-2412_v1_220mm.dxf',
        format: 'dxf',
        checksum: first.headers.get('x-checksum-sha256'),
      },
    ]);
    expect(Date.parse(list.reply.items[1]!.at)).toBeGreaterThanOrEqual(before);
    const [row] = await records().where({ format: 'dxf' });
    expect(row.options).toMatchObject({ chordMm: 220, toleranceMm: 0.01, release: 'r2000' });
  });

  it('is not sent again when it is still the same, and that is not a download', async () => {
    const input = { params: of(1), query: { chordMm: 220 } };
    const first = await technician.call('dxfFile', input);
    const etag = first.headers.get('etag')!;
    const same = await technician.call('dxfFile', { ...input, headers: { 'if-none-match': etag } });
    expect([same.status, same.text]).toEqual([304, '']);
    const among = await technician.call('dxfFile', {
      ...input,
      headers: { 'if-none-match': `"x", W/${etag}` },
    });
    expect(among.status).toBe(304);
    const weak = await technician.call('dxfFile', { ...input, headers: { 'if-none-match': '"other"' } });
    expect(weak.status).toBe(200);
    const larger = await technician.call('dxfFile', {
      ...input,
      query: { chordMm: 221 },
      headers: { 'if-none-match': etag },
    });
    expect(larger.status).toBe(200);
    expect(await records()).toHaveLength(3);
  });

  it('can be asked about with HEAD, which is not a download', async () => {
    const path = `/api/sections/${sectionId}/versions/1/contour.dxf?chordMm=220`;
    const head = await technician.fetch(path, { method: 'HEAD' });
    const get = await technician.fetch(path);
    expect([head.status, await head.text()]).toEqual([200, '']);
    for (const header of [
      'etag',
      'content-length',
      'content-type',
      'content-disposition',
      'x-checksum-sha256',
    ]) {
      expect(head.headers.get(header)).toBe(get.headers.get(header));
      expect(head.headers.get(header)).not.toBeNull();
    }
    expect(await records()).toHaveLength(1);
  });

  it('is sent as it is, whatever compression is offered', async () => {
    const headers = { 'accept-encoding': 'gzip, br' };
    const response = await technician.fetch(`/api/sections/${sectionId}/versions/1/contour.dat?points=1000`, {
      headers,
    });
    expect(response.headers.get('content-encoding')).toBeNull();
  });

  it('says in its bytes that it is a draft', async () => {
    const draft = await designer.call('datFile', { params: of(2) });
    expect(draft.text.split('\n').slice(0, 6).join(' ')).toContain('draft');
  });

  it.each([
    ['dxfFile', 'chordMm', {}],
    ['dxfFile', 'chordMm', { chordMm: 'wide' }],
    ['dxfFile', 'chordMm', { chordMm: 9 }],
    ['dxfFile', 'toleranceMm', { chordMm: 220, toleranceMm: 0 }],
    ['dxfFile', 'release', { chordMm: 220, release: 'r14' }],
    ['dxfFile', 'layers', { chordMm: 220, layers: 'OUTLINE,FOLD' }],
    ['dxfFile', 'colour', { chordMm: 220, colour: 'red' }],
    ['datFile', 'points', { points: 5 }],
    ['datFile', 'points', { points: 1e9 }],
    ['datFile', 'decimals', { decimals: 2 }],
    ['datFile', 'chordMm', { spacing: 'tolerance' }],
    ['svgFile', 'chordMm', { chordMm: 'NaN' }],
    ['svgFile', 'chordMm', { chordMm: 'Infinity' }],
  ] as const)('%s refuses a wrong %s by name: %j', async (name, path, query) => {
    const answer = await technician.call(name, { params: of(1), query });
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path.split('.')[0])).toContain(path);
    expect(answer.headers.get('content-disposition')).toBeNull();
    expect(await records()).toEqual([]);
  });
});

describe('which version may be cut', () => {
  it('is for the technician the released one only, and the refusal names the version in force', async () => {
    await designer.call('releaseVersion', { params: of(2), body: {} });
    const old = await technician.call('dxfFile', { params: of(1), query: { chordMm: 220 } });
    expect([old.status, old.problem.code]).toEqual([409, 'status-conflict']);
    expect(old.problem.detail).toBe(
      'Version 1 is superseded and must not be cut. Version 2 is in force: take that one.',
    );
    expect(old.problem['releasedNumber']).toBe(2);
    expect((await technician.call('dxfFile', { params: of(2), query: { chordMm: 220 } })).status).toBe(200);
    await designer.call('withdrawVersion', { params: of(2), body: { reason: 'tip too thin' } });
    const withdrawn = await technician.call('dxfFile', { params: of(2), query: { chordMm: 220 } });
    expect(withdrawn.problem.detail).toBe(
      'Version 2 is withdrawn (tip too thin) and must not be cut. No version of this section is released now.',
    );
    expect((await records()).map((row) => row.version_number)).toEqual([2]);
  });

  it('is never a draft for the technician', async () => {
    expect((await technician.call('dxfFile', { params: of(2), query: { chordMm: 220 } })).status).toBe(404);
  });

  it('is any for who sees drafts, and the file says what it is', async () => {
    await designer.call('releaseVersion', { params: of(2), body: {} });
    const old = await builder.call('datFile', { params: of(1) });
    expect(old.status).toBe(200);
    expect(old.text).toContain('superseded');
  });

  it('is told anew after the status changed, though the shape is the same', async () => {
    const before = await builder.call('datFile', { params: of(1) });
    await designer.call('releaseVersion', { params: of(2), body: {} });
    const headers = { 'if-none-match': before.headers.get('etag')! };
    const after = await builder.call('datFile', { params: of(1), headers });
    expect(after.status).toBe(200);
    expect(after.text).not.toBe(before.text);
  });
});

describe('the record of downloads', () => {
  it('shows every download once over its pages, newest first', async () => {
    for (let points = 10; points < 17; points += 1)
      await builder.call('datFile', { params: of(1), query: { points } });
    const seen: string[] = [];
    let cursor: string | undefined;
    do {
      const page = await designer.call('listDownloads', { params: of(1), query: { limit: 3, cursor } });
      seen.push(...page.reply.items.map(({ at, id }) => `${at} ${id}`));
      cursor = page.reply.nextCursor ?? undefined;
    } while (cursor !== undefined);
    expect(seen).toHaveLength(7);
    expect(seen).toEqual([...new Set(seen)].sort().reverse());
  });

  it('refuses a place of another list', async () => {
    const page = await designer.call('listDownloads', { params: of(1), query: { cursor: 'bm9uZQ' } });
    expect(page.problem.errors?.map((error) => error.path)).toEqual(['cursor']);
  });

  it('holds what a version of an unusual shape was sent as', async () => {
    const made = await designer.call('createSection', {
      body: { name: '翼', shape: naca4({ maxThickness: 0.4, trailingEdge: 'closed' }) },
    });
    const params = { sectionId: made.reply.id, number: 1 };
    const file = await designer.call('svgFile', { params, query: { chordMm: 5000 } });
    expect(file.status).toBe(200);
    const [download] = (await designer.call('listDownloads', { params })).reply.items;
    expect(file.headers.get('content-disposition')).toContain(download!.fileName);
  });
});
