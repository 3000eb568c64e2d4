import { type Remote, wrap } from 'comlink';
import { type Plan } from '#geometry/cutting/plan.ts';
import { type ProgramIdentity } from '#geometry/cutting/program.ts';
import { type Worked } from '#client/cut-sheets/views/work-out.ts';
import { type PlanWorker } from './plan-worker.ts';

let remote: Remote<PlanWorker> | null = null;

/** Works out a plan in the worker, which is started at the first call and then kept. Rejects when it cannot run. */
export function workOutAside(plan: Plan, identity: ProgramIdentity): Promise<Worked> {
  remote ??= wrap<PlanWorker>(
    new Worker(new URL('./plan-worker.ts', import.meta.url), { type: 'module', name: 'plan' }),
  );
  return remote.workOut(plan, identity);
}
