import { cutFiles } from '#geometry/cutting/files/cut-files.ts';
import { downloadNameOf } from '#geometry/cutting/files/names.ts';
import { type SheetIdentity } from '#geometry/cutting/files/identity.ts';
import { type Finding, hasErrors } from '#geometry/cutting/findings.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { type CorePlan, planCore } from '#geometry/cutting/planner.ts';
import { type SheetFile, type SheetPlan } from '#server/contracts/cut-sheets.ts';
import { cutSheetPages } from '#geometry/pages/cut-sheet/cut-sheet-pages.ts';
import { type Page } from '#geometry/pages/page.ts';
import { templatePages } from '#geometry/pages/templates/template-pages.ts';
import { MANIFEST_NAME, manifestOf, zipOf } from './archive.ts';
import { pagesToPdf } from './pdf.ts';
import { qrModules } from './qr.ts';

/** How many findings of a plan are errors, and how many warnings. */
export interface Count {
  readonly errors: number;
  readonly warnings: number;
}

/** A version whose files are wanted. */
export interface SheetOrder {
  readonly plan: Plan;
  readonly identity: SheetIdentity;
  /** What the templates are printed on. */
  readonly paper: SheetPlan['paper'];
  /** The workshop's name, as the legal owner of the drawing. */
  readonly owner: string;
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
export async function makeFiles(order: SheetOrder): Promise<MadeFiles> {
  const { plan, identity } = order;
  // The only line of a program that can say it.
  const part = identity.status === 'draft' ? 'core, DRAFT' : 'core';
  const { core, findings } = planCore(plan, { ...identity, part });
  if (core === null || hasErrors(findings)) return { findings, files: [] };
  const files = cutFiles(core, identity).map(({ text, facts: _, ...file }) => ({
    ...file,
    bytes: Buffer.from(text, 'utf8'),
  }));
  return { findings, files: [...files, ...(await printedFiles(core, findings, order))] };
}

async function printedFiles(
  core: CorePlan,
  findings: readonly Finding[],
  { identity, paper, owner }: SheetOrder,
): Promise<MadeFile[]> {
  const details = { qr: qrModules(identity.address), owner };
  const printed = async (
    part: MadeFile['part'],
    name: string,
    pages: readonly Page[],
  ): Promise<MadeFile> => ({
    name,
    part,
    downloadName: downloadNameOf(identity, core.plan.panel, name),
    mediaType: 'application/pdf',
    bytes: await pagesToPdf(pages, `${identity.sheetName} v${identity.versionNumber}, ${part}`, identity),
  });
  const templates = templatePages(core, identity, paper, details);
  const sheet = cutSheetPages(core, findings, identity, details);
  return [
    ...(templates.length > 0 ? [await printed('templates', 'templates.pdf', templates)] : []),
    await printed('sheet', 'cut-sheet.pdf', sheet),
  ];
}

/** All files of a version in one, under the names they are saved under, with the sums of their bytes. */
export function makeArchive(files: readonly Pick<MadeFile, 'downloadName' | 'bytes'>[]): Uint8Array {
  const named = files.map(({ downloadName, bytes }) => ({ name: downloadName, bytes }));
  return zipOf([...named, { name: MANIFEST_NAME, bytes: Buffer.from(manifestOf(named), 'utf8') }]);
}
