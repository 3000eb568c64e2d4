import { type Knex } from 'knex';
import { v7 as uuid } from 'uuid';
import { type Shape } from '#geometry/shapes/shape.ts';
import { type Section, type VersionStatus } from '#server/contracts/sections.ts';
import { once } from '#server/database/once.ts';
import { scoped } from '#server/database/scoped.ts';
import { Refusal } from '#server/refusal.ts';
import { describe, requestChecksum } from './described.ts';
import { findSection } from './library/store.ts';
import { type Author, type Reach } from './rules.ts';
import { addVersion, latestColumns, versionKeys } from './versions/rows.ts';

/** What decisions about a section need to know of it. */
interface SectionState {
  readonly id: string;
  readonly latestNumber: number;
  readonly latestStatus: VersionStatus;
  readonly releasedNumber: number | null;
  readonly releasedCount: number;
  readonly archived: boolean;
}

interface StateRow {
  id: string;
  latest_number: number;
  latest_status: VersionStatus;
  released_number: number | null;
  released_count: number;
  archived: 0 | 1;
}

/**
 * The state of a section; with `lock` it stays so until the transaction ends, and other writers wait.
 * @throws Refusal `not-found` when the workshop has no such section, or none within reach
 */
export async function sectionState(
  db: Knex,
  workshopId: string,
  sectionId: string,
  options: { reach?: Reach; lock?: boolean } = {},
): Promise<SectionState> {
  const query = scoped(db, workshopId).table('sections').where({ id: sectionId });
  if (options.lock) query.forUpdate();
  const row: StateRow | undefined = await query.first(
    'id',
    'latest_number',
    'latest_status',
    'released_number',
    'released_count',
    'archived',
  );
  if (!row || (options.reach === 'released' && row.released_count === 0)) throw new Refusal('not-found');
  return {
    id: row.id,
    latestNumber: row.latest_number,
    latestStatus: row.latest_status,
    releasedNumber: row.released_number,
    releasedCount: row.released_count,
    archived: row.archived === 1,
  };
}

interface SectionInput {
  readonly name: string;
  readonly purpose: string;
  readonly shape: Shape;
  readonly note: string;
  /** Made by the client once for each section it wants; a retry with it makes no second one. */
  readonly key?: string | undefined;
}

/**
 * Makes a section with version 1, a draft.
 * @throws Refusal `key-reused` when the key stands for another request
 */
export async function createSection(db: Knex, author: Author, input: SectionInput): Promise<Section> {
  const shape = describe(input.shape);
  const { name, purpose, note } = input;
  const request = requestChecksum('section', author.personId, name, purpose, note, shape.checksum);
  const made = await once(
    db,
    author.workshopId,
    versionKeys,
    { key: input.key, request },
    async (transaction) => {
      const sectionId = uuid();
      const scope = scoped(transaction, author.workshopId);
      await scope.insert('sections', {
        id: sectionId,
        name,
        purpose,
        ...latestColumns(null, shape),
        updated_at: author.at,
        updated_by: author.personId,
        created_at: author.at,
      });
      await addVersion(transaction, author, {
        sectionId,
        number: 1,
        basedOn: null,
        shape,
        note,
        key: input.key,
        request,
      });
      await scope.table('sections').where({ id: sectionId }).update({ latest_number: 1 });
      return { section_id: sectionId, number: 1 };
    },
  );
  return findSection(db, author.workshopId, made.section_id, 'all');
}

interface SectionChange {
  readonly name?: string | undefined;
  readonly purpose?: string | undefined;
  readonly archived?: boolean | undefined;
}

/**
 * Changes name or purpose, archives or takes back; what is left out stays.
 * @throws Refusal `not-found`
 */
export async function changeSection(
  db: Knex,
  author: Author,
  sectionId: string,
  change: SectionChange,
): Promise<Section> {
  const before = await findSection(db, author.workshopId, sectionId, 'all');
  const columns: Record<string, string | Date | null> = {};
  if (change.name !== undefined && change.name !== before.name) columns['name'] = change.name;
  if (change.purpose !== undefined && change.purpose !== before.purpose) columns['purpose'] = change.purpose;
  if (change.archived !== undefined && change.archived !== before.archived) {
    columns['archived_at'] = change.archived ? author.at : null;
  }
  if (Object.keys(columns).length === 0) return before;
  await scoped(db, author.workshopId)
    .table('sections')
    .where({ id: sectionId })
    .update({ ...columns, updated_at: author.at, updated_by: author.personId });
  return findSection(db, author.workshopId, sectionId, 'all');
}
