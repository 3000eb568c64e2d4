import { may, type Role } from '#server/contracts/permissions.ts';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { Refusal } from '#server/refusal.ts';

/**
 * Whether somebody may take the files of a version. Who sees drafts may take any, and the file says what it is; who cuts
 * gets the version in force and no other.
 *
 * @param inForce number of the released version; null when none is
 * @throws Refusal `status-conflict` that names the version in force
 */
export function checkDownload(
  role: Role,
  version: { readonly number: number; readonly status: VersionStatus; readonly statusReason: string },
  inForce: number | null,
  what: 'section' | 'cut sheet' = 'section',
): void {
  const seesDrafts = may(role, what === 'section' ? 'sections.read' : 'cut-sheets.read');
  if (seesDrafts || version.status === 'released') return;
  const reason =
    version.status === 'withdrawn' && version.statusReason !== '' ? ` (${version.statusReason})` : '';
  const advice =
    inForce === null
      ? `No version of this ${what} is released now.`
      : `Version ${inForce} is in force: take that one.`;
  throw new Refusal('status-conflict', {
    detail: `Version ${version.number} is ${version.status}${reason} and must not be cut. ${advice}`,
    members: { releasedNumber: inForce },
  });
}
