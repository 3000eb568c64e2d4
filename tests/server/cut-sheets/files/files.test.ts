import { createHash } from 'node:crypto';
import { unzipSync } from 'fflate';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type SheetFile } from '#server/contracts/cut-sheets.ts';
import { worksInPlace } from '#server/cut-sheets/files/works.ts';
import { startApi, type TestApi, type TestWorkshop } from '../../support/api.ts';
import { type Client } from '../../support/client.ts';
import { makeSection, makeShop } from '../../support/requests.ts';
import { makeSheet, samplePlan } from '../../support/sheets.ts';

let api: TestApi;
let marsh: TestWorkshop;
let builder: Client;
let technician: Client;
let sheetId: string;
beforeAll(async () => {
  api = await startApi({ publicUrl: 'https://marsh.example' });
  marsh = await api.addWorkshop('marsh');
  builder = await api.signIn(marsh, 'builder');
  technician = await api.signIn(marsh, 'technician');
  const parts = { sectionId: await makeSection(api, marsh), ...(await makeShop(api, marsh)) };
  sheetId = await makeSheet(api, marsh, parts, worksInPlace);
});
afterAll(() => api.close());

const sum = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');
const path = (number: number, name: string) => `/api/cut-sheets/${sheetId}/versions/${number}/files/${name}`;
async function take(client: Client, number: number, name: string) {
  const response = await client.fetch(path(number, name));
  return { response, bytes: new Uint8Array(await response.arrayBuffer()) };
}
const list = async (client: Client, number: number): Promise<SheetFile[]> =>
  (await client.call('listSheetFiles', { params: { sheetId, number } })).reply.items;

describe('the files of a released version', () => {
  it('are listed with their sums, and taken byte for byte under their names', async () => {
    const files = await list(technician, 1);
    expect(files.map(({ name }) => name)).toEqual([
      'root.dxf',
      'tip.dxf',
      'core.nc',
      'root.dat',
      'tip.dat',
      'cut-sheet.pdf',
      'all.zip',
    ]);
    expect(files.at(-1)).toMatchObject({ name: 'all.zip', part: 'all', mediaType: 'application/zip' });
    expect(new Set(files.map(({ downloadName }) => downloadName)).size).toBe(files.length);
    for (const file of files) {
      const { response, bytes } = await take(technician, 1, file.name);
      expect(response.status).toBe(200);
      expect(response.headers.get('content-type')).toBe(file.mediaType);
      const given = /^attachment; filename="?([^"]+)"?$/.exec(response.headers.get('content-disposition')!);
      expect(given?.[1]).toBe(file.downloadName);
      expect([bytes.length, sum(bytes)]).toEqual([file.bytes, file.checksum]);
      expect(response.headers.get('etag')).toBe(`"${file.checksum}"`);
    }
  });

  it('say the version, its checksum and that it is released', async () => {
    const { reply } = await technician.call('getSheetVersion', { params: { sheetId, number: 1 } });
    for (const name of ['root.dxf', 'core.nc', 'tip.dat']) {
      const { bytes } = await take(technician, 1, name);
      const text = Buffer.from(bytes).toString('latin1');
      expect(text, name).toMatch(/marsh panel v1/i);
      expect(text, name).toContain(reply.checksum.slice(0, 12));
      expect(text, name).not.toMatch(/draft/i);
    }
  });

  it('are all in the archive, with a manifest of their sums', async () => {
    const files = await list(technician, 1);
    const entries = unzipSync((await take(technician, 1, 'all.zip')).bytes);
    const inside = files.filter(({ name }) => name !== 'all.zip');
    expect(Object.keys(entries).sort()).toEqual(
      [...inside.map(({ downloadName }) => downloadName), 'manifest.sha256'].sort(),
    );
    const manifest = Buffer.from(entries['manifest.sha256']!).toString('utf8');
    for (const { downloadName, checksum } of inside) {
      expect(sum(entries[downloadName]!)).toBe(checksum);
      expect(manifest).toContain(`${checksum}  ${downloadName}\n`);
    }
    const another = await take(builder, 1, 'all.zip');
    expect(sum(another.bytes)).toBe(files.at(-1)!.checksum);
  });

  it('stay the same when sheet, section and machine are changed', async () => {
    const before = await list(builder, 1);
    const { reply } = await builder.call('getSheetVersion', { params: { sheetId, number: 1 } });
    await builder.call('changeCutSheet', { params: { sheetId }, body: { name: 'Reed panel' } });
    await builder.call('changeMachine', {
      params: { machineId: reply.plan.machineId! },
      body: { revision: 1, name: 'Renamed bench' },
    });
    const designer = await api.signIn(marsh, 'designer');
    await designer.call('changeSection', {
      params: { sectionId: reply.plan.panel.root.sectionId },
      body: { name: 'Renamed section' },
    });
    const after = await list(builder, 1);
    const stored = ({ name }: SheetFile) => name !== 'all.zip';
    expect(after.filter(stored)).toEqual(before.filter(stored));
    expect(after.at(-1)!.checksum).toBe(before.at(-1)!.checksum);
    await builder.call('changeCutSheet', { params: { sheetId }, body: { name: 'Marsh panel' } });
  });

  it('are recorded when they are taken, and only then', async () => {
    const count = async () => (await api.knex('cut_downloads').where({ sheet_id: sheetId })).length;
    const before = await count();
    const file = (await list(builder, 1))[0]!;
    await builder.fetch(path(1, file.name), { method: 'HEAD' });
    const same = await builder.fetch(path(1, file.name), {
      headers: { 'if-none-match': `"${file.checksum}"` },
    });
    expect(same.status).toBe(304);
    expect((await builder.fetch(path(1, 'nothing.dxf'))).status).toBe(404);
    expect((await builder.fetch(path(1, '..%2Fpackage.json'))).status).toBe(404);
    expect(await count()).toBe(before);
    await take(technician, 1, file.name);
    const { reply } = await builder.call('listSheetDownloads', {
      params: { sheetId, number: 1 },
      query: { limit: 2 },
    });
    expect(reply.items).toHaveLength(2);
    expect(reply.items[0]).toMatchObject({
      person: { id: marsh.people.technician },
      fileName: file.downloadName,
      checksum: file.checksum,
    });
    const behind = await builder.call('listSheetDownloads', {
      params: { sheetId, number: 1 },
      query: { cursor: reply.nextCursor!, limit: 100 },
    });
    expect(behind.reply.items).toHaveLength(before + 1 - 2);
  });
});

