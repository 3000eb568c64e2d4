import { type Finding } from '#geometry/cutting/findings.ts';
import { may, type Role } from '#server/contracts/permissions.ts';
import { type SheetPart, type SheetSource } from '#server/contracts/cut-sheets.ts';
import { Refusal, refuseField } from '#server/refusal.ts';
import { archived, checkBase, type Reach } from '#server/sections/rules.ts';
import { isSameDocument, type SheetDocument } from './document.ts';

/** How far a role sees cut sheets. */
export function sheetReachOf(role: Role): Reach {
  return may(role, 'cut-sheets.read') ? 'all' : 'released';
}

/** Where a save would go, as it is known under the lock. */
interface SaveTarget {
  readonly latestNumber: number;
  readonly archived: boolean;
  /** The version that the save is based on; null when there is none of that number. */
  readonly base: SheetDocument | null;
}

/**
 * Whether a version may be saved now.
 * @returns `conflict` when another version came in between
 * @throws Refusal `archived`, or `invalid` for a base that does not exist or a plan that changes nothing and says nothing
 */
export function checkSheetSave(
  target: SaveTarget,
  offered: { readonly basedOn: number; readonly document: SheetDocument; readonly note: string },
): 'save' | 'conflict' {
  if (target.archived) throw archived('cut sheet');
  checkBase(offered.basedOn, target.latestNumber);
  if (offered.basedOn < target.latestNumber) return 'conflict';
  const isSame = target.base !== null && isSameDocument(offered.document, target.base);
  if (isSame && offered.note === '') {
    throw refuseField(
      'plan',
      `Nothing changed since version ${offered.basedOn}; a note would be a reason to save it.`,
    );
  }
  return 'save';
}

const standing = {
  draft: 'was never released',
  superseded: 'was superseded',
  withdrawn: 'was withdrawn',
} as const;

/**
 * Whether all that a version is made from is in force.
 * @throws Refusal `status-conflict` naming the section versions that are not
 */
export function checkSources(...sources: readonly SheetSource[]): void {
  const sentences = new Set<string>();
  for (const { status, sectionName, versionNumber, inForce } of sources) {
    if (status === 'released') continue;
    const instead = inForce === null ? 'none of it is released now' : `version ${inForce} is in force`;
    sentences.add(`Version ${versionNumber} of “${sectionName}” ${standing[status]}; ${instead}.`);
  }
  if (sentences.size === 0) return;
  throw new Refusal('status-conflict', {
    detail: `${[...sentences].join(' ')} Plan with released sections, save that and release it.`,
  });
}

/** The field of a plan as people make it that stands for a field of the pinned one. */
function fieldOf(path: string): string {
  if (path === '') return 'plan';
  if (/^(machine|material)(\.|$)/.test(path)) return `plan.${path.replace(/\..*/, '')}Id`;
  return `plan.${path.replace(/^(panel\.(?:root|tip))\.shape.*/, '$1.sectionId')}`;
}

/**
 * Whether a plan can be cut.
 * @throws Refusal `invalid` with every finding that is an error, each at its field of the plan, or because there is nothing to cut
 */
export function checkFindings(findings: readonly Finding[], parts: readonly SheetPart[]): void {
  const errors = findings
    .filter(({ severity }) => severity === 'error')
    .map(({ path, message }) => ({ path: fieldOf(path), message }));
  if (errors.length > 0) throw new Refusal('invalid', { errors });
  if (parts.length === 0) {
    throw refuseField('plan.block', 'The plan makes nothing: it has no block, no ribs and no templates.');
  }
}
