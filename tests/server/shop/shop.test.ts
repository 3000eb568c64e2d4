import { v4 as uuid } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { machineSchema, materialSchema } from '#geometry/cutting/plan.ts';
import { balsa, extrudedFoam, handBow, laser, wireBench } from '#server/contracts/shop-samples.ts';
import { shopDefaults } from '#server/shop/defaults.ts';
import { createItem, machines } from '#server/shop/store.ts';
import { startApi, type TestApi, type TestWorkshop } from '../support/api.ts';
import { type Client } from '../support/client.ts';
import { makeShop } from '../support/requests.ts';

let api: TestApi;
let marsh: TestWorkshop;
let builder: Client;
let owner: Client;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  builder = await api.signIn(marsh, 'builder');
  owner = await api.signIn(marsh, 'owner');
});
afterAll(() => api.close());

const named = (settings: object) => ({ name: uuid(), settings });

describe('machines', () => {
  it.each([
    ['four-axis wire', wireBench],
    ['hand bow', handBow],
    ['laser', laser],
  ])('keep a %s as it was entered', async (_kind, settings) => {
    const name = uuid();
    const made = await builder.call('createMachine', { body: { name: ` ${name} `, settings } });
    expect(made.status).toBe(201);
    expect(made.reply).toMatchObject({
      name,
      settings,
      archived: false,
      revision: 1,
      updatedBy: { id: marsh.people.builder, name: 'builder of marsh' },
    });
    const found = await owner.call('getMachine', { params: { machineId: made.reply.id } });
    expect(found.reply).toEqual(made.reply);
  });

  it('have the form that a plan takes, with their name', async () => {
    const { machineId, materialId } = await makeShop(api, marsh);
    const machine = (await builder.call('getMachine', { params: { machineId } })).reply;
    const { kind, ...settings } = machine.settings;
    expect(kind).toBe('wire');
    expect(machineSchema.safeParse({ name: machine.name, ...settings }).success).toBe(true);
    const material = (await builder.call('getMaterial', { params: { materialId } })).reply;
    const { densityKgM3, feedMmMin, maxFeedMmMin } = material.settings as typeof extrudedFoam;
    const planned = { name: material.name, densityKgM3, feedMmMin, maxFeedMmMin };
    expect(materialSchema.parse(planned)).toEqual(planned);
  });

  const refused: [string, object][] = [
    ['name', { name: ' ', settings: handBow }],
    ['name', { name: 'x'.repeat(61), settings: handBow }],
    ['name', { name: 'two\nlines', settings: handBow }],
    ['settings', { name: 'None' }],
    ['settings.kind', named({ ...handBow, kind: 'plasma' })],
    ['settings.towerDistanceMm', named({ ...wireBench, towerDistanceMm: 9 })],
    ['settings.towerDistanceMm', named({ ...wireBench, towerDistanceMm: '1000' })],
    ['settings.travelFeedMmMin', named({ ...wireBench, travelFeedMmMin: 1001 })],
    [
      'settings.controller.axes',
      named({
        ...wireBench,
        controller: { ...wireBench.controller, axes: { leftX: 'X', leftY: 'Y', rightX: 'X', rightY: 'V' } },
      }),
    ],
    [
      'settings.controller.header.0',
      named({ ...wireBench, controller: { ...wireBench.controller, header: ['no words'] } }),
    ],
    ['settings.sheetWidthMm', named({ ...laser, sheetWidthMm: -1 })],
    ['settings.colour', named({ ...laser, colour: 'red' })],
  ];
  it.each(refused)('are refused with %s at fault', async (path, body) => {
    const answer = await builder.call('createMachine', { body });
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toEqual([path]);
  });

  it('change on the revision that was seen, and on no other', async () => {
    const { machineId } = await makeShop(api, marsh);
    const params = { machineId };
    const settings = { ...wireBench, towerDistanceMm: 1200 };
    const first = await builder.call('changeMachine', { params, body: { revision: 1, settings } });
    expect(first.reply).toMatchObject({ revision: 2, settings });
    const second = await owner.call('changeMachine', { params, body: { revision: 1, name: uuid() } });
    expect(second.status).toBe(409);
    expect(second.problem.code).toBe('revision-conflict');
    expect(second.problem['current']).toEqual(first.reply);
    const found = await owner.call('getMachine', { params });
    expect(found.reply).toEqual(first.reply);
  });

  it('let one of two changes through that come at the same time', async () => {
    const { machineId } = await makeShop(api, marsh);
    const change = (client: Client) =>
      client.call('changeMachine', { params: { machineId }, body: { revision: 1, name: uuid() } });
    const answers = await Promise.all([change(builder), change(owner), change(builder)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409]);
  });

  it('do not count a change that changes nothing', async () => {
    const { machineId } = await makeShop(api, marsh);
    const body = { revision: 1, settings: wireBench, archived: false };
    expect((await builder.call('changeMachine', { params: { machineId }, body })).reply.revision).toBe(1);
  });

  it('keep their kind', async () => {
    const { machineId } = await makeShop(api, marsh);
    const body = { revision: 1, settings: handBow };
    const answer = await builder.call('changeMachine', { params: { machineId }, body });
    expect(answer.problem.errors?.[0]?.path).toBe('settings.kind');
  });

  it('bear a name that no other has, also in the archive and in capitals', async () => {
    const name = `Fen ${uuid()}`;
    const made = await builder.call('createMachine', { body: { name, settings: handBow } });
    const params = { machineId: made.reply.id };
    await builder.call('changeMachine', { params, body: { revision: 1, archived: true } });
    const again = { name: name.toUpperCase(), settings: laser };
    const second = await builder.call('createMachine', { body: again });
    expect(second.status).toBe(422);
    expect(second.problem.errors?.[0]?.path).toBe('name');
    const { machineId } = await makeShop(api, marsh);
    const renamed = await builder.call('changeMachine', {
      params: { machineId },
      body: { revision: 1, name },
    });
    expect(renamed.problem.errors?.[0]?.path).toBe('name');
  });

  it('go to the archive, stand last in the list, and come back', async () => {
    const first = await builder.call('createMachine', { body: { name: '! first', settings: handBow } });
    const params = { machineId: first.reply.id };
    const names = async () => (await builder.call('listMachines')).reply.items.map(({ name }) => name);
    expect((await names())[0]).toBe('! first');
    const gone = await builder.call('changeMachine', { params, body: { revision: 1, archived: true } });
    expect(gone.reply).toMatchObject({ archived: true, revision: 2 });
    const shelf = (await builder.call('listMachines')).reply.items.map(({ archived }) => archived);
    expect(shelf.indexOf(true)).toBe(shelf.lastIndexOf(false) + 1);
    expect((await names()).indexOf('! first')).toBe(shelf.indexOf(true));
    const back = await builder.call('changeMachine', { params, body: { revision: 2, archived: false } });
    expect(back.reply).toMatchObject({ archived: false, revision: 3 });
  });

  it('are at most two hundred', async () => {
    const fen = await api.addWorkshop('fen');
    for (let n = 0; n < 200; n += 1) {
      await createItem(api.knex, fen.author('owner'), machines, { name: `Bow ${n}`, settings: handBow });
    }
    const client = await api.signIn(fen, 'owner');
    const more = await client.call('createMachine', { body: named(handBow) });
    expect(more.status).toBe(422);
    expect((await client.call('listMachines')).reply.items).toHaveLength(200);
  });
});

