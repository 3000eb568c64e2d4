import { v4 as uuid } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { handBow } from '#server/contracts/shop-samples.ts';
import { createCutSheet } from '#server/cut-sheets/store.ts';
import { releaseSheetVersion, withdrawSheetVersion } from '#server/cut-sheets/versions/status-store.ts';
import { findSheetVersion } from '#server/cut-sheets/versions/store.ts';
import { saveVersion } from '#server/sections/versions/store.ts';
import { releaseVersion } from '#server/sections/versions/status-store.ts';
import { createItem, machines } from '#server/shop/store.ts';
import { startApi, type TestApi, type TestWorkshop } from '../support/api.ts';
import { type Client } from '../support/client.ts';
import { byHand, handTemplate } from '../support/floor.ts';
import { makeSection, makeShop } from '../support/requests.ts';
import { naca4 } from '../support/shapes.ts';
import { cheapWorks, makeSheet, type PlanParts, sampleNames, samplePlan } from '../support/sheets.ts';

let api: TestApi;
let marsh: TestWorkshop;
let technician: Client;
let builder: Client;
let parts: PlanParts;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  technician = await api.signIn(marsh, 'technician');
  builder = await api.signIn(marsh, 'builder');
  parts = { sectionId: await makeSection(api, marsh), ...(await makeShop(api, marsh)) };
});
afterAll(() => api.close());

const makeOne = () => makeSheet(api, marsh, parts);
const minutes = (n: number) => new Date(Date.UTC(2026, 2, 2, 10, n)).toISOString();
const entry = (sheetId: string, change: object = {}) => ({
  sheetId,
  versionNumber: 1,
  part: 'core',
  action: 'started',
  at: minutes(0),
  key: uuid(),
  ...change,
});
const log = (sheetId: string, change: object = {}, client = technician) =>
  client.call('logCut', { body: entry(sheetId, change) });
const rowsOf = (sheetId: string) => api.knex('cut_logs').where({ sheet_id: sheetId });
const listed = async (sheetId: string) =>
  (await technician.call('cuttingList')).reply.items.filter((item) => item.sheetId === sheetId);
const author = () => marsh.author('builder', new Date('2026-03-01T08:00:00.000Z'));
const signed = { names: sampleNames, reason: '' };
const supersede = (sheetId: string) =>
  releaseSheetVersion(api.knex, cheapWorks, author(), { sheetId, number: 2, ...signed });
const withdraw = (sheetId: string) =>
  withdrawSheetVersion(api.knex, author(), { sheetId, number: 1 }, 'too thin');

