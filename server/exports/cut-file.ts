import {
  exportFile,
  type ExportFile,
  type ExportFormat,
  type ExportOptions,
} from '#geometry/formats/export.ts';
import { type SectionVersion } from '#server/contracts/sections.ts';

/** The cut file of a version, which says what it is and how the version stands at this moment. */
export function cutFileOf<Format extends ExportFormat>(
  version: SectionVersion,
  format: Format,
  options: ExportOptions[Format],
): ExportFile {
  const identity = {
    sectionName: version.sectionName,
    versionNumber: version.number,
    status: version.status,
    designation: version.description,
    checksum: version.checksum,
  };
  return exportFile(format, version.shape, identity, options);
}
