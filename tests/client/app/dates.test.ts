import { describe, expect, it } from 'vitest';
import { shortDate } from '#client/app/dates.ts';

const now = new Date(2026, 11, 1, 15, 0);
const at = (...parts: [number, number, number, number, number]) => new Date(...parts).toISOString();
const format = (options: Intl.DateTimeFormatOptions, date: Date) =>
  new Intl.DateTimeFormat(undefined, options).format(date);

describe('shortDate', () => {
  it('is the time on the same day', () => {
    const date = new Date(2026, 11, 1, 9, 5);
    expect(shortDate(date.toISOString(), now)).toBe(format({ hour: '2-digit', minute: '2-digit' }, date));
  });

  it('has no year within this year and has it before', () => {
    expect(shortDate(at(2026, 10, 28, 23, 59), now)).not.toContain('2026');
    expect(shortDate(at(2025, 11, 1, 15, 0), now)).toContain('2025');
  });
});
