import { v4 as uuid } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { sheetConflictSchema, type SheetPlan } from '#server/contracts/cut-sheets.ts';
import { parseShortCode, shortCodeOf } from '#server/contracts/sheet-plan.ts';
import { balsa, laser } from '#server/contracts/shop-samples.ts';
import { canonicalText, describeDocument } from '#server/cut-sheets/document.ts';
import { sha256 } from '#server/sections/described.ts';
import { createItem, machines, materials } from '#server/shop/store.ts';
import { startApi, type TestApi, type TestWorkshop } from '../../support/api.ts';
import { type Client } from '../../support/client.ts';
import { makeSection, makeShop } from '../../support/requests.ts';
import { naca4 } from '../../support/shapes.ts';
import { makeSheet, type PlanParts, samplePlan } from '../../support/sheets.ts';

let api: TestApi;
let marsh: TestWorkshop;
let builder: Client;
let designer: Client;
let parts: PlanParts;
let plan: SheetPlan;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  builder = await api.signIn(marsh, 'builder');
  designer = await api.signIn(marsh, 'designer');
  parts = { sectionId: await makeSection(api, marsh), ...(await makeShop(api, marsh)) };
  plan = samplePlan(parts);
});
afterAll(() => api.close());

const rows = async () => ({
  sheets: await api.knex('cut_sheets').where({ workshop_id: marsh.id }),
  versions: await api.knex('cut_sheet_versions').where({ workshop_id: marsh.id }),
});
const create = (of: unknown, more: Record<string, unknown> = {}) =>
  builder.call('createCutSheet', { body: { name: 'Heron outer panel', plan: of, ...more } });

describe('a new cut sheet', () => {
  it('has version 1, a draft with the plan as it was made and as it stood at that moment', async () => {
    const made = await create(plan, { purpose: ' left and right ', note: 'first' });
    expect(made.status).toBe(201);
    expect(made.reply).toMatchObject({
      name: 'Heron outer panel',
      purpose: 'left and right',
      versionCount: 1,
      releasedNumber: null,
      progress: [],
      latest: {
        number: 1,
        status: 'draft',
        root: { sectionName: 'Marsh 2412', versionNumber: 1, status: 'released', inForce: 1 },
        rootChordMm: 220,
        tipChordMm: 180,
        spanMm: 600,
        parts: ['core'],
        machine: { id: parts.machineId, kind: 'wire' },
        errors: 0,
        warnings: 2,
      },
    });
    const { reply } = await builder.call('getSheetVersion', {
      params: { sheetId: made.reply.id, number: 1 },
    });
    expect(reply).toMatchObject({ plan, note: 'first', basedOn: null, author: { id: marsh.people.builder } });
    expect(reply.pinned.panel.root).toEqual({ shape: naca4(), chordMm: 220 });
    expect(reply.pinned.machine).toMatchObject({ towerDistanceMm: 1000 });
    expect(reply.pinned.material).toMatchObject({ densityKgM3: 32 });
    const { text } = describeDocument(reply, { sheetId: made.reply.id, number: 1 });
    expect(reply.checksum).toBe(sha256(text));
    expect(reply.shortCode).toBe(shortCodeOf(reply.checksum));
    expect(parseShortCode(reply.shortCode.toLowerCase().replace('-', ' '))).toBe(reply.shortCode);
  });

  it('takes a plan with errors and counts them', async () => {
    const low = { ...plan, block: { ...plan.block, heightMm: 12 } };
    const made = await create(low);
    expect(made.status).toBe(201);
    expect(made.reply.latest.errors).toBeGreaterThan(0);
  });

  it('takes ids in any letters and gives them back in small ones', async () => {
    const loud = JSON.parse(JSON.stringify(plan).replace(/[0-9a-f-]{36}/g, (id) => id.toUpperCase()));
    const made = await create(loud);
    expect(made.status).toBe(201);
    const version = await builder.call('getSheetVersion', {
      params: { sheetId: made.reply.id, number: 1 },
    });
    expect(version.reply.plan).toEqual(plan);
  });

  it('is made once for a key, also when two ask at the same moment, and never for another plan', async () => {
    const key = uuid();
    const [one, other] = await Promise.all([create(plan, { key }), create(plan, { key })]);
    expect([one.status, other.status]).toEqual([201, 201]);
    expect(other.reply.id).toBe(one.reply.id);
    const again = await create({ ...plan, quantity: 8 }, { key });
    expect([again.status, again.problem.code]).toEqual([409, 'key-reused']);
  });
});

