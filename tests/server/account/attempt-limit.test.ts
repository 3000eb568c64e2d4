import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { AttemptLimit, signInLimit } from '#server/account/attempt-limit.ts';

const options = { free: 3, firstWaitMs: 100, longestWaitMs: 450, forgetAfterMs: 10_000, most: 2 };

function limitAt() {
  const clock = { now: 1_000_000 };
  return { clock, limit: new AttemptLimit(options, () => clock.now) };
}

describe('AttemptLimit', () => {
  it('lets the free attempts through and then makes each further one wait twice as long, up to the longest', () => {
    const { clock, limit } = limitAt();
    expect([1, 2, 3].map(() => limit.begin('a'))).toEqual([0, 0, 0]);
    for (const wait of [100, 200, 400, 450, 450]) {
      expect(limit.begin('a')).toBe(wait);
      clock.now += wait - 1;
      expect(limit.begin('a')).toBe(1);
      clock.now += 1;
      expect(limit.begin('a')).toBe(0);
    }
  });

  it('does not let one subject slow down another', () => {
    const { limit } = limitAt();
    for (let i = 0; i < 5; i += 1) limit.begin('a');
    expect(limit.begin('a')).toBeGreaterThan(0);
    expect(limit.begin('b')).toBe(0);
  });

  it('forgets failures at a success, and after a time without attempts', () => {
    const { clock, limit } = limitAt();
    for (let i = 0; i < 3; i += 1) limit.begin('a');
    limit.succeed('a');
    expect([1, 2, 3].map(() => limit.begin('a'))).toEqual([0, 0, 0]);
    expect(limit.begin('a')).toBe(100);
    clock.now += options.forgetAfterMs;
    expect([1, 2, 3].map(() => limit.begin('a'))).toEqual([0, 0, 0]);
    expect(limit.begin('a')).toBe(100);
  });

  it('holds a bounded number of subjects and drops the one longest without an attempt', () => {
    const { limit } = limitAt();
    for (let i = 0; i < 3; i += 1) limit.begin('a');
    limit.begin('b');
    limit.begin('c');
    expect(limit.begin('a')).toBe(0);
  });

  it('never lets more through in any hour than the waits allow, however the attempts are timed', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 600 }), { maxLength: 60 }), (pauses) => {
        const { clock, limit } = limitAt();
        const passed: number[] = [];
        for (const pause of pauses) {
          clock.now += pause;
          if (limit.begin('a') === 0) passed.push(clock.now);
        }
        passed.forEach((at, index) => {
          if (index < options.free) return;
          const wait = Math.min(options.longestWaitMs, options.firstWaitMs * 2 ** (index - options.free));
          expect(at - (passed[index - 1] ?? 0)).toBeGreaterThanOrEqual(wait);
        });
      }),
    );
  });

  it('allows fewer than 30 guesses in the first hour as it is set', () => {
    const clock = { now: 0 };
    const limit = new AttemptLimit(signInLimit, () => clock.now);
    let guesses = 0;
    for (; clock.now < 3_600_000; clock.now += 500) if (limit.begin('a') === 0) guesses += 1;
    expect(guesses).toBeLessThan(30);
    expect(guesses).toBeGreaterThan(5);
  });
});
