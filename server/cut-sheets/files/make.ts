import { cutFiles } from '#geometry/cutting/files/cut-files.ts';
import { type SheetIdentity } from '#geometry/cutting/files/identity.ts';
import { type Finding, hasErrors } from '#geometry/cutting/findings.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { type SheetFile, type SheetPlan } from '#server/contracts/cut-sheets.ts';
import { MANIFEST_NAME, manifestOf, zipOf } from './archive.ts';

/** How many findings of a plan are errors, and how many warnings. */
export interface Count {
  readonly errors: number;
  readonly warnings: number;
}

/** A version whose files are wanted. */
export interface SheetOrder {
  readonly plan: Plan;
  readonly identity: SheetIdentity;
  readonly paper: SheetPlan['paper'];
}

export interface MadeFile extends Pick<SheetFile, 'name' | 'part' | 'downloadName' | 'mediaType'> {
  readonly bytes: Uint8Array;
}

/** The files of a plan; none while one of its findings is an error, because what they would cut is wrong. */
export interface MadeFiles {
  readonly findings: readonly Finding[];
  readonly files: readonly MadeFile[];
}

const nobody = { sheetName: '', versionNumber: 1, checksum: '0'.repeat(64), part: 'core' };

/** Works a plan out for its findings alone; they do not depend on whose it is. */
export function countFindings(plan: Plan): Count {
  const { findings } = planCore(plan, nobody);
  const count = (severity: Finding['severity']) => findings.filter((one) => one.severity === severity).length;
  return { errors: count('error'), warnings: count('warning') };
}

/** Works a plan out and writes all its files but the archive. The same order gives the same bytes. */
export async function makeFiles({ plan, identity }: SheetOrder): Promise<MadeFiles> {
  const { core, findings } = planCore(plan, { ...identity, part: 'core' });
  if (core === null || hasErrors(findings)) return { findings, files: [] };
  const files = cutFiles(core, identity).map(({ text, facts: _, ...file }) => ({
    ...file,
    bytes: Buffer.from(text, 'utf8'),
  }));
  return { findings, files };
}

/** All files of a version in one, under the names they are saved under, with the sums of their bytes. */
export function makeArchive(files: readonly Pick<MadeFile, 'downloadName' | 'bytes'>[]): Uint8Array {
  const named = files.map(({ downloadName, bytes }) => ({ name: downloadName, bytes }));
  return zipOf([...named, { name: MANIFEST_NAME, bytes: Buffer.from(manifestOf(named), 'utf8') }]);
}