const set = (path: string, value: unknown) => {
  const changed = structuredClone(plan) as unknown as Record<string, unknown>;
  const keys = path.split('.');
  const last = keys.pop()!;
  const holder = keys.reduce((at, key) => at[key] as Record<string, unknown>, changed);
  holder[last] = value;
  return changed;
};
const absent = '0190a5b0-1111-7222-8333-444455556666';

describe('a plan that cannot be', () => {
  it.each([
    ['panel.root.chordMm', 1],
    ['panel.tip.chordMm', 5000],
    ['panel.spanMm', 0],
    ['kerfMm.root', null],
    ['allowances.upperMm', -1],
    ['quantity', 0],
    ['quantity', 1.5],
    ['paper', 'A5'],
    ['inspection.stations', []],
    ['panel.root.versionNumber', 99],
    ['panel.tip.sectionId', absent],
    ['panel.tip.sectionId', 'no id'],
    ['machineId', absent],
    ['materialId', absent],
    ['ribMachineId', absent],
    ['ribMaterialId', absent],
  ])('is refused by its field: %s = %j; nothing is stored', async (path, value) => {
    const before = await rows();
    const answer = await create(set(path, value));
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toEqual([`plan.${path}`]);
    expect(answer.problem.errors?.[0]?.message).toMatch(/^[A-Z“].*\.$/);
    expect(await rows()).toEqual(before);
  });

  it('is refused where a machine or material is of the wrong kind, and names all of them at once', async () => {
    const author = marsh.author('builder');
    const bed = await createItem(api.knex, author, machines, { name: 'Laser', settings: laser });
    const sheet = await createItem(api.knex, author, materials, { name: 'Balsa', settings: balsa });
    const right = await create({ ...plan, ribMachineId: bed.id, ribMaterialId: sheet.id });
    expect(right.status).toBe(201);
    const wrong = {
      machineId: bed.id,
      materialId: sheet.id,
      ribMachineId: parts.machineId,
      ribMaterialId: parts.materialId,
    };
    const answer = await create({ ...plan, ...wrong });
    expect(answer.problem.errors?.map(({ path }) => path)).toEqual([
      'plan.machineId',
      'plan.materialId',
      'plan.ribMachineId',
      'plan.ribMaterialId',
    ]);
  });

  it('is refused whole when it is larger than any plan', async () => {
    const answer = await create(set('features', Array(400).fill({ kind: 'strip', name: 'x'.repeat(90) })));
    expect(answer.status).toBe(413);
  });
});

