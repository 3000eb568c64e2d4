/** A start that cannot go on: the message is one sentence, the advice says what to do. */
export class StartError extends Error {
  constructor(message: string, advice: string, cause?: unknown);
  readonly advice: string;
}

/** The advice that fits an error, by its code and text. */
export function adviceFor(error: unknown): string | undefined;

/** Runs one step of the start: says what it does, then how long it took. `note` sets the words at its end. */
export function step<T>(title: string, work: (note: (text: string) => void) => Promise<T> | T): Promise<T>;

/** Prints why the start failed and what to do. */
export function explain(error: unknown): void;
