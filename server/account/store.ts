import { type Knex } from 'knex';
import { v7 as uuid } from 'uuid';
import { preferencesSchema, type Preferences } from '#server/contracts/people.ts';
import { scoped } from '#server/database/scoped.ts';
import { type AccountRole, defaultPreferences, type Person } from './person.ts';

/** An e-mail address as it is kept and compared. */
export function canonicalEmail(email: string): string {
  return email.trim().toLowerCase();
}

interface PersonRow {
  id: string;
  workshop_id: string;
  workshop_name: string;
  name: string;
  email: string;
  role: AccountRole;
  active: 0 | 1;
  session_epoch: number;
  password_hash: string;
  preferences: unknown;
}

function personOf(row: PersonRow): Person {
  const preferences = preferencesSchema.safeParse(row.preferences);
  return {
    id: row.id,
    workshopId: row.workshop_id,
    workshopName: row.workshop_name,
    name: row.name,
    email: row.email,
    role: row.role,
    active: row.active === 1,
    sessionEpoch: row.session_epoch,
    passwordHash: row.password_hash,
    preferences: preferences.success ? preferences.data : defaultPreferences,
  };
}

/**
 * The one read that no workshop scopes: who signs in, or whose session this is, says which workshop the rest is about.
 */
async function findPerson(db: Knex, by: 'id' | 'email', value: string): Promise<Person | null> {
  const row: PersonRow | undefined = await db('people as p')
    .join('workshops as w', 'w.id', 'p.workshop_id')
    .where(`p.${by}`, value)
    .first('p.*', 'w.name as workshop_name');
  return row ? personOf(row) : null;
}

export async function personById(db: Knex, id: string): Promise<Person | null> {
  return findPerson(db, 'id', id);
}

export async function personByEmail(db: Knex, email: string): Promise<Person | null> {
  return findPerson(db, 'email', canonicalEmail(email));
}

/** Makes a workshop and returns its id. */
export async function createWorkshop(db: Knex, input: { name: string; at: Date }): Promise<string> {
  const id = uuid();
  await db('workshops').insert({ id, name: input.name, created_at: input.at });
  return id;
}

/** The id of the workshop of this name, the oldest if several bear it; null when there is none. */
export async function workshopByName(db: Knex, name: string): Promise<string | null> {
  const row: { id: string } | undefined = await db('workshops').where({ name }).orderBy('id').first('id');
  return row?.id ?? null;
}

/**
 * Makes a person of a workshop and returns the id.
 * @throws ER_DUP_ENTRY when the address has an account already, in whatever workshop
 */
export async function createPerson(
  db: Knex,
  workshopId: string,
  input: { name: string; email: string; role: AccountRole; passwordHash: string; at: Date },
): Promise<string> {
  const id = uuid();
  await scoped(db, workshopId).insert('people', {
    id,
    email: canonicalEmail(input.email),
    name: input.name,
    role: input.role,
    password_hash: input.passwordHash,
    preferences: JSON.stringify(defaultPreferences),
    created_at: input.at,
  });
  return id;
}

export async function keepPreferences(db: Knex, person: Person, preferences: Preferences): Promise<void> {
  await scoped(db, person.workshopId)
    .table('people')
    .where({ id: person.id })
    .update({ preferences: JSON.stringify(preferences) });
}

/** Sets a new password; the database ends every session of the person with it. */
export async function keepPassword(db: Knex, person: Person, passwordHash: string): Promise<void> {
  await scoped(db, person.workshopId)
    .table('people')
    .where({ id: person.id })
    .update({ password_hash: passwordHash });
}
