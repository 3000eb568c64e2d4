import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { balsa, handBow, laser } from '#server/contracts/shop-samples.ts';
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

const measured = { kerfMm: 0.94, speedMmMin: 180, measuredOn: '2026-02-03', revision: 1 };
const place = () => makeShop(api, marsh);
const rowOf = (machineId: string) => api.knex('kerfs').where({ machine_id: machineId });

describe('kerfs', () => {
  it('stand in the list with the mark that nobody measured them', async () => {
    const params = await place();
    const list = (await builder.call('listKerfs')).reply.items;
    expect(list.find(({ machineId }) => machineId === params.machineId)).toEqual({
      ...params,
      kerfMm: 0.8,
      speedMmMin: 200,
      isDefault: true,
      measuredOn: null,
      by: { id: marsh.people.builder, name: 'builder of marsh' },
      revision: 1,
      updatedAt: '2026-02-01T09:00:00.000Z',
    });
  });

  it('lose the mark when one is measured, and keep day and person', async () => {
    const params = await place();
    const put = await owner.call('putKerf', { params, body: measured });
    expect(put.status).toBe(200);
    expect(put.reply).toMatchObject({
      ...params,
      ...measured,
      isDefault: false,
      revision: 2,
      by: { id: marsh.people.owner },
    });
    const back = { ...measured, measuredOn: null, revision: 2 };
    expect((await builder.call('putKerf', { params, body: back })).reply).toMatchObject({
      isDefault: true,
      measuredOn: null,
      revision: 3,
    });
  });

  it('leave what they were in the history, with who had set it and who replaced it', async () => {
    const params = await place();
    await owner.call('putKerf', { params, body: measured });
    await builder.call('putKerf', { params, body: { ...measured, kerfMm: 0.9, revision: 2 } });
    await builder.call('putKerf', { params, body: { ...measured, kerfMm: 3, revision: 1 } });
    const history = () => api.knex('kerf_history').where({ machine_id: params.machineId });
    const rows: unknown[] = await history()
      .orderBy('revision')
      .select(
        'revision',
        'kerf_mm',
        'person_id',
        'replaced_by',
        api.knex.raw("date_format(measured_on, '%Y-%m-%d') as measured_on"),
      );
    const { builder: byBuilder, owner: byOwner } = marsh.people;
    expect(rows).toEqual([
      { revision: 1, kerf_mm: 0.8, person_id: byBuilder, replaced_by: byOwner, measured_on: null },
      { revision: 2, kerf_mm: 0.94, person_id: byOwner, replaced_by: byBuilder, measured_on: '2026-02-03' },
    ]);
    await expect(history().update({ kerf_mm: 1 })).rejects.toThrow(/neither changed nor deleted/);
    await expect(history().delete()).rejects.toThrow(/neither changed nor deleted/);
  });

  it.each(['changeMachine', 'changeMaterial'] as const)(
    'are not set once %s has put it away',
    async (name) => {
      const params = await place();
      await builder.call(name, { params, body: { revision: 1, archived: true } });
      const away = await builder.call('putKerf', { params, body: measured });
      expect([away.status, away.problem.code]).toEqual([409, 'archived']);
      expect(await rowOf(params.machineId)).toMatchObject([{ kerf_mm: 0.8, revision: 1 }]);
      await builder.call(name, { params, body: { revision: 2, archived: false } });
      expect((await builder.call('putKerf', { params, body: measured })).status).toBe(200);
    },
  );

  it.each([1, 3, null])('are not overwritten on revision %s when it is 2', async (revision) => {
    const params = await place();
    const now = await builder.call('putKerf', { params, body: measured });
    const late = await owner.call('putKerf', { params, body: { ...measured, kerfMm: 2, revision } });
    expect(late.status).toBe(409);
    expect(late.problem.code).toBe('revision-conflict');
    expect(late.problem['current']).toEqual(now.reply);
    expect(await rowOf(params.machineId)).toMatchObject([{ kerf_mm: 0.94, revision: 2 }]);
  });

  it('let one of several first ones through that come at the same time', async () => {
    const params = await place();
    await rowOf(params.machineId).delete();
    const first = { ...measured, revision: null };
    const absent = await builder.call('putKerf', { params, body: measured });
    expect([absent.status, absent.problem['current']]).toEqual([409, null]);
    const answers = await Promise.all(
      [builder, owner, builder, owner].map((client) => client.call('putKerf', { params, body: first })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409, 409]);
    for (const { problem } of answers.filter(({ status }) => status === 409)) {
      expect(problem['current']).toMatchObject({ kerfMm: 0.94, revision: 1 });
    }
  });

  it('let one of several changes through that come at the same time', async () => {
    const params = await place();
    const answers = await Promise.all(
      [builder, owner, builder].map((client) => client.call('putKerf', { params, body: measured })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409]);
    expect(await rowOf(params.machineId)).toMatchObject([{ revision: 2 }]);
  });

  const wrong: [string, object][] = [
    ['kerfMm', { kerfMm: 0 }],
    ['kerfMm', { kerfMm: 6.1 }],
    ['kerfMm', { kerfMm: '0.8' }],
    ['speedMmMin', { speedMmMin: 0 }],
    ['speedMmMin', { speedMmMin: null }],
    ['measuredOn', { measuredOn: '2026-02-30' }],
    ['measuredOn', { measuredOn: '2999-01-01' }],
    ['revision', { revision: 0 }],
  ];
  it.each(wrong)('are refused with %s at fault', async (path, change) => {
    const params = await place();
    const answer = await builder.call('putKerf', { params, body: { ...measured, ...change } });
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toEqual([path]);
    expect(await rowOf(params.machineId)).toMatchObject([{ kerf_mm: 0.8, revision: 1 }]);
  });

  it('are of a bow without a speed, and of no pair that does not cut', async () => {
    const { machineId, materialId } = await place();
    const name = machineId;
    const bow = (await builder.call('createMachine', { body: { name, settings: handBow } })).reply.id;
    const light = (await builder.call('createMachine', { body: { name: materialId, settings: laser } })).reply
      .id;
    const wood = (await builder.call('createMaterial', { body: { name, settings: balsa } })).reply.id;
    const put = (machine: string, material: string, speedMmMin: number | null) =>
      builder.call('putKerf', {
        params: { machineId: machine, materialId: material },
        body: { ...measured, speedMmMin, revision: null },
      });
    expect((await put(bow, materialId, 100)).problem.errors?.[0]?.path).toBe('speedMmMin');
    expect((await put(bow, materialId, null)).status).toBe(200);
    expect((await put(light, wood, 900)).status).toBe(200);
    expect((await put(light, materialId, 900)).problem.errors?.[0]?.path).toBe('materialId');
    expect((await put(machineId, wood, 900)).problem.errors?.[0]?.path).toBe('materialId');
  });
});

