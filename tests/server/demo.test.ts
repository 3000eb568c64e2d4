import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { parseExportOptions } from '#geometry/formats/export.ts';
import { cuttingList } from '#server/cutting-list/store.ts';
import { cutFileOf } from '#server/exports/cut-file.ts';
import { listInspections } from '#server/inspections/store.ts';
import { findVersion } from '#server/sections/versions/store.ts';
import { measure } from '#geometry/contour/measures.ts';
import { camberAt, thicknessAt } from '#geometry/contour/thickness.ts';
import { checkShape, outlineOf } from '#geometry/shapes/shape.ts';
import { personByEmail } from '#server/account/store.ts';
import { isPassword } from '#server/account/passwords.ts';
import { isStale } from '#server/contracts/cut-sheets.ts';
import { versionStatuses } from '#server/contracts/sections.ts';
import { listCutSheets } from '#server/cut-sheets/list/store.ts';
import { demoEmail, demoPeople, demoWorkshop } from '#server/start/demo/people.ts';
import { demoSections } from '#server/start/demo/sections.ts';
import { demoSheets } from '#server/start/demo/sheets.ts';
import { freeForms } from '#server/start/demo/shapes.ts';
import { isEmpty, seedDemo } from '#server/start/demo/seed.ts';
import { createTestDatabase, type TestDatabase } from '#tests/database.ts';

const now = new Date('2026-12-01T07:30:00.000Z');
const password = 'a password for tests';
let database: TestDatabase;

beforeAll(async () => {
  database = await createTestDatabase();
});
afterAll(() => database.drop());

/** Everything but ids and password hashes. */
async function contents({ knex }: TestDatabase) {
  const versions: unknown[] = await knex('section_versions as v')
    .join('sections as s', 's.id', 'v.section_id')
    .join('people as p', 'p.id', 'v.author_id')
    .select(
      's.name',
      'v.number',
      'v.status',
      'v.checksum',
      'v.note',
      'v.created_at',
      'v.status_at',
      'p.email',
    )
    .orderBy(['s.name', 'v.number']);
  const sections: unknown[] = await knex('sections')
    .select('name', 'purpose', 'latest_status', 'released_number', 'updated_at', 'archived_at')
    .orderBy('name');
  const downloads: unknown[] = await knex('downloads as d')
    .join('sections as s', 's.id', 'd.section_id')
    .select('s.name', 'd.version_number', 'd.file_name', 'd.checksum', 'd.downloaded_at')
    .orderBy(['s.name', 'd.downloaded_at']);
  const sheets: unknown[] = await knex('cut_sheet_versions as v')
    .join('cut_sheets as s', 's.id', 'v.sheet_id')
    .select(
      's.name',
      'v.number',
      'v.status',
      'v.errors',
      'v.warnings',
      'v.parts',
      'v.note',
      'v.created_at',
      'v.status_at',
    )
    .orderBy(['s.name', 'v.number']);
  const taken: unknown[] = await knex('cut_downloads')
    .select('file_name', 'downloaded_at')
    .orderBy('file_name');
  return { versions, sections, downloads, sheets, taken };
}

