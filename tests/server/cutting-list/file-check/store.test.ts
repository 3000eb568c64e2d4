import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { releaseSheetVersion, withdrawSheetVersion } from '#server/cut-sheets/versions/status-store.ts';
import { findSheetVersion } from '#server/cut-sheets/versions/store.ts';
import { releaseVersion } from '#server/sections/versions/status-store.ts';
import { startApi, type TestApi, type TestWorkshop } from '../../support/api.ts';
import { type Client, type Input } from '../../support/client.ts';
import { makeSection, makeShop } from '../../support/requests.ts';
import { cheapWorks, makeSheet, type PlanParts, sampleNames } from '../../support/sheets.ts';

let api: TestApi;
let marsh: TestWorkshop;
let technician: Client;
let builder: Client;
let stranger: Client;
let parts: PlanParts;
let sheetId: string;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  const fen = await api.addWorkshop('fen');
  technician = await api.signIn(marsh, 'technician');
  builder = await api.signIn(marsh, 'builder');
  stranger = await api.signIn(fen, 'owner');
  parts = { sectionId: await makeSection(api, marsh), ...(await makeShop(api, marsh)) };
  sheetId = await makeSheet(api, marsh, parts);
});
afterAll(() => api.close());

async function taken(client: Client, name: 'sheetFile' | 'datFile', input: Input): Promise<string> {
  const { status, text } = await client.call(name, input);
  expect(status).toBe(200);
  return createHash('sha256').update(text).digest('hex');
}
const fileOf = (client: Client, number: number, name = 'root.dxf') =>
  taken(client, 'sheetFile', { params: { sheetId, number, name } });
const check = async (query: NonNullable<Input['query']>, client = technician) =>
  (await client.call('checkFile', { query })).reply;

describe('whether a file is current', () => {
  it('is known of every file that a version was released with, taken or not', async () => {
    const [{ checksum } = { checksum: '' }] = (await api
      .knex('cut_files')
      .where({ sheet_id: sheetId, version_number: 1 })) as { checksum: string }[];
    const found = await check({ checksum: checksum.toUpperCase() });
    expect(found).toMatchObject({
      verdict: 'current',
      what: {
        kind: 'cut-sheet',
        id: sheetId,
        name: 'Marsh panel',
        versionNumber: 1,
        fileName: 'sheet_v1_root_220mm.dxf',
      },
      inForce: 1,
      since: '2026-02-02T09:00:00.000Z',
      stale: [],
    });
    expect(await fileOf(technician, 1)).toBe(checksum);
  });

  it('is known of a section’s file and of an archive that was taken', async () => {
    const { sectionId } = parts;
    const dat = await taken(technician, 'datFile', {
      params: { sectionId, number: 1 },
      query: { points: 60 },
    });
    expect(await check({ checksum: dat })).toMatchObject({
      verdict: 'current',
      what: { kind: 'section', id: sectionId, versionNumber: 1 },
    });
    const zip = await api.knex('cut_downloads').insert({
      workshop_id: marsh.id,
      id: '0190a5b0-1111-7222-8333-444455556666',
      sheet_id: sheetId,
      version_number: 1,
      person_id: marsh.people.technician,
      name: 'all.zip',
      file_name: 'sheet_v1_all_220mm.zip',
      checksum: 'f'.repeat(64),
      downloaded_at: new Date(),
    });
    expect(zip).toHaveLength(1);
    expect(await check({ checksum: 'f'.repeat(64) })).toMatchObject({
      verdict: 'current',
      what: { kind: 'cut-sheet', fileName: 'sheet_v1_all_220mm.zip' },
    });
  });

  it('is not known to another workshop, nor of bytes that nobody took', async () => {
    const checksum = await fileOf(technician, 1);
    for (const found of [await check({ checksum }, stranger), await check({ checksum: '0'.repeat(64) })]) {
      expect(found).toMatchObject({ verdict: 'unknown', what: null, inForce: null, since: null });
    }
  });

  it('changes with the version: draft, current, superseded, withdrawn', async () => {
    const draft = await fileOf(builder, 2);
    expect(await check({ checksum: draft })).toEqual({
      verdict: 'draft',
      what: null,
      inForce: null,
      since: null,
      reason: 'Draft: do not cut.',
      stale: [],
    });
    expect((await check({ checksum: draft }, builder)).what?.versionNumber).toBe(2);
    const old = await fileOf(technician, 1);
    const author = marsh.author('builder', new Date(Date.now() + 1000));
    const signed = { names: sampleNames, reason: '' };
    const named = { ...cheapWorks, make: makeOther };
    await releaseSheetVersion(api.knex, named, author, { sheetId, number: 2, ...signed });
    expect(await check({ checksum: old })).toMatchObject({
      verdict: 'superseded',
      inForce: 2,
      since: author.at.toISOString(),
      reason: 'Superseded by version 2.',
    });
    // What was taken as a draft says so in itself, and stays one.
    expect((await check({ checksum: draft })).verdict).toBe('draft');
    const now = await fileOf(technician, 2);
    expect(await check({ checksum: now })).toMatchObject({ verdict: 'current', inForce: 2 });
    await withdrawSheetVersion(api.knex, author, { sheetId, number: 2 }, 'tip too thin');
    expect(await check({ checksum: now })).toMatchObject({
      verdict: 'withdrawn',
      inForce: null,
      reason: 'tip too thin',
    });
  });

  /** As the real works do, the file of a release differs from that of the draft. */
  const makeOther: typeof cheapWorks.make = async (order) => {
    const { findings, files } = await cheapWorks.make(order);
    const released = files.map((file) => ({ ...file, bytes: Buffer.concat([file.bytes, Buffer.from('!')]) }));
    return { findings, files: released };
  };
});

