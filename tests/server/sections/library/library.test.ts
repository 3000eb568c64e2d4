import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Section, sectionSorts } from '#server/contracts/sections.ts';
import { libraryQuery } from '#server/sections/library/store.ts';
import { createSection } from '#server/sections/store.ts';
import { type Sort } from '#server/sections/library/views.ts';
import { releaseVersion, withdrawVersion } from '#server/sections/versions/status-store.ts';
import { saveVersion } from '#server/sections/versions/store.ts';
import { startApi, type TestApi, type TestWorkshop } from '../../support/api.ts';
import { type Client } from '../../support/client.ts';
import { cst, naca4 } from '../../support/shapes.ts';

let api: TestApi;
let marsh: TestWorkshop;
let designer: Client;
let technician: Client;

/** 23 sections: few different names, times and thicknesses, so that pages end between equal ones; every third released. */
async function fill(): Promise<void> {
  for (let index = 0; index < 23; index += 1) {
    const author = marsh.author('designer', new Date(Date.UTC(2026, 2, 1 + (index % 4))));
    const shape =
      index % 5 === 0
        ? cst()
        : naca4({
            maxThickness: 0.1 + (index % 3) / 100,
            maxCamber: (index % 4) / 100,
            maxCamberPosition: index % 4 === 0 ? 0 : 0.4,
          });
    const { id } = await createSection(api.knex, author, {
      name: ['Reed', 'reed', 'Sedge', 'Ärmel', 'Zander'][index % 5]!,
      purpose: index % 7 === 0 ? 'winglet 50%' : '',
      shape,
      note: '',
    });
    if (index % 3 === 0) await releaseVersion(api.knex, author, id, 1);
    if (index % 6 === 0)
      await saveVersion(api.knex, author, id, { basedOn: 1, shape: naca4({ maxThickness: 0.2 }), note: '' });
    if (index === 9) await withdrawVersion(api.knex, author, id, 1, 'no');
  }
}

beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  await fill();
  designer = await api.signIn(marsh, 'designer');
  technician = await api.signIn(marsh, 'technician');
});
afterAll(() => api.close());

async function pages(
  client: Client,
  { cursor: start, ...query }: Record<string, string | number | undefined>,
): Promise<Section[]> {
  const items: Section[] = [];
  let cursor = start;
  for (let page = 0; page < 50; page += 1) {
    const answer = await client.call('listSections', { query: { ...query, cursor } });
    expect(answer.status).toBe(200);
    items.push(...answer.reply.items);
    if (answer.reply.nextCursor === null) return items;
    expect(answer.reply.items).toHaveLength(Number(query['limit'] ?? 30));
    cursor = answer.reply.nextCursor;
  }
  throw new Error('The list does not end.');
}

const valueOf: Record<Sort, (section: Section) => string | number> = {
  updated: (s) => s.updatedAt,
  name: (s) => s.name,
  thickness: (s) => s.latest.maxThickness,
  camber: (s) => s.latest.maxCamber,
};
const collator = new Intl.Collator('en', { sensitivity: 'base' });
const compare = (a: string | number, b: string | number) =>
  typeof a === 'number' ? a - Number(b) : collator.compare(a, String(b));

