import { type Knex } from 'knex';
import { canonicalShape, type Shape } from '#geometry/shapes/shape.ts';
import { type Draft } from '#server/contracts/sections.ts';
import { scoped } from '#server/database/scoped.ts';
import { inTransaction } from '#server/database/transaction.ts';
import { Refusal } from '#server/refusal.ts';
import { type Author, checkBase, isSavedWork } from '../rules.ts';
import { sectionState } from '../store.ts';

interface Row {
  based_on: number;
  shape: Shape;
  chord_mm: number;
  updated_at: Date;
}

type Owner = Pick<Author, 'workshopId' | 'personId'>;

function ownDraft(db: Knex, owner: Owner, sectionId: string): Knex.QueryBuilder {
  return scoped(db, owner.workshopId)
    .table('section_drafts')
    .where({ section_id: sectionId, person_id: owner.personId });
}

/**
 * A person's unsaved work on a section.
 * @throws Refusal `not-found` when there is none
 */
export async function findDraft(db: Knex, owner: Owner, sectionId: string): Promise<Draft> {
  const row: Row | undefined = await ownDraft(db, owner, sectionId).first();
  if (!row) throw new Refusal('not-found', { detail: 'There is no unsaved work of yours on this section.' });
  return {
    basedOn: row.based_on,
    shape: row.shape,
    chordMm: row.chord_mm,
    updatedAt: row.updated_at.toISOString(),
  };
}

/**
 * Keeps a person's unsaved work; what was kept before is replaced.
 * @throws Refusal `not-found` for the section, `invalid` naming `basedOn` when there is no such version
 */
export async function keepDraft(
  db: Knex,
  author: Author,
  sectionId: string,
  draft: Omit<Draft, 'updatedAt'>,
): Promise<Draft> {
  const section = await sectionState(db, author.workshopId, sectionId);
  checkBase(draft.basedOn, section.latestNumber);
  await inTransaction(db, (transaction) =>
    scoped(transaction, author.workshopId)
      .insert('section_drafts', {
        section_id: section.id,
        person_id: author.personId,
        based_on: draft.basedOn,
        shape: canonicalShape(draft.shape),
        chord_mm: draft.chordMm,
        updated_at: author.at,
      })
      .onConflict(['workshop_id', 'section_id', 'person_id'])
      .merge(),
  );
  return { ...draft, updatedAt: author.at.toISOString() };
}

/**
 * Discards a person's unsaved work; none is as good as discarded.
 * @throws Refusal `not-found` for the section
 */
export async function dropDraft(db: Knex, owner: Owner, sectionId: string): Promise<void> {
  const section = await sectionState(db, owner.workshopId, sectionId);
  await ownDraft(db, owner, section.id).delete();
}

/** Discards the author's unsaved work when it holds nothing beyond what was just saved. */
export async function dropSavedDraft(db: Knex, owner: Owner, sectionId: string, saved: Shape): Promise<void> {
  const row: Row | undefined = await ownDraft(db, owner, sectionId).forUpdate().first();
  if (row && isSavedWork(row.shape, saved)) await ownDraft(db, owner, sectionId).delete();
}
