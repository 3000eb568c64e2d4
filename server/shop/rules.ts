import { cuts, type KerfInput, type MachineKind, type MaterialKind } from '#server/contracts/shop.ts';
import { Refusal, refuseField } from '#server/refusal.ts';

const DAY_MS = 86_400_000;
/** More than any shop has; it keeps each list one page long. */
export const MOST_ITEMS = 200;

/** @throws Refusal naming `name` when the workshop keeps as many as it may */
export function checkRoom(count: number): void {
  if (count >= MOST_ITEMS) {
    throw refuseField('name', `A workshop keeps at most ${MOST_ITEMS} of these, the archive included.`);
  }
}

/**
 * Whether a change was made on what stands there now.
 * @throws Refusal `revision-conflict` that carries what stands there now
 */
export function checkRevision(expected: number | null, current: { readonly revision: number } | null): void {
  if (expected === (current?.revision ?? null)) return;
  throw new Refusal('revision-conflict', {
    detail: 'Nothing was overwritten. Look at what stands there now, then decide.',
    members: { current },
  });
}

/** @throws Refusal naming `settings.kind`: kerfs and plans rest on what a thing is */
export function checkSameKind(before: string, after: string): void {
  if (before !== after) {
    throw refuseField('settings.kind', 'The kind stays as it is. Make a new entry for another kind.');
  }
}

/** @throws Refusal naming `name`, which another one of the workshop bears already, perhaps in the archive */
export function nameTaken(name: string): Refusal {
  return refuseField('name', `“${name}” is there already; it may stand in the archive.`);
}

/** @throws Refusal `archived` naming what is put away: nobody cuts with it or from it */
export function checkInUse(
  ...things: readonly { readonly name: string; readonly archived: boolean }[]
): void {
  const away = things.find(({ archived }) => archived);
  if (away) {
    throw new Refusal('archived', { detail: `“${away.name}” is in the archive; take it back first.` });
  }
}

export interface KerfPair {
  readonly machineKind: MachineKind;
  readonly materialKind: MaterialKind;
}

/**
 * Whether a kerf can be of this pair, at this speed, measured on this day.
 * @throws Refusal `invalid` with the field at fault
 */
export function checkKerf({ machineKind, materialKind }: KerfPair, input: KerfInput, now: Date): void {
  if (!cuts(machineKind, materialKind)) {
    throw refuseField('materialId', 'Hot wire cuts foam, laser and router cut sheet.');
  }
  if (machineKind === 'bow' && input.speedMmMin !== null) {
    throw refuseField('speedMmMin', 'A hand bow has no speed that is set.');
  }
  if (machineKind !== 'bow' && input.speedMmMin === null) {
    throw refuseField('speedMmMin', 'Give the speed that the kerf was measured at.');
  }
  // East of Greenwich the day begins earlier: up to the next day in UTC it may be today somewhere.
  const latest = new Date(now.getTime() + DAY_MS).toISOString().slice(0, 10);
  if (input.measuredOn !== null && input.measuredOn > latest) {
    throw refuseField('measuredOn', 'This day has not come yet.');
  }
}