describe('the files of a draft', () => {
  it('are made when they are asked for, say that they are of a draft, and are not kept', async () => {
    const files = await list(builder, 2);
    expect(files.map(({ name }) => name)).toEqual((await list(builder, 1)).map(({ name }) => name));
    for (const name of ['root.dxf', 'core.nc', 'tip.dat']) {
      const { response, bytes } = await take(builder, 2, name);
      expect(sum(bytes), name).toBe(files.find((file) => file.name === name)?.checksum);
      expect(response.headers.get('content-disposition')).toContain('marsh-panel_v2');
      expect(Buffer.from(bytes).toString('latin1'), name).toMatch(/draft/i);
    }
    expect(await api.knex('cut_files').where({ sheet_id: sheetId, version_number: 2 })).toEqual([]);
  });

  it('are not for the technician, who takes those of the version in force and no other', async () => {
    const draft = await take(technician, 2, 'root.dxf');
    expect(draft.response.status).toBe(404);
    await builder.call('releaseSheetVersion', { params: { sheetId, number: 2 }, body: {} });
    const old = await technician.call('sheetFile', { params: { sheetId, number: 1, name: 'core.nc' } });
    expect([old.status, old.problem['releasedNumber']]).toEqual([409, 2]);
    expect(old.problem.detail).toBe(
      'Version 1 is superseded and must not be cut. Version 2 is in force: take that one.',
    );
    expect((await take(technician, 2, 'core.nc')).response.status).toBe(200);
    expect((await take(builder, 1, 'core.nc')).response.status).toBe(200);
    await builder.call('withdrawSheetVersion', {
      params: { sheetId, number: 2 },
      body: { reason: 'spar too loose' },
    });
    const gone = await technician.call('sheetFile', { params: { sheetId, number: 2, name: 'core.nc' } });
    expect(gone.problem.detail).toBe(
      'Version 2 is withdrawn (spar too loose) and must not be cut. No version of this cut sheet is released now.',
    );
    expect(api.errors).toEqual([]);
  });
});

describe('a plan with everything left out', () => {
  it('is kept as a draft, and not released', async () => {
    const parts = { sectionId: await makeSection(api, marsh), ...(await makeShop(api, marsh)) };
    const bare = { ...samplePlan(parts), block: null, machineId: null, materialId: null };
    const { reply } = await builder.call('createCutSheet', { body: { name: 'Bare', plan: bare } });
    expect(reply.latest).toMatchObject({ parts: [], machine: null, material: null, errors: 0 });
    const params = { sheetId: reply.id, number: 1 };
    const refused = await builder.call('releaseSheetVersion', { params, body: {} });
    expect(refused.problem.errors?.map(({ path }) => path)).toEqual(['plan.block']);
    const without = { ...samplePlan(parts), materialId: null };
    const other = await builder.call('createCutSheet', { body: { name: 'No foam', plan: without } });
    const again = await builder.call('releaseSheetVersion', {
      params: { sheetId: other.reply.id, number: 1 },
      body: {},
    });
    expect(again.problem.errors?.map(({ path }) => path)).toEqual(['plan.materialId']);
  });
});
