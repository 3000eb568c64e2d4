import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { startApi, type TestApi, type TestWorkshop } from '../support/api.ts';
import { makeSection } from '../support/requests.ts';

let api: TestApi;
let marsh: TestWorkshop;
let fen: TestWorkshop;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  fen = await api.addWorkshop('fen');
  await makeSection(api, marsh);
  await makeSection(api, fen);
});
afterAll(() => api.close());

describe('scoped', () => {
  it('reads, changes and deletes in one workshop only', async () => {
    const scope = scoped(api.knex, marsh.id);
    const people: { workshop_id: string }[] = await scope.table('people');
    expect(people.map(({ workshop_id }) => workshop_id)).toEqual(Array(4).fill(marsh.id));
    await scope.table('sections').update({ purpose: 'changed' });
    await scope.table('section_drafts').delete();
    expect(await api.knex('sections').where({ purpose: 'changed' })).toHaveLength(1);
    expect(await api.knex('section_drafts').pluck('workshop_id')).toEqual([fen.id, fen.id]);
  });

  it('keeps to it under another name, with an index, and in joins', async () => {
    const versions = scoped(api.knex, fen.id).table('section_versions', {
      as: 'v',
      index: 'versions_number',
    });
    const rows: { person: string }[] = await joinScoped(versions, 'inner', ['people', 'p'], 'v', []).select(
      'p.workshop_id as person',
    );
    expect(rows).toHaveLength(2 * 4);
    expect(new Set(rows.map(({ person }) => person))).toEqual(new Set([fen.id]));
  });

  it('writes into its workshop whatever the row says', async () => {
    const row = { id: fen.people.builder.replace(/.$/, 'f'), workshop_id: fen.id };
    const insert = scoped(api.knex, marsh.id).insert('sections', row).toSQL();
    expect(insert.bindings).toContain(marsh.id);
    expect(insert.bindings).not.toContain(fen.id);
  });
});

describe('the stores', () => {
  const root = fileURLToPath(new URL('../../../server', import.meta.url));
  const files = readdirSync(root, { recursive: true, encoding: 'utf8' }).filter((name) =>
    name.endsWith('.ts'),
  );
  const tables = /\b(?:db|knex|transaction|trx)(?:<[^>]*>)?\(\s*['"`{]/;

  it('reach tables past the scope only where nobody is known yet', () => {
    const past = files.filter((name) => tables.test(readFileSync(join(root, name), 'utf8')));
    expect(past.map((name) => name.replaceAll('\\', '/')).sort()).toEqual([
      'account/store.ts',
      'start/demo/seed.ts',
    ]);
  });
});