describe('a printed code', () => {
  it('is read as people type it', async () => {
    const other = await makeSheet(api, marsh, parts);
    const { shortCode } = await findSheetVersion(api.knex, marsh.id, other, 1, 'released');
    for (const code of [shortCode, ` ${shortCode.toLowerCase()} `, shortCode.replace('-', '')]) {
      expect(await check({ code })).toMatchObject({
        verdict: 'current',
        what: { id: other, versionNumber: 1, fileName: null },
      });
    }
    expect((await check({ code: shortCode }, stranger)).verdict).toBe('unknown');
    const draft = await findSheetVersion(api.knex, marsh.id, other, 2, 'all');
    expect(await check({ code: draft.shortCode })).toMatchObject({ verdict: 'draft', what: null });
  });

  it('tells of sections that were superseded since', async () => {
    const sectionId = await makeSection(api, marsh, 'Marsh 2412 flagged');
    const other = await makeSheet(api, marsh, { ...parts, sectionId });
    await releaseVersion(api.knex, marsh.author('designer'), sectionId, 2);
    const { shortCode } = await findSheetVersion(api.knex, marsh.id, other, 1, 'released');
    const found = await check({ code: shortCode });
    expect(found.verdict).toBe('current');
    expect(found.stale).toMatchObject(Array(2).fill({ sectionId, status: 'superseded', inForce: 2 }));
  });

  it.each([
    ['a code that can be none', { code: '7K3M-Q9XU' }, 'code'],
    ['a code too short', { code: '7K' }, 'code'],
    ['a sum that is none', { checksum: 'abc' }, 'checksum'],
    ['nothing', {}, 'code'],
    ['both', { code: '7K3M-Q9XD', checksum: 'a'.repeat(64) }, 'code'],
  ] as [string, Record<string, string>, string][])('is refused: %s', async (_name, query, path) => {
    const answer = await technician.call('checkFile', { query });
    expect([answer.status, answer.problem.errors?.map((error) => error.path)]).toEqual([422, [path]]);
  });
});
