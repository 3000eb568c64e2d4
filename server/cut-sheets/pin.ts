import { type Knex } from 'knex';
import { type Shape } from '#geometry/shapes/shape.ts';
import { type SheetPlan } from '#server/contracts/cut-sheets.ts';
import { resolvePlan } from '#server/contracts/sheet-plan.ts';
import { type MachineKind, type MachineSettings, type MaterialSettings } from '#server/contracts/shop.ts';
import { scoped } from '#server/database/scoped.ts';
import { type FieldIssue, Refusal } from '#server/refusal.ts';
import { type ItemKeeping } from '#server/shop/items.ts';
import { machines, materials } from '#server/shop/store.ts';
import { type SheetDocument, withPlainIds } from './document.ts';

type Settings = MachineSettings | MaterialSettings;
interface Found<Kept extends Settings> {
  readonly name: string;
  readonly settings: Kept;
}

/** A plan with what its ids stand for at this moment. */
export interface PinnedPlan extends SheetDocument {
  readonly kinds: {
    readonly machine: MachineKind | null;
    readonly material: MaterialSettings['kind'] | null;
    readonly ribMachine: MachineKind | null;
    readonly ribMaterial: MaterialSettings['kind'] | null;
  };
}

/** Field by field, what of a plan the workshop does not have. */
class Issues {
  readonly found: FieldIssue[] = [];

  add(field: string, message: string): null {
    this.found.push({ path: `plan.${field}`, message });
    return null;
  }
}

/**
 * Looks up the section versions, machines and materials that a plan names, and puts them in their place.
 * @throws Refusal `invalid` naming every id that the workshop does not have, or that is of another kind
 */
export async function pinPlan(db: Knex, workshopId: string, given: SheetPlan): Promise<PinnedPlan> {
  const plan = withPlainIds(given);
  const issues = new Issues();
  const root = await shapeAt(db, workshopId, plan, 'root', issues);
  const tip = await shapeAt(db, workshopId, plan, 'tip', issues);
  const look = lookUp(db, workshopId, issues);
  const hot = ['wire', 'bow'];
  const bed = ['laser', 'router'];
  const foamMachine = 'Foam is cut by a wire machine or a hand bow.';
  const ribMachine = 'Ribs are cut by a laser or a router.';
  const machine = await look(machines, plan.machineId, 'machineId', hot, foamMachine);
  const material = await look(materials, plan.materialId, 'materialId', ['foam'], 'A core is cut from foam.');
  const ribs = await look(machines, plan.ribMachineId, 'ribMachineId', bed, ribMachine);
  const sheet = await look(
    materials,
    plan.ribMaterialId,
    'ribMaterialId',
    ['sheet'],
    'Ribs are cut from sheet.',
  );
  if (!root || !tip || issues.found.length > 0) throw new Refusal('invalid', { errors: issues.found });
  return {
    plan,
    pinned: resolvePlan(plan, { root, tip, machine, material }),
    kinds: {
      machine: machine?.settings.kind ?? null,
      material: material?.settings.kind ?? null,
      ribMachine: ribs?.settings.kind ?? null,
      ribMaterial: sheet?.settings.kind ?? null,
    },
  };
}

async function shapeAt(
  db: Knex,
  workshopId: string,
  { panel }: SheetPlan,
  end: 'root' | 'tip',
  issues: Issues,
): Promise<Shape | null> {
  const { sectionId, versionNumber } = panel[end];
  const scope = scoped(db, workshopId);
  const section: { name: string } | undefined = await scope
    .table('sections')
    .where({ id: sectionId })
    .first('name');
  if (!section) return issues.add(`panel.${end}.sectionId`, 'There is no such section.');
  const version: { shape: Shape } | undefined = await scope
    .table('section_versions')
    .where({ section_id: sectionId, number: versionNumber })
    .first('shape');
  const absent = `“${section.name}” has no version ${versionNumber}.`;
  return version?.shape ?? issues.add(`panel.${end}.versionNumber`, absent);
}

function lookUp(db: Knex, workshopId: string, issues: Issues) {
  return async <Kept extends Settings>(
    { table, settings }: ItemKeeping<Kept>,
    id: string | null,
    field: string,
    kinds: readonly string[],
    rule: string,
  ): Promise<Found<Kept> | null> => {
    if (id === null) return null;
    const row: { name: string; settings: unknown } | undefined = await scoped(db, workshopId)
      .table(table)
      .where({ id })
      .first('name', 'settings');
    const what = table === 'machines' ? 'machine' : 'material';
    if (!row) return issues.add(field, `There is no such ${what}.`);
    const found = settings.parse(row.settings);
    if (!kinds.includes(found.kind)) return issues.add(field, rule);
    return { name: row.name, settings: found };
  };
}
