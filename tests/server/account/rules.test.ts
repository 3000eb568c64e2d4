import { describe, expect, it } from 'vitest';
import { type Person } from '#server/account/person.ts';
import { meOf, sessionHolds, withPreferences } from '#server/account/rules.ts';
import { meSchema } from '#server/contracts/people.ts';

const person: Person = {
  id: '0190a5b0-1111-7222-8333-444455556666',
  workshopId: '0190a5b0-1111-7222-8333-444455557777',
  workshopName: 'Marsh',
  name: 'Ada',
  email: 'ada@marsh.example',
  role: 'builder',
  active: true,
  sessionEpoch: 3,
  passwordHash: 'secret',
  preferences: { units: 'mm', theme: 'night' },
};

describe('sessionHolds', () => {
  const claim = { personId: person.id, epoch: 3 };
  it('holds for the same person in the same epoch', () => {
    expect(sessionHolds(claim, person)).toBe(true);
  });
  it.each([
    ['nobody', claim, null],
    ['a person put out of action', claim, { ...person, active: false }],
    ['an older epoch', { ...claim, epoch: 2 }, person],
    ['a newer epoch', { ...claim, epoch: 4 }, person],
    ['another person', { ...claim, personId: person.workshopId }, person],
  ])('does not hold for %s', (_name, given, found) => {
    expect(sessionHolds(given, found)).toBe(false);
  });
});

describe('meOf', () => {
  it('says what the contract says and nothing of the password', () => {
    const me = meOf(person);
    expect(meSchema.strict().parse(me)).toEqual(me);
    expect(JSON.stringify(me)).not.toContain('secret');
  });
});

describe('withPreferences', () => {
  it('keeps what is not set anew', () => {
    expect(withPreferences({ units: 'mm', theme: 'night' }, { units: 'inch' })).toEqual({
      units: 'inch',
      theme: 'night',
    });
    expect(withPreferences({ units: 'mm', theme: 'night' }, {})).toEqual({ units: 'mm', theme: 'night' });
  });
});
