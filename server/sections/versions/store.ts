import { type Knex } from 'knex';
import { z } from 'zod';
import { type Shape } from '#geometry/shapes/shape.ts';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { decodeCursor, encodeCursor, pageOfRows } from '#server/database/cursor.ts';
import { madeBefore, once } from '#server/database/once.ts';
import { scoped } from '#server/database/scoped.ts';
import { Refusal } from '#server/refusal.ts';
import { describe, requestChecksum } from '../described.ts';
import { dropSavedDraft } from '../drafts/store.ts';
import { type Author, checkSave, type Reach, statusesFor } from '../rules.ts';
import { sectionState } from '../store.ts';
import { addVersion, latestColumns, versionKeys, versionOf, versionRows } from './rows.ts';

/**
 * One version.
 * @throws Refusal `not-found` when there is none within reach
 */
export async function findVersion(
  db: Knex,
  workshopId: string,
  sectionId: string,
  number: number,
  reach: Reach,
): Promise<SectionVersion> {
  const row: unknown = await versionRows(db, workshopId)
    .where({ 'v.section_id': sectionId, 'v.number': number })
    .whereIn('v.status', statusesFor(reach))
    .first();
  if (!row) throw new Refusal('not-found');
  return versionOf(row);
}

const cursorSchema = z.tuple([z.int().min(1)]);

/**
 * Versions of a section within reach, newest first.
 * @throws Refusal `not-found` for the section, `invalid` for a cursor of another list
 */
export async function listVersions(
  db: Knex,
  workshopId: string,
  sectionId: string,
  options: { reach: Reach; cursor?: string | undefined; limit: number },
): Promise<{ items: SectionVersion[]; nextCursor: string | null }> {
  const after = options.cursor === undefined ? null : decodeCursor(options.cursor, cursorSchema)[0];
  await sectionState(db, workshopId, sectionId, { reach: options.reach });
  const query = versionRows(db, workshopId)
    .where('v.section_id', sectionId)
    .whereIn('v.status', statusesFor(options.reach))
    .orderBy('v.number', 'desc')
    .limit(options.limit + 1);
  if (after !== null) query.where('v.number', '<', after);
  const rows: unknown[] = await query;
  const { page, last } = pageOfRows(rows.map(versionOf), options.limit);
  return { items: [...page], nextCursor: last ? encodeCursor([last.number]) : null };
}

interface VersionInput {
  readonly basedOn: number;
  readonly shape: Shape;
  readonly note: string;
  /** Made by the client once for each version it wants to save; a retry with it saves no second one. */
  readonly key?: string | undefined;
}

/**
 * Saves the next version of a section, as a draft. The author's unsaved work goes with it when it holds the same shape.
 *
 * @throws Refusal `version-conflict` with the newest version when the base is not the newest any more; `key-reused`,
 *   `archived`, `not-found`, and `invalid` for what {@link checkSave} refuses
 */
export async function saveVersion(
  db: Knex,
  author: Author,
  sectionId: string,
  input: VersionInput,
): Promise<SectionVersion> {
  const shape = describe(input.shape);
  const { basedOn, note, key } = input;
  const request = requestChecksum(
    'version',
    author.personId,
    sectionId.toLowerCase(),
    basedOn,
    note,
    shape.checksum,
  );
  const made = await once(db, author.workshopId, versionKeys, { key, request }, async (transaction) => {
    const section = await sectionState(transaction, author.workshopId, sectionId, { lock: true });
    const before = await madeBefore(transaction, author.workshopId, versionKeys, { key, request });
    if (before) return before;
    const base = await shapeOf(transaction, author.workshopId, section.id, basedOn);
    if (checkSave({ ...section, base }, input) === 'conflict') {
      const latest = await findVersion(
        transaction,
        author.workshopId,
        section.id,
        section.latestNumber,
        'all',
      );
      throw new Refusal('version-conflict', {
        detail: `Version ${latest.number} was saved by ${latest.author.name} in between. Nothing of yours was lost.`,
        members: { basedOn, latest },
      });
    }
    const number = section.latestNumber + 1;
    await addVersion(transaction, author, {
      sectionId: section.id,
      number,
      basedOn,
      shape,
      note,
      key,
      request,
    });
    await scoped(transaction, author.workshopId)
      .table('sections')
      .where({ id: section.id })
      .update({ ...latestColumns(number, shape), updated_at: author.at, updated_by: author.personId });
    await dropSavedDraft(transaction, author, section.id, input.shape);
    return { section_id: section.id, number };
  });
  return findVersion(db, author.workshopId, made.section_id, made.number, 'all');
}

async function shapeOf(
  db: Knex,
  workshopId: string,
  sectionId: string,
  number: number,
): Promise<Shape | null> {
  const row: { shape: Shape } | undefined = await scoped(db, workshopId)
    .table('section_versions')
    .where({ section_id: sectionId, number })
    .first('shape');
  return row?.shape ?? null;
}