describe('the cutting list', () => {
  it('says what waits, from what and on what, with the files of the released version', async () => {
    const sheetId = await makeOne();
    const { shortCode } = await findSheetVersion(api.knex, marsh.id, sheetId, 1, 'released');
    const [item, ...more] = await listed(sheetId);
    expect(more).toEqual([]);
    expect(item).toMatchObject({
      sheetName: 'Marsh panel',
      versionNumber: 1,
      standing: 'released',
      shortCode,
      part: 'core',
      machine: { id: parts.machineId, kind: 'wire' },
      material: { id: parts.materialId },
      rootChordMm: 220,
      tipChordMm: 180,
      spanMm: 600,
      wanted: 2,
      done: 0,
      scrapped: 0,
      started: null,
      files: ['root.dxf'],
      releasedAt: '2026-02-02T09:00:00.000Z',
    });
    expect(item?.root).toMatchObject({ sectionId: parts.sectionId, versionNumber: 1, status: 'released' });
  });

  it('gives the templates with a core that is cut by hand, and with none that a machine cuts', async () => {
    const wire = (await listed(await makeOne()))[0];
    const machine = await createItem(api.knex, author(), machines, { name: 'Bow', settings: handBow });
    const plan = { ...samplePlan(parts), machineId: machine.id, template: handTemplate };
    const { id } = await createCutSheet(api.knex, byHand, author(), {
      name: 'By hand',
      purpose: '',
      plan,
      note: '',
    });
    await releaseSheetVersion(api.knex, byHand, author(), { sheetId: id, number: 1, ...signed });
    const items = await listed(id);
    expect(items.map(({ part, wanted, files }) => [part, wanted, files])).toEqual([
      ['core', 2, ['root.dxf', 'templates.pdf', 'cut-sheet.pdf']],
      ['templates', 1, ['templates.pdf', 'cut-sheet.pdf']],
    ]);
    expect(items.map(({ machine: by, material }) => [by?.kind, material?.id])).toEqual([
      ['bow', parts.materialId],
      [undefined, undefined],
    ]);
    expect(wire?.files).toEqual(['root.dxf']);
  });

  it('follows a part from start to done, and lets it go when all are done', async () => {
    const sheetId = await makeOne();
    await log(sheetId, { machineId: parts.machineId });
    expect(await listed(sheetId)).toMatchObject([
      {
        done: 0,
        started: {
          by: { id: marsh.people.technician, name: 'technician of marsh' },
          at: minutes(0),
          machine: { id: parts.machineId },
        },
      },
    ]);
    await log(sheetId, { action: 'done', at: minutes(20) });
    await log(sheetId, { action: 'scrapped', at: minutes(30), reason: 'dropped' });
    expect(await listed(sheetId)).toMatchObject([{ done: 0, scrapped: 1, started: null }]);
    await log(sheetId, { action: 'done', at: minutes(50), quantity: 2 });
    expect(await listed(sheetId)).toEqual([]);
    const sheet = await technician.call('getCutSheet', { params: { sheetId } });
    expect(sheet.reply.progress).toEqual([{ part: 'core', wanted: 2, done: 2, scrapped: 1 }]);
    // One of them fails later: another is wanted.
    await log(sheetId, { action: 'scrapped', at: minutes(59), reason: 'out of tolerance' });
    expect(await listed(sheetId)).toMatchObject([{ done: 1, scrapped: 2 }]);
  });

  it('counts an entry that comes in late at the time at which it happened', async () => {
    const sheetId = await makeOne();
    await log(sheetId, { action: 'done', at: minutes(20) });
    await log(sheetId, { action: 'started', at: minutes(5) });
    expect(await listed(sheetId)).toMatchObject([{ done: 1, started: null }]);
    await log(sheetId, { action: 'started', at: minutes(25) });
    expect(await listed(sheetId)).toMatchObject([{ done: 1, started: { at: minutes(25) } }]);
  });

  it.each([
    ['superseded', supersede],
    ['withdrawn', withdraw],
  ] as const)('keeps what was begun of a version %s since, without its files', async (standing, change) => {
    const sheetId = await makeOne();
    await log(sheetId);
    await log(sheetId, { action: 'done', at: minutes(1) });
    await log(sheetId, { at: minutes(2) });
    await change(sheetId);
    const own = async () => (await listed(sheetId)).filter(({ versionNumber }) => versionNumber === 1);
    expect(await own()).toMatchObject([
      { standing, done: 1, started: { at: minutes(2) }, files: [], releasedAt: null },
    ]);
    await log(sheetId, { action: 'scrapped', reason: 'of an old version', at: minutes(3) });
    expect(await own()).toEqual([]);
    const newer = (await listed(sheetId)).map(({ versionNumber, wanted }) => [versionNumber, wanted]);
    expect(newer).toEqual(standing === 'superseded' ? [[2, 4]] : []);
  });

  it('shows no draft, and of an archived sheet only what is begun', async () => {
    const sheetId = await makeOne();
    await log(sheetId, { versionNumber: 2 }, builder);
    expect((await listed(sheetId)).map(({ versionNumber }) => versionNumber)).toEqual([1]);
    await builder.call('changeCutSheet', { params: { sheetId }, body: { archived: true } });
    expect(await listed(sheetId)).toEqual([]);
    await log(sheetId);
    expect(await listed(sheetId)).toHaveLength(1);
  });

  it('flags a sheet whose section was superseded', async () => {
    const sectionId = await makeSection(api, marsh, 'Marsh 2412 flagged');
    const sheetId = await makeSheet(api, marsh, { ...parts, sectionId });
    const designer = marsh.author('designer');
    await saveVersion(api.knex, designer, sectionId, { basedOn: 2, shape: naca4(), note: 'again' });
    await releaseVersion(api.knex, designer, sectionId, 3);
    const [item] = await listed(sheetId);
    expect([item?.root, item?.tip]).toMatchObject(
      Array(2).fill({ versionNumber: 1, status: 'superseded', inForce: 3 }),
    );
  });
});

