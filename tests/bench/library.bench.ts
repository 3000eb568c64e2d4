import { v7 as uuid } from 'uuid';
import { type Knex } from 'knex';
import { createPerson, createWorkshop } from '#server/account/store.ts';
import { scoped } from '#server/database/scoped.ts';
import { sectionListQuerySchema, sectionSorts } from '#server/contracts/sections.ts';
import { describe } from '#server/sections/described.ts';
import { listSections } from '#server/sections/library/store.ts';
import { type Reach } from '#server/sections/rules.ts';
import { createTestDatabase } from '#tests/database.ts';
import { type Bench, type Figure } from './figures.ts';

const VERSIONS_PER_SECTION = 10;
const SMALL = 100;
const LARGE = 100_000;
/** The first page of the large library may take this much longer than that of the small one. */
const GOAL_RATIO = 1.5;
const WARM_UP = 40;
const RUNS = 301;
const ROWS_PER_INSERT = 2_000;

interface Filled {
  readonly workshopId: string;
  readonly personId: string;
}

/** 64 different sections, so that measures and texts differ as in a real library. */
const shapes = Array.from({ length: 64 }, (_, index) =>
  describe({
    kind: 'naca4',
    maxCamber: (index % 8) / 100,
    maxCamberPosition: index % 8 === 0 ? 0 : 0.4,
    maxThickness: 0.08 + index / 1000,
    trailingEdge: 'open',
  }),
);
const shapeOf = (index: number) => shapes[(index * 37) % shapes.length] ?? shapes[0]!;

async function insert(db: Knex, table: 'sections' | 'section_versions', rows: object[]): Promise<void> {
  for (let start = 0; start < rows.length; start += ROWS_PER_INSERT) {
    await db(table).insert(rows.slice(start, start + ROWS_PER_INSERT));
  }
}

function sectionRow(
  { workshopId, personId }: Filled,
  index: number,
): Record<string, unknown> & { id: string } {
  const shape = shapeOf(index);
  const at = new Date(Date.UTC(2024, 0, 1) + index * 60_000);
  return {
    workshop_id: workshopId,
    id: uuid(),
    name: `Section ${(index * 7919) % 1_000_003}`,
    purpose: index % 10 === 0 ? 'winglet' : 'panel',
    latest_status: 'draft',
    latest_kind: shape.kind,
    latest_description: shape.description,
    latest_thickness: shape.thickness,
    latest_camber: shape.camber,
    updated_at: at,
    updated_by: personId,
    created_at: at,
  };
}

function versionRow(filled: Filled, section: { id: string }, number: number, index: number) {
  const { text, checksum, kind, description, thickness, camber } = shapeOf(index);
  return {
    workshop_id: filled.workshopId,
    id: uuid(),
    section_id: section.id,
    number,
    based_on: number === 1 ? null : number - 1,
    shape: text,
    checksum,
    kind,
    description,
    thickness,
    camber,
    note: 'filled in',
    author_id: filled.personId,
    created_at: new Date(Date.UTC(2024, 0, 1) + index * 60_000),
  };
}

/** Every second section has version 5 released, as statements over the whole workshop: row by row would take an hour. */
async function release(db: Knex, { workshopId, personId }: Filled): Promise<void> {
  await db.raw(
    `UPDATE section_versions SET status = 'released', status_by = ?, status_at = created_at
      WHERE workshop_id = ? AND number = 5 AND right(section_id, 1) IN ('0','2','4','6','8','a','c','e')`,
    [personId, workshopId],
  );
  await db.raw(
    `UPDATE sections s JOIN section_versions v
        ON v.workshop_id = s.workshop_id AND v.section_id = s.id AND v.status = 'released'
      SET s.released_number = v.number, s.released_kind = v.kind, s.released_description = v.description,
        s.released_thickness = v.thickness, s.released_camber = v.camber, s.released_at = s.updated_at,
        s.released_by = v.status_by, s.released_count = 1
      WHERE s.workshop_id = ?`,
    [workshopId],
  );
}

