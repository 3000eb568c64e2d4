interface Attempts {
  readonly failures: number;
  readonly lastAt: number;
}

/** How failed attempts are slowed down. */
interface AttemptLimitOptions {
  /** Failures without any wait. */
  readonly free: number;
  /** Wait after the first failure beyond those; it doubles with each further one. */
  readonly firstWaitMs: number;
  readonly longestWaitMs: number;
  /** A subject is forgotten after this time without an attempt. */
  readonly forgetAfterMs: number;
  /** Subjects held at once; beyond that the one longest without an attempt is forgotten. */
  readonly most: number;
}

export const signInLimit: AttemptLimitOptions = {
  free: 5,
  firstWaitMs: 2_000,
  longestWaitMs: 15 * 60_000,
  forgetAfterMs: 60 * 60_000,
  most: 20_000,
};

/**
 * Growing waits after failed attempts. A subject is an account as seen from one network address: somebody who guesses
 * from elsewhere slows down himself and never the account's owner.
 *
 * Held in memory: the server is one process, a write to the database at each guess would be the better attack, and a
 * restart, which forgets, is not in an attacker's hands.
 */
export class AttemptLimit {
  readonly #subjects = new Map<string, Attempts>();
  readonly #options: AttemptLimitOptions;
  readonly #now: () => number;

  constructor(options: AttemptLimitOptions = signInLimit, now: () => number = Date.now) {
    this.#options = options;
    this.#now = now;
  }

  /**
   * Begins an attempt and counts it as failed until {@link succeed}, so that many at once count as many.
   * @returns the milliseconds left to wait; 0 when the attempt may go ahead
   */
  begin(subject: string): number {
    const now = this.#now();
    const before = this.#subjects.get(subject);
    const known = before && now - before.lastAt < this.#options.forgetAfterMs ? before : undefined;
    const wait = known ? known.lastAt + this.#waitAfter(known.failures) - now : 0;
    if (wait > 0) return wait;
    this.#subjects.delete(subject);
    this.#subjects.set(subject, { failures: (known?.failures ?? 0) + 1, lastAt: now });
    const oldest = this.#subjects.keys().next();
    if (this.#subjects.size > this.#options.most && !oldest.done) this.#subjects.delete(oldest.value);
    return 0;
  }

  /** The attempt was right: what failed before is forgotten. */
  succeed(subject: string): void {
    this.#subjects.delete(subject);
  }

  #waitAfter(failures: number): number {
    const beyond = failures - this.#options.free;
    if (beyond < 0) return 0;
    return Math.min(this.#options.longestWaitMs, this.#options.firstWaitMs * 2 ** beyond);
  }
}
