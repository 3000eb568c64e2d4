import { type Knex } from 'knex';
import { type SectionVersion, type VersionStatus } from '#server/contracts/sections.ts';
import { scoped } from '#server/database/scoped.ts';
import { inTransaction } from '#server/database/transaction.ts';
import { archived, type Author, checkTransition } from '../rules.ts';
import { sectionState } from '../store.ts';
import { findVersion } from './store.ts';

const nothingReleased = {
  released_number: null,
  released_kind: null,
  released_description: null,
  released_thickness: null,
  released_camber: null,
  released_at: null,
  released_by: null,
};

async function setStatus(
  db: Knex,
  author: Author,
  version: { sectionId: string; number: number },
  to: { status: VersionStatus; reason: string },
): Promise<void> {
  const scope = scoped(db, author.workshopId);
  const signed = { updated_at: author.at, updated_by: author.personId };
  await scope
    .table('section_versions')
    .where({ section_id: version.sectionId, number: version.number })
    .update({
      status: to.status,
      status_reason: to.reason,
      status_by: author.personId,
      status_at: author.at,
    });
  await scope.table('sections').where({ id: version.sectionId }).update(signed);
  await scope
    .table('sections')
    .where({ id: version.sectionId, latest_number: version.number })
    .update({ latest_status: to.status });
}

/** Repeats the released version on its section; the version's own columns are read where they are written. */
async function showReleased(db: Knex, author: Author, sectionId: string, number: number): Promise<void> {
  const version: { kind: string; description: string; thickness: number; camber: number } = await scoped(
    db,
    author.workshopId,
  )
    .table('section_versions')
    .where({ section_id: sectionId, number })
    .first('kind', 'description', 'thickness', 'camber');
  await scoped(db, author.workshopId)
    .table('sections')
    .where({ id: sectionId })
    .update({
      released_number: number,
      released_kind: version.kind,
      released_description: version.description,
      released_thickness: version.thickness,
      released_camber: version.camber,
      released_at: author.at,
      released_by: author.personId,
      released_count: db.raw('released_count + 1'),
    });
}

/**
 * Releases a draft; the version released before is superseded in the same moment.
 * @throws Refusal `not-found`, `archived`, or `status-conflict` when the version is not a draft
 */
export async function releaseVersion(
  db: Knex,
  author: Author,
  sectionId: string,
  number: number,
  reason = '',
): Promise<SectionVersion> {
  await inTransaction(db, async (transaction) => {
    const section = await sectionState(transaction, author.workshopId, sectionId, { lock: true });
    const version = await findVersion(transaction, author.workshopId, section.id, number, 'all');
    if (section.archived) throw archived();
    checkTransition(number, version.status, 'released');
    if (section.releasedNumber !== null) {
      const before = { sectionId: section.id, number: section.releasedNumber };
      const superseded = { status: 'superseded', reason: `Superseded by version ${number}.` } as const;
      await setStatus(transaction, author, before, superseded);
    }
    await setStatus(transaction, author, { sectionId: section.id, number }, { status: 'released', reason });
    await showReleased(transaction, author, section.id, number);
  });
  return findVersion(db, author.workshopId, sectionId, number, 'all');
}

/**
 * Withdraws the released version; none is released then, until another is.
 * @throws Refusal `not-found`, or `status-conflict` when the version is not the released one
 */
export async function withdrawVersion(
  db: Knex,
  author: Author,
  sectionId: string,
  number: number,
  reason: string,
): Promise<SectionVersion> {
  await inTransaction(db, async (transaction) => {
    const section = await sectionState(transaction, author.workshopId, sectionId, { lock: true });
    const version = await findVersion(transaction, author.workshopId, section.id, number, 'all');
    checkTransition(number, version.status, 'withdrawn');
    await scoped(transaction, author.workshopId)
      .table('sections')
      .where({ id: section.id })
      .update(nothingReleased);
    await setStatus(transaction, author, { sectionId: section.id, number }, { status: 'withdrawn', reason });
  });
  return findVersion(db, author.workshopId, sectionId, number, 'all');
}
