import DxfParser from 'dxf-parser';
import { type CutFile } from '#geometry/cutting/files/cut-file.ts';
import { cutFiles } from '#geometry/cutting/files/cut-files.ts';
import { type SheetIdentity } from '#geometry/cutting/files/identity.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { type CorePlan, planCore } from '#geometry/cutting/planner.ts';
import { RIBS, TEMPLATE, planWith } from '../plans.ts';

export const SHEET: SheetIdentity = {
  sheetName: 'Reed wing',
  versionNumber: 3,
  status: 'released',
  checksum: '3f2a9c81b0de5577a1c0ffee00112233445566778899aabbccddeeff00112233',
  shortCode: '7WN9-S0DG',
  address: 'https://ribwright.example/cut-sheets/reed-wing/3',
  root: {
    sectionName: 'Marsh',
    versionNumber: 5,
    checksum: 'a1b2c3d4e5f60718293a4b5c6d7e8f90a1b2c3d4e5f60718293a4b5c6d7e8f90',
    designation: 'NACA 2412',
  },
  tip: {
    sectionName: 'Marsh tip',
    versionNumber: 2,
    checksum: '0f1e2d3c4b5a69788796a5b4c3d2e1f00f1e2d3c4b5a69788796a5b4c3d2e1f0',
    designation: 'NACA 2410',
  },
  author: 'Ada Builder',
  createdAt: '2026-11-30T09:00:00.000Z',
  releasedBy: 'Ada Builder',
  releasedAt: '2026-12-01T09:00:00.000Z',
  machineName: 'Long bench',
  materialName: 'EPS 20',
  ribMaterialName: 'Poplar plywood',
};

/** The shop's tapered panel with all that a sheet can make: core, ribs, templates. */
export const WHOLE: Plan = planWith({ ribs: RIBS, template: TEMPLATE });

export function planned(plan: Plan, { sheetName, versionNumber, checksum }: SheetIdentity = SHEET): CorePlan {
  const { core } = planCore(plan, { sheetName, versionNumber, checksum, part: 'core' });
  if (!core) throw new Error('The plan gives no core.');
  return core;
}

export function fileOf(files: readonly CutFile[], name: string): CutFile {
  const file = files.find((of) => of.name === name);
  if (!file) throw new Error(`There is no ${name} among ${files.map((of) => of.name).join(', ')}.`);
  return file;
}

export function textOf(core: CorePlan, name: string): string {
  return fileOf(cutFiles(core, SHEET), name).text;
}

interface ReadPoint {
  readonly x: number;
  readonly y: number;
}

/** An entity as an independent reader of DXF gives it. */
export interface ReadEntity {
  readonly type: string;
  readonly layer: string;
  /** Closed. */
  readonly shape?: boolean;
  readonly vertices?: readonly ReadPoint[];
  readonly center?: ReadPoint;
  readonly radius?: number;
  readonly text?: string;
  readonly startPoint?: ReadPoint;
}

export interface ReadDxf {
  readonly header: Readonly<Record<string, unknown>>;
  readonly layers: readonly string[];
  readonly entities: readonly ReadEntity[];
  on(layer: string): readonly ReadEntity[];
}

export function readDxf(text: string): ReadDxf {
  const dxf = new DxfParser().parseSync(text);
  if (!dxf) throw new Error('The reader gave nothing back.');
  const entities = dxf.entities as unknown as readonly ReadEntity[];
  return {
    header: dxf.header,
    layers: Object.keys(dxf.tables.layer.layers),
    entities,
    on: (layer) => entities.filter((of) => of.layer === layer),
  };
}
