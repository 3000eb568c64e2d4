import { type Knex } from 'knex';
import { type Person } from '#server/account/person.ts';
import { type Desk } from '#server/contracts/cutting-list.ts';
import { findCutSheet, listCutSheets } from '#server/cut-sheets/list/store.ts';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { listInspections } from '#server/inspections/store.ts';
import { findSection, listSections } from '#server/sections/library/store.ts';
import { isOnDesk } from './rules.ts';

/** Lines of each list; who wants more goes to the list itself. */
const MOST = 8;

type Owner = Pick<Person, 'workshopId' | 'id'>;

async function draftsIn(
  db: Knex,
  { workshopId, id }: Owner,
  kind: Desk['drafts'][number]['kind'],
): Promise<Desk['drafts']> {
  const [drafts, owners, key] =
    kind === 'section'
      ? (['section_drafts', 'sections', 'section_id'] as const)
      : (['cut_sheet_drafts', 'cut_sheets', 'sheet_id'] as const);
  const query = scoped(db, workshopId).table(drafts, { as: 'd' }).where('d.person_id', id);
  joinScoped(query, 'inner', [owners, 'o'], 'd', [['o.id', `d.${key}`]]);
  const rows: { id: string; name: string; updated_at: Date }[] = await query
    .where('o.archived', 0)
    .orderBy('d.updated_at', 'desc')
    .orderBy('o.id')
    .limit(MOST)
    .select('o.id', 'o.name', 'd.updated_at');
  return rows.map((row) => ({ kind, id: row.id, name: row.name, updatedAt: row.updated_at.toISOString() }));
}

/** The person's own unsaved work, newest first. */
async function ownDrafts(db: Knex, owner: Owner): Promise<Desk['drafts']> {
  const drafts = [...(await draftsIn(db, owner, 'section')), ...(await draftsIn(db, owner, 'cut-sheet'))];
  return drafts.sort((a, b) => (a.updatedAt < b.updatedAt ? 1 : -1)).slice(0, MOST);
}

/** Released sections that no cut sheet uses in any version, those released last coming first. */
async function unplannedSections(db: Knex, workshopId: string): Promise<Desk['unplanned']> {
  const uses = scoped(db, workshopId)
    .table('cut_sheet_versions', { as: 'v' })
    .select(db.raw('1'))
    .where((either) => either.whereRaw('v.root_section_id = s.id').orWhereRaw('v.tip_section_id = s.id'));
  const ids: string[] = await scoped(db, workshopId)
    .table('sections', { as: 's' })
    .where({ 's.archived': 0, 's.released': 1 })
    .whereNotExists(uses)
    .orderBy('s.released_at', 'desc')
    .orderBy('s.id')
    .limit(MOST)
    .pluck('s.id');
  return Promise.all(ids.map((id) => findSection(db, workshopId, id, 'all')));
}

/** Cut sheets whose newest version is a draft, or of which the released one still wants parts; those changed last come first. */
async function sheetsInWork(db: Knex, workshopId: string): Promise<Desk['sheetsInWork']> {
  const doneParts = scoped(db, workshopId)
    .table('cut_progress', { as: 'c' })
    .whereRaw('c.sheet_id = s.id AND c.version_number = s.released_number')
    .whereRaw(`c.done >= if(c.part = 'templates', 1, v.quantity)`)
    .count('*');
  const query = scoped(db, workshopId).table('cut_sheets', { as: 's' });
  joinScoped(query, 'left', ['cut_sheet_versions', 'v'], 's', [
    ['v.sheet_id', 's.id'],
    ['v.number', 's.released_number'],
  ]);
  const ids: string[] = await query
    .where('s.archived', 0)
    .where((either) =>
      either
        .where('s.latest_status', 'draft')
        .orWhere((wanting) =>
          wanting.where('s.released', 1).whereRaw('(?) < bit_count(v.parts + 0)', [doneParts]),
        ),
    )
    .orderBy('s.updated_at', 'desc')
    .orderBy('s.id')
    .limit(MOST)
    .pluck('s.id');
  return Promise.all(ids.map((id) => findCutSheet(db, workshopId, id, 'all')));
}

/** What waits for a person, by role; lists that the role has nothing to do with are empty. */
export async function deskOf(db: Knex, person: Person): Promise<Desk> {
  const { workshopId, role } = person;
  const first = { limit: MOST, sort: 'updated' } as const;
  const when = async <Item>(list: keyof Desk, items: () => Promise<Item[]>): Promise<Item[]> =>
    isOnDesk(role, list) ? items() : [];
  return {
    drafts: await when('drafts', () => ownDrafts(db, person)),
    recentSections: await when(
      'recentSections',
      async () => (await listSections(db, workshopId, 'all', first)).items,
    ),
    outOfTolerance: await when(
      'outOfTolerance',
      async () =>
        (await listInspections(db, workshopId, 'all', { limit: MOST, outcome: 'unanswered' })).items,
    ),
    unplanned: await when('unplanned', () => unplannedSections(db, workshopId)),
    sheetsInWork: await when('sheetsInWork', () => sheetsInWork(db, workshopId)),
    staleSheets: await when(
      'staleSheets',
      async () => (await listCutSheets(db, workshopId, 'all', { ...first, status: 'stale' })).items,
    ),
  };
}
