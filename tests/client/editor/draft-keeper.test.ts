import { describe, expect, it } from 'vitest';
import { type DraftInput } from '#client/api/sections.ts';
import { DraftKeeper, PAUSE_MS, type SendResult } from '#client/sections/editor/draft-keeper.ts';
import { ago, draftWords } from '#client/sections/editor/draft-words.ts';
import { naca2412 } from './editor-driver.ts';

const draft = (maxThickness: number): DraftInput => ({
  basedOn: 3,
  chordMm: 220,
  shape: { ...naca2412, maxThickness },
});

/** A keeper with a clock and a server of the test's own. */
function stand() {
  let now = 0;
  let timers: { due: number; action: () => void }[] = [];
  const sent: DraftInput[] = [];
  const last: DraftInput[] = [];
  const answers: ((result: SendResult) => void)[] = [];
  let mirrored: DraftInput | null = null;
  const keeper = new DraftKeeper({
    send: (one) => {
      sent.push(one);
      return new Promise((resolve) => answers.push(resolve));
    },
    sendLast: (one) => last.push(one),
    mirror: {
      write: (one) => {
        mirrored = one;
      },
      clear: () => {
        mirrored = null;
      },
    },
    now: () => now,
    after: (ms, action) => {
      const timer = { due: now + ms, action };
      timers.push(timer);
      return () => {
        timers = timers.filter((other) => other !== timer);
      };
    },
  });
  return {
    keeper,
    sent,
    last,
    mirror: () => mirrored,
    pass: (ms: number) => {
      now += ms;
      const due = timers.filter((timer) => timer.due <= now);
      timers = timers.filter((timer) => timer.due > now);
      for (const { action } of due) action();
    },
    answer: async (result: SendResult) => {
      answers.shift()?.(result);
      await Promise.resolve();
      await Promise.resolve();
    },
  };
}

describe('DraftKeeper', () => {
  it('mirrors at once, sends a moment after the last change, and clears the mirror when the server has it', async () => {
    const { keeper, sent, mirror, pass, answer } = stand();
    keeper.change(draft(0.12));
    expect(mirror()).toEqual(draft(0.12));
    pass(PAUSE_MS - 1);
    keeper.change(draft(0.13));
    pass(PAUSE_MS - 1);
    expect(sent).toEqual([]);
    pass(1);
    expect(sent).toEqual([draft(0.13)]);
    expect(mirror()).toEqual(draft(0.13));
    await answer({ kind: 'kept' });
    expect(mirror()).toBeNull();
    expect(keeper.state()).toEqual({ step: 'kept', at: 2 * PAUSE_MS - 1 });
  });

  it('sends what came while it was sending, and keeps the mirror until then', async () => {
    const { keeper, sent, mirror, pass, answer } = stand();
    keeper.change(draft(0.12));
    pass(PAUSE_MS);
    keeper.change(draft(0.14));
    pass(PAUSE_MS);
    expect(sent).toHaveLength(1);
    await answer({ kind: 'kept' });
    expect(mirror()).toEqual(draft(0.14));
    pass(PAUSE_MS);
    expect(sent[1]).toEqual(draft(0.14));
    await answer({ kind: 'kept' });
    expect(mirror()).toBeNull();
  });

  it('tries again with growing pauses, at once when the network is back', async () => {
    const { keeper, sent, mirror, pass, answer } = stand();
    keeper.change(draft(0.12));
    pass(PAUSE_MS);
    await answer({ kind: 'failed', offline: true });
    expect(keeper.state()).toEqual({ step: 'retrying', offline: true });
    pass(1999);
    expect(sent).toHaveLength(1);
    pass(1);
    expect(sent).toHaveLength(2);
    await answer({ kind: 'failed', offline: true });
    pass(3999);
    expect(sent).toHaveLength(2);
    keeper.flush();
    expect(sent).toHaveLength(3);
    await answer({ kind: 'kept' });
    expect(mirror()).toBeNull();
  });

  it('does not repeat what the server refuses, and tries the next change', async () => {
    const { keeper, sent, mirror, pass, answer } = stand();
    keeper.change(draft(0.12));
    pass(PAUSE_MS);
    await answer({ kind: 'refused', reason: 'The section is archived.' });
    pass(60_000);
    expect(sent).toHaveLength(1);
    expect(mirror()).toEqual(draft(0.12));
    keeper.change(draft(0.13));
    pass(PAUSE_MS);
    expect(sent).toHaveLength(2);
  });

  it('hands over what is not known to be kept when the page goes away', async () => {
    const { keeper, last, mirror, pass, answer } = stand();
    keeper.leave();
    expect(last).toEqual([]);
    keeper.change(draft(0.12));
    keeper.leave();
    expect(last).toEqual([draft(0.12)]);
    pass(PAUSE_MS);
    keeper.leave();
    expect(last).toEqual([draft(0.12), draft(0.12)]);
    expect(mirror()).toEqual(draft(0.12));
    await answer({ kind: 'kept' });
    keeper.leave();
    expect(last).toHaveLength(2);
  });

  it('forgets everything once the work is saved, also an answer that comes late', async () => {
    const { keeper, sent, mirror, pass, answer } = stand();
    keeper.change(draft(0.12));
    pass(PAUSE_MS);
    keeper.change(draft(0.13));
    keeper.settle();
    await answer({ kind: 'failed', offline: false });
    pass(60_000);
    expect(sent).toHaveLength(1);
    expect(mirror()).toBeNull();
    expect(keeper.state()).toEqual({ step: 'idle' });
  });
});

describe('the words for a draft', () => {
  it('say since when it is kept, or why it is not', () => {
    expect(draftWords(true, 3, { step: 'kept', at: 1000 }, 3000)).toBe('draft on version 3, kept 2 s ago');
    expect(draftWords(true, 3, { step: 'sending' }, 0)).toBe('draft on version 3, keeping…');
    expect(draftWords(true, 3, { step: 'retrying', offline: true }, 0)).toBe(
      'draft on version 3, not kept: offline, trying again',
    );
    expect(draftWords(false, 3, { step: 'kept', at: 0 }, 0)).toBe('version 3, no unsaved changes');
    expect([ago(-5), ago(59_400), ago(90_000), ago(7_200_000)]).toEqual(['0 s', '59 s', '2 min', '2 h']);
  });
});
