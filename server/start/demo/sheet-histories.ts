import { type SheetPlan } from '#server/contracts/cut-sheets.ts';
import { type Moment, type Signed, type Time } from './histories.ts';

/** A section version at an end of a panel, by the section's name. */
interface NamedEnd {
  readonly section: string;
  readonly version: number;
  readonly chordMm: number;
}

/** A plan that names sections, machines and materials; their ids are known only when the workshop is filled in. */
export interface NamedPlan extends Omit<
  SheetPlan,
  'panel' | 'machineId' | 'materialId' | 'ribMachineId' | 'ribMaterialId'
> {
  readonly panel: Omit<SheetPlan['panel'], 'root' | 'tip'> & {
    readonly root: NamedEnd;
    readonly tip: NamedEnd;
  };
  readonly machine: string | null;
  readonly material: string | null;
  readonly ribMachine: string | null;
  readonly ribMaterial: string | null;
}

/** What happened to a cut sheet, in order. */
export type SheetStep = Signed &
  (
    | { readonly did: 'save'; readonly plan: NamedPlan; readonly note: string }
    | { readonly did: 'release' | 'withdraw'; readonly version: number; readonly reason: string }
    | { readonly did: 'take file'; readonly version: number; readonly name: string }
    | { readonly did: 'keep draft'; readonly plan: NamedPlan }
  );

export interface SheetHistory {
  readonly name: string;
  readonly purpose: string;
  readonly steps: readonly [SheetStep & { readonly did: 'save' }, ...SheetStep[]];
}

type By = Signed['by'];
const at = (daysAgo: number, time: Time): Moment => ({ daysAgo, time });

export function savePlan(daysAgo: number, time: Time, by: By, plan: NamedPlan, note: string) {
  return { did: 'save', at: at(daysAgo, time), by, plan, note } as const;
}

export function takeSheetFile(daysAgo: number, time: Time, by: By, version: number, name: string) {
  return { did: 'take file', at: at(daysAgo, time), by, version, name } as const;
}

/** Finds the ids behind names. */
export interface Ids {
  section(name: string): string;
  machine(name: string): string;
  material(name: string): string;
}

/** The plan as people send it. */
export function planWithIds(plan: NamedPlan, ids: Ids): SheetPlan {
  const { panel, machine, material, ribMachine, ribMaterial, ...values } = plan;
  const end = ({ section, version, chordMm }: NamedEnd) => ({
    sectionId: ids.section(section),
    versionNumber: version,
    chordMm,
  });
  return {
    ...values,
    panel: { ...panel, root: end(panel.root), tip: end(panel.tip) },
    machineId: machine && ids.machine(machine),
    materialId: material && ids.material(material),
    ribMachineId: ribMachine && ids.machine(ribMachine),
    ribMaterialId: ribMaterial && ids.material(ribMaterial),
  };
}
