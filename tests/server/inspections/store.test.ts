import { v4 as uuid } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { thicknessAt } from '#geometry/contour/thickness.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { createCutSheet } from '#server/cut-sheets/store.ts';
import { startApi, type TestApi, type TestWorkshop } from '../support/api.ts';
import { type Client } from '../support/client.ts';
import { photo } from '../support/floor.ts';
import { makeSection, makeShop } from '../support/requests.ts';
import { naca4 } from '../support/shapes.ts';
import { cheapWorks, makeSheet, type PlanParts, samplePlan } from '../support/sheets.ts';

let api: TestApi;
let marsh: TestWorkshop;
let technician: Client;
let designer: Client;
let parts: PlanParts;
let sheetId: string;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  technician = await api.signIn(marsh, 'technician');
  designer = await api.signIn(marsh, 'designer');
  parts = { sectionId: await makeSection(api, marsh), ...(await makeShop(api, marsh)) };
  sheetId = await makeSheet(api, marsh, parts);
});
afterAll(() => api.close());

interface Reading {
  readonly end: 'root' | 'tip';
  readonly station: number;
  readonly measuredMm: number;
}
/** The thickness that a plan without skins wants: the section's own, times the chord. */
const nominal = (end: 'root' | 'tip', station: number) =>
  thicknessAt(outlineOf(naca4()), station) * (end === 'root' ? 220 : 180);
const off = (end: 'root' | 'tip', station: number, deviationMm: number): Reading => ({
  end,
  station,
  measuredMm: nominal(end, station) + deviationMm,
});
const minutes = (n: number) => new Date(Date.UTC(2026, 2, 2, 10, n)).toISOString();
const body = (measurements: readonly Reading[], change: object = {}) => ({
  sheetId,
  versionNumber: 1,
  measurements,
  at: minutes(0),
  key: uuid(),
  ...change,
});
const add = (measurements: readonly Reading[], change: object = {}, client = technician) =>
  client.call('addInspection', { body: body(measurements, change) });
const outside = async () => (await add([off('root', 0.3, 0.5)])).reply.id;

