import { type Me, type Preferences } from '#server/contracts/people.ts';
import { type Person } from './person.ts';

/** What a session says about itself; the rest is read from the database at every request. */
interface SessionClaim {
  readonly personId: string;
  readonly epoch: number;
}

/** Whether a session still holds: the person is active, and neither password nor role changed since it began. */
export function sessionHolds(claim: SessionClaim, person: Person | null): person is Person {
  return (
    person !== null && person.active && person.id === claim.personId && person.sessionEpoch === claim.epoch
  );
}

/** What a person is told about himself. */
export function meOf(person: Person): Me {
  return {
    id: person.id,
    name: person.name,
    email: person.email,
    role: person.role,
    workshop: { id: person.workshopId, name: person.workshopName },
    preferences: person.preferences,
  };
}

/** Preferences with some of them set anew. */
export function withPreferences(
  present: Preferences,
  change: { readonly [Key in keyof Preferences]?: Preferences[Key] | undefined },
): Preferences {
  return { units: change.units ?? present.units, theme: change.theme ?? present.theme };
}
