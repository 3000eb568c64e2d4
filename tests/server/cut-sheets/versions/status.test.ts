import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { isStale, type SheetPlan } from '#server/contracts/cut-sheets.ts';
import { type SheetWorks } from '#server/cut-sheets/files/works.ts';
import { releaseSheetVersion } from '#server/cut-sheets/versions/status-store.ts';
import { releaseVersion } from '#server/sections/versions/status-store.ts';
import { startApi, type TestApi, type TestWorkshop } from '../../support/api.ts';
import { type Client } from '../../support/client.ts';
import { makeSamples, makeSection, makeShop } from '../../support/requests.ts';
import { cheapWorks, makeSheet, type PlanParts, sampleNames, samplePlan } from '../../support/sheets.ts';

let api: TestApi;
let marsh: TestWorkshop;
let builder: Client;
let technician: Client;
let parts: PlanParts;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  builder = await api.signIn(marsh, 'builder');
  technician = await api.signIn(marsh, 'technician');
  parts = { sectionId: await makeSection(api, marsh), ...(await makeShop(api, marsh)) };
});
afterAll(() => api.close());

const release = (sheetId: string, number: number, reason = '') =>
  builder.call('releaseSheetVersion', { params: { sheetId, number }, body: { reason } });
const withdraw = (sheetId: string, number: number) =>
  builder.call('withdrawSheetVersion', { params: { sheetId, number }, body: { reason: 'spar too loose' } });
const versionOf = async (sheetId: string, number: number, client = builder) =>
  (await client.call('getSheetVersion', { params: { sheetId, number } })).reply;
const statuses = async (sheetId: string) =>
  (await builder.call('listSheetVersions', { params: { sheetId } })).reply.items
    .map(({ status }) => status)
    .reverse();
/** Everything that a refused release must leave alone. */
const rows = () =>
  Promise.all(
    ['cut_sheets', 'cut_sheet_versions', 'cut_files'].map((table) =>
      api.knex(table).where({ workshop_id: marsh.id }),
    ),
  );
const newSheet = async (plan: SheetPlan) =>
  (await builder.call('createCutSheet', { body: { name: 'Reed panel', plan } })).reply.id;