describe('an inspection', () => {
  it('takes nominal and tolerance from the pinned plan, and says what is within', async () => {
    const readings = [off('root', 0.3, 0.12), off('tip', 0.7, -0.31)];
    const { status, reply } = await add(readings, {
      mark: 'left 2',
      machineId: parts.machineId,
      note: 'warm',
    });
    expect(status).toBe(201);
    expect(reply).toMatchObject({
      sheetId,
      sheetName: 'Marsh panel',
      versionNumber: 1,
      mark: 'left 2',
      measured: 'core',
      machine: { id: parts.machineId, kind: 'wire' },
      within: false,
      note: 'warm',
      person: { id: marsh.people.technician },
      at: minutes(0),
      photos: [],
      answer: null,
    });
    const [root, tip] = reply.measurements;
    // The core's polygon lies within the plan's tolerance of 0.02 mm on either surface.
    expect(Math.abs(root!.nominalMm - nominal('root', 0.3))).toBeLessThan(0.04);
    expect(Math.abs(tip!.nominalMm - nominal('tip', 0.7))).toBeLessThan(0.04);
    expect([root!.toleranceMm, tip!.toleranceMm]).toEqual([0.3, 0.3]);
    for (const one of reply.measurements) {
      expect(one.deviationMm).toBeCloseTo(one.measuredMm - one.nominalMm, 4);
    }
    expect([root!.within, tip!.within]).toEqual([true, false]);
    expect((await designer.call('getInspection', { params: { inspectionId: reply.id } })).reply).toEqual(
      reply,
    );
  });

  it('is kept once for its key, and refused when it says something else', async () => {
    const sent = body([off('tip', 0.3, 0)]);
    const call = (change: object = {}) => technician.call('addInspection', { body: { ...sent, ...change } });
    const [first, second, third] = await Promise.all([call(), call(), call()]);
    expect([first.status, second.reply, third.reply]).toEqual([201, first.reply, first.reply]);
    const other = await call({ mark: 'another part' });
    expect([other.status, other.problem.code]).toEqual([409, 'key-reused']);
    const again = await call({ at: minutes(1) });
    expect(again.problem.code).toBe('key-reused');
  });

  const wrong: [string, readonly unknown[], object][] = [
    ['measurements.0.station', [off('root', 0.31, 0)], {}],
    ['measurements.1.station', [off('root', 0.3, 0), off('root', 0.3, 0)], {}],
    ['measurements.0.end', [{ end: 'middle', station: 0.3, measuredMm: 20 }], {}],
    ['measurements.0.measuredMm', [{ end: 'root', station: 0.3, measuredMm: 501 }], {}],
    ['measurements.0.measuredMm', [{ end: 'root', station: 0.3, measuredMm: -1 }], {}],
    ['measurements.0.measuredMm', [{ end: 'root', station: 0.3, measuredMm: null }], {}],
    ['measurements', [], {}],
    ['versionNumber', [off('root', 0.3, 0)], { versionNumber: 2 }],
    ['sheetId', [off('root', 0.3, 0)], { sheetId: '0190a5b0-1111-7222-8333-444455556666' }],
    ['machineId', [off('root', 0.3, 0)], { machineId: '0190a5b0-1111-7222-8333-444455556666' }],
    ['at', [off('root', 0.3, 0)], { at: '2999-01-01T00:00:00.000Z' }],
    ['mark', [off('root', 0.3, 0)], { mark: 'x'.repeat(41) }],
  ];
  it.each(wrong)('is refused whole with %s at fault', async (path, measurements, change) => {
    const before = await api.knex('inspections').count({ n: '*' });
    const answer = await add(measurements as Reading[], change);
    expect([answer.status, answer.problem.errors?.map((error) => error.path)]).toEqual([422, [path]]);
    expect(await api.knex('inspections').count({ n: '*' })).toEqual(before);
    expect(api.errors).toEqual([]);
  });

  it('stands in the list by its outcome, newest first, page by page', async () => {
    const other = await makeSheet(api, marsh, parts);
    const marks = async (query: object) =>
      (await technician.call('listInspections', { query: { sheetId: other, ...query } })).reply.items.map(
        ({ mark }) => mark,
      );
    const made = [];
    for (const [n, deviation] of [0.4, 0, 0.5, 0.1].entries()) {
      const change = { sheetId: other, mark: `${n}`, at: minutes(n) };
      made.push((await add([off('root', 0.3, deviation)], change)).reply);
    }
    const answer = { decision: 'accepted', note: 'Sand it.' };
    await designer.call('answerInspection', { params: { inspectionId: made[0]!.id }, body: answer });
    expect(await marks({})).toEqual(['3', '2', '1', '0']);
    expect(await marks({ outcome: 'within' })).toEqual(['3', '1']);
    expect(await marks({ outcome: 'out' })).toEqual(['2', '0']);
    expect(await marks({ outcome: 'unanswered' })).toEqual(['2']);
    expect(await marks({ versionNumber: 2 })).toEqual([]);
    const page = await technician.call('listInspections', { query: { sheetId: other, limit: 3 } });
    expect(await marks({ limit: 3, cursor: page.reply.nextCursor ?? '' })).toEqual(['0']);
  });

  it('of a draft is hidden from whom drafts are not shown to', async () => {
    const drafted = await add([off('root', 0.3, 0.9)], { versionNumber: 2 }, designer);
    expect(drafted.status).toBe(201);
    const inspectionId = drafted.reply.id;
    const added = await designer.call('addPhoto', { params: { inspectionId }, file: photo });
    const params = { inspectionId, photoId: added.reply.id };
    for (const name of ['getInspection', 'photo'] as const) {
      expect([name, (await technician.call(name, { params })).status]).toEqual([name, 404]);
      expect([name, (await designer.call(name, { params })).status]).toEqual([name, 200]);
    }
    const hidden = await technician.call('addPhoto', { params, file: photo });
    expect(hidden.status).toBe(404);
    const listed = await technician.call('listInspections', { query: { versionNumber: 2 } });
    expect(listed.reply.items).toEqual([]);
  });
});