async function fill(db: Knex, name: string, sections: number): Promise<Filled> {
  const at = new Date(Date.UTC(2024, 0, 1));
  const workshopId = await createWorkshop(db, { name, at });
  const person = {
    name: 'Filler',
    email: `filler@${name}.example`,
    role: 'owner',
    passwordHash: 'none',
    at,
  } as const;
  const filled = { workshopId, personId: await createPerson(db, workshopId, person) };
  for (let start = 0; start < sections; start += ROWS_PER_INSERT) {
    const count = Math.min(ROWS_PER_INSERT, sections - start);
    const rows = Array.from({ length: count }, (_, index) => sectionRow(filled, start + index));
    await insert(db, 'sections', rows);
    const versions = rows.flatMap((section, index) =>
      Array.from({ length: VERSIONS_PER_SECTION }, (_, number) =>
        versionRow(filled, section, number + 1, start + index + (VERSIONS_PER_SECTION - 1 - number)),
      ),
    );
    await insert(db, 'section_versions', versions);
  }
  await scoped(db, workshopId).table('sections').update({ latest_number: VERSIONS_PER_SECTION });
  await release(db, filled);
  return filled;
}

type Page = () => Promise<unknown>;

async function timeMs(page: Page): Promise<number> {
  const start = performance.now();
  await page();
  return performance.now() - start;
}

const medianOf = (list: number[]) => list.sort((a, b) => a - b)[Math.floor(list.length / 2)] ?? NaN;

/**
 * Median time of the large library's page, and the median of its ratio to the small one's. The two are taken in pairs,
 * so that whatever else the machine does meets both alike.
 */
async function pairs(small: Page, large: Page): Promise<{ largeMs: number; ratio: number }> {
  const times: number[] = [];
  const ratios: number[] = [];
  for (let run = 0; run < WARM_UP + RUNS; run += 1) {
    const [smallMs, largeMs] = [await timeMs(small), await timeMs(large)];
    if (run < WARM_UP) continue;
    times.push(largeMs);
    ratios.push(largeMs / smallMs);
  }
  return { largeMs: medianOf(times), ratio: medianOf(ratios) };
}

async function compare(
  db: Knex,
  small: Filled,
  large: Filled,
  reach: Reach,
  query: object,
): Promise<Figure[]> {
  const asked = sectionListQuerySchema.parse(query);
  const page =
    ({ workshopId }: Filled) =>
    () =>
      listSections(db, workshopId, reach, asked);
  const found = await pairs(page(small), page(large));
  const what = `${reach === 'all' ? 'all' : 'released'} ${JSON.stringify(query)}`;
  return [
    { what: `first page of ${LARGE}, ${what}`, value: found.largeMs, unit: 'ms' },
    {
      what: `the same against ${SMALL} sections`,
      value: found.ratio,
      unit: '×',
      goal: GOAL_RATIO,
    },
  ];
}

/** What cannot follow an index from its beginning: shown without a goal. */
async function once(db: Knex, { workshopId }: Filled, query: object): Promise<Figure> {
  const asked = sectionListQuerySchema.parse(query);
  const times: number[] = [];
  for (let run = 0; run < 7; run += 1) {
    times.push(await timeMs(() => listSections(db, workshopId, 'all', asked)));
  }
  return { what: `page of ${LARGE}, ${JSON.stringify(query)}`, value: medianOf(times), unit: 'ms' };
}

async function run(): Promise<Figure[]> {
  const database = await createTestDatabase();
  try {
    const db = database.knex;
    const small = await fill(db, 'small', SMALL);
    const large = await fill(db, 'large', LARGE);
    await db.raw('ANALYZE TABLE sections, section_versions');
    const figures: Figure[] = [];
    for (const reach of ['all', 'released'] as const) {
      for (const sort of sectionSorts) {
        for (const direction of ['ascending', 'descending'] as const) {
          figures.push(...(await compare(db, small, large, reach, { sort, direction })));
        }
      }
    }
    for (const query of [
      { search: 'winglet' },
      { search: 'found nowhere' },
      { status: 'released' },
      { status: 'withdrawn' },
      { kind: 'cst' },
      { status: 'archived' },
    ]) {
      figures.push(await once(db, large, query));
    }
    return figures;
  } finally {
    await database.drop();
  }
}

export default {
  name: `library of ${LARGE} sections with ${VERSIONS_PER_SECTION} versions each`,
  run,
} satisfies Bench;
