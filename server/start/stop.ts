import { npmWatch } from './hold.mjs';

/** What is to be done at the end, the last begun first. */
export interface Stops {
  add(stop: () => Promise<unknown> | undefined): void;
  /** Whether the end has begun, or is due because the npm above was killed. */
  isEnding(): boolean;
  /** Stops everything and ends the process. */
  stop(code: number): Promise<never>;
}

/** A second Ctrl-C within this time of the first is npm passing the same one on, ms. */
const echoMs = 600;

/**
 * Ends the process in order on Ctrl-C, SIGTERM, a closed terminal, a lost parent or a killed npm. A second Ctrl-C does
 * not wait for the order.
 * @param options.force what must be done even then, without waiting
 * @param options.code the exit code after a signal: 0 for a program that is meant to be ended so
 */
export function onStop(options: { readonly force?: () => void; readonly code?: number } = {}): Stops {
  const { force = () => undefined, code: signalCode = 0 } = options;
  const tasks: (() => Promise<unknown> | undefined)[] = [];
  let since: number | undefined;
  const stop = async (code: number): Promise<never> => {
    since ??= Date.now();
    for (let task = tasks.pop(); task !== undefined; task = tasks.pop()) {
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
    force();
    process.exit(130);
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, signalled);
  if (process.send !== undefined) process.on('disconnect', () => void stop(signalCode));
  const npmIsGone = npmWatch();
  setInterval(() => {
    if (since === undefined && npmIsGone()) void stop(signalCode);
  }, 500).unref();
  return {
    add: (task) => void tasks.push(task),
    isEnding: () => since !== undefined || npmIsGone(),
    stop,
  };
}
