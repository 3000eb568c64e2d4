import { type Knex } from 'knex';
import { type ExportFormat, type ExportOptions } from '#geometry/formats/export.ts';
import { type Person } from '#server/account/person.ts';
import { type FileReply, type Handlers } from '#server/http/handlers.ts';
import { reachOf } from '#server/sections/rules.ts';
import { sectionState } from '#server/sections/store.ts';
import { findVersion } from '#server/sections/versions/store.ts';
import { cutFileOf } from './cut-file.ts';
import { checkDownload } from './rules.ts';
import { listDownloads, recordDownload } from './store.ts';

interface FileCall<Format extends ExportFormat> {
  readonly person: Person;
  readonly params: { readonly sectionId: string; readonly number: number };
  readonly query: ExportOptions[Format];
  readonly now: Date;
}

function fileHandler<Format extends ExportFormat>(knex: Knex, format: Format) {
  return async ({ person, params, query, now }: FileCall<Format>): Promise<FileReply> => {
    const { workshopId } = person;
    const version = await findVersion(
      knex,
      workshopId,
      params.sectionId,
      params.number,
      reachOf(person.role),
    );
    const section = await sectionState(knex, workshopId, params.sectionId);
    checkDownload(person.role, version, section.releasedNumber);
    const file = cutFileOf(version, format, query);
    return {
      file,
      record: (checksum) =>
        recordDownload(
          knex,
          { workshopId, personId: person.id, at: now },
          {
            sectionId: version.sectionId,
            versionNumber: version.number,
            fileName: file.fileName,
            format,
            options: query,
            checksum,
          },
        ),
    };
  };
}

export function exportHandlers(
  knex: Knex,
): Pick<Handlers, 'datFile' | 'dxfFile' | 'svgFile' | 'listDownloads'> {
  return {
    datFile: fileHandler(knex, 'dat'),
    dxfFile: fileHandler(knex, 'dxf'),
    svgFile: fileHandler(knex, 'svg'),
    listDownloads: async ({ person, params, query }) => {
      const version = await findVersion(
        knex,
        person.workshopId,
        params.sectionId,
        params.number,
        reachOf(person.role),
      );
      return listDownloads(knex, person.workshopId, version, query);
    },
  };
}
