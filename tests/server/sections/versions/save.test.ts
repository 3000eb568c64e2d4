import { v4 as uuid } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { canonicalShape } from '#geometry/shapes/shape.ts';
import { versionConflictSchema } from '#server/contracts/sections.ts';
import { sha256 } from '#server/sections/described.ts';
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

const thicker = (thickness: number) => naca4({ maxThickness: thickness });
const numbers = async () =>
  (await designer.call('listVersions', { params, query: { limit: 100 } })).reply.items.map(
    ({ number }) => number,
  );

describe('saving a version', () => {
  it('gives it the next number, its checksum, and the section its measures', async () => {
    const saved = await designer.call('saveVersion', {
      params,
      body: { basedOn: 1, shape: cst(), note: '  free-form  ' },
    });
    expect(saved.status).toBe(201);
    expect(saved.reply).toMatchObject({
      number: 2,
      basedOn: 1,
      status: 'draft',
      note: 'free-form',
      shape: cst(),
      checksum: sha256(canonicalShape(cst())),
      author: { id: marsh.people.designer },
    });
    const section = await designer.call('getSection', { params });
    expect(section.reply.latest).toMatchObject({ number: 2, shape: cst(), description: 'CST order 2/2' });
  });

  it('keeps every digit of the shape', async () => {
    const shape = naca4({ maxCamber: 0.1 + 0.02 - 0.1, maxThickness: 1 / 9, maxCamberPosition: 1 / 3 });
    const saved = await designer.call('saveVersion', { params, body: { basedOn: 1, shape } });
    expect(saved.reply.shape).toEqual(shape);
    const [row] = await api.knex('section_versions').where({ section_id: params.sectionId, number: 2 });
    expect(row.shape).toEqual(shape);
  });

  it('answers a retry under the same key as the first time, and saves nothing more', async () => {
    const body = { basedOn: 1, shape: thicker(0.13), note: 'once', key: uuid() };
    const first = await designer.call('saveVersion', { params, body });
    const again = await designer.call('saveVersion', { params, body });
    await designer.call('saveVersion', { params, body: { basedOn: 2, shape: thicker(0.14) } });
    const late = await designer.call('saveVersion', { params, body });
    expect([first.status, again.status, late.status]).toEqual([201, 201, 201]);
    expect([again.text, late.text]).toEqual([first.text, first.text]);
    expect(await numbers()).toEqual([3, 2, 1]);
  });

  it('saves once when retries come at the same time', async () => {
    const body = { basedOn: 1, shape: thicker(0.13), key: uuid() };
    const answers = await Promise.all(
      Array.from({ length: 6 }, () => designer.call('saveVersion', { params, body })),
    );
    expect(answers.map(({ status }) => status)).toEqual(Array(6).fill(201));
    expect(new Set(answers.map(({ text }) => text)).size).toBe(1);
    expect(await numbers()).toEqual([2, 1]);
  });

  it('refuses the same key for anything else, by whomever', async () => {
    const body = { basedOn: 1, shape: thicker(0.13), note: '', key: uuid() };
    await designer.call('saveVersion', { params, body });
    const other = await designer.call('createSection', { body: { name: 'Other', shape: naca4() } });
    const answers = [
      await designer.call('saveVersion', { params, body: { ...body, shape: thicker(0.14) } }),
      await designer.call('saveVersion', { params, body: { ...body, note: 'other' } }),
      await designer.call('saveVersion', { params, body: { ...body, basedOn: 2 } }),
      await designer.call('saveVersion', { params: { sectionId: other.reply.id }, body }),
      await owner.call('saveVersion', { params, body }),
      await designer.call('createSection', { body: { name: 'x', shape: thicker(0.13), key: body.key } }),
    ];
    expect(answers.map(({ status, problem }) => `${status} ${problem.code}`)).toEqual(
      Array(6).fill('409 key-reused'),
    );
    expect(await numbers()).toEqual([2, 1]);
  });

  it('refuses a base that does not exist, a shape that changes nothing, and a made-up member, by name', async () => {
    const offers: [string, object][] = [
      ['basedOn', { basedOn: 2, shape: thicker(0.13) }],
      ['basedOn', { basedOn: 0, shape: thicker(0.13) }],
      ['basedOn', { basedOn: 1.5, shape: thicker(0.13) }],
      ['shape', { basedOn: 1, shape: naca4() }],
      ['number', { basedOn: 1, shape: thicker(0.13), number: 7 }],
    ];
    for (const [path, body] of offers) {
      const answer = await designer.call('saveVersion', { params, body });
      expect(answer.status).toBe(422);
      expect(answer.problem.errors?.map((error) => error.path)).toEqual([path]);
    }
    expect(await numbers()).toEqual([1]);
    const noted = await designer.call('saveVersion', {
      params,
      body: { basedOn: 1, shape: naca4(), note: 'flown' },
    });
    expect(noted.status).toBe(201);
  });
});