describe('the database itself', () => {
  it('refuses kerfs that contradict themselves', async () => {
    const { machineId } = await place();
    const kerf = rowOf(machineId);
    const refused: [object, string][] = [
      [{ kerf_mm: 0 }, 'kerfs_width'],
      [{ speed_mm_min: null }, 'kerfs_speed'],
      [{ is_default: false }, 'kerfs_measured'],
      [{ measured_on: '2026-02-01' }, 'kerfs_measured'],
      [{ machine_kind: 'laser' }, 'kerfs_'],
      [{ revision: 0 }, 'kerfs_revision'],
    ];
    for (const [change, rule] of refused) {
      await expect(kerf.clone().update(change), JSON.stringify(change)).rejects.toThrow(rule);
    }
  });

  it('refuses a machine of another kind than its settings, one with a kerf to be deleted, and a foreign person', async () => {
    const fen = await api.addWorkshop('fen');
    const { machineId } = await place();
    const machine = api.knex('machines').where({ id: machineId });
    await expect(machine.clone().update({ settings: JSON.stringify(handBow) })).rejects.toThrow(
      'machines_settings_of_kind',
    );
    await expect(machine.clone().update({ kind: 'lathe' })).rejects.toThrow('CONSTRAINT');
    await expect(machine.clone().update({ name: ' ' })).rejects.toThrow('machines_name_given');
    await expect(machine.clone().delete()).rejects.toThrow(/foreign key/);
    await expect(machine.clone().update({ updated_by: fen.people.owner })).rejects.toThrow(
      'machines_updated_by',
    );
  });
});
