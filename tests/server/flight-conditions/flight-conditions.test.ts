import { v4 as uuid } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { fastDash, levelTrainer, slowLoiter } from '#server/contracts/flight-condition-samples.ts';
import { startApi, type TestApi, type TestWorkshop } from '../support/api.ts';
import { type Client } from '../support/client.ts';
import { makeCondition } from '../support/requests.ts';

let api: TestApi;
let marsh: TestWorkshop;
let designer: Client;
let owner: Client;
let first: string;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  designer = await api.signIn(marsh, 'designer');
  owner = await api.signIn(marsh, 'owner');
  first = await makeCondition(api, marsh);
});
afterAll(() => api.close());

const defaults = async () =>
  (await designer.call('listFlightConditions')).reply.items
    .filter(({ isDefault }) => isDefault)
    .map(({ id }) => id);
const makeDefault = (client: Client, conditionId: string) =>
  client.call('setDefaultFlightCondition', { params: { conditionId } });

describe('flight conditions', () => {
  it.each([
    ['span and speed', levelTrainer],
    ['lift coefficient and altitude', slowLoiter],
    ['area and forced transition', fastDash],
  ])('with %s are kept as they were entered', async (_what, settings) => {
    const name = uuid();
    const made = await designer.call('createFlightCondition', { body: { name: ` ${name} `, settings } });
    expect(made.status).toBe(201);
    expect(made.reply).toMatchObject({
      name,
      settings,
      isDefault: false,
      archived: false,
      revision: 1,
      updatedBy: { id: marsh.people.designer, name: 'designer of marsh' },
    });
    const found = await owner.call('getFlightCondition', { params: { conditionId: made.reply.id } });
    expect(found.reply).toEqual(made.reply);
    expect((await owner.call('listFlightConditions')).reply.items).toContainEqual(made.reply);
  });

  it('fill in sea level, the standard temperature and a smooth surface', async () => {
    const { altitudeM: _altitude, temperatureOffsetC: _offset, surface: _surface, ...short } = slowLoiter;
    const made = await designer.call('createFlightCondition', { body: { name: uuid(), settings: short } });
    expect(made.reply.settings).toEqual({
      ...short,
      altitudeM: 0,
      temperatureOffsetC: 0,
      surface: { turbulencePercent: 0.07, tripUpper: null, tripLower: null },
    });
  });

  const refused: [string, object][] = [
    ['settings.massKg', { ...levelTrainer, massKg: 0 }],
    ['settings.massKg', { ...levelTrainer, massKg: '4.2' }],
    ['settings.wing.areaM2', { ...fastDash, wing: { kind: 'area', areaM2: 61 } }],
    ['settings.wing.kind', { ...fastDash, wing: { kind: 'disc', areaM2: 1 } }],
    ['settings.flight.speedMS', { ...levelTrainer, flight: { kind: 'speed', speedMS: 0.5 } }],
    ['settings.altitudeM', { ...levelTrainer, altitudeM: 11_001 }],
    ['settings.surface.tripUpper', { ...fastDash, surface: { tripUpper: 1 } }],
    ['settings.colour', { ...levelTrainer, colour: 'red' }],
  ];
  it.each(refused)('are refused with %s at fault', async (path, settings) => {
    const answer = await designer.call('createFlightCondition', { body: { name: uuid(), settings } });
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toEqual([path]);
  });

  it('change on the revision that was seen, and on no other', async () => {
    const params = { conditionId: await makeCondition(api, marsh) };
    const body = { revision: 1, settings: fastDash };
    const change = await designer.call('changeFlightCondition', { params, body });
    expect(change.reply).toMatchObject({ revision: 2, settings: fastDash });
    const stale = await owner.call('changeFlightCondition', { params, body: { revision: 1, name: uuid() } });
    expect(stale.status).toBe(409);
    expect(stale.problem.code).toBe('revision-conflict');
    expect(stale.problem['current']).toEqual(change.reply);
    const same = { revision: 2, settings: fastDash, archived: false };
    const again = await owner.call('changeFlightCondition', { params, body: same });
    expect(again.reply).toEqual(change.reply);
  });

  it('let one of two changes through that come at the same time', async () => {
    const params = { conditionId: await makeCondition(api, marsh) };
    const change = (client: Client) =>
      client.call('changeFlightCondition', { params, body: { revision: 1, name: uuid() } });
    const answers = await Promise.all([change(designer), change(owner)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('bear a name that no other has', async () => {
    const body = { name: `Fen ${uuid()}`, settings: fastDash };
    await designer.call('createFlightCondition', { body });
    const again = { ...body, name: body.name.toUpperCase() };
    const second = await designer.call('createFlightCondition', { body: again });
    expect(second.status).toBe(422);
    expect(second.problem.errors?.[0]?.path).toBe('name');
  });

  it('go to the archive, stand last in the list, and come back', async () => {
    const params = { conditionId: await makeCondition(api, marsh) };
    const gone = await designer.call('changeFlightCondition', {
      params,
      body: { revision: 1, archived: true },
    });
    expect(gone.reply).toMatchObject({ archived: true, revision: 2 });
    const shelf = (await designer.call('listFlightConditions')).reply.items.map(({ archived }) => archived);
    expect(shelf.indexOf(true)).toBe(shelf.lastIndexOf(false) + 1);
    const back = await designer.call('changeFlightCondition', {
      params,
      body: { revision: 2, archived: false },
    });
    expect(back.reply).toMatchObject({ archived: false, revision: 3 });
  });
});

describe('the default', () => {
  it('is the first of a workshop, also of two that come at the same time', async () => {
    const fen = await api.addWorkshop('fen');
    const client = await api.signIn(fen, 'designer');
    const create = () =>
      client.call('createFlightCondition', { body: { name: uuid(), settings: levelTrainer } });
    const made = await Promise.all([create(), create()]);
    expect(made.map(({ reply }) => reply.isDefault).sort()).toEqual([false, true]);
  });

  it('moves to another one and leaves its revision as it is', async () => {
    const before = await defaults();
    expect(before).toHaveLength(1);
    const next = await makeCondition(api, marsh);
    const answer = await makeDefault(designer, next);
    expect(answer.reply).toMatchObject({ id: next, isDefault: true, revision: 1 });
    expect(await defaults()).toEqual([next]);
    expect((await designer.call('listFlightConditions')).reply.items[0]?.id).toBe(next);
    expect((await makeDefault(designer, next)).status).toBe(200);
    expect(await defaults()).toEqual([next]);
  });

  it('is one, also when two choose at the same time', async () => {
    const other = await makeCondition(api, marsh);
    const answers = await Promise.all([makeDefault(designer, first), makeDefault(owner, other)]);
    expect(answers.map(({ status }) => status)).toEqual([200, 200]);
    const now = await defaults();
    expect(now).toHaveLength(1);
    expect([first, other]).toContain(now[0]);
  });

  it('stays in use, and nothing of the archive becomes it', async () => {
    await makeDefault(designer, first);
    const params = { conditionId: first };
    const { revision } = (await designer.call('getFlightCondition', { params })).reply;
    const refused = await designer.call('changeFlightCondition', {
      params,
      body: { revision, archived: true },
    });
    expect(refused.status).toBe(422);
    expect(refused.problem.errors?.[0]?.path).toBe('archived');
    const away = await makeCondition(api, marsh);
    const put = { params: { conditionId: away }, body: { revision: 1, archived: true } };
    await designer.call('changeFlightCondition', put);
    const answer = await makeDefault(designer, away);
    expect(answer.status).toBe(409);
    expect(answer.problem.code).toBe('archived');
    expect(await defaults()).toEqual([first]);
  });

  it('cannot be two in the database, nor one of the archive', async () => {
    const other = await makeCondition(api, marsh);
    const row = () => api.knex('flight_conditions').where({ id: other });
    await makeDefault(designer, first);
    await expect(row().update({ is_default: true })).rejects.toThrow(/flight_conditions_default/);
    const archivedDefault = api
      .knex('flight_conditions')
      .where({ id: first })
      .update({ archived_at: new Date() });
    await expect(archivedDefault).rejects.toThrow(/flight_conditions_default_in_use/);
  });
});
