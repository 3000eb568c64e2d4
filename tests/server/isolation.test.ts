import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Endpoint } from '#server/contracts/endpoint.ts';
import { type EndpointName, endpoints } from '#server/contracts/endpoints.ts';
import { startApi, type TestApi, type TestWorkshop } from './support/api.ts';
import { type Client } from './support/client.ts';
import { makeSamples, makeSection, makeShop, requests, type Samples } from './support/requests.ts';
import { cheapWorks } from './support/sheets.ts';
import { naca4 } from './support/shapes.ts';

const tables = [
  'people',
  'sections',
  'section_versions',
  'section_drafts',
  'downloads',
  'machines',
  'materials',
  'kerfs',
  'cut_sheets',
  'cut_sheet_versions',
  'cut_sheet_drafts',
  'cut_files',
  'cut_downloads',
  'cut_logs',
  'cut_progress',
  'inspections',
  'inspection_measurements',
  'photos',
  'kerf_history',
  'flight_conditions',
];

describe('two workshops', () => {
  let api: TestApi;
  let marsh: TestWorkshop;
  let fen: TestWorkshop;
  let stranger: Client;
  let member: Client;
  let samples: Samples;

  beforeAll(async () => {
    api = await startApi({ works: cheapWorks });
    marsh = await api.addWorkshop('marsh');
    fen = await api.addWorkshop('fen');
    stranger = await api.signIn(fen, 'owner');
    member = await api.signIn(marsh, 'owner');
    await makeSection(api, marsh, 'Marsh 2410');
    samples = await makeSamples(api, marsh);
  });
  afterAll(() => api.close());

  /** Everything that belongs to the first workshop. */
  const rowsOfMarsh = () =>
    Promise.all(tables.map((table) => api.knex(table).where({ workshop_id: marsh.id })));

  const naming = (Object.keys(endpoints) as EndpointName[]).filter((name) => {
    const endpoint: Endpoint = endpoints[name];
    return endpoint.params !== undefined;
  });

  it('covers every route that names something', () => {
    const named = Object.values(endpoints).filter(({ path }) => path.includes('/:'));
    expect(naming).toHaveLength(named.length);
    expect(named.length).toBeGreaterThanOrEqual(37);
  });

  it.each(naming)('%s finds nothing of another workshop and changes nothing there', async (name) => {
    // What is only read serves again.
    const own = endpoints[name].method === 'GET' ? samples : await makeSamples(api, marsh);
    const before = await rowsOfMarsh();
    const foreign = await stranger.call(name, requests[name](own));
    expect(foreign.status).toBe(404);
    expect(foreign.problem.code).toBe('not-found');
    expect(foreign.text).not.toContain('Marsh');
    expect(await rowsOfMarsh()).toEqual(before);
    const answer = await member.call(name, requests[name](own));
    expect(answer.status).toBeLessThan(300);
  });

  it('answers for another workshop exactly as for a section that does not exist', async () => {
    const { sectionId } = samples;
    const foreign = await stranger.call('getSection', { params: { sectionId } });
    const absent = await stranger.call('getSection', {
      params: { sectionId: '0190a5b0-1111-7222-8333-444455556666' },
    });
    const { requestId: _foreign, ...one } = foreign.problem;
    const { requestId: _absent, ...other } = absent.problem;
    expect(one).toEqual(other);
  });

  it('lists only what is of the own workshop, also behind a place of the other one', async () => {
    const page = await member.call('listSections', { query: { limit: 1 } });
    expect(page.reply.items).toHaveLength(1);
    const own = await stranger.call('listSections');
    expect(own.reply.items).toEqual([]);
    const cursor = page.reply.nextCursor ?? '';
    expect(cursor).not.toBe('');
    const behind = await stranger.call('listSections', { query: { cursor } });
    expect(behind.reply.items).toEqual([]);
  });

  it('lists no machine, material or kerf of the other one, and takes no material of it', async () => {
    for (const name of ['listMachines', 'listMaterials', 'listKerfs'] as const) {
      expect((await stranger.call(name)).reply.items, name).toEqual([]);
      expect((await member.call(name)).reply.items, name).not.toEqual([]);
    }
    const { machineId } = await makeShop(api, fen);
    const mixed = await stranger.call('putKerf', {
      ...requests.putKerf({ ...samples, machineId }),
    });
    expect(mixed.status).toBe(404);
    await api.knex('kerfs').where({ workshop_id: fen.id }).delete();
    await api.knex('machines').where({ workshop_id: fen.id }).delete();
    await api.knex('materials').where({ workshop_id: fen.id }).delete();
  });

  it('lists no cut sheet of the other one, and takes nothing of it into a plan', async () => {
    expect((await stranger.call('listCutSheets')).reply.items).toEqual([]);
    expect((await member.call('listCutSheets')).reply.items).not.toEqual([]);
    const mixed = await stranger.call('createCutSheet', requests.createCutSheet(samples));
    expect(mixed.status).toBe(422);
    expect(mixed.problem.errors?.map(({ path }) => path)).toEqual([
      'plan.panel.root.sectionId',
      'plan.panel.tip.sectionId',
      'plan.machineId',
      'plan.materialId',
    ]);
    expect(mixed.text).not.toContain('Marsh');
  });

  it('keeps the idempotency keys of workshops apart', async () => {
    const key = '3f0e4d5c-1111-4222-8333-444455556666';
    const body = { name: 'Same key', shape: naca4(), key };
    const one = await member.call('createSection', { body });
    const other = await stranger.call('createSection', { body });
    expect([one.status, other.status]).toEqual([201, 201]);
    expect(other.reply.id).not.toBe(one.reply.id);
  });

  it('tells each person of the own workshop only', async () => {
    expect((await stranger.call('me')).reply.workshop).toEqual({ id: fen.id, name: 'fen' });
    expect((await member.call('me')).reply.workshop).toEqual({ id: marsh.id, name: 'marsh' });
  });
});
