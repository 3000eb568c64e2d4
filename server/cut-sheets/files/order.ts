import { type EndIdentity } from '#geometry/cutting/files/identity.ts';
import { type SheetSource, type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { type SheetOrder } from './make.ts';

function endOf({ sectionName, versionNumber, checksum, description }: SheetSource): EndIdentity {
  return { sectionName, versionNumber, checksum, designation: description };
}

/** What files say that does not stand in their version. */
export interface SheetNames {
  /** The one for whom they are made: who releases the version. */
  readonly person: string;
  readonly workshop: string;
  /** The address under which people reach the program, for the code on the paper. */
  readonly publicUrl: string;
}

/**
 * What it takes to make the files of a version.
 * @param releasedAt of a version that is about to be released; null for a draft
 */
export function orderOf(version: SheetVersion, names: SheetNames, releasedAt: Date | null): SheetOrder {
  const identity = {
    sheetName: version.sheetName,
    versionNumber: version.number,
    status: releasedAt ? 'released' : 'draft',
    checksum: version.checksum,
    shortCode: version.shortCode,
    address: `${names.publicUrl}/cut-sheets/${version.sheetId}/versions/${version.number}`,
    root: endOf(version.root),
    tip: endOf(version.tip),
    author: version.author.name,
    createdAt: version.createdAt,
    releasedBy: releasedAt ? names.person : null,
    releasedAt: releasedAt?.toISOString() ?? null,
    machineName: version.machine?.name ?? null,
    materialName: version.material?.name ?? null,
    ribMaterialName: version.ribMaterial?.name ?? null,
  };
  return { plan: version.pinned, identity, paper: version.plan.paper, owner: names.workshop };
}
