import { v7 as uuid } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { cutSheetSorts } from '#server/contracts/cut-sheets.ts';
import { sheetListQuery } from '#server/cut-sheets/list/store.ts';
import { changeCutSheet } from '#server/cut-sheets/store.ts';
import { withdrawSheetVersion } from '#server/cut-sheets/versions/status-store.ts';
import { releaseVersion } from '#server/sections/versions/status-store.ts';
import { startApi, type TestApi, type TestWorkshop } from '../../support/api.ts';
import { type Client, type Input } from '../../support/client.ts';
import { makeSection, makeShop } from '../../support/requests.ts';
import { makeSheet, type PlanParts } from '../../support/sheets.ts';

let api: TestApi;
let marsh: TestWorkshop;
let builder: Client;
let technician: Client;
let parts: PlanParts;
const names = ['Älv', 'bittern 50%', 'Bittern', 'crane_tip', 'Dunlin', 'Egret', 'fen panel', 'Grebe'];

beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  builder = await api.signIn(marsh, 'builder');
  technician = await api.signIn(marsh, 'technician');
  parts = { sectionId: await makeSection(api, marsh), ...(await makeShop(api, marsh)) };
  const author = (minute: number) => marsh.author('builder', new Date(Date.UTC(2026, 2, 1, 8, minute)));
  for (const [i, name] of names.entries()) {
    const own = name === 'Egret' ? { ...parts, sectionId: await makeSection(api, marsh, 'Own') } : parts;
    const sheetId = await makeSheet(api, marsh, own);
    // Two of each minute, so that places in the list have ties.
    await changeCutSheet(api.knex, author(Math.floor(i / 2)), sheetId, { name, purpose: `no ${i}` });
    if (name === 'Egret') await releaseVersion(api.knex, marsh.author('designer'), own.sectionId, 2);
    if (name === 'Dunlin') await withdrawSheetVersion(api.knex, author(9), { sheetId, number: 1 }, 'worn');
    if (name === 'Grebe') await changeCutSheet(api.knex, author(9), sheetId, { archived: true });
  }
});
afterAll(() => api.close());

async function pages(client: Client, query: Input['query'], limit = 3): Promise<string[]> {
  const found: string[] = [];
  let cursor: string | null | undefined;
  do {
    const page: { reply: { items: { name: string }[]; nextCursor: string | null } } = await client.call(
      'listCutSheets',
      { query: { ...query, limit, cursor: cursor ?? undefined } },
    );
    found.push(...page.reply.items.map(({ name }) => name));
    cursor = page.reply.nextCursor;
  } while (cursor);
  return found;
}

describe('the list of cut sheets', () => {
  it.each([1, 2, 3, 100])('is whole and in order over pages of %i', async (limit) => {
    const byName = await pages(builder, { sort: 'name' }, limit);
    expect(byName).toEqual(['Älv', 'Bittern', 'bittern 50%', 'crane_tip', 'Dunlin', 'Egret', 'fen panel']);
    const newest = await pages(builder, {}, limit);
    expect(newest[0]).toBe('Dunlin');
    expect([...newest].sort()).toEqual([...byName].sort());
    expect(newest.slice(-2).sort()).toEqual(['bittern 50%', 'Älv']);
  });

  it.each([
    [{ status: 'draft' }, 7, 0],
    [{ status: 'released' }, 6, 6],
    [{ status: 'withdrawn' }, 0, 0],
    [{ status: 'stale' }, 1, 1],
    [{ status: 'archived' }, 1, 1],
    [{ search: 'BITTERN' }, 2, 2],
    [{ search: '50%' }, 1, 1],
    [{ search: '%' }, 1, 1],
    [{ search: 'e_t' }, 1, 1],
    [{ search: 'no 3' }, 1, 1],
    [{ search: 'nothing' }, 0, 0],
    [{ search: 'grebe', status: 'archived' }, 1, 1],
    [{ search: 'egret', status: 'stale' }, 1, 1],
    [{ search: 'crane', status: 'stale' }, 0, 0],
  ])('%j finds %i, and %i for who sees released versions only', async (query, all, released) => {
    expect(await pages(builder, query)).toHaveLength(all);
    expect(await pages(technician, query)).toHaveLength(released);
  });

  it('shows the newest version, or the released one to who sees no other', async () => {
    const of = async (client: Client) =>
      (await client.call('listCutSheets', { query: { search: 'crane' } })).reply.items[0];
    const progress = [{ part: 'core', wanted: 2, done: 0, scrapped: 0 }];
    expect(await of(builder)).toMatchObject({
      releasedNumber: 1,
      versionCount: 2,
      progress,
      latest: { number: 2, status: 'draft', quantity: 4, root: { sectionName: 'Marsh 2412', inForce: 1 } },
    });
    expect(await of(technician)).toMatchObject({
      releasedNumber: 1,
      versionCount: 1,
      progress,
      latest: { number: 1, status: 'released', quantity: 2 },
    });
    expect(await pages(technician, {})).not.toContain('Dunlin');
  });

  it.each([
    ['cursor', { cursor: 'nonsense' }],
    ['cursor', { cursor: Buffer.from('["updated"]').toString('base64url') }],
    ['sort', { sort: 'price' }],
    ['status', { status: 'superseded' }],
    ['limit', { limit: 0 }],
    ['search', { search: 'x'.repeat(81) }],
    ['page', { page: 2 }],
  ])('refuses a wrong %s by name', async (path, query) => {
    const answer = await builder.call('listCutSheets', { query });
    expect(answer.problem.errors?.map((error) => error.path)).toEqual([path]);
  });

  it('refuses a place of another order', async () => {
    const byName = await builder.call('listCutSheets', { query: { sort: 'name', limit: 2 } });
    const answer = await builder.call('listCutSheets', {
      query: { sort: 'updated', cursor: byName.reply.nextCursor! },
    });
    expect(answer.problem.errors?.map((error) => error.path)).toEqual(['cursor']);
  });

  it.each(cutSheetSorts)('reads by %s along an index, without sorting the sheets', async (sort) => {
    for (const reach of ['all', 'released'] as const) {
      for (const status of [undefined, 'stale'] as const) {
        const query = sheetListQuery(api.knex, marsh.id, reach, { sort, limit: 30, status });
        const { sql, bindings } = query.toSQL().toNative();
        const [plan] = await api.knex.raw(`EXPLAIN ${sql}`, [...bindings]);
        const step = (plan as { table: string; key: string; Extra: string }[]).filter(
          ({ table }) => table === 's',
        );
        expect(step).toHaveLength(1);
        expect(step[0]!.key).toMatch(reach === 'all' ? /^sheets_by_/ : /^released_sheets_by_/);
        expect(step[0]!.Extra).not.toContain('filesort');
      }
    }
  });

  it('finds nothing under an id that is not there', async () => {
    const answer = await builder.call('getCutSheet', { params: { sheetId: uuid() } });
    expect([answer.status, answer.problem.code]).toEqual([404, 'not-found']);
    expect(api.errors).toEqual([]);
  });
});