describe('releasing', () => {
  it('makes and keeps all files, signs the version and supersedes the one before', async () => {
    const sheetId = await makeSheet(api, marsh, parts);
    const released = await release(sheetId, 2, 'tried');
    expect(released.status).toBe(200);
    expect(released.reply).toMatchObject({
      number: 2,
      status: 'released',
      statusReason: 'tried',
      statusBy: { id: marsh.people.builder, name: 'builder of marsh' },
    });
    expect(await statuses(sheetId)).toEqual(['superseded', 'released']);
    expect((await versionOf(sheetId, 1)).statusReason).toBe('Superseded by version 2.');
    const files = await api.knex('cut_files').where({ sheet_id: sheetId, version_number: 2 });
    expect(files.length).toBeGreaterThanOrEqual(5);
    const sheet = (await technician.call('getCutSheet', { params: { sheetId } })).reply;
    expect(sheet).toMatchObject({
      releasedNumber: 2,
      latest: { number: 2, status: 'released', quantity: 4 },
      progress: [{ part: 'core', wanted: 4, done: 0, scrapped: 0 }],
    });
  });

  it('is refused while findings are errors, each named by its field; nothing changes', async () => {
    const plan = samplePlan(parts);
    const low = { ...plan, block: plan.block && { ...plan.block, heightMm: 12 } };
    const sheetId = await newSheet(low);
    const before = await rows();
    const refused = await release(sheetId, 1);
    expect([refused.status, refused.problem.code]).toEqual([422, 'invalid']);
    const errors = refused.problem.errors ?? [];
    expect(errors.length).toBe((await versionOf(sheetId, 1)).errors);
    for (const { path, message } of errors) {
      expect(path).toMatch(/^plan\.block/);
      expect(message).toMatch(/\.$/);
    }
    expect(await rows()).toEqual(before);
    const list = await builder.call('listSheetFiles', { params: { sheetId, number: 1 } });
    expect(list.reply.items).toEqual([]);
    const file = await builder.call('sheetFile', { params: { sheetId, number: 1, name: 'core.nc' } });
    expect([file.status, file.problem.code]).toEqual([409, 'status-conflict']);
  });

  it('is refused while a section version behind it is not released, which is named', async () => {
    const sheetId = await newSheet(samplePlan(parts, 2));
    const before = await rows();
    const refused = await release(sheetId, 1);
    expect([refused.status, refused.problem.code]).toEqual([409, 'status-conflict']);
    expect(refused.problem.detail).toBe(
      'Version 2 of “Marsh 2412” was never released; version 1 is in force. ' +
        'Plan with released sections, save that and release it.',
    );
    expect(await rows()).toEqual(before);
  });

  it('is refused when making the files fails; nothing changes and the error is logged', async () => {
    const sheetId = await makeSheet(api, marsh, parts);
    const before = await rows();
    const failing: SheetWorks = { ...cheapWorks, make: () => Promise.reject(new Error('no ink')) };
    const nameless: SheetWorks = {
      ...cheapWorks,
      make: async (order) => {
        const { findings, files } = await cheapWorks.make(order);
        return { findings, files: [...files, { ...files[0]!, name: 'NOT A NAME' }] };
      },
    };
    const wanted = { sheetId, number: 2, reason: '', names: sampleNames };
    const at = (works: SheetWorks) => releaseSheetVersion(api.knex, works, marsh.author('builder'), wanted);
    await expect(at(failing)).rejects.toThrow('no ink');
    await expect(at(nameless)).rejects.toThrow('cut_files_name');
    expect(await rows()).toEqual(before);
  });

  it('takes the section away or renames the sheet while files are made: it is refused', async () => {
    const samples = await makeSamples(api, marsh);
    const { sheetId, sectionId } = samples;
    const wanted = { sheetId, number: 2, reason: '', names: sampleNames };
    const meanwhile = (change: () => Promise<unknown>): SheetWorks => ({
      ...cheapWorks,
      make: async (order) => {
        await change();
        return cheapWorks.make(order);
      },
    });
    const at = (works: SheetWorks) => releaseSheetVersion(api.knex, works, marsh.author('builder'), wanted);
    const rename = () =>
      builder.call('changeCutSheet', { params: { sheetId }, body: { name: 'Another name' } });
    await expect(at(meanwhile(rename))).rejects.toThrow('The sheet was renamed');
    const supersede = () => releaseVersion(api.knex, marsh.author('designer'), sectionId, 2);
    await expect(at(meanwhile(supersede))).rejects.toThrow('was superseded; version 2 is in force');
    expect(await statuses(sheetId)).toEqual(['released', 'draft']);
  });

  it('leaves exactly one released when several are released at once', async () => {
    const sheetId = await makeSheet(api, marsh, parts);
    const save = { basedOn: 2, plan: { ...samplePlan(parts), quantity: 7 } };
    await builder.call('saveSheetVersion', { params: { sheetId }, body: save });
    const answers = await Promise.all([release(sheetId, 2), release(sheetId, 3)]);
    expect(answers.map(({ status }) => status)).toEqual([200, 200]);
    const now = await statuses(sheetId);
    expect(now[0]).toBe('superseded');
    expect(now.slice(1).sort()).toEqual(['released', 'superseded']);
    const sheet = (await builder.call('getCutSheet', { params: { sheetId } })).reply;
    expect(sheet.releasedNumber).toBe(now.indexOf('released') + 1);
  });

  it('refuses what is released, superseded or withdrawn already, and says so', async () => {
    const sheetId = await makeSheet(api, marsh, parts);
    expect((await release(sheetId, 1)).problem.detail).toBe('Version 1 is released already.');
    expect((await withdraw(sheetId, 1)).reply).toMatchObject({
      status: 'withdrawn',
      statusReason: 'spar too loose',
    });
    const again = await release(sheetId, 1);
    expect(again.problem.detail).toBe(
      'Version 1 was withdrawn. Save its plan as a new version and release that.',
    );
    expect((await withdraw(sheetId, 2)).problem.detail).toBe('Version 2 was never released.');
    expect((await release(sheetId, 3)).status).toBe(404);
    const sheet = (await builder.call('getCutSheet', { params: { sheetId } })).reply;
    expect(sheet).toMatchObject({ releasedNumber: null, progress: [], latest: { number: 2 } });
    const none = await technician.call('getCutSheet', { params: { sheetId } });
    expect(none.status).toBe(404);
    expect((await versionOf(sheetId, 1, technician)).status).toBe('withdrawn');
    await builder.call('changeCutSheet', { params: { sheetId }, body: { archived: true } });
    expect((await release(sheetId, 2)).problem.code).toBe('archived');
  });
});

describe('the sections behind a sheet', () => {
  const stale = async (client: Client) =>
    (await client.call('listCutSheets', { query: { status: 'stale', limit: 100 } })).reply.items.map(
      ({ id }) => id,
    );

  it('stay pinned; superseded or withdrawn they are shown as such wherever the sheet is', async () => {
    const samples = await makeSamples(api, marsh);
    const { sheetId, sectionId } = samples;
    const designer = await api.signIn(marsh, 'designer');
    const before = await versionOf(sheetId, 1);
    expect(isStale(before)).toBe(false);
    expect(await stale(builder)).not.toContain(sheetId);
    await designer.call('releaseVersion', { params: { sectionId, number: 2 }, body: {} });
    const superseded = await versionOf(sheetId, 1);
    expect(superseded.root).toMatchObject({ versionNumber: 1, status: 'superseded', inForce: 2 });
    expect(superseded.root.statusAt).not.toBe(before.root.statusAt);
    expect(isStale(superseded)).toBe(true);
    expect([superseded.pinned, superseded.checksum]).toEqual([before.pinned, before.checksum]);
    for (const client of [builder, technician]) {
      expect(await stale(client)).toContain(sheetId);
      const { latest } = (await client.call('getCutSheet', { params: { sheetId } })).reply;
      expect([latest.root.status, latest.tip.status]).toEqual(['superseded', 'superseded']);
    }
    const refused = await release(sheetId, 2);
    expect(refused.problem.detail).toContain(
      'Version 1 of “Marsh 2412” was superseded; version 2 is in force',
    );
    await designer.call('withdrawVersion', {
      params: { sectionId, number: 2 },
      body: { reason: 'too thin' },
    });
    expect((await versionOf(sheetId, 1)).root).toMatchObject({ status: 'superseded', inForce: null });
    expect(api.errors).toEqual([]);
  });
});
