import { v7 as uuid } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { canonicalText, describeDocument } from '#server/cut-sheets/document.ts';
import { recordSheetDownload } from '#server/cut-sheets/files/downloads.ts';
import { findSheetVersion } from '#server/cut-sheets/versions/store.ts';
import { sha256 } from '#server/sections/described.ts';
import { startApi, type TestApi, type TestWorkshop } from '../support/api.ts';
import { makeSamples, type Samples } from '../support/requests.ts';

let api: TestApi;
let marsh: TestWorkshop;
let fen: TestWorkshop;
let samples: Samples;
let foreign: Samples;
beforeAll(async () => {
  api = await startApi();
  marsh = await api.addWorkshop('marsh');
  fen = await api.addWorkshop('fen');
  samples = await makeSamples(api, marsh);
  foreign = await makeSamples(api, fen);
});
afterAll(() => api.close());

const version = (number: number) =>
  api.knex('cut_sheet_versions').where({ sheet_id: samples.sheetId, number });
const files = () => api.knex('cut_files').where({ sheet_id: samples.sheetId });
const signed = () => ({ status_by: marsh.people.owner, status_at: new Date() });

describe('the database itself keeps a cut sheet’s version', () => {
  const other = '{"number":2}';
  const changes: [string, () => Record<string, unknown>][] = [
    ['document', () => ({ document: other })],
    ['document with a checksum that fits', () => ({ document: other, checksum: sha256(other) })],
    ['checksum', () => ({ checksum: 'a'.repeat(64) })],
    ['short code', () => ({ short_code: '0000-0000' })],
    ['number', () => ({ number: 7 })],
    ['root version', () => ({ root_number: 2 })],
    ['tip section', () => ({ tip_section_id: foreign.sectionId })],
    ['chord', () => ({ root_chord_mm: 221 })],
    ['machine', () => ({ machine_id: null, machine_kind: null })],
    ['quantity', () => ({ quantity: 5 })],
    ['parts', () => ({ parts: 'core,ribs' })],
    ['count of warnings', () => ({ warnings: 9 })],
    ['note', () => ({ note: 'Another note' })],
    ['author', () => ({ author_id: marsh.people.owner })],
    ['idempotency key', () => ({ idempotency_key: uuid(), request_checksum: 'a'.repeat(64) })],
    ['status to superseded', () => ({ status: 'superseded', ...signed() })],
    ['status to released beside another', () => ({ status: 'released', ...signed() })],
  ];
  it.each(changes)('from a change of its %s', async (_name, change) => {
    const before = await version(2).first();
    await expect(version(2).update(change())).rejects.toThrow(
      /A saved version never changes|CONSTRAINT|goes from draft|released with its files|Duplicate/,
    );
    expect(await version(2).first()).toEqual(before);
  });

  it('from losing its record, its files or itself', async () => {
    await expect(version(1).update({ status_reason: 'so' })).rejects.toThrow('The record of a status');
    await expect(version(1).update({ status: 'draft', status_by: null, status_at: null })).rejects.toThrow(
      'goes from draft to released',
    );
    await expect(version(1).delete()).rejects.toThrow('A saved version is never deleted.');
    await expect(files().delete()).rejects.toThrow('neither changed nor deleted');
    await expect(files().update({ bytes: Buffer.from('x'), checksum: sha256('x') })).rejects.toThrow(
      'neither changed nor deleted',
    );
    await expect(api.knex('cut_sheets').where({ id: samples.sheetId }).delete()).rejects.toThrow(
      /foreign key/,
    );
    expect(await files()).toHaveLength(1);
  });

  it('from a release without files, and from further files after it', async () => {
    await version(1).update({ status: 'withdrawn', ...signed() });
    await expect(version(2).update({ status: 'released', ...signed() })).rejects.toThrow(
      'A version is released with its files.',
    );
    const [file] = await files();
    await expect(
      api.knex('cut_files').insert({ ...file, name: 'tip.dxf', download_name: 'tip.dxf', place: 1 }),
    ).rejects.toThrow('A released version gets no further files.');
  });
});

