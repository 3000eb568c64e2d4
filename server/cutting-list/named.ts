import { type Knex } from 'knex';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { scoped } from '#server/database/scoped.ts';
import { refuseField } from '#server/refusal.ts';
import { type Reach, statusesFor } from '#server/sections/rules.ts';

/** The version that an entry or an inspection speaks of. */
export interface NamedVersion {
  readonly sheetId: string;
  readonly versionNumber: number;
}

interface VersionRow {
  status: VersionStatus;
  parts: string;
}

/**
 * How the version that a body names stands; it stays so until the transaction ends, and other entries of the sheet wait.
 * @throws Refusal naming `sheetId` or `versionNumber` when there is none within reach
 */
export async function holdNamedVersion(
  transaction: Knex.Transaction,
  workshopId: string,
  { sheetId, versionNumber }: NamedVersion,
  reach: Reach,
): Promise<VersionRow> {
  const scope = scoped(transaction, workshopId);
  // The lock comes first, so that whoever waited for it reads what the one before has written.
  const sheet: unknown = await scope.table('cut_sheets').where({ id: sheetId }).forUpdate().first('id');
  if (!sheet) throw refuseField('sheetId', 'There is no such cut sheet.');
  const version: VersionRow | undefined = await scope
    .table('cut_sheet_versions')
    .where({ sheet_id: sheetId, number: versionNumber })
    .whereIn('status', statusesFor(reach))
    .first('status', 'parts');
  if (!version) throw refuseField('versionNumber', `There is no version ${versionNumber} of this cut sheet.`);
  return version;
}

/** @throws Refusal naming `machineId` for a machine that the workshop does not have */
export async function checkNamedMachine(
  db: Knex,
  workshopId: string,
  machineId: string | null,
): Promise<void> {
  if (machineId === null) return;
  const machine: unknown = await scoped(db, workshopId)
    .table('machines')
    .where({ id: machineId })
    .first('id');
  if (!machine) throw refuseField('machineId', 'There is no such machine.');
}
