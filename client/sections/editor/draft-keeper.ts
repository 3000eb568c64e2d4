import { type DraftInput } from '#client/api/sections.ts';

/** How it stands with keeping the unsaved work. */
export type KeeperState =
  | { readonly step: 'idle' }
  | { readonly step: 'waiting' }
  | { readonly step: 'sending' }
  | { readonly step: 'kept'; readonly at: number }
  | { readonly step: 'retrying'; readonly offline: boolean }
  | { readonly step: 'refused'; readonly reason: string };

/** How a try to keep the draft ended. */
export type SendResult =
  | { readonly kind: 'kept' }
  | { readonly kind: 'failed'; readonly offline: boolean }
  | { readonly kind: 'refused'; readonly reason: string };

/** What the keeper needs from outside; the tests give it a clock of their own. */
export interface KeeperPorts<Draft> {
  send(draft: Draft): Promise<SendResult>;
  /** Sends once more while the page goes away; nobody waits for the answer. */
  sendLast(draft: Draft): void;
  mirror: { write(draft: Draft, at: number): void; clear(): void };
  now(): number;
  /** Calls back after a time; returns the way to call it off. */
  after(ms: number, action: () => void): () => void;
}

export const PAUSE_MS = 800;
const FIRST_RETRY_MS = 2000;
const LONGEST_RETRY_MS = 30_000;

/**
 * Keeps unsaved work: at once in the browser's mirror, and on the server a moment after the last change. Tries again
 * with growing pauses until the server has it; the mirror is cleared only then.
 */
export class DraftKeeper<Draft = DraftInput> {
  readonly #ports: KeeperPorts<Draft>;
  readonly #listeners = new Set<() => void>();
  #state: KeeperState = { step: 'idle' };
  #pending: Draft | null = null;
  #inFlight: Draft | null = null;
  #cancelTimer: () => void = () => undefined;
  #failures = 0;

  constructor(ports: KeeperPorts<Draft>) {
    this.#ports = ports;
  }

  readonly state = (): KeeperState => this.#state;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  };

  /** Takes note of unsaved work; the newest counts. */
  change(draft: Draft): void {
    this.#pending = draft;
    this.#failures = 0;
    this.#ports.mirror.write(draft, this.#ports.now());
    this.#schedule(PAUSE_MS);
    if (this.#inFlight === null) this.#become({ step: 'waiting' });
  }

  /** Tries at once, as when the network is back. */
  flush(): void {
    if (this.#pending === null || this.#inFlight !== null) return;
    this.#cancelTimer();
    void this.#send(this.#pending);
  }

  /** The page goes away: hands over what the server does not have yet. The mirror stays until it is known to be kept. */
  leave(): void {
    const draft = this.#pending ?? this.#inFlight;
    if (draft !== null) this.#ports.sendLast(draft);
  }

  /** The work was saved as a version, or dropped: nothing is left to keep. */
  settle(): void {
    this.#cancelTimer();
    this.#pending = null;
    this.#inFlight = null;
    this.#failures = 0;
    this.#ports.mirror.clear();
    this.#become({ step: 'idle' });
  }

  /** Stops all timers; nothing more is sent. */
  stop(): void {
    this.#cancelTimer();
  }

  #schedule(ms: number): void {
    this.#cancelTimer();
    this.#cancelTimer = this.#ports.after(ms, () => {
      this.flush();
    });
  }

  async #send(draft: Draft): Promise<void> {
    this.#pending = null;
    this.#inFlight = draft;
    this.#become({ step: 'sending' });
    const result = await this.#ports.send(draft);
    // Settled meanwhile: the answer is about work that is no longer a draft.
    if (this.#inFlight !== draft) return;
    this.#inFlight = null;
    if (result.kind === 'kept') this.#kept();
    else this.#failed(draft, result);
  }

  #kept(): void {
    this.#failures = 0;
    if (this.#pending === null) {
      this.#ports.mirror.clear();
      this.#become({ step: 'kept', at: this.#ports.now() });
    } else {
      this.#become({ step: 'waiting' });
      this.#schedule(PAUSE_MS);
    }
  }

  #failed(draft: Draft, result: Exclude<SendResult, { kind: 'kept' }>): void {
    const newer = this.#pending !== null;
    this.#pending ??= draft;
    if (result.kind === 'refused' && !newer) {
      this.#become({ step: 'refused', reason: result.reason });
      return;
    }
    const pause = Math.min(LONGEST_RETRY_MS, FIRST_RETRY_MS * 2 ** this.#failures);
    this.#failures += 1;
    this.#become(
      result.kind === 'failed' ? { step: 'retrying', offline: result.offline } : { step: 'waiting' },
    );
    this.#schedule(newer ? PAUSE_MS : pause);
  }

  #become(state: KeeperState): void {
    this.#state = state;
    for (const listener of this.#listeners) listener();
  }
}
