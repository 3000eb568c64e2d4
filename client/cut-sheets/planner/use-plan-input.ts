import { useMemo } from 'react';
import { resolvePlan } from '#server/contracts/sheet-plan.ts';
import { type SheetPlan } from '#server/contracts/cut-sheets.ts';
import { type PlanInput } from '../views/use-worked.ts';
import { type PlanSources } from './use-plan-sources.ts';

/** What is worked out: the plan with everything its ids stand for; null while that is not known, or the form holds no plan. */
export function usePlanInput(
  plan: SheetPlan | null,
  sources: PlanSources,
  sheetName: string,
  versionNumber: number,
): PlanInput | null {
  const { machines, materials } = sources;
  const root = sources.root.shape;
  const tip = sources.tip.shape;
  return useMemo(() => {
    if (!plan || !root || !tip || !machines || !materials) return null;
    const resolved = resolvePlan(plan, {
      root,
      tip,
      machine: machines.find(({ id }) => id === plan.machineId) ?? null,
      material: materials.find(({ id }) => id === plan.materialId) ?? null,
    });
    // A draft has no checksum of its own yet.
    return { plan: resolved, identity: { sheetName, versionNumber, checksum: 'draft', part: 'core' } };
  }, [plan, root, tip, machines, materials, sheetName, versionNumber]);
}
