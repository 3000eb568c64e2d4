import { npmWatch } from './hold.mjs';
import { explain } from './steps.mjs';

/** What is to be done at the end, the last begun first. */
export interface Stops {
  /** `force` stands in for `stop` when there is no time: it asks, and waits for nothing. */
  add(stop: () => Promise<unknown> | undefined, force?: () => void): void;
  /** Whether the end has begun, or is due because the npm above was killed. */
  isEnding(): boolean;
  /** Stops everything and ends the process. */
  stop(code: number): Promise<never>;
  /** Does the work; if that fails, explains why and stops everything. */
  guard(work: () => Promise<void>): Promise<void>;
}

/** A second Ctrl-C within this time of the first is npm passing the same one on, ms. */
const echoMs = 600;

/**
 * Ends the process in order on Ctrl-C, SIGTERM, a closed terminal, a lost parent or a killed npm. A second Ctrl-C does
 * not wait for the order.
 * @param signalCode the exit code after a signal: 0 for a program that is meant to be ended so
 */
export function onStop(signalCode = 0): Stops {
  const waiting: (() => Promise<unknown> | undefined)[] = [];
  const forces: (() => void)[] = [];
  let since: number | undefined;
  const stop = async (code: number): Promise<never> => {
    since ??= Date.now();
    for (let task = waiting.pop(); task !== undefined; task = waiting.pop()) {
      try {
        await task();
      } catch (error) {
        console.error(error);
        code = 1;
      }
    }
    return process.exit(code);
  };
  const signalled = (): void => {
    if (since === undefined) return void stop(signalCode);
    if (Date.now() - since < echoMs) return;
    for (const force of forces) force();
    process.exit(130);
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, signalled);
  if (process.send !== undefined) process.on('disconnect', () => void stop(signalCode));
  const npmIsGone = npmWatch();
  setInterval(() => {
    if (since === undefined && npmIsGone()) void stop(signalCode);
  }, 500).unref();
  return {
    add: (task, force) => {
      waiting.push(task);
      if (force !== undefined) forces.push(force);
    },
    isEnding: () => since !== undefined || npmIsGone(),
    stop,
    guard: async (work) => {
      try {
        await work();
      } catch (error) {
        // Once the end has begun, what fails is its consequence.
        if (since !== undefined) return;
        explain(error);
        await stop(1);
      }
    },
  };
}