describe('the demo workshop', () => {
  it('fills an empty database, and says whether it is empty', async () => {
    expect(await isEmpty(database.knex)).toBe(true);
    await seedDemo(database.knex, password, now);
    expect(await isEmpty(database.knex)).toBe(false);
  });

  it('has a person of each role who signs in with the password', async () => {
    for (const { role, name } of demoPeople) {
      const person = await personByEmail(database.knex, demoEmail(role));
      expect(person).toMatchObject({ role, name, workshopName: demoWorkshop, active: true });
      expect(await isPassword(password, person?.passwordHash ?? null)).toBe(true);
    }
  });

  it('shows every status, an archived section and one that nothing of is in force', async () => {
    const { versions, sections } = await contents(database);
    const statuses = (versions as { status: string }[]).map(({ status }) => status);
    expect(new Set(statuses)).toEqual(new Set(versionStatuses));
    expect(statuses.filter((status) => status === 'withdrawn')).toHaveLength(1);
    expect(sections).toHaveLength(demoSections.length);
    expect((sections as { archived_at: unknown }[]).filter((row) => row.archived_at !== null)).toHaveLength(
      1,
    );
    expect((sections as { latest_status: string }[]).map((row) => row.latest_status)).toContain('withdrawn');
    expect(await database.knex('section_drafts')).toHaveLength(1);
  });

  it('has machines and materials with kerfs, none of them measured yet', async () => {
    const kinds = async (table: string) => new Set<string>(await database.knex(table).pluck('kind'));
    expect(await kinds('machines')).toEqual(new Set(['wire', 'bow', 'laser']));
    expect(await kinds('materials')).toEqual(new Set(['foam', 'sheet']));
    const defaults: number[] = await database.knex('kerfs').pluck('is_default');
    expect(defaults).toEqual(Array(6).fill(1));
  });

  it('happened before now, each section in the order told', async () => {
    const { versions, sheets } = await contents(database);
    const times = [...versions, ...sheets] as { created_at: Date; status_at: Date | null }[];
    for (const { created_at, status_at } of times) {
      expect(created_at.getTime()).toBeLessThan(now.getTime());
      if (status_at) expect(status_at.getTime()).toBeGreaterThan(created_at.getTime());
    }
    for (const { name, steps } of [...demoSections, ...demoSheets]) {
      const order = steps.map(({ at }) => -at.daysAgo * 1440 + minutesOf(at.time));
      expect(order, name).toEqual([...order].sort((a, b) => a - b));
    }
  });

  it('has files taken of every version in force, and only while it was in force', async () => {
    const { knex } = database;
    const inForce: { id: string; name: string; number: number }[] = await knex('sections')
      .whereNotNull('released_number')
      .whereNull('archived_at')
      .select('id', 'name', 'released_number as number');
    expect(inForce.length).toBeGreaterThanOrEqual(9);
    for (const { id, name, number } of inForce) {
      const taken = await knex('downloads').where({ section_id: id, version_number: number });
      expect(taken.length, name).toBeGreaterThan(0);
    }
    for (const { name, steps } of demoSections) {
      let released: number | null = null;
      for (const step of steps) {
        if (step.did === 'release') released = step.version;
        if (step.did === 'withdraw') released = null;
        if (step.did === 'take file') expect(step.version, name).toBe(released);
      }
    }
  });

  it('recorded the sum of the very bytes that a person gets', async () => {
    const { knex } = database;
    const [row] = (await knex('downloads as d')
      .join('sections as s', 's.id', 'd.section_id')
      .where({ 's.name': 'Heron outer panel', 'd.version_number': 3, 'd.format': 'svg' })
      .select('d.*')) as { workshop_id: string; section_id: string; file_name: string; checksum: string }[];
    const version = await findVersion(knex, row!.workshop_id, row!.section_id, 3, 'released');
    const file = cutFileOf(version, 'svg', parseExportOptions('svg', { chordMm: 220 }));
    expect(file.fileName).toBe(row!.file_name);
    expect(createHash('sha256').update(file.text).digest('hex')).toBe(row!.checksum);
  });

  it('has cut sheets in every state: in force, stale, by hand, of ribs, withdrawn, and one with errors', async () => {
    const { knex } = database;
    const workshop: { id: string } = await knex('workshops').first('id');
    const { items } = await listCutSheets(knex, workshop.id, 'all', { sort: 'name', limit: 100 });
    expect(items).toHaveLength(demoSheets.length);
    const of = (name: string) => items.find((sheet) => sheet.name === name)!;
    const inForce = of('Heron outer panel');
    expect(inForce).toMatchObject({ releasedNumber: 2, latest: { parts: ['core'], errors: 0 } });
    expect(inForce.latest.machine?.name).toBe('Long bench');
    expect(isStale(inForce.latest)).toBe(false);
    const old = of('Heron outer panel, first set').latest;
    expect([old.status, old.root.status, old.root.inForce]).toEqual(['released', 'superseded', 3]);
    expect(of('Heron winglet, by hand').latest).toMatchObject({
      status: 'released',
      parts: ['core', 'templates'],
      machine: { kind: 'bow' },
    });
    expect(of('Curlew trainer ribs').latest).toMatchObject({ status: 'released', parts: ['ribs'] });
    expect(of('Sedge rudder core').latest).toMatchObject({
      status: 'withdrawn',
      root: { status: 'withdrawn' },
    });
    const bittern = of('Bittern wing').latest;
    expect([bittern.status, bittern.tip.status, bittern.errors > 0]).toEqual(['draft', 'draft', true]);
    expect(await knex('cut_sheet_drafts')).toHaveLength(1);
  });

  it('has the files of every sheet that was released, and those that were taken are among them', async () => {
    const { knex } = database;
    const released: { sheet_id: string; number: number }[] = await knex('cut_sheet_versions').whereNot({
      status: 'draft',
    });
    for (const { sheet_id, number } of released) {
      const names: string[] = await knex('cut_files')
        .where({ sheet_id, version_number: number })
        .pluck('name');
      expect(names).toEqual(expect.arrayContaining(['cut-sheet.pdf', 'root.dat', 'tip.dat']));
    }
    const taken: { checksum: string }[] = await knex('cut_downloads');
    expect(taken.length).toBeGreaterThanOrEqual(6);
    const stored = new Set<string>(await knex('cut_files').pluck('checksum'));
    expect(taken.every(({ checksum }) => stored.has(checksum))).toBe(true);
  });

  it('has a cutting list with work begun, work left, and what was scrapped with its reason', async () => {
    const { knex } = database;
    const [{ id } = { id: '' }] = (await knex('workshops').select('id')) as { id: string }[];
    const { items } = await cuttingList(knex, id);
    const told = items.map(({ sheetName, part, wanted, done, scrapped, started }) =>
      [sheetName, part, wanted, done, scrapped, started ? 'begun' : 'waits'].join(', '),
    );
    expect(told).toEqual([
      'Heron winglet, by hand, core, 2, 1, 1, waits',
      'Curlew trainer ribs, ribs, 2, 1, 0, waits',
      'Heron outer panel, core, 4, 2, 1, begun',
    ]);
    const scrapped: string[] = await knex('cut_logs').where({ action: 'scrapped' }).pluck('reason');
    expect(scrapped).toHaveLength(2);
    const times: Date[] = [
      ...(await knex('cut_logs').pluck('happened_at')),
      ...(await knex('inspections').pluck('happened_at')),
    ];
    expect(times.every((time) => time < now)).toBe(true);
  });

  it('has parts within and out of tolerance, one of these answered and one not', async () => {
    const { knex } = database;
    const [{ id } = { id: '' }] = (await knex('workshops').select('id')) as { id: string }[];
    const { items } = await listInspections(knex, id, 'released', { limit: 30 });
    const told = items.map(({ mark, within, answer }) => [mark, within, answer?.decision ?? null]);
    expect(told).toEqual([
      ['Second set, right', false, null],
      ['Second set, left', true, null],
      ['Winglet 1', true, null],
      ['First set, right', false, 'accepted'],
      ['First set, left', true, null],
    ]);
    expect(items[0]?.measurements.filter(({ within }) => !within)).toMatchObject([
      { end: 'tip', station: 0.7 },
    ]);
  });

  it('is the same each time for the same moment', async () => {
    const other = await createTestDatabase();
    try {
      await seedDemo(other.knex, 'another password', now);
      expect(await contents(other)).toEqual(await contents(database));
    } finally {
      await other.drop();
    }
  });

  it('leaves nothing behind when it cannot be filled in', async () => {
    const before = await contents(database);
    await expect(seedDemo(database.knex, password, now)).rejects.toThrow(/Duplicate/);
    expect(await contents(database)).toEqual(before);
    expect(await database.knex('workshops')).toHaveLength(1);
  });
});

