import { createHash } from 'node:crypto';
import { type Knex } from 'knex';
import { parseExportOptions } from '#geometry/formats/export.ts';
import { hashPassword } from '#server/account/passwords.ts';
import { createPerson, createWorkshop } from '#server/account/store.ts';
import { keepDraft } from '#server/sections/drafts/store.ts';
import { cutFileOf } from '#server/exports/cut-file.ts';
import { recordDownload } from '#server/exports/store.ts';
import { type Author } from '#server/sections/rules.ts';
import { changeSection, createSection } from '#server/sections/store.ts';
import { releaseVersion, withdrawVersion } from '#server/sections/versions/status-store.ts';
import { findVersion, saveVersion } from '#server/sections/versions/store.ts';
import { fillShop } from '#server/shop/defaults.ts';
import { type History, type Moment, type Step } from './histories.ts';
import { demoEmail, demoPeople, demoWorkshop } from './people.ts';
import { demoSections } from './sections.ts';
import { demoShop } from './shop.ts';

const DAY_MS = 86_400_000;
/** The workshop began a little before its first section. */
const OPENING: Moment = { daysAgo: 45, time: '08:00' };

/** Whether nobody has an account yet; only then may the demo workshop be filled in. */
export async function isEmpty(knex: Knex): Promise<boolean> {
  return (await knex('workshops').first('id')) === undefined;
}

/**
 * Fills in the demo workshop: four people with one password, machines and materials, and sections with some weeks of
 * history before `now`.
 * All or nothing. The same `now` gives the same workshop but for its ids and the salt of the passwords.
 * @throws ER_DUP_ENTRY when the accounts are there already
 */
export async function seedDemo(knex: Knex, password: string, now: Date = new Date()): Promise<void> {
  const passwordHash = await hashPassword(password);
  await knex.transaction(async (transaction) => {
    const opened = timeOf(OPENING, now);
    const workshopId = await createWorkshop(transaction, { name: demoWorkshop, at: opened });
    const ids = new Map<string, string>();
    for (const { role, name } of demoPeople) {
      const person = { name, role, email: demoEmail(role), passwordHash, at: opened };
      ids.set(role, await createPerson(transaction, workshopId, person));
    }
    const builder = { workshopId, personId: ids.get('builder') ?? '', at: opened };
    await fillShop(transaction, builder, demoShop);
    const author = ({ by, at }: Step): Author => ({
      workshopId,
      personId: ids.get(by) ?? '',
      at: timeOf(at, now),
    });
    for (const history of demoSections) await live(transaction, history, author);
  });
}

/** Takes the steps of a section one after the other, through the same stores that people use. */
async function live(
  db: Knex,
  { name, purpose, steps }: History,
  author: (step: Step) => Author,
): Promise<void> {
  const [first, ...later] = steps;
  const { id } = await createSection(db, author(first), {
    name,
    purpose,
    shape: first.shape,
    note: first.note,
  });
  let newest = 1;
  for (const step of later) {
    await take(db, id, newest, step, author(step));
    if (step.did === 'save') newest += 1;
  }
}

async function take(
  db: Knex,
  sectionId: string,
  newest: number,
  step: Step,
  author: Author,
): Promise<unknown> {
  switch (step.did) {
    case 'save':
      return saveVersion(db, author, sectionId, { basedOn: newest, shape: step.shape, note: step.note });
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

function timeOf({ daysAgo, time }: Moment, now: Date): Date {
  const [hours = 0, minutes = 0] = time.split(':').map(Number);
  const midnight = Math.floor(now.getTime() / DAY_MS) * DAY_MS;
  return new Date(midnight - daysAgo * DAY_MS + (hours * 60 + minutes) * 60_000);
}
