import { type Knex } from 'knex';
import { v7 as uuid } from 'uuid';
import { type SectionVersion, type VersionStatus } from '#server/contracts/sections.ts';
import { type Shape } from '#geometry/shapes/shape.ts';
import { type Keyed, keyColumns, type KeyKeeping } from '#server/database/once.ts';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { type DescribedShape } from '../described.ts';
import { type Author } from '../rules.ts';

/** The version that a request has made. */
interface Made {
  readonly section_id: string;
  readonly number: number;
}

export const versionKeys: KeyKeeping<Made> = {
  table: 'section_versions',
  uniqueKey: 'versions_idempotency',
  columns: ['section_id', 'number'],
};

interface NewVersion extends Keyed {
  readonly sectionId: string;
  readonly number: number;
  readonly basedOn: number | null;
  readonly shape: DescribedShape;
  readonly note: string;
}

/** Writes a version as a draft. */
export async function addVersion(db: Knex, author: Author, version: NewVersion): Promise<void> {
  await scoped(db, author.workshopId).insert('section_versions', {
    id: uuid(),
    section_id: version.sectionId,
    number: version.number,
    based_on: version.basedOn,
    shape: version.shape.text,
    checksum: version.shape.checksum,
    kind: version.shape.kind,
    description: version.shape.description,
    thickness: version.shape.thickness,
    camber: version.shape.camber,
    note: version.note,
    author_id: author.personId,
    created_at: author.at,
    ...keyColumns(version),
  });
}

/** What a section repeats of its newest version, so that the library is sorted and searched without the versions. */
export function latestColumns(number: number | null, shape: DescribedShape) {
  return {
    latest_number: number,
    latest_status: 'draft',
    latest_kind: shape.kind,
    latest_description: shape.description,
    latest_thickness: shape.thickness,
    latest_camber: shape.camber,
  };
}

interface Row {
  id: string;
  section_id: string;
  section_name: string;
  number: number;
  based_on: number | null;
  status: VersionStatus;
  status_reason: string;
  status_by: string | null;
  status_by_name: string | null;
  status_at: Date | null;
  shape: Shape;
  description: string;
  checksum: string;
  note: string;
  author_id: string;
  author_name: string;
  created_at: Date;
}

/** Versions of a workshop with the names that belong to them; rows are read with {@link versionOf}. */
export function versionRows(db: Knex, workshopId: string): Knex.QueryBuilder {
  const versions = scoped(db, workshopId).table('section_versions', { as: 'v' });
  const withSection = joinScoped(versions, 'inner', ['sections', 's'], 'v', [['s.id', 'v.section_id']]);
  const withAuthor = joinScoped(withSection, 'inner', ['people', 'a'], 'v', [['a.id', 'v.author_id']]);
  return joinScoped(withAuthor, 'left', ['people', 'b'], 'v', [['b.id', 'v.status_by']]).select(
    'v.*',
    's.name as section_name',
    'a.name as author_name',
    'b.name as status_by_name',
  );
}

export function versionOf(row: unknown): SectionVersion {
  const version = row as Row;
  return {
    id: version.id,
    sectionId: version.section_id,
    sectionName: version.section_name,
    number: version.number,
    basedOn: version.based_on,
    status: version.status,
    statusReason: version.status_reason,
    statusBy:
      version.status_by === null ? null : { id: version.status_by, name: version.status_by_name ?? '' },
    statusAt: version.status_at?.toISOString() ?? null,
    shape: version.shape,
    description: version.description,
    checksum: version.checksum,
    note: version.note,
    author: { id: version.author_id, name: version.author_name },
    createdAt: version.created_at.toISOString(),
  };
}
