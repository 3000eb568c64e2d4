import { z } from 'zod';
import { cutLogCreateSchema } from '#server/contracts/cutting-list.ts';
import { OfflineError, ProblemError } from '#client/api/errors.ts';
import { type CutLogInput } from '#client/api/cutting-list.ts';

/** An entry that the server does not have yet, or would not take. */
export interface OutboxEntry {
  readonly log: CutLogInput;
  /** Why the server refused it; null while it only waits for the network. */
  readonly refusal: string | null;
}

const entriesSchema = z.array(z.object({ log: cutLogCreateSchema, refusal: z.string().nullable() }));

type Store = Pick<Storage, 'getItem' | 'setItem'>;

/**
 * Entries of the cut log on their way to the server, kept in the browser so that a network loss, a closed tab or an empty battery loses
 * none. Each carries its key, so an entry whose answer was lost is sent again and kept once.
 */
export class Outbox {
  private entries: readonly OutboxEntry[];
  private sending: Promise<void> | null = null;
  private readonly listeners = new Set<() => void>();

  constructor(
    private readonly store: Store,
    private readonly key: string,
    private readonly send: (log: CutLogInput) => Promise<unknown>,
  ) {
    this.entries = readEntries(store.getItem(key));
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly snapshot = (): readonly OutboxEntry[] => this.entries;

  /** Keeps an entry and sends it with all that wait. */
  add(log: CutLogInput): Promise<void> {
    this.change([...this.entries, { log, refusal: null }]);
    return this.flush();
  }

  /** Drops an entry that the server refused, once somebody has read why. */
  dismiss(key: string): void {
    this.change(this.entries.filter(({ log }) => log.key !== key));
  }

  /** Sends what waits, in order, one after the other; stops at the first that gets no answer. Never throws. */
  flush(): Promise<void> {
    this.sending ??= this.sendAll().finally(() => {
      this.sending = null;
    });
    return this.sending;
  }

  private async sendAll(): Promise<void> {
    for (;;) {
      const next = this.entries.find(({ refusal }) => refusal === null);
      if (!next) return;
      try {
        await this.send(next.log);
        this.dismiss(next.log.key);
      } catch (error) {
        if (waits(error)) return;
        const refusal = error instanceof Error ? error.message : 'The server did not take it.';
        this.change(this.entries.map((entry) => (entry === next ? { ...entry, refusal } : entry)));
      }
    }
  }

  private change(entries: readonly OutboxEntry[]): void {
    this.entries = entries;
    try {
      this.store.setItem(this.key, JSON.stringify(entries));
    } catch {
      // A full or forbidden store: the entry is still sent, as long as the screen stands open.
    }
    for (const listener of this.listeners) listener();
  }
}

/** No answer, or a server that is not ready: the entry is sent again later. So it is when the session has ended. */
function waits(error: unknown): boolean {
  if (error instanceof OfflineError) return true;
  return error instanceof ProblemError && [401, 429, 502, 503].includes(error.status);
}

function readEntries(text: string | null): readonly OutboxEntry[] {
  if (text === null) return [];
  try {
    return entriesSchema.parse(JSON.parse(text));
  } catch {
    return [];
  }
}