describe('an answer', () => {
  const said = { decision: 'accepted', note: 'Sand it to size.' } as const;

  it('is given once, with who and when', async () => {
    const inspectionId = await outside();
    const call = () => designer.call('answerInspection', { params: { inspectionId }, body: said });
    const answers = await Promise.all([call(), call()]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    const found = await technician.call('getInspection', { params: { inspectionId } });
    expect(found.reply.answer).toMatchObject({ ...said, by: { id: marsh.people.designer } });
  });

  it('needs a reason and a part out of tolerance', async () => {
    const inspectionId = await outside();
    const mute = await designer.call('answerInspection', {
      params: { inspectionId },
      body: { ...said, note: ' ' },
    });
    expect(mute.problem.errors?.map(({ path }) => path)).toEqual(['note']);
    const fine = (await add([off('root', 0.3, 0.1)])).reply.id;
    const needless = await designer.call('answerInspection', { params: { inspectionId: fine }, body: said });
    expect([needless.status, needless.problem.code]).toEqual([409, 'status-conflict']);
  });
});

describe('the statistics', () => {
  it('are mean and sample deviation for each section and machine', async () => {
    const fen = await api.addWorkshop('fen');
    const measured = await api.signIn(fen, 'technician');
    const [rootId, tipId] = [await makeSection(api, fen, 'A root'), await makeSection(api, fen, 'B tip')];
    const shop = await makeShop(api, fen);
    const plan = samplePlan({ sectionId: rootId, ...shop });
    plan.panel.tip.sectionId = tipId;
    // Measured with the skins on, the nominal is that of the true contour to the last digit.
    plan.inspection.measured = 'with-skin';
    const author = fen.author('builder');
    const sheet = await createCutSheet(api.knex, cheapWorks, author, {
      name: 'Two sections',
      purpose: '',
      plan,
      note: '',
    });
    const owner = await api.signIn(fen, 'owner');
    const release = { params: { sheetId: sheet.id, number: 1 }, body: { reason: '' } };
    expect((await owner.call('inspectionStatistics')).reply.items).toEqual([]);
    const put = (measurements: Reading[], machineId: string | null) =>
      owner.call('addInspection', { body: body(measurements, { sheetId: sheet.id, machineId }) });
    // Root at the machine: +0.1, +0.3, -0.1, +0.5 mm. Mean 0.8 / 4 = 0.2; squares of the rests 0.01 + 0.01 + 0.09 + 0.09 = 0.20;
    // 0.20 / 3 = 0.0667, root 0.258199. One of the four is out of 0.3 mm. Tip at the machine: 0.2 and 0.4, mean 0.3, rests 0.1: root of 0.02.
    await put([off('root', 0.15, 0.1), off('root', 0.3, 0.3), off('tip', 0.3, 0.2)], shop.machineId);
    await put([off('root', 0.5, -0.1), off('root', 0.7, 0.5), off('tip', 0.5, 0.4)], shop.machineId);
    await put([off('root', 0.3, -0.2)], null);
    const { items } = (await owner.call('inspectionStatistics')).reply;
    expect(items.map(({ sectionName, machine }) => [sectionName, machine?.id ?? null])).toEqual([
      ['A root', null],
      ['A root', shop.machineId],
      ['B tip', shop.machineId],
    ]);
    expect(items.map(({ parts: n, readings, outOfTolerance }) => [n, readings, outOfTolerance])).toEqual([
      [1, 1, 0],
      [2, 4, 1],
      [2, 2, 1],
    ]);
    const near = [
      [-0.2, null],
      [0.2, 0.258199],
      [0.3, 0.141421],
    ] as const;
    for (const [i, [mean, spread]] of near.entries()) {
      expect(Math.abs(items[i]!.meanMm - mean)).toBeLessThan(1e-4);
      if (spread === null) expect(items[i]!.spreadMm).toBeNull();
      else expect(Math.abs(items[i]!.spreadMm! - spread)).toBeLessThan(1e-4);
    }
    // What was measured on a draft is for those alone who see drafts.
    expect((await measured.call('inspectionStatistics')).reply.items).toEqual([]);
    expect((await owner.call('releaseSheetVersion', release)).status).toBe(200);
    expect((await measured.call('inspectionStatistics')).reply.items).toEqual(items);
  });
});

describe('the database itself', () => {
  it('changes nothing of an inspection but its answer, once', async () => {
    const id = await outside();
    await technician.call('addPhoto', { params: { inspectionId: id }, file: photo });
    const row = () => api.knex('inspections').where({ id });
    await expect(row().update({ note: 'else' })).rejects.toThrow('An inspection never changes.');
    await expect(row().update({ within_tolerance: 1 })).rejects.toThrow('An inspection never changes.');
    await expect(row().delete()).rejects.toThrow(/never deleted|foreign key/);
    await expect(row().update({ decision: 'accepted' })).rejects.toThrow('inspections_decision');
    const answer = { decision_note: 'so', decided_by: marsh.people.owner, decided_at: new Date() };
    await row().update({ decision: 'accepted', ...answer });
    await expect(row().update({ decision: 'rejected', ...answer })).rejects.toThrow('answered once');
    for (const table of ['inspection_measurements', 'photos']) {
      const own = () => api.knex(table).where({ inspection_id: id });
      await expect(own().delete()).rejects.toThrow(/neither changed nor deleted/);
      await expect(own().update({ inspection_id: id })).rejects.toThrow(/neither changed nor deleted/);
    }
  });

  it('takes no reading whose deviation or verdict does not fit', async () => {
    const id = await outside();
    const [row] = (await api.knex('inspection_measurements').where({ inspection_id: id })) as object[];
    const add = (change: object) =>
      api.knex('inspection_measurements').insert({ ...row, place: 7, station: 0.5, ...change });
    await expect(add({ deviation_mm: 0 })).rejects.toThrow('measurements_deviation');
    await expect(add({ within_tolerance: 1 })).rejects.toThrow('measurements_within');
    await expect(add({ panel_end: 'nose' })).rejects.toThrow('measurements_end');
    await expect(add({ station: 0.3 })).rejects.toThrow('measurements_station');
    await add({});
    expect(await api.knex('inspection_measurements').where({ inspection_id: id })).toHaveLength(2);
  });
});
