import { v4 as uuid } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { measure } from '#geometry/contour/measures.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { startApi, type TestApi, type TestWorkshop } from '../support/api.ts';
import { type Client } from '../support/client.ts';
import { makeSection } from '../support/requests.ts';
import { cst, naca4 } from '../support/shapes.ts';

let api: TestApi;
let marsh: TestWorkshop;
let designer: Client;
let technician: Client;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  designer = await api.signIn(marsh, 'designer');
  technician = await api.signIn(marsh, 'technician');
});
afterAll(() => api.close());

describe('a new section', () => {
  it('begins with version 1, a draft, measured on its true contour', async () => {
    const body = { name: '  Reed tip  ', purpose: 'outer panel', shape: cst(), note: 'first idea' };
    const made = await designer.call('createSection', { body });
    expect(made.status).toBe(201);
    const { maxThickness, maxCamber } = measure(outlineOf(cst()));
    expect(made.reply).toMatchObject({
      name: 'Reed tip',
      purpose: 'outer panel',
      archived: false,
      versionCount: 1,
      releasedNumber: null,
      updatedBy: { id: marsh.people.designer, name: 'designer of marsh' },
      latest: {
        number: 1,
        status: 'draft',
        description: 'CST order 2/2',
        maxThickness,
        maxCamber,
        shape: cst(),
      },
    });
    const version = await designer.call('getVersion', { params: { sectionId: made.reply.id, number: 1 } });
    expect(version.reply).toMatchObject({
      note: 'first idea',
      basedOn: null,
      shape: cst(),
      sectionName: 'Reed tip',
    });
  });

  it('is made once under one key, also when both requests come at the same time', async () => {
    const body = { name: 'Once', shape: naca4(), key: uuid() };
    const answers = await Promise.all([1, 2, 3].map(() => designer.call('createSection', { body })));
    expect(answers.map(({ status }) => status)).toEqual([201, 201, 201]);
    expect(new Set(answers.map(({ text }) => text)).size).toBe(1);
    const found = await designer.call('listSections', { query: { search: 'Once' } });
    expect(found.reply.items).toHaveLength(1);
  });

  it.each([
    ['name', { name: 'Another' }],
    ['purpose', { purpose: 'root' }],
    ['shape', { shape: naca4({ maxThickness: 0.13 }) }],
    ['note', { note: 'why' }],
  ])('is refused under a used key with another %s', async (_name, change) => {
    const body = { name: 'Keyed', purpose: '', shape: naca4(), note: '', key: uuid() };
    expect((await designer.call('createSection', { body })).status).toBe(201);
    const second = await designer.call('createSection', { body: { ...body, ...change } });
    expect(second.status).toBe(409);
    expect(second.problem.code).toBe('key-reused');
  });

  it.each([
    ['name', { name: '   ' }],
    ['name', { name: 'x'.repeat(81) }],
    ['name', { name: 'two\nlines' }],
    ['name', { name: 'nul\u0000' }],
    ['name', { name: 7 }],
    ['purpose', { purpose: 'x'.repeat(201) }],
    ['note', { note: 'x'.repeat(501) }],
    ['key', { key: 'no key' }],
    ['shape.maxThickness', { shape: naca4({ maxThickness: 0.5 }) }],
    ['shape.maxThickness', { shape: { ...naca4(), maxThickness: null } }],
    ['shape.maxThickness', { shape: { ...naca4(), maxThickness: '0.12' } }],
    ['shape.maxCamberPosition', { shape: naca4({ maxCamberPosition: 0 }) }],
    ['shape.trailingEdge', { shape: { ...naca4(), trailingEdge: 'ajar' } }],
    ['shape.chord', { shape: { ...naca4(), chord: 1 } }],
    ['shape.kind', { shape: { ...naca4(), kind: 'naca5' } }],
    ['shape.upper.1', { shape: { ...cst(), upper: [0.17, 1e9, 0.15] } }],
    ['shape.upper', { shape: { ...cst(), upper: Array(14).fill(0.1) } }],
    ['shape', { shape: undefined }],
    ['owner', { owner: 'me' }],
  ])('is refused by the name of its field: %s', async (path, change) => {
    const answer = await designer.call('createSection', {
      body: { name: 'Refused', shape: naca4(), ...change },
    });
    expect(answer.status).toBe(422);
    expect(answer.problem.code).toBe('invalid');
    expect(answer.problem.errors?.map((error) => error.path)).toContain(path);
    expect((await designer.call('listSections', { query: { search: 'Refused' } })).reply.items).toEqual([]);
  });

  it('names every field at fault at once', async () => {
    const body = { name: '', shape: naca4({ maxThickness: 0.5, maxCamber: 0.5 }) };
    const answer = await designer.call('createSection', { body });
    expect(answer.problem.errors?.map((error) => error.path).sort()).toEqual([
      'name',
      'shape.maxCamber',
      'shape.maxThickness',
    ]);
  });

  it.each([
    `'; DROP TABLE sections; --`,
    `" OR ""="`,
    '<script>alert(1)</script>',
    '../../etc/passwd',
    '%_\\%',
    '{"$gt": ""}',
    'Ｆｕｌｌ ｗｉｄｔｈ 翼型 🪁 ÅÉ',
    '__proto__',
  ])('keeps the name %s as the text it is, and finds it again', async (name) => {
    const made = await designer.call('createSection', { body: { name, purpose: name, shape: naca4() } });
    expect(made.status).toBe(201);
    expect(made.reply.name).toBe(name);
    const found = await designer.call('listSections', { query: { search: name } });
    expect(found.reply.items.map((item) => item.id)).toEqual([made.reply.id]);
    const file = await designer.call('datFile', { params: { sectionId: made.reply.id, number: 1 } });
    expect(file.status).toBe(200);
    expect(file.headers.get('content-disposition')).toMatch(
      /^attachment; filename="?[a-z0-9._-]+_v1_unit\.dat"?$/,
    );
  });
});