describe('the library', () => {
  const orders = sectionSorts.flatMap((sort) =>
    (['ascending', 'descending'] as const).map((direction) => [sort, direction] as const),
  );

  it.each(orders)(
    'by %s, %s: every section exactly once over pages of any size, in order',
    async (sort, direction) => {
      for (const limit of [1, 4, 23]) {
        const items = await pages(designer, { sort, direction, limit });
        expect(items).toHaveLength(23);
        expect(new Set(items.map(({ id }) => id)).size).toBe(23);
        const values = items.map(valueOf[sort]);
        values.slice(1).forEach((value, index) => {
          const step = compare(values[index]!, value);
          expect(direction === 'ascending' ? step : -step).toBeLessThanOrEqual(0);
        });
      }
    },
  );

  it.each(orders)(
    'by %s, %s, for the technician: the released ones, as they are released',
    async (sort, direction) => {
      const items = await pages(technician, { sort, direction, limit: 2 });
      expect(items).toHaveLength(7);
      expect(new Set(items.map(({ id }) => id)).size).toBe(7);
      for (const { latest, releasedNumber } of items) {
        expect([latest.number, latest.status, releasedNumber]).toEqual([1, 'released', 1]);
      }
      const values = items.map(valueOf[sort]);
      values.slice(1).forEach((value, index) => {
        const step = compare(values[index]!, value);
        expect(direction === 'ascending' ? step : -step).toBeLessThanOrEqual(0);
      });
    },
  );

  it('is newest first by default, in pages of 30', async () => {
    const { reply } = await designer.call('listSections');
    expect(reply.items).toHaveLength(23);
    expect(reply.nextCursor).toBeNull();
    const times = reply.items.map(({ updatedAt }) => updatedAt);
    expect(times).toEqual([...times].sort().reverse());
  });

  it('stays whole when sections come in and change between the pages', async () => {
    const first = await designer.call('listSections', { query: { sort: 'name', limit: 10 } });
    const added = await designer.call('createSection', { body: { name: 'Aaa', shape: naca4() } });
    const rest = await pages(designer, { sort: 'name', limit: 10, cursor: first.reply.nextCursor! });
    const ids = [...first.reply.items, ...rest].map(({ id }) => id);
    expect(ids).toHaveLength(23);
    expect(new Set(ids).size).toBe(23);
    await designer.call('archiveSection', { params: { sectionId: added.reply.id } });
  });

  const filters: [Record<string, string>, (section: Section) => boolean, number][] = [
    [{ status: 'released' }, (section) => section.releasedNumber !== null, 7],
    [{ status: 'draft' }, (section) => section.latest.status === 'draft', 19],
    [{ status: 'withdrawn' }, (section) => section.latest.status === 'withdrawn', 1],
    [{ kind: 'cst' }, (section) => section.latest.shape.kind === 'cst', 4],
    [{ kind: 'naca4', status: 'released' }, (section) => section.latest.shape.kind === 'naca4', 6],
    [{ search: 'REED' }, (section) => section.name.toLowerCase() === 'reed', 10],
    [{ search: 'armel' }, (section) => section.name === 'Ärmel', 4],
    [{ search: '50%' }, (section) => section.purpose === 'winglet 50%', 4],
    [{ search: '5_%' }, () => false, 0],
    [{ search: 'CST order 2' }, (section) => section.latest.description === 'CST order 2/2', 4],
    [{ search: 'reed', status: 'released' }, (section) => /reed/i.test(section.name), 4],
    [{ search: '' }, () => true, 23],
  ];
  it.each(filters)('narrows by %j', async (query, holds, count) => {
    const items = await pages(designer, { ...query, limit: 2 });
    expect(items.every(holds)).toBe(true);
    expect(items).toHaveLength(count);
  });

  it('does not let the technician find out about drafts by searching or filtering', async () => {
    const drafts = await pages(designer, { search: 'NACA 2420' });
    expect(drafts.length).toBeGreaterThan(0);
    expect(await pages(technician, { search: 'NACA 2420' })).toEqual([]);
    expect(await pages(technician, { status: 'draft' })).toEqual([]);
    expect(await pages(technician, { status: 'withdrawn' })).toEqual([]);
    expect(await pages(technician, { status: 'archived' })).toEqual([]);
    expect(await pages(technician, { status: 'released' })).toHaveLength(7);
  });

  it.each([
    ['cursor', { cursor: 'nonsense' }],
    ['cursor', { cursor: Buffer.from('["updated"]').toString('base64url') }],
    ['cursor', { cursor: Buffer.from('[{"a":1},2]').toString('base64url') }],
    ['cursor', { cursor: 'x'.repeat(501) }],
    ['sort', { sort: 'price' }],
    ['direction', { direction: 'up' }],
    ['status', { status: 'superseded' }],
    ['kind', { kind: 'naca5' }],
    ['limit', { limit: -1 }],
    ['limit', { limit: 1.5 }],
    ['search', { search: 'x'.repeat(81) }],
    ['page', { page: 2 }],
  ])('refuses a wrong %s by name', async (path, query) => {
    const answer = await designer.call('listSections', { query });
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toEqual([path]);
  });

  it('refuses a place of another order', async () => {
    const byName = await designer.call('listSections', { query: { sort: 'name', limit: 2 } });
    const cursor = byName.reply.nextCursor!;
    for (const query of [
      { sort: 'updated', cursor },
      { sort: 'name', direction: 'descending', cursor },
    ]) {
      const answer = await designer.call('listSections', { query });
      expect(answer.problem.errors?.map((error) => error.path)).toEqual(['cursor']);
    }
  });

  it('refuses a parameter given twice', async () => {
    const response = await designer.fetch('/api/sections?sort=name&sort=camber');
    expect(response.status).toBe(422);
    expect(await response.json()).toMatchObject({ errors: [{ path: 'sort' }] });
  });

  it.each(orders)('reads by %s, %s along an index, without sorting the sections', async (sort, direction) => {
    for (const reach of ['all', 'released'] as const) {
      const query = libraryQuery(api.knex, marsh.id, reach, { sort, direction, limit: 30 });
      const { sql, bindings } = query.toSQL().toNative();
      const [plan] = await api.knex.raw(`EXPLAIN ${sql}`, [...bindings]);
      const step = (plan as { table: string; key: string; Extra: string }[]).filter(
        ({ table }) => table === 's',
      );
      expect(step).toHaveLength(1);
      expect(step[0]!.key).toMatch(reach === 'all' ? /^sections_by_/ : /^released_by_/);
      expect(step[0]!.Extra).not.toContain('filesort');
    }
  });
});
