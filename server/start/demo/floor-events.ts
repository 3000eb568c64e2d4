import { type Knex } from 'knex';
import { v4 as uuid } from 'uuid';
import { findSheetVersion } from '#server/cut-sheets/versions/store.ts';
import { logCut } from '#server/cutting-list/logs/store.ts';
import { scoped } from '#server/database/scoped.ts';
import { nominalRows } from '#server/inspections/rules.ts';
import { addInspection, answerInspection } from '#server/inspections/store.ts';
import { type Author } from '#server/sections/rules.ts';
import { type FloorStep } from './floor.ts';
import { type Ids } from './sheet-histories.ts';

type Step<Did extends FloorStep['did']> = FloorStep & { readonly did: Did };

/** Takes one step of the floor, through the same stores that people use. */
export async function floorStep(db: Knex, ids: Ids, step: FloorStep, author: Author): Promise<void> {
  if (step.did === 'log') await log(db, ids, step, author);
  else if (step.did === 'inspect') await inspect(db, ids, step, author);
  else await answer(db, step, author);
}

/** The one thing of a name: a sheet, or an inspection by what is written on the part. */
async function idOf(
  db: Knex,
  workshopId: string,
  table: 'cut_sheets' | 'inspections',
  where: Readonly<Record<string, string>>,
): Promise<string> {
  const [row, another] = (await scoped(db, workshopId).table(table).where(where).select('id')) as {
    id: string;
  }[];
  if (!row || another)
    throw new Error(`The demo names ${JSON.stringify(where)}, which is not one of ${table}.`);
  return row.id;
}

async function log(db: Knex, ids: Ids, step: Step<'log'>, author: Author): Promise<void> {
  await logCut(db, author, 'released', {
    sheetId: await idOf(db, author.workshopId, 'cut_sheets', { name: step.sheet }),
    versionNumber: step.version,
    part: step.part,
    action: step.action,
    quantity: 1,
    reason: step.reason,
    machineId: step.machine && ids.machine(step.machine),
    at: author.at.toISOString(),
    key: uuid(),
  });
}

/** What a caliper with hundredths of a millimetre shows. */
function reading(mm: number): number {
  return Number(mm.toFixed(2));
}

async function inspect(db: Knex, ids: Ids, step: Step<'inspect'>, author: Author): Promise<void> {
  const sheetId = await idOf(db, author.workshopId, 'cut_sheets', { name: step.sheet });
  const version = await findSheetVersion(db, author.workshopId, sheetId, step.version, 'released');
  const rows = nominalRows(version.pinned);
  const measurements = step.deviations.map(({ end, station, mm }) => {
    const row = rows.find((one) => one.end === end && one.station === station);
    if (!row) throw new Error(`The demo measures at ${station} of the ${end}, which the plan does not have.`);
    return { end, station, measuredMm: reading(row.nominalMm + mm) };
  });
  await addInspection(db, author, 'released', {
    sheetId,
    versionNumber: step.version,
    mark: step.mark,
    machineId: step.machine && ids.machine(step.machine),
    measurements,
    note: step.note,
    at: author.at.toISOString(),
    key: uuid(),
  });
}

async function answer(db: Knex, step: Step<'answer'>, author: Author): Promise<void> {
  const id = await idOf(db, author.workshopId, 'inspections', { mark: step.mark });
  await answerInspection(db, author, 'all', id, { decision: step.decision, note: step.note });
}
