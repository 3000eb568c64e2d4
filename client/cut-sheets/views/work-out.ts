import { type Finding } from '#geometry/cutting/findings.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { type ProgramIdentity } from '#geometry/cutting/program.ts';
import { modelOf, type PlanModel } from './plan-model.ts';

/** A plan worked out, ready to be drawn. */
export interface Worked {
  /** Null when nothing can be drawn of it: the findings say why. */
  readonly model: PlanModel | null;
  readonly findings: readonly Finding[];
}

/** Works out a plan and reduces it to what is drawn and told. Never throws because of the plan's values. */
export function workOut(plan: Plan, identity: ProgramIdentity): Worked {
  const { core, findings } = planCore(plan, identity);
  return { model: core && modelOf(core), findings };
}