describe('the database itself refuses', () => {
  it.each([
    ['a file whose checksum is not of its bytes', { checksum: 'c'.repeat(64) }, 'cut_files_checksum'],
    ['a file of no plain name', { name: '../root.dxf' }, 'cut_files_name'],
    ['a stored archive', { name: 'all.zip' }, 'cut_files_name'],
    ['a file of no part', { part: 'all' }, 'cut_files_part'],
    ['a file of a version that is not there', { version_number: 9 }, 'cut_files_version'],
  ])('%s', async (_name, change, message) => {
    const [stored] = await files();
    const file = { ...stored, version_number: 2, ...change };
    await expect(api.knex('cut_files').insert(file)).rejects.toThrow(message);
  });

  /** A third version that is right but for what is changed. */
  async function row(change: Record<string, unknown>) {
    const { released_sheet: _, ...second } = await version(2).first();
    const { plan, pinned } = await findSheetVersion(api.knex, marsh.id, samples.sheetId, 2, 'all');
    const described = describeDocument({ plan, pinned }, { sheetId: samples.sheetId, number: 3 });
    return {
      ...second,
      id: uuid(),
      number: 3,
      based_on: 2,
      document: described.text,
      checksum: described.checksum,
      ...change,
    };
  }
  const wrong: [string, () => Record<string, unknown>, string | RegExp][] = [
    ['a number twice', () => ({ number: 2, based_on: 1 }), /sheet_versions_number|sheet_versions_document/],
    ['a base that does not exist', () => ({ based_on: 9 }), 'sheet_versions_numbered'],
    [
      'a checksum that is not of the document',
      () => ({ checksum: 'b'.repeat(64) }),
      'sheet_versions_checksum',
    ],
    ['a section version that is not there', () => ({ root_number: 7 }), /sheet_versions_(root|document)/],
    [
      'a section of another workshop',
      () => ({ tip_section_id: foreign.sectionId }),
      /sheet_versions_(tip|document)/,
    ],
    ['a machine of another workshop', () => ({ machine_id: foreign.machineId }), 'sheet_versions_machine'],
    ['a machine that does not cut foam', () => ({ machine_kind: 'laser' }), 'sheet_versions_machine'],
    ['a material without its kind', () => ({ material_kind: null }), 'sheet_versions_material_kind'],
    ['an author of another workshop', () => ({ author_id: fen.people.owner }), 'sheet_versions_author'],
    ['a part that is none', () => ({ parts: 'core,wing' }), /parts/],
    ['a chord of nothing', () => ({ root_chord_mm: 0 }), 'sheet_versions_lengths'],
    [
      'a release with errors',
      () => ({ status: 'released', errors: 1, ...signed() }),
      'sheet_versions_released_sound',
    ],
    ['a draft with a record of its release', () => signed(), 'sheet_versions_status_known'],
    ['a document of other ends', () => otherEnds(), 'sheet_versions_document'],
  ];
  function otherEnds() {
    const text = canonicalText({ number: 3, plan: { panel: {} } });
    return { document: text, checksum: sha256(text) };
  }
  it.each(wrong)('%s', async (_name, change, message) => {
    await expect(api.knex('cut_sheet_versions').insert(await row(change()))).rejects.toThrow(message);
  });

  it('nothing of the same row when nothing is wrong with it', async () => {
    await api.knex('cut_sheet_versions').insert(await row({}));
    expect(await version(3).first('number', 'status')).toEqual({ number: 3, status: 'draft' });
  });

  it('to change or delete the record of a download', async () => {
    await recordSheetDownload(api.knex, marsh.author('technician'), {
      sheetId: samples.sheetId,
      number: 1,
      name: 'root.dxf',
      fileName: 'marsh-panel_v1_root_220mm.dxf',
      checksum: 'c'.repeat(64),
    });
    const records = () => api.knex('cut_downloads').where({ sheet_id: samples.sheetId });
    await expect(records().update({ name: 'tip.dxf' })).rejects.toThrow(/neither changed nor deleted/);
    await expect(records().delete()).rejects.toThrow(/neither changed nor deleted/);
    expect(await records()).toHaveLength(1);
  });
});
