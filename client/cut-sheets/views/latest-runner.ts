/** What came of the newest input that was worked out. */
export interface RunState<Output> {
  readonly output: Output | null;
  /** A newer input is being worked out. */
  readonly stale: boolean;
  /** Why the last run failed; null when it did not. */
  readonly error: unknown;
}

/**
 * Runs one input at a time; while it runs, only the newest further input waits. So the work never queues up behind someone who types, and an
 * older result never replaces a newer one.
 */
export class LatestRunner<Input, Output> {
  readonly #run: (input: Input) => Promise<Output>;
  readonly #listeners = new Set<() => void>();
  #state: RunState<Output> = { output: null, stale: false, error: null };
  #waiting: { readonly input: Input } | null = null;
  #running = false;

  constructor(run: (input: Input) => Promise<Output>) {
    this.#run = run;
  }

  readonly state = (): RunState<Output> => this.#state;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  };

  /** Asks for the result of an input; it takes the place of one that still waits. */
  ask(input: Input): void {
    this.#waiting = { input };
    this.#become({ ...this.#state, stale: true });
    if (!this.#running) void this.#work();
  }

  async #work(): Promise<void> {
    this.#running = true;
    for (let next = this.#waiting; next !== null; next = this.#waiting) {
      this.#waiting = null;
      try {
        const output = await this.#run(next.input);
        this.#become({ output, stale: this.#isWaiting(), error: null });
      } catch (error) {
        this.#become({ output: this.#state.output, stale: this.#isWaiting(), error });
      }
    }
    this.#running = false;
  }

  #isWaiting(): boolean {
    return this.#waiting !== null;
  }

  #become(state: RunState<Output>): void {
    this.#state = state;
    for (const listener of this.#listeners) listener();
  }
}
