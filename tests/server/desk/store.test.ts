import { v4 as uuid } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { accountRoles } from '#server/contracts/permissions.ts';
import { type Desk } from '#server/contracts/cutting-list.ts';
import { releaseVersion } from '#server/sections/versions/status-store.ts';
import { startApi, type TestApi, type TestWorkshop } from '../support/api.ts';
import { type Client } from '../support/client.ts';
import { makeInspection } from '../support/floor.ts';
import { makeSection, makeShop } from '../support/requests.ts';
import { makeSheet, type PlanParts } from '../support/sheets.ts';

let api: TestApi;
let marsh: TestWorkshop;
let clients: Readonly<Record<(typeof accountRoles)[number], Client>>;
let parts: PlanParts;
let sheetId: string;
let unplannedId: string;
let inspectionId: string;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  const signedIn = await Promise.all(
    accountRoles.map(async (role) => [role, await api.signIn(marsh, role)] as const),
  );
  clients = Object.fromEntries(signedIn) as typeof clients;
  parts = { sectionId: await makeSection(api, marsh), ...(await makeShop(api, marsh)) };
  unplannedId = await makeSection(api, marsh, 'Marsh unplanned');
  sheetId = await makeSheet(api, marsh, parts);
  ({ inspectionId } = await makeInspection(api, marsh, { sheetId, ...parts }));
});
afterAll(() => api.close());

const deskOf = async (role: keyof typeof clients): Promise<Desk> => {
  const { status, reply } = await clients[role].call('desk');
  expect(status).toBe(200);
  return reply;
};
const ids = (items: readonly { readonly id: string }[]) => items.map(({ id }) => id);

describe('the desk', () => {
  it('has for each role the lists that wait for it, and none of the others', async () => {
    const lists = Object.fromEntries(
      await Promise.all(
        accountRoles.map(async (role) => {
          const filled = Object.entries(await deskOf(role)).filter(([, items]) => items.length > 0);
          return [role, filled.map(([name]) => name).sort()] as const;
        }),
      ),
    );
    expect(lists).toEqual({
      owner: ['drafts', 'outOfTolerance', 'recentSections', 'sheetsInWork', 'unplanned'],
      designer: ['drafts', 'outOfTolerance', 'recentSections'],
      builder: ['drafts', 'outOfTolerance', 'sheetsInWork', 'unplanned'],
      technician: [],
    });
  });

  it('shows the own drafts of sections and sheets, newest first, and nobody else’s', async () => {
    await clients.designer.call('keepSheetDraft', {
      params: { sheetId },
      body: { basedOn: 1, values: { quantity: 3 } },
    });
    const [newest, ...more] = (await deskOf('designer')).drafts;
    expect(newest).toMatchObject({ kind: 'cut-sheet', id: sheetId, name: 'Marsh panel' });
    expect(new Set(ids(more))).toEqual(new Set([parts.sectionId, unplannedId]));
    expect((await deskOf('builder')).drafts.map(({ kind }) => kind)).toEqual(['cut-sheet']);
  });

  it('shows released sections that no sheet uses', async () => {
    expect(ids((await deskOf('builder')).unplanned)).toEqual([unplannedId]);
  });

  it('shows parts out of tolerance until they are answered', async () => {
    expect(ids((await deskOf('builder')).outOfTolerance)).toEqual([inspectionId]);
    const body = { decision: 'rejected', note: 'Cut it again.' };
    await clients.designer.call('answerInspection', { params: { inspectionId }, body });
    for (const role of ['designer', 'builder'] as const) {
      expect((await deskOf(role)).outOfTolerance).toEqual([]);
    }
  });

  it('shows sheets in work: with a draft, and released ones until their parts are done', async () => {
    expect(ids((await deskOf('builder')).sheetsInWork)).toEqual([sheetId]);
    const released = await clients.builder.call('releaseSheetVersion', {
      params: { sheetId: await makeSheet(api, marsh, parts), number: 2 },
      body: { reason: '' },
    });
    const other = released.reply.sheetId;
    const done = (quantity: number) =>
      clients.technician.call('logCut', {
        body: {
          sheetId: other,
          versionNumber: 2,
          part: 'core',
          action: 'done',
          quantity,
          at: '2026-03-02T10:00:00.000Z',
          key: uuid(),
        },
      });
    await done(3);
    const inWork = (await deskOf('builder')).sheetsInWork;
    expect(ids(inWork)).toEqual([other, sheetId]);
    expect(inWork[0]?.progress).toEqual([{ part: 'core', wanted: 4, done: 3, scrapped: 0 }]);
    await done(1);
    expect(ids((await deskOf('builder')).sheetsInWork)).toEqual([sheetId]);
  });

  it('shows sheets whose sections are not in force any more', async () => {
    await releaseVersion(api.knex, marsh.author('designer'), parts.sectionId, 2);
    for (const role of ['designer', 'builder', 'owner'] as const) {
      expect(ids((await deskOf(role)).staleSheets)).toContain(sheetId);
    }
  });

  it('shows nothing of another workshop', async () => {
    const fen = await api.addWorkshop('fen');
    const desk = (await (await api.signIn(fen, 'owner')).call('desk')).reply;
    expect(Object.values(desk).flat()).toEqual([]);
  });
});