describe('changing a section', () => {
  it('changes what is given and signs it', async () => {
    const sectionId = await makeSection(api, marsh);
    const owner = await api.signIn(marsh, 'owner');
    const changed = await owner.call('changeSection', {
      params: { sectionId },
      body: { name: 'Sedge 2412' },
    });
    expect(changed.reply).toMatchObject({
      name: 'Sedge 2412',
      purpose: 'tip',
      updatedBy: { id: marsh.people.owner },
      versionCount: 2,
    });
    expect(new Date(changed.reply.updatedAt).getTime()).toBeGreaterThan(
      Date.parse('2026-02-01T09:00:00.000Z'),
    );
    const version = await designer.call('getVersion', { params: { sectionId, number: 1 } });
    expect(version.reply.sectionName).toBe('Sedge 2412');
  });

  it('leaves a section as it is when nothing changes', async () => {
    const sectionId = await makeSection(api, marsh);
    const before = await designer.call('getSection', { params: { sectionId } });
    const same = await designer.call('changeSection', { params: { sectionId }, body: { purpose: 'tip' } });
    expect(same.reply).toEqual(before.reply);
    const none = await designer.call('changeSection', { params: { sectionId }, body: {} });
    expect(none.reply).toEqual(before.reply);
  });

  it('archives, refuses saves and releases there, and takes back', async () => {
    const sectionId = await makeSection(api, marsh, 'Old thing');
    const params = { sectionId };
    expect((await designer.call('archiveSection', { params })).status).toBe(204);
    expect((await designer.call('archiveSection', { params })).status).toBe(204);
    expect((await designer.call('getSection', { params })).reply.archived).toBe(true);
    const listed = async (status?: string) =>
      (await designer.call('listSections', { query: { search: 'Old thing', status } })).reply.items.length;
    expect([await listed(), await listed('released'), await listed('archived')]).toEqual([0, 0, 1]);
    const save = await designer.call('saveVersion', { params, body: { basedOn: 2, shape: cst() } });
    const release = await designer.call('releaseVersion', { params: { sectionId, number: 2 }, body: {} });
    expect([save.problem.code, release.problem.code]).toEqual(['archived', 'archived']);
    const back = await designer.call('changeSection', { params, body: { archived: false } });
    expect(back.reply.archived).toBe(false);
    expect((await designer.call('saveVersion', { params, body: { basedOn: 2, shape: cst() } })).status).toBe(
      201,
    );
  });
});

describe('what a technician sees of a section', () => {
  it('is the released version and nothing of the drafts', async () => {
    const sectionId = await makeSection(api, marsh);
    const own = (await technician.call('getSection', { params: { sectionId } })).reply;
    expect(own).toMatchObject({
      versionCount: 1,
      releasedNumber: 1,
      latest: { number: 1, status: 'released', shape: naca4() },
      updatedAt: '2026-02-01T09:00:00.000Z',
    });
    const drafts = await technician.call('getVersion', { params: { sectionId, number: 2 } });
    expect(drafts.status).toBe(404);
    expect(drafts.problem.code).toBe('not-found');
    const versions = await technician.call('listVersions', { params: { sectionId } });
    expect(versions.reply.items.map(({ number }) => number)).toEqual([1]);
  });

  it('is nothing of a section that was never released', async () => {
    const made = await designer.call('createSection', { body: { name: 'Secret', shape: naca4() } });
    const params = { sectionId: made.reply.id };
    expect((await technician.call('getSection', { params })).status).toBe(404);
    expect((await technician.call('listVersions', { params })).status).toBe(404);
    expect((await technician.call('listSections', { query: { search: 'Secret' } })).reply.items).toEqual([]);
  });

  it('is every version that is or was released, also after none is', async () => {
    const sectionId = await makeSection(api, marsh);
    await designer.call('releaseVersion', { params: { sectionId, number: 2 }, body: {} });
    await designer.call('withdrawVersion', {
      params: { sectionId, number: 2 },
      body: { reason: 'too thin' },
    });
    const versions = await technician.call('listVersions', { params: { sectionId } });
    expect(versions.reply.items.map(({ number, status }) => [number, status])).toEqual([
      [2, 'withdrawn'],
      [1, 'superseded'],
    ]);
    expect((await technician.call('getSection', { params: { sectionId } })).status).toBe(404);
  });
});
