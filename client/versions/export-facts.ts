import { exportFile, type ExportFile } from '#geometry/formats/export.ts';
import { type FileIdentity } from '#geometry/formats/identity.ts';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { type ExportFields, exportSchemas, optionsOf } from './export-fields.ts';

/** What a version's files say about where they come from; the server writes the same. */
export function identityOf(version: SectionVersion): FileIdentity {
  return {
    sectionName: version.sectionName,
    versionNumber: version.number,
    status: version.status,
    designation: version.description,
    checksum: version.checksum,
  };
}

/** The file as these fields would make it, or null while one of them is refused. */
export function previewOf(version: SectionVersion, fields: ExportFields): ExportFile | null {
  const options = exportSchemas[fields.format].safeParse(optionsOf(fields));
  if (!options.success) return null;
  return exportFile(fields.format, version.shape, identityOf(version), options.data);
}
