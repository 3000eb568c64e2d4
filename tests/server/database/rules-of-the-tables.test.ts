import { v7 as uuid } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { canonicalShape } from '#geometry/shapes/shape.ts';
import { recordDownload } from '#server/exports/store.ts';
import { describe as describeShape } from '#server/sections/described.ts';
import { saveVersion } from '#server/sections/versions/store.ts';
import { startApi, type TestApi, type TestWorkshop } from '../support/api.ts';
import { makeSection } from '../support/requests.ts';
import { naca4 } from '../support/shapes.ts';

describe('the database itself', () => {
  let api: TestApi;
  let marsh: TestWorkshop;
  let fen: TestWorkshop;
  let sectionId: string;

  beforeAll(async () => {
    api = await startApi();
    marsh = await api.addWorkshop('marsh');
    fen = await api.addWorkshop('fen');
    sectionId = await makeSection(api, marsh);
  });
  afterAll(() => api.close());

  const version = (number: number) => api.knex('section_versions').where({ section_id: sectionId, number });
  const other = canonicalShape(naca4({ maxThickness: 0.2 }));

  const changes: [string, Record<string, unknown>][] = [
    ['shape', { shape: other }],
    [
      'shape with a checksum that fits',
      { shape: other, checksum: describeShape(naca4({ maxThickness: 0.2 })).checksum },
    ],
    ['checksum', { checksum: 'a'.repeat(64) }],
    ['number', { number: 7 }],
    ['based_on', { based_on: null }],
    ['kind', { kind: 'cst' }],
    ['description', { description: 'NACA 2420' }],
    ['thickness', { thickness: 0.13 }],
    ['camber', { camber: 0.021 }],
    ['note', { note: 'Another note' }],
    ['author', { author_id: () => marsh.people.owner }],
    ['time', { created_at: new Date('2026-02-01T09:00:00.001Z') }],
    ['idempotency key', { idempotency_key: uuid(), request_checksum: 'a'.repeat(64) }],
    ['id', { id: uuid() }],
  ];
  it.each(changes)('refuses to change the %s of a version', async (_name, change) => {
    const before = await version(2).first();
    const values = Object.fromEntries(
      Object.entries(change).map(([key, value]) => [key, typeof value === 'function' ? value() : value]),
    );
    await expect(version(2).update(values)).rejects.toThrow(/A saved version never changes|CONSTRAINT/);
    expect(await version(2).first()).toEqual(before);
  });

  it('refuses to change only the case of a note', async () => {
    const id = await makeSection(api, marsh);
    const author = marsh.author('designer');
    await saveVersion(api.knex, author, id, { basedOn: 2, shape: naca4(), note: 'Flown' });
    const saved = api.knex('section_versions').where({ section_id: id, number: 3 });
    await expect(saved.clone().update({ note: 'flown' })).rejects.toThrow('A saved version never changes.');
  });

  it('refuses to delete a version', async () => {
    await expect(version(2).delete()).rejects.toThrow('A saved version is never deleted.');
    await expect(api.knex('sections').where({ id: sectionId }).delete()).rejects.toThrow(/foreign key/);
    expect(await version(2).first('number')).toEqual({ number: 2 });
  });

  const signed = () => ({ status_by: marsh.people.owner, status_at: new Date() });
  const statusSteps: [string, number, string][] = [
    ['from draft to superseded', 2, 'superseded'],
    ['from draft to withdrawn', 2, 'withdrawn'],
    ['from released back to draft', 1, 'draft'],
    ['to an unknown status', 1, 'lost'],
  ];
  it.each(statusSteps)('refuses a status %s', async (_name, number, status) => {
    const by = status === 'draft' ? { status_by: null, status_at: null } : signed();
    await expect(version(number).update({ status, ...by })).rejects.toThrow(
      /goes from draft to released|CONSTRAINT/,
    );
  });

  it('refuses to rewrite who released, when and why', async () => {
    for (const change of [
      { status_by: marsh.people.owner },
      { status_at: new Date() },
      { status_reason: 'so' },
    ]) {
      await expect(version(1).update(change)).rejects.toThrow('The record of a status never changes.');
    }
  });

  it('refuses a second released version of one section', async () => {
    await expect(version(2).update({ status: 'released', ...signed() })).rejects.toThrow(
      'versions_one_released',
    );
  });

  it('refuses what ended to begin again', async () => {
    const id = await makeSection(api, marsh);
    const first = api.knex('section_versions').where({ section_id: id, number: 1 });
    await first.clone().update({ status: 'withdrawn', ...signed() });
    await expect(first.clone().update({ status: 'released', ...signed() })).rejects.toThrow(
      /goes from draft/,
    );
  });

  const row = (change: Record<string, unknown> = {}) => {
    const { text, checksum, kind, description, thickness, camber } = describeShape(
      naca4({ maxThickness: 0.1 }),
    );
    return {
      workshop_id: marsh.id,
      id: uuid(),
      section_id: sectionId,
      number: 3,
      based_on: 2,
      shape: text,
      checksum,
      kind,
      description,
      thickness,
      camber,
      author_id: marsh.people.designer,
      created_at: new Date(),
      ...change,
    };
  };
  const refusedRows: [string, () => Record<string, unknown>, string | RegExp][] = [
    ['a number twice', () => ({ number: 2, based_on: 1 }), 'versions_number'],
    ['a checksum that is not of the shape', () => ({ checksum: 'b'.repeat(64) }), 'versions_checksum'],
    ['a base that does not exist', () => ({ number: 9, based_on: 8 }), 'versions_based_on'],
    ['a base after itself', () => ({ based_on: 3 }), 'versions_numbered'],
    ['an author of another workshop', () => ({ author_id: fen.people.designer }), 'versions_author'],
    [
      'a section of another workshop',
      () => ({ workshop_id: fen.id, author_id: fen.people.owner }),
      /foreign key/,
    ],
    ['a shape that is no JSON', () => ({ shape: '{' }), /CONSTRAINT/],
    ['a draft with a record of its release', () => signed(), 'versions_status_known'],
  ];
  it.each(refusedRows)('refuses %s', async (_name, change, message) => {
    await expect(api.knex('section_versions').insert(row(change()))).rejects.toThrow(message);
  });

  it('takes the same row when nothing is wrong with it', async () => {
    const id = await makeSection(api, marsh);
    await api.knex('section_versions').insert(row({ section_id: id }));
    const stored = await api.knex('section_versions').where({ section_id: id, number: 3 }).first();
    expect(stored.shape).toEqual(naca4({ maxThickness: 0.1 }));
  });

  it('refuses people of unknown roles, addresses twice or not in small letters', async () => {
    const person = api.knex('people').where({ id: marsh.people.builder });
    await expect(person.clone().update({ role: 'guest' })).rejects.toThrow('people_role');
    await expect(person.clone().update({ email: 'Big@marsh.example' })).rejects.toThrow('people_email_lower');
    await expect(person.clone().update({ email: marsh.email('owner') })).rejects.toThrow('people_email');
  });

  it('refuses to change or delete the record of a download', async () => {
    await recordDownload(api.knex, marsh.author('technician'), {
      sectionId,
      versionNumber: 1,
      fileName: 'marsh-2412_v1_unit.dat',
      format: 'dat',
      options: { points: 40 },
      checksum: 'c'.repeat(64),
    });
    const records = () => api.knex('downloads').where({ section_id: sectionId });
    await expect(records().update({ file_name: 'x' })).rejects.toThrow(/neither changed nor deleted/);
    await expect(records().delete()).rejects.toThrow(/neither changed nor deleted/);
    expect(await records()).toHaveLength(1);
  });

  it('counts the session epoch up when role, password or activity change, and only then', async () => {
    const person = () => api.knex('people').where({ id: marsh.people.builder });
    const epoch = async () => (await person().first('session_epoch')).session_epoch as number;
    expect(await epoch()).toBe(1);
    await person().update({ name: 'Another name' });
    expect(await epoch()).toBe(1);
    await person().update({ role: 'technician' });
    expect(await epoch()).toBe(2);
    await person().update({ password_hash: 'x' });
    expect(await epoch()).toBe(3);
    await person().update({ active: false });
    expect(await epoch()).toBe(4);
  });
});
