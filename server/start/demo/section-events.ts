import { createHash } from 'node:crypto';
import { type Knex } from 'knex';
import { parseExportOptions } from '#geometry/formats/export.ts';
import { cutFileOf } from '#server/exports/cut-file.ts';
import { recordDownload } from '#server/exports/store.ts';
import { keepDraft } from '#server/sections/drafts/store.ts';
import { type Author } from '#server/sections/rules.ts';
import { changeSection, createSection } from '#server/sections/store.ts';
import { releaseVersion, withdrawVersion } from '#server/sections/versions/status-store.ts';
import { findVersion, saveVersion } from '#server/sections/versions/store.ts';
import { type History, type Step } from './histories.ts';

/**
 * Takes the steps of a section, through the same stores that people use.
 * @param begun is told the id of the section as soon as there is one
 * @returns what takes one step; it is called in order
 */
export function sectionLife(
  db: Knex,
  { name, purpose }: History,
  begun: (id: string) => void,
): (step: Step, author: Author) => Promise<void> {
  let id = '';
  let newest = 0;
  return async (step, author) => {
    if (step.did !== 'save') return void (await take(db, id, newest, step, author));
    const { shape, note } = step;
    if (newest > 0) await saveVersion(db, author, id, { basedOn: newest, shape, note });
    else begun((id = (await createSection(db, author, { name, purpose, shape, note })).id));
    newest += 1;
  };
}

async function take(
  db: Knex,
  sectionId: string,
  newest: number,
  step: Exclude<Step, { readonly did: 'save' }>,
  author: Author,
): Promise<unknown> {
  switch (step.did) {
    case 'release':
      return releaseVersion(db, author, sectionId, step.version, step.reason);
    case 'withdraw':
      return withdrawVersion(db, author, sectionId, step.version, step.reason);
    case 'archive':
      return changeSection(db, author, sectionId, { archived: true });
    case 'take file':
      return takeFile(db, sectionId, step, author);
    case 'keep draft':
      return keepDraft(db, author, sectionId, { basedOn: newest, shape: step.shape, chordMm: step.chordMm });
  }
}

/** The bytes are made as they were at that moment, so that their sum is that of the file then taken. */
async function takeFile(
  db: Knex,
  sectionId: string,
  { version: number, format, options: asked }: Step & { readonly did: 'take file' },
  author: Author,
): Promise<void> {
  const version = await findVersion(db, author.workshopId, sectionId, number, 'all');
  const options = parseExportOptions(format, asked);
  const { fileName, text } = cutFileOf(version, format, options);
  const checksum = createHash('sha256').update(text, 'utf8').digest('hex');
  await recordDownload(db, author, {
    sectionId,
    versionNumber: number,
    fileName,
    format,
    options,
    checksum,
  });
}
