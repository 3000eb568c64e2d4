import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApi, type TestApi, type TestWorkshop } from '../../support/api.ts';
import { type Client } from '../../support/client.ts';
import { makeSection } from '../../support/requests.ts';
import { cst, naca4 } from '../../support/shapes.ts';

let api: TestApi;
let marsh: TestWorkshop;
let designer: Client;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  designer = await api.signIn(marsh, 'designer');
});
afterAll(() => api.close());

const statuses = async (sectionId: string) =>
  (await designer.call('listVersions', { params: { sectionId } })).reply.items
    .map(({ status }) => status)
    .reverse();

describe('releasing', () => {
  it('signs the version and supersedes the one before in the same moment', async () => {
    const sectionId = await makeSection(api, marsh);
    const released = await designer.call('releaseVersion', {
      params: { sectionId, number: 2 },
      body: { reason: 'flown' },
    });
    expect(released.status).toBe(200);
    expect(released.reply).toMatchObject({
      number: 2,
      status: 'released',
      statusReason: 'flown',
      statusBy: { id: marsh.people.designer, name: 'designer of marsh' },
    });
    const before = await designer.call('getVersion', { params: { sectionId, number: 1 } });
    expect(before.reply).toMatchObject({ status: 'superseded', statusReason: 'Superseded by version 2.' });
    const section = (await designer.call('getSection', { params: { sectionId } })).reply;
    expect(section).toMatchObject({ releasedNumber: 2, latest: { number: 2, status: 'released' } });
  });

  it('may take an older draft', async () => {
    const sectionId = await makeSection(api, marsh);
    await designer.call('saveVersion', { params: { sectionId }, body: { basedOn: 2, shape: cst() } });
    await designer.call('releaseVersion', { params: { sectionId, number: 3 }, body: {} });
    await designer.call('releaseVersion', { params: { sectionId, number: 2 }, body: {} });
    expect(await statuses(sectionId)).toEqual(['superseded', 'released', 'superseded']);
    const section = (await designer.call('getSection', { params: { sectionId } })).reply;
    expect(section).toMatchObject({ releasedNumber: 2, latest: { number: 3, status: 'superseded' } });
  });

  it('leaves exactly one released when several are released at once', async () => {
    const sectionId = await makeSection(api, marsh);
    for (let number = 2; number <= 5; number += 1) {
      await designer.call('saveVersion', {
        params: { sectionId },
        body: { basedOn: number, shape: naca4({ maxThickness: 0.1 + number / 100 }) },
      });
    }
    const answers = await Promise.all(
      [2, 3, 4, 5, 6].map((number) =>
        designer.call('releaseVersion', { params: { sectionId, number }, body: {} }),
      ),
    );
    expect(answers.map(({ status }) => status)).toEqual(Array(5).fill(200));
    const now = await statuses(sectionId);
    expect(now.filter((status) => status === 'released')).toHaveLength(1);
    expect(now.filter((status) => status === 'superseded')).toHaveLength(5);
    const section = (await designer.call('getSection', { params: { sectionId } })).reply;
    expect(section.releasedNumber).toBe(now.indexOf('released') + 1);
    expect(api.errors).toEqual([]);
  });

  it('refuses what is released, superseded or withdrawn already, and says so', async () => {
    const sectionId = await makeSection(api, marsh);
    const release = (number: number) =>
      designer.call('releaseVersion', { params: { sectionId, number }, body: {} });
    const again = await release(1);
    expect([again.status, again.problem.code]).toEqual([409, 'status-conflict']);
    expect(again.problem.detail).toBe('Version 1 is released already.');
    await release(2);
    expect((await release(1)).problem.detail).toContain('was superseded by a later release');
    await designer.call('withdrawVersion', { params: { sectionId, number: 2 }, body: { reason: 'no' } });
    expect((await release(2)).problem.detail).toContain('Version 2 was withdrawn.');
    expect((await release(3)).status).toBe(404);
  });
});

describe('withdrawing', () => {
  it('leaves no version released and keeps the reason', async () => {
    const sectionId = await makeSection(api, marsh);
    const withdrawn = await designer.call('withdrawVersion', {
      params: { sectionId, number: 1 },
      body: { reason: 'spar does not fit' },
    });
    expect(withdrawn.reply).toMatchObject({ status: 'withdrawn', statusReason: 'spar does not fit' });
    expect((await designer.call('getSection', { params: { sectionId } })).reply.releasedNumber).toBeNull();
  });

  it('needs a reason, and a released version', async () => {
    const sectionId = await makeSection(api, marsh);
    for (const body of [{}, { reason: '  ' }]) {
      const answer = await designer.call('withdrawVersion', { params: { sectionId, number: 1 }, body });
      expect(answer.problem.errors?.map((error) => error.path)).toEqual(['reason']);
    }
    const draft = await designer.call('withdrawVersion', {
      params: { sectionId, number: 2 },
      body: { reason: 'no' },
    });
    expect([draft.status, draft.problem.detail]).toEqual([409, 'Version 2 was never released.']);
  });
});
