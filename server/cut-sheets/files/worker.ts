import { parentPort } from 'node:worker_threads';
import { type Answer, type Job } from './threaded-works.ts';
import { worksInPlace } from './works.ts';

async function answerTo({ work, given }: Job): Promise<Answer> {
  try {
    const does = worksInPlace[work] as (given: unknown) => Promise<unknown>;
    return { done: await does(given) };
  } catch (error) {
    return { failed: error };
  }
}

parentPort?.on('message', (job: Job) => {
  void answerTo(job).then((answer) => parentPort?.postMessage(answer));
});
parentPort?.postMessage('ready');
