import { useEffect, useState, useSyncExternalStore } from 'react';
import { type Plan } from '#geometry/cutting/plan.ts';
import { type ProgramIdentity } from '#geometry/cutting/program.ts';
import { workOutAside } from '#client/workers/plan-client.ts';
import { LatestRunner, type RunState } from './latest-runner.ts';
import { type Worked } from './work-out.ts';

export interface PlanInput {
  readonly plan: Plan;
  readonly identity: ProgramIdentity;
}

/**
 * The newest worked-out state of a plan, made beside the page. While `input` is null (its values are refused) the last one stays.
 * @param input a value that stays the same object as long as it says the same
 */
export function useWorked(input: PlanInput | null): RunState<Worked> {
  const [runner] = useState(
    () => new LatestRunner(({ plan, identity }: PlanInput) => workOutAside(plan, identity)),
  );
  useEffect(() => {
    if (input !== null) runner.ask(input);
  }, [runner, input]);
  return useSyncExternalStore(runner.subscribe, runner.state);
}