describe('an entry', () => {
  it('is kept with its own time and the one of receipt, and says how the version stands', async () => {
    const sheetId = await makeOne();
    const kept = await log(sheetId, { machineId: parts.machineId });
    expect(kept.status).toBe(201);
    expect(kept.reply).toMatchObject({
      sheetId,
      sheetName: 'Marsh panel',
      versionNumber: 1,
      part: 'core',
      action: 'started',
      quantity: 1,
      person: { id: marsh.people.technician },
      at: minutes(0),
      standing: 'released',
    });
    const [row] = (await rowsOf(sheetId)) as { happened_at: Date; received_at: Date }[];
    expect(row?.happened_at.toISOString()).toBe(minutes(0));
    expect(Math.abs(row!.received_at.getTime() - Date.now())).toBeLessThan(60_000);
  });

  it('is a fact also of a version that is not in force any more', async () => {
    const sheetId = await makeOne();
    await supersede(sheetId);
    const late = await log(sheetId, { action: 'done' });
    expect([late.status, late.reply.standing]).toEqual([201, 'superseded']);
    await withdrawSheetVersion(api.knex, author(), { sheetId, number: 2 }, 'too thin');
    const later = await log(sheetId, { versionNumber: 2, action: 'done' });
    expect([later.status, later.reply.standing]).toEqual([201, 'withdrawn']);
  });

  it('is kept once for its key, at the same moment and later, whoever sends it again', async () => {
    const sheetId = await makeOne();
    const body = entry(sheetId, { action: 'done' });
    const at = () => technician.call('logCut', { body });
    const answers = await Promise.all([at(), at(), at(), at()]);
    await supersede(sheetId);
    const later = [await at(), await builder.call('logCut', { body })];
    for (const { status, reply } of [...answers, ...later]) {
      expect([status, reply]).toEqual([201, answers[0]!.reply]);
    }
    expect(later[0]?.reply.standing).toBe('released');
    expect(await rowsOf(sheetId)).toHaveLength(1);
    const counted = api.knex('cut_progress').where({ sheet_id: sheetId });
    expect(await counted).toMatchObject([{ done: 1, open: 0 }]);
  });

  it.each([{ quantity: 2 }, { action: 'done' }, { at: minutes(1) }, { machineId: 'machine' }])(
    'is refused under a key that was used for something else: %j',
    async (change) => {
      const sheetId = await makeOne();
      const body = entry(sheetId);
      await technician.call('logCut', { body });
      const other = 'machineId' in change ? { machineId: parts.machineId } : change;
      const again = await technician.call('logCut', { body: { ...body, ...other } });
      expect([again.status, again.problem.code]).toEqual([409, 'key-reused']);
      expect(await rowsOf(sheetId)).toHaveLength(1);
    },
  );

  it('is counted with all others that come at the same time', async () => {
    const sheetId = await makeOne();
    await Promise.all([1, 2, 3, 4, 5].map((n) => log(sheetId, { action: 'done', at: minutes(n) })));
    expect(await api.knex('cut_progress').where({ sheet_id: sheetId })).toMatchObject([{ done: 5 }]);
  });

  const wrong: [string, object][] = [
    ['at', { at: '2999-01-01T00:00:00.000Z' }],
    ['at', { at: 'yesterday' }],
    ['sheetId', { sheetId: '0190a5b0-1111-7222-8333-444455556666' }],
    ['versionNumber', { versionNumber: 7 }],
    ['versionNumber', { versionNumber: 2 }],
    ['part', { part: 'ribs' }],
    ['part', { part: 'wing' }],
    ['action', { action: 'lost' }],
    ['quantity', { quantity: 0 }],
    ['quantity', { quantity: 501 }],
    ['reason', { action: 'scrapped' }],
    ['reason', { action: 'scrapped', reason: '   ' }],
    ['machineId', { machineId: '0190a5b0-1111-7222-8333-444455556666' }],
    ['key', { key: 'none' }],
    ['colour', { colour: 'red' }],
  ];
  let untouched: string;
  beforeAll(async () => void (untouched = await makeOne()));
  it.each(wrong)('is refused with %s at fault: %j', async (path, change) => {
    const answer = await log(untouched, change);
    expect([answer.status, answer.problem.errors?.map((error) => error.path)]).toEqual([422, [path]]);
    expect(await rowsOf(untouched)).toEqual([]);
    expect(api.errors).toEqual([]);
  });

  it('of a draft is taken from whom drafts are shown to, and hidden from others', async () => {
    const sheetId = await makeOne();
    const drafted = await log(sheetId, { versionNumber: 2, action: 'done' }, builder);
    expect([drafted.status, drafted.reply.standing]).toEqual([201, 'draft']);
    await log(sheetId);
    const seen = async (client: Client) =>
      (await client.call('listCutLogs', { query: { sheetId } })).reply.items.length;
    expect([await seen(technician), await seen(builder)]).toEqual([1, 2]);
  });

  it('stands in the list, newest first, page by page', async () => {
    const sheetId = await makeOne();
    for (const n of [3, 1, 5, 2, 4]) await log(sheetId, { at: minutes(n), action: 'done' });
    const times: string[] = [];
    let cursor: string | null = null;
    do {
      const query = { sheetId, versionNumber: 1, limit: 2, ...(cursor === null ? {} : { cursor }) };
      const page: Awaited<ReturnType<typeof technician.call<'listCutLogs'>>> = await technician.call(
        'listCutLogs',
        { query },
      );
      times.push(...page.reply.items.map(({ at }) => at));
      cursor = page.reply.nextCursor;
    } while (cursor !== null);
    expect(times).toEqual([5, 4, 3, 2, 1].map(minutes));
    const foreign = await technician.call('listCutLogs', { query: { cursor: 'bm8' } });
    expect(foreign.problem.errors).toMatchObject([{ path: 'cursor' }]);
  });
});

describe('the database itself', () => {
  it('neither changes nor deletes an entry, nor takes one that is wrong', async () => {
    const sheetId = await makeOne();
    await log(sheetId);
    await expect(rowsOf(sheetId).update({ quantity: 3 })).rejects.toThrow(/neither changed nor deleted/);
    await expect(rowsOf(sheetId).delete()).rejects.toThrow(/neither changed nor deleted/);
    const [row] = (await rowsOf(sheetId)) as object[];
    const add = (change: object) =>
      api.knex('cut_logs').insert({ ...row, id: uuid(), idempotency_key: uuid(), ...change });
    await expect(add({ action: 'lost' })).rejects.toThrow('cut_logs_action');
    await expect(add({ action: 'scrapped' })).rejects.toThrow('cut_logs_reason');
    await expect(add({ version_number: 9 })).rejects.toThrow('cut_logs_version');
    await expect(add({ quantity: 0 })).rejects.toThrow('cut_logs_quantity');
    await add({});
    expect(await rowsOf(sheetId)).toHaveLength(2);
  });
});
