import { describe, expect, it } from 'vitest';
import { type InspectionRow } from '#geometry/cutting/inspection.ts';
import {
  checkAnswerable,
  checkPhotoRoom,
  compareReadings,
  isWithin,
  MOST_PHOTOS,
} from '#server/inspections/rules.ts';
import { Refusal } from '#server/refusal.ts';

const row = (end: 'root' | 'tip', station: number, nominalMm: number): InspectionRow => ({
  end,
  station,
  nominalMm,
  toleranceMm: 0.3,
});
const rows = [row('root', 0.15, 24.2), row('root', 0.3, 26.4), row('tip', 0.3, 19.1)];

function refused(act: () => unknown): Refusal {
  try {
    act();
  } catch (error) {
    if (error instanceof Refusal) return error;
    throw error;
  }
  throw new Error('not refused');
}

describe('readings', () => {
  it('are set beside nominal and tolerance of their station, in their own order', () => {
    const found = compareReadings(rows, [
      { end: 'tip', station: 0.3, measuredMm: 19.45 },
      { end: 'root', station: 0.3, measuredMm: 26.1 },
    ]);
    expect(found).toEqual([
      { ...rows[2], measuredMm: 19.45, deviationMm: 0.35, within: false },
      { ...rows[1], measuredMm: 26.1, deviationMm: -0.3, within: true },
    ]);
    expect([isWithin(found), isWithin(found.slice(1))]).toEqual([false, true]);
  });

  it('are refused, each by itself, where the plan has nothing to measure or a station stands twice', () => {
    const { code, details } = refused(() =>
      compareReadings(rows, [
        { end: 'root', station: 0.15, measuredMm: 24 },
        { end: 'tip', station: 0.15, measuredMm: 20 },
        { end: 'root', station: 0.15, measuredMm: 24 },
        { end: 'root', station: 0.151, measuredMm: 24 },
      ]),
    );
    expect(code).toBe('invalid');
    expect(details.errors).toEqual([
      {
        path: 'measurements.1.station',
        message: 'The plan has nothing to measure at 15 % of the tip chord.',
      },
      { path: 'measurements.2.station', message: 'The reading at 15 % of the root chord stands twice.' },
      {
        path: 'measurements.3.station',
        message: 'The plan has nothing to measure at 15.1 % of the root chord.',
      },
    ]);
  });
});

describe('an inspection', () => {
  const answer = {
    decision: 'rejected' as const,
    note: 'Cut it again.',
    by: { id: '0190a5b0-1111-7222-8333-444455556666', name: 'Ines' },
    at: '2026-03-02T10:00:00.000Z',
  };

  it('is answered once, and only when it is out of tolerance', () => {
    expect(() => checkAnswerable({ within: false, answer: null })).not.toThrow();
    const within = refused(() => checkAnswerable({ within: true, answer: null }));
    expect([within.code, within.details.detail]).toEqual([
      'status-conflict',
      'This part is within tolerance: there is nothing to decide.',
    ]);
    const again = refused(() => checkAnswerable({ within: false, answer }));
    expect(again.details.detail).toBe('Ines rejected this part already.');
  });

  it('holds so many photographs and no more', () => {
    expect(() => checkPhotoRoom(MOST_PHOTOS - 1)).not.toThrow();
    expect(refused(() => checkPhotoRoom(MOST_PHOTOS)).details.errors?.[0]?.path).toBe('file');
  });
});
