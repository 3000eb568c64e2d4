import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { startApi, type TestApi, type TestWorkshop } from '../../support/api.ts';
import { type Client } from '../../support/client.ts';
import { cst, naca4 } from '../../support/shapes.ts';

let api: TestApi;
let marsh: TestWorkshop;
let designer: Client;
let owner: Client;
let params: { sectionId: string };
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  designer = await api.signIn(marsh, 'designer');
  owner = await api.signIn(marsh, 'owner');
});
afterAll(() => api.close());
beforeEach(async () => {
  const made = await designer.call('createSection', { body: { name: 'Marsh 2412', shape: naca4() } });
  params = { sectionId: made.reply.id };
});

const body = { basedOn: 1, shape: cst(), chordMm: 220.5 };

describe('unsaved work', () => {
  it('is nothing at first, then what was kept last, then nothing again', async () => {
    expect((await designer.call('getDraft', { params })).status).toBe(404);
    const kept = await designer.call('keepDraft', { params, body });
    expect(kept.reply).toMatchObject(body);
    const newer = { ...body, shape: naca4({ maxThickness: 0.09 }), chordMm: 180 };
    const second = await designer.call('keepDraft', { params, body: newer });
    expect((await designer.call('getDraft', { params })).reply).toEqual(second.reply);
    expect(second.reply).toMatchObject(newer);
    expect((await designer.call('dropDraft', { params })).status).toBe(204);
    expect((await designer.call('getDraft', { params })).status).toBe(404);
    expect((await designer.call('dropDraft', { params })).status).toBe(204);
  });

  it('belongs to one person', async () => {
    await designer.call('keepDraft', { params, body });
    expect((await owner.call('getDraft', { params })).status).toBe(404);
    await owner.call('keepDraft', { params, body: { ...body, chordMm: 100 } });
    await owner.call('dropDraft', { params });
    expect((await designer.call('getDraft', { params })).reply.chordMm).toBe(220.5);
  });

  it('does not move the section', async () => {
    const before = (await designer.call('getSection', { params })).reply;
    await designer.call('keepDraft', { params, body });
    expect((await designer.call('getSection', { params })).reply).toEqual(before);
  });

  it('goes with the save of the same shape, and stays when it holds another', async () => {
    await designer.call('keepDraft', { params, body });
    await owner.call('keepDraft', { params, body });
    await designer.call('saveVersion', { params, body: { basedOn: 1, shape: naca4({ maxCamber: 0.03 }) } });
    expect((await designer.call('getDraft', { params })).status).toBe(200);
    await designer.call('saveVersion', { params, body: { basedOn: 2, shape: cst() } });
    expect((await designer.call('getDraft', { params })).status).toBe(404);
    expect((await owner.call('getDraft', { params })).status).toBe(200);
  });

  it('outlives a save that was refused', async () => {
    await owner.call('saveVersion', { params, body: { basedOn: 1, shape: naca4({ maxCamber: 0.03 }) } });
    await designer.call('keepDraft', { params, body });
    const refused = await designer.call('saveVersion', { params, body: { basedOn: 1, shape: cst() } });
    expect(refused.status).toBe(409);
    expect((await designer.call('getDraft', { params })).reply).toMatchObject(body);
  });

  it('is kept once when many keeps come at the same time', async () => {
    const keeps = Array.from({ length: 10 }, (_, index) =>
      designer.call('keepDraft', { params, body: { ...body, chordMm: 100 + index } }),
    );
    expect((await Promise.all(keeps)).map(({ status }) => status)).toEqual(Array(10).fill(200));
    const rows = await api.knex('section_drafts').where({ section_id: params.sectionId });
    expect(rows).toHaveLength(1);
  });

  it.each([
    ['basedOn', { basedOn: 2 }],
    ['chordMm', { chordMm: 5 }],
    ['chordMm', { chordMm: 5001 }],
    ['chordMm', { chordMm: '220' }],
    ['shape.upper.0', { shape: cst({ upper: [9, 0.1, 0.1] }) }],
    ['updatedAt', { updatedAt: '2026-01-01T00:00:00Z' }],
  ])('is refused by the name of its field: %s', async (path, change) => {
    const answer = await designer.call('keepDraft', { params, body: { ...body, ...change } });
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toContain(path);
  });
});