describe('saving a version', () => {
  it('is based on the newest; what came in between is named and nothing is lost', async () => {
    const sheetId = await makeSheet(api, marsh, parts);
    const save = (client: Client, basedOn: number, quantity: number) =>
      client.call('saveSheetVersion', {
        params: { sheetId },
        body: { basedOn, plan: { ...plan, quantity } },
      });
    expect((await save(builder, 2, 6)).reply).toMatchObject({ number: 3, basedOn: 2, status: 'draft' });
    const late = await save(designer, 2, 8);
    expect([late.status, late.problem.code]).toEqual([409, 'version-conflict']);
    const { basedOn, latest } = sheetConflictSchema.parse(late.problem);
    expect([basedOn, latest.number, latest.plan.quantity]).toEqual([2, 3, 6]);
    expect(late.problem.detail).toContain('builder of marsh');
    expect((await save(designer, 3, 8)).reply.number).toBe(4);
    const missing = await save(designer, 9, 8);
    expect(missing.problem.errors?.map(({ path }) => path)).toEqual(['basedOn']);
  });

  it('gives numbers without a gap when several save at once, each on the newest', async () => {
    const sheetId = await makeSheet(api, marsh, parts);
    const answers = await Promise.all(
      [1, 2, 3, 4].map((quantity) =>
        builder.call('saveSheetVersion', {
          params: { sheetId },
          body: { basedOn: 2, plan: { ...plan, quantity: quantity + 10 }, key: uuid() },
        }),
      ),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409, 409]);
    const list = await builder.call('listSheetVersions', { params: { sheetId } });
    expect(list.reply.items.map(({ number }) => number)).toEqual([3, 2, 1]);
  });

  it('of what changes nothing needs a note; a machine that was changed since is a change', async () => {
    const shop = await makeShop(api, marsh);
    const own = { ...parts, ...shop };
    const sheetId = await makeSheet(api, marsh, own);
    const same = { ...samplePlan(own), quantity: 4 };
    const save = (body: object) => builder.call('saveSheetVersion', { params: { sheetId }, body });
    const refused = await save({ basedOn: 2, plan: same });
    expect(refused.problem.errors?.map(({ path }) => path)).toEqual(['plan']);
    const noted = await save({ basedOn: 2, plan: same, note: 'for the second wing' });
    expect(noted.reply.number).toBe(3);
    const machine = await builder.call('getMachine', { params: { machineId: shop.machineId } });
    await builder.call('changeMachine', {
      params: { machineId: shop.machineId },
      body: { revision: 1, settings: { ...machine.reply.settings, towerDistanceMm: 1200 } },
    });
    const moved = await save({ basedOn: 3, plan: same });
    expect(moved.reply.pinned.machine?.towerDistanceMm).toBe(1200);
    const before = await builder.call('getSheetVersion', { params: { sheetId, number: 3 } });
    expect(before.reply.pinned.machine?.towerDistanceMm).toBe(1000);
    expect(before.reply.checksum).toBe(noted.reply.checksum);
  });

  it('is done once for a key', async () => {
    const sheetId = await makeSheet(api, marsh, parts);
    const body = { basedOn: 2, plan: { ...plan, quantity: 12 }, key: uuid() };
    const [one, other] = await Promise.all(
      [1, 2].map(() => builder.call('saveSheetVersion', { params: { sheetId }, body })),
    );
    expect([one!.status, one!.reply.number, other!.reply.number]).toEqual([201, 3, 3]);
    const later = await builder.call('saveSheetVersion', { params: { sheetId }, body });
    expect(later.reply.number).toBe(3);
  });

  it('is refused for a sheet in the archive, until it is taken back', async () => {
    const sheetId = await makeSheet(api, marsh, parts);
    const change = (archived: boolean) =>
      builder.call('changeCutSheet', { params: { sheetId }, body: { archived } });
    const save = () =>
      builder.call('saveSheetVersion', {
        params: { sheetId },
        body: { basedOn: 2, plan: { ...plan, quantity: 3 } },
      });
    expect((await change(true)).reply.archived).toBe(true);
    const refused = await save();
    expect([refused.status, refused.problem.code]).toEqual([409, 'archived']);
    expect(refused.problem.detail).toBe('Take the cut sheet back from the archive first.');
    expect((await change(false)).reply.archived).toBe(false);
    expect((await save()).status).toBe(201);
    expect(api.errors).toEqual([]);
  });
});

describe('canonical text', () => {
  it('is the same whatever the order of the keys, and another for another value', () => {
    const one = canonicalText({ b: [1, { d: 0.1 + 0.2, c: null }], a: 'ß' });
    expect(one).toBe('{"a":"ß","b":[1,{"c":null,"d":0.30000000000000004}]}');
    expect(canonicalText({ a: 'ß', b: [1, { c: null, d: 0.30000000000000004 }] })).toBe(one);
    expect(canonicalText({ b: [{ d: 0.1 + 0.2, c: null }, 1], a: 'ß' })).not.toBe(one);
  });
});
