import { type Preferences } from '#server/contracts/people.ts';
import { type accountRoles } from '#server/contracts/permissions.ts';

export type AccountRole = (typeof accountRoles)[number];

/** Somebody who may sign in, with all that a request needs to know. */
export interface Person {
  readonly id: string;
  readonly workshopId: string;
  readonly workshopName: string;
  readonly name: string;
  readonly email: string;
  readonly role: AccountRole;
  readonly active: boolean;
  readonly sessionEpoch: number;
  readonly passwordHash: string;
  readonly preferences: Preferences;
}

export const defaultPreferences: Preferences = { units: 'mm', theme: 'system' };
