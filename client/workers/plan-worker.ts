import { expose, transfer } from 'comlink';
import { config } from 'zod';
import { workOut } from '#client/cut-sheets/views/work-out.ts';
import { buffersOf } from '#client/cut-sheets/views/plan-model.ts';

// The content security policy forbids code made from text here too.
config({ jitless: true });

/** Works out plans beside the page. */
const api = {
  workOut: (...input: Parameters<typeof workOut>) => {
    const worked = workOut(...input);
    return transfer(worked, [...buffersOf(worked)]);
  },
};
export type PlanWorker = typeof api;

expose(api);