function minutesOf(time: string): number {
  const [hours = 0, minutes = 0] = time.split(':').map(Number);
  return hours * 60 + minutes;
}

describe('the demo shapes', () => {
  const shapes = demoSections.flatMap(({ name, steps }) =>
    steps.flatMap((step) => ('shape' in step ? [{ name, shape: step.shape }] : [])),
  );

  it('are valid, of plausible thickness and camber, and smooth', () => {
    expect(shapes.length).toBeGreaterThan(30);
    for (const { name, shape } of shapes) {
      expect(checkShape(shape), name).toEqual(shape);
      const measures = measure(outlineOf(shape));
      expect(measures.maxThickness, name).toBeGreaterThan(0.055);
      expect(measures.maxThickness, name).toBeLessThan(0.21);
      expect(measures.maxThicknessPosition, name).toBeGreaterThan(0.25);
      expect(measures.maxThicknessPosition, name).toBeLessThan(0.35);
      expect(measures.maxCamber, name).toBeLessThan(0.05);
      expect(measures.noseRadius, name).toBeGreaterThan(0.003);
      // A dent would show as a hollow of small radius; intended ones are wider than the chord.
      expect(measures.smallestConcaveRadius?.radius ?? Infinity, name).toBeGreaterThan(1);
    }
  });

  it('have the traits that they are named for', () => {
    const of = (shape: keyof typeof freeForms) => {
      const outline = outlineOf(freeForms[shape]);
      const lower = (station: number) => camberAt(outline, station) - thicknessAt(outline, station) / 2;
      return { measures: measure(outline), camber: (station: number) => camberAt(outline, station), lower };
    };
    const { lower } = of('flatBottom');
    for (let station = 0.2; station <= 0.95; station += 0.05) {
      const line = lower(0.2) + ((lower(0.95) - lower(0.2)) * (station - 0.2)) / 0.75;
      expect(Math.abs(lower(station) - line), `underside at ${station}`).toBeLessThan(0.001);
    }
    expect(of('reflex').camber(0.35)).toBeGreaterThan(0.01);
    expect(of('reflex').camber(0.9)).toBeLessThan(-0.002);
    expect(of('highLift').measures.maxCamberPosition).toBeGreaterThan(0.55);
    expect(of('thinTail').measures.maxThickness).toBeLessThan(0.08);
    expect(of('fin').measures.maxCamber).toBeCloseTo(0, 12);
    expect(of('thickRoot').measures.maxThickness * 260).toBeGreaterThan(40 + 2 * 5);
  });
});
