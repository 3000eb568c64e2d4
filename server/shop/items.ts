import { type z } from 'zod';
import { type PersonRef } from '#server/contracts/common.ts';
import { type MachineSettings, type MaterialSettings } from '#server/contracts/shop.ts';

/** A machine or a material, by the settings it has. */
export interface Item<Settings> {
  readonly id: string;
  readonly name: string;
  readonly settings: Settings;
  readonly archived: boolean;
  readonly revision: number;
  readonly createdAt: string;
  readonly updatedAt: string;
  readonly updatedBy: PersonRef;
}

export interface ItemChange<Settings> {
  readonly revision: number;
  readonly name?: string | undefined;
  readonly settings?: Settings | undefined;
  readonly archived?: boolean | undefined;
}

/** Where the items of one sort are kept and how their settings are read. */
export interface ItemKeeping<Settings extends MachineSettings | MaterialSettings> {
  readonly table: 'machines' | 'materials';
  readonly settings: z.ZodType<Settings>;
}

export interface ItemRow {
  id: string;
  name: string;
  settings: unknown;
  archived_at: Date | null;
  revision: number;
  created_at: Date;
  updated_at: Date;
  updated_by: string;
  updated_by_name: string;
}

export function itemOf<Settings extends MachineSettings | MaterialSettings>(
  { settings }: ItemKeeping<Settings>,
  row: ItemRow,
): Item<Settings> {
  return {
    id: row.id,
    name: row.name,
    settings: settings.parse(row.settings),
    archived: row.archived_at !== null,
    revision: row.revision,
    createdAt: row.created_at.toISOString(),
    updatedAt: row.updated_at.toISOString(),
    updatedBy: { id: row.updated_by, name: row.updated_by_name },
  };
}
