import { exportFile, type ExportFile } from '#geometry/formats/export.ts';
import { type FileIdentity } from '#geometry/formats/identity.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { type ExportFields, exportSchemas, optionsOf } from './export-fields.ts';

/** What a version's files say about where they come from; the server writes the same. */
function identityOf(version: SectionVersion): FileIdentity {
  return {
    sectionName: version.sectionName,
    versionNumber: version.number,
    status: version.status,
    designation: version.description,
    checksum: version.checksum,
  };
}

interface Preview {
  /** The file as the fields would make it, or null while one of them is refused. */
  readonly file: ExportFile | null;
  /** Why the options, each good in itself, make no file together; empty when a field of its own is at fault. */
  readonly refusal: string;
}

/** Makes the file in the browser, for what is said about it before it is fetched. */
export function previewOf(version: SectionVersion, fields: ExportFields): Preview {
  const options = exportSchemas[fields.format].safeParse(optionsOf(fields));
  if (!options.success) return { file: null, refusal: '' };
  try {
    return { file: exportFile(fields.format, version.shape, identityOf(version), options.data), refusal: '' };
  } catch (error) {
    if (error instanceof ShapeError)
      return { file: null, refusal: error.issues.map((issue) => issue.message).join(' ') };
    throw error;
  }
}
