import { type Knex } from 'knex';
import { type CutAction } from '#server/contracts/cutting-list.ts';
import { type SheetPart } from '#server/contracts/cut-sheets.ts';
import { scoped } from '#server/database/scoped.ts';
import { countParts } from '../rules.ts';

interface PartKey {
  readonly sheetId: string;
  readonly versionNumber: number;
  readonly part: SheetPart;
}

interface Row {
  id: string;
  action: CutAction;
  quantity: number;
  machine_id: string | null;
}

/**
 * Counts a part anew from all its entries: one that comes in late counts at the time at which it happened. The caller holds the sheet.
 */
export async function countAgain(
  transaction: Knex.Transaction,
  workshopId: string,
  { sheetId, versionNumber, part }: PartKey,
): Promise<void> {
  const scope = scoped(transaction, workshopId);
  const key = { sheet_id: sheetId, version_number: versionNumber, part };
  const rows: Row[] = await scope
    .table('cut_logs')
    .where(key)
    .orderBy(['happened_at', 'received_at', 'id'])
    .select('id', 'action', 'quantity', 'machine_id');
  const count = countParts(rows.map(({ machine_id: machineId, ...entry }) => ({ ...entry, machineId })));
  await scope
    .insert('cut_progress', {
      ...key,
      done: count.done,
      scrapped: count.scrapped,
      open: count.open,
      open_log_id: count.openEntry,
    })
    .onConflict(['workshop_id', 'sheet_id', 'version_number', 'part'])
    .merge();
}