describe('two people who save on the same base', () => {
  it('at the same moment: one is saved, the other learns of it, nothing is lost', async () => {
    for (let round = 1; round <= 5; round += 1) {
      const offers = [
        designer.call('saveVersion', {
          params,
          body: { basedOn: round, shape: thicker(0.13 + round / 1000) },
        }),
        owner.call('saveVersion', { params, body: { basedOn: round, shape: thicker(0.15 + round / 1000) } }),
      ];
      const answers = await Promise.all(offers);
      expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
      const [saved, refused] = [
        answers.find((one) => one.status === 201)!,
        answers.find((one) => one.status === 409)!,
      ];
      const conflict = versionConflictSchema.parse(refused.problem);
      expect(conflict).toEqual({ code: 'version-conflict', basedOn: round, latest: saved.reply });
      expect(refused.problem.detail).toContain(saved.reply.author.name);
    }
    expect(await numbers()).toEqual([6, 5, 4, 3, 2, 1]);
  });

  it('many at once, each trying again on the newest: the numbers have no gap and no one is lost', async () => {
    const save = async (client: Client, worker: number) => {
      for (let basedOn = 1, tries = 0; tries < 60; tries += 1) {
        const body = { basedOn, shape: thicker(0.1 + worker / 1000), note: `of ${worker}`, key: uuid() };
        const answer = await client.call('saveVersion', { params, body });
        if (answer.status === 201) return answer.reply.number;
        expect(answer.status).toBe(409);
        basedOn = versionConflictSchema.parse(answer.problem).latest.number;
      }
      throw new Error('No turn in 60 tries.');
    };
    const workers = Array.from({ length: 12 }, (_, index) => save(index % 2 ? owner : designer, index));
    const saved = await Promise.all(workers);
    expect(saved.sort((a, b) => a - b)).toEqual(Array.from({ length: 12 }, (_, index) => index + 2));
    const versions = await designer.call('listVersions', { params, query: { limit: 100 } });
    expect(new Set(versions.reply.items.map(({ note }) => note)).size).toBe(13);
    for (const { number, basedOn } of versions.reply.items)
      expect(basedOn).toBe(number === 1 ? null : number - 1);
    expect(api.errors).toEqual([]);
  });
});

describe('the list of versions', () => {
  it('shows every version once over its pages, newest first', async () => {
    for (let number = 1; number < 8; number += 1) {
      await designer.call('saveVersion', {
        params,
        body: { basedOn: number, shape: thicker(0.1 + number / 100) },
      });
    }
    const seen: number[] = [];
    let cursor: string | undefined;
    do {
      const page = await designer.call('listVersions', { params, query: { limit: 3, cursor } });
      seen.push(...page.reply.items.map(({ number }) => number));
      cursor = page.reply.nextCursor ?? undefined;
    } while (cursor !== undefined);
    expect(seen).toEqual([8, 7, 6, 5, 4, 3, 2, 1]);
  });

  it.each([
    ['limit', { limit: 0 }],
    ['limit', { limit: 101 }],
    ['limit', { limit: 'all' }],
    ['cursor', { cursor: 'x' }],
    ['sort', { sort: 'name' }],
  ])('refuses a wrong %s by name', async (path, query) => {
    const answer = await designer.call('listVersions', { params, query });
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toEqual([path]);
  });
});
