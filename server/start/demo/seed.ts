import { type Knex } from 'knex';
import { hashPassword } from '#server/account/passwords.ts';
import { createPerson, createWorkshop } from '#server/account/store.ts';
import { type Author } from '#server/sections/rules.ts';
import { createCondition } from '#server/flight-conditions/store.ts';
import { fillShop } from '#server/shop/defaults.ts';
import { listItems, machines, materials } from '#server/shop/store.ts';
import { demoConditions } from './flight-conditions.ts';
import { demoFloor } from './floor.ts';
import { floorStep } from './floor-events.ts';
import { type Moment, type Signed } from './histories.ts';
import { demoEmail, demoPeople, demoWorkshop } from './people.ts';
import { sectionLife } from './section-events.ts';
import { demoSections } from './sections.ts';
import { sheetLife } from './sheet-events.ts';
import { type Ids } from './sheet-histories.ts';
import { demoSheets } from './sheets.ts';
import { demoShop } from './shop.ts';

const DAY_MS = 86_400_000;
/** The workshop began a little before its first section. */
const OPENING: Moment = { daysAgo: 45, time: '08:00' };

/** Whether nobody has an account yet; only then may the demo workshop be filled in. */
export async function isEmpty(knex: Knex): Promise<boolean> {
  return (await knex('workshops').first('id')) === undefined;
}

/**
 * Fills in the demo workshop: four people with one password, machines and materials, flight conditions, sections and cut sheets with some weeks of history before `now`,
 * and what was cut and measured of them.
 * All or nothing. The same `now` gives the same workshop but for its ids, the sums that name them, and the salt of the passwords.
 * @param publicUrl the address under which people reach the program, for the code on printed sheets
 * @throws ER_DUP_ENTRY when the accounts are there already
 */
export async function seedDemo(
  knex: Knex,
  password: string,
  now: Date = new Date(),
  publicUrl = 'http://localhost:8000',
): Promise<void> {
  const passwordHash = await hashPassword(password);
  await knex.transaction(async (transaction) => {
    const opened = timeOf(OPENING, now);
    const workshopId = await createWorkshop(transaction, { name: demoWorkshop, at: opened });
    const people = new Map<string, { id: string; name: string }>();
    for (const { role, name } of demoPeople) {
      const person = { name, role, email: demoEmail(role), passwordHash, at: opened };
      people.set(role, { name, id: await createPerson(transaction, workshopId, person) });
    }
    const personOf = (role: string) => people.get(role) ?? { id: '', name: '' };
    await fillShop(transaction, { workshopId, personId: personOf('builder').id, at: opened }, demoShop);
    for (const condition of demoConditions) {
      const designer = { workshopId, personId: personOf('designer').id, at: opened };
      await createCondition(transaction, designer, condition);
    }
    const author = ({ by, at }: Signed): Author => ({
      workshopId,
      personId: personOf(by).id,
      at: timeOf(at, now),
    });
    const names = ({ by }: Signed) => ({ person: personOf(by).name, workshop: demoWorkshop, publicUrl });
    for (const event of await eventsOf(transaction, workshopId, author, names)) await event();
  });
}

type Event = () => Promise<void>;

/** All that happened in the workshop, at the desks and on the floor, in the order of time. */
async function eventsOf(
  db: Knex,
  workshopId: string,
  author: (step: Signed) => Author,
  names: (step: Signed) => { person: string; workshop: string; publicUrl: string },
): Promise<Event[]> {
  const sections = new Map<string, string>();
  const ids = await idsOf(db, workshopId, sections);
  const events: { readonly at: Date; readonly happens: Event }[] = [];
  for (const history of demoSections) {
    const live = sectionLife(db, history, (id) => sections.set(history.name, id));
    for (const step of history.steps)
      events.push({ at: author(step).at, happens: () => live(step, author(step)) });
  }
  for (const history of demoSheets) {
    const live = sheetLife(db, history, ids);
    for (const step of history.steps)
      events.push({ at: author(step).at, happens: () => live(step, author(step), names(step)) });
  }
  for (const step of demoFloor) {
    events.push({ at: author(step).at, happens: () => floorStep(db, ids, step, author(step)) });
  }
  return events.sort((a, b) => a.at.getTime() - b.at.getTime()).map(({ happens }) => happens);
}

async function idsOf(db: Knex, workshopId: string, sections: ReadonlyMap<string, string>): Promise<Ids> {
  const byName = (items: readonly { readonly name: string; readonly id: string }[]) =>
    new Map(items.map(({ name, id }) => [name, id]));
  const machineIds = byName((await listItems(db, workshopId, machines)).items);
  const materialIds = byName((await listItems(db, workshopId, materials)).items);
  const lookIn = (ids: ReadonlyMap<string, string>) => (name: string) => ids.get(name) ?? '';
  return { section: lookIn(sections), machine: lookIn(machineIds), material: lookIn(materialIds) };
}

function timeOf({ daysAgo, time }: Moment, now: Date): Date {
  const [hours = 0, minutes = 0] = time.split(':').map(Number);
  const midnight = Math.floor(now.getTime() / DAY_MS) * DAY_MS;
  return new Date(midnight - daysAgo * DAY_MS + (hours * 60 + minutes) * 60_000);
}
