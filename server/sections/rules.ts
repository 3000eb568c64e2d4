import { canonicalShape, type Shape } from '#geometry/shapes/shape.ts';
import { may, type Role } from '#server/contracts/permissions.ts';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { Refusal, refuseField } from '#server/refusal.ts';

/** Who acts, in which workshop, and when: what every change is signed with. */
export interface Author {
  readonly workshopId: string;
  readonly personId: string;
  readonly at: Date;
}

/** How far somebody sees: every section and version, or only what is or was released. */
export type Reach = 'all' | 'released';

/** How far a role sees. */
export function reachOf(role: Role): Reach {
  return may(role, 'sections.read') ? 'all' : 'released';
}

/** The statuses within reach. */
export function statusesFor(reach: Reach): readonly VersionStatus[] {
  return reach === 'all'
    ? ['draft', 'released', 'superseded', 'withdrawn']
    : ['released', 'superseded', 'withdrawn'];
}

/** Where a save would go, as it is known under the lock. */
interface SaveTarget {
  readonly latestNumber: number;
  readonly archived: boolean;
  /** The shape of the version that the save is based on; null when there is none of that number. */
  readonly base: Shape | null;
}

/**
 * Whether a version may be saved now.
 * @returns `conflict` when another version came in between
 * @throws Refusal `archived`, or `invalid` for a base that does not exist or a shape that changes nothing and says nothing
 */
export function checkSave(
  target: SaveTarget,
  offered: { basedOn: number; shape: Shape; note: string },
): 'save' | 'conflict' {
  if (target.archived) throw archived();
  checkBase(offered.basedOn, target.latestNumber);
  if (offered.basedOn < target.latestNumber) return 'conflict';
  const isSame = target.base !== null && isSavedWork(offered.shape, target.base);
  if (isSame && offered.note === '') {
    throw refuseField(
      'shape',
      `Nothing changed since version ${offered.basedOn}; a note would be a reason to save it.`,
    );
  }
  return 'save';
}

/**
 * Whether work can stand on a version of this number.
 * @throws Refusal `invalid` naming `basedOn` when there is no such version
 */
export function checkBase(basedOn: number, latestNumber: number): void {
  if (basedOn <= latestNumber) return;
  throw refuseField('basedOn', `There is no version ${basedOn}; the newest is ${latestNumber}.`);
}

/** What is said to a change of something that is put away. */
export function archived(what: 'section' | 'cut sheet' = 'section'): Refusal {
  return new Refusal('archived', { detail: `Take the ${what} back from the archive first.` });
}

const sentences: Readonly<Record<VersionStatus, string>> = {
  draft: 'was never released',
  released: 'is released already',
  superseded: 'was superseded by a later release',
  withdrawn: 'was withdrawn',
};

/**
 * Whether a version may take a new status: from draft to released, from released to superseded or withdrawn.
 * @param holds what a version of that kind holds
 * @throws Refusal `status-conflict` with a sentence that says how the version stands
 */
export function checkTransition(
  number: number,
  from: VersionStatus,
  to: 'released' | 'withdrawn',
  holds: 'shape' | 'plan' = 'shape',
): void {
  const needed = to === 'released' ? 'draft' : 'released';
  if (from === needed) return;
  const advice =
    to === 'released' && from !== 'released' ? ` Save its ${holds} as a new version and release that.` : '';
  throw new Refusal('status-conflict', { detail: `Version ${number} ${sentences[from]}.${advice}` });
}

/** Whether unsaved work holds nothing beyond what was just saved. */
export function isSavedWork(draft: Shape, saved: Shape): boolean {
  return canonicalShape(draft) === canonicalShape(saved);
}