describe('materials', () => {
  const refused: [string, object][] = [
    ['settings.kind', named({ kind: 'metal' })],
    ['settings.densityKgM3', named({ ...extrudedFoam, densityKgM3: 0.5 })],
    ['settings.feedMmMin', named({ ...extrudedFoam, feedMmMin: 351 })],
    ['settings.blockHeightMm', named({ ...extrudedFoam, blockHeightMm: 0 })],
    ['settings.thicknessMm', named({ ...balsa, thicknessMm: 31 })],
  ];
  it.each(refused)('are refused with %s at fault', async (path, body) => {
    const answer = await builder.call('createMaterial', { body });
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toEqual([path]);
  });

  it('are kept, changed and listed like machines', async () => {
    const made = await builder.call('createMaterial', { body: named(balsa) });
    expect(made.reply).toMatchObject({ settings: balsa, revision: 1 });
    const params = { materialId: made.reply.id };
    const settings = { ...balsa, thicknessMm: 3 };
    const changed = await owner.call('changeMaterial', { params, body: { revision: 1, settings } });
    expect(changed.reply).toMatchObject({ settings, revision: 2, updatedBy: { id: marsh.people.owner } });
    const stale = await builder.call('changeMaterial', { params, body: { revision: 1, archived: true } });
    expect(stale.problem['current']).toEqual(changed.reply);
    const list = (await builder.call('listMaterials')).reply;
    expect(list.items).toContainEqual(changed.reply);
    expect(list.nextCursor).toBeNull();
  });
});

describe('a new workshop', () => {
  it('finds kerfs of such pairs only as cut, each marked as not measured', () => {
    const kindOf = (list: readonly { name: string; settings: { kind: string } }[], name: string) =>
      list.find((one) => one.name === name)?.settings.kind;
    const pairs = shopDefaults.kerfs.map(({ machine, material }) =>
      [kindOf(shopDefaults.machines, machine), kindOf(shopDefaults.materials, material)].join(' '),
    );
    expect(pairs).toHaveLength(8);
    expect(new Set(pairs)).toEqual(new Set(['wire foam', 'bow foam', 'laser sheet', 'router sheet']));
  });
});
