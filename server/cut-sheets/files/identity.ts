import { type EndIdentity, type SheetIdentity } from '#geometry/cutting/files/identity.ts';
import { type SheetSource, type SheetVersion } from '#server/contracts/cut-sheets.ts';

function endOf({ sectionName, versionNumber, checksum, description }: SheetSource): EndIdentity {
  return { sectionName, versionNumber, checksum, designation: description };
}

/** Who released a version, and when. */
export interface ReleaseSigned {
  readonly by: string;
  readonly at: Date;
}

/**
 * What the files of a version say about it.
 * @param publicUrl the address under which people reach the program, for the code on the paper
 * @param release of a version that is about to be released; null for a draft
 */
export function identityOf(
  version: SheetVersion,
  publicUrl: string,
  release: ReleaseSigned | null,
): SheetIdentity {
  return {
    sheetName: version.sheetName,
    versionNumber: version.number,
    status: release ? 'released' : 'draft',
    checksum: version.checksum,
    shortCode: version.shortCode,
    address: `${publicUrl}/cut-sheets/${version.sheetId}/versions/${version.number}`,
    root: endOf(version.root),
    tip: endOf(version.tip),
    author: version.author.name,
    createdAt: version.createdAt,
    releasedBy: release?.by ?? null,
    releasedAt: release?.at.toISOString() ?? null,
    machineName: version.machine?.name ?? null,
    materialName: version.material?.name ?? null,
    ribMaterialName: version.ribMaterial?.name ?? null,
  };
}
