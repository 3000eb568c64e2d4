import { type Knex } from 'knex';

/**
 * `latest_*` describe the newest version and `released_*` the released one, so that each kind of reader has a library
 * that is sorted and searched without touching the versions. Statements can be run again after a kill.
 */
const createSections = `
  CREATE TABLE IF NOT EXISTS sections (
    workshop_id uuid NOT NULL,
    id uuid NOT NULL PRIMARY KEY,
    name varchar(80) NOT NULL,
    purpose varchar(200) NOT NULL DEFAULT '',
    latest_number int unsigned NULL,
    latest_status varchar(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    latest_kind varchar(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    latest_description varchar(120) NOT NULL,
    latest_thickness double NOT NULL,
    latest_camber double NOT NULL,
    updated_at datetime(3) NOT NULL,
    updated_by uuid NOT NULL,
    released_number int unsigned NULL,
    released_kind varchar(12) CHARACTER SET ascii COLLATE ascii_bin NULL,
    released_description varchar(120) NULL,
    released_thickness double NULL,
    released_camber double NULL,
    released_at datetime(3) NULL,
    released_by uuid NULL,
    released_count int unsigned NOT NULL DEFAULT 0,
    created_at datetime(3) NOT NULL,
    archived_at datetime(3) NULL,
    archived boolean AS (archived_at IS NOT NULL) PERSISTENT,
    released boolean AS (released_number IS NOT NULL) PERSISTENT,
    UNIQUE KEY sections_in_workshop (workshop_id, id),
    KEY sections_by_update (workshop_id, archived, updated_at, id),
    KEY sections_by_name (workshop_id, archived, name, id),
    KEY sections_by_thickness (workshop_id, archived, latest_thickness, id),
    KEY sections_by_camber (workshop_id, archived, latest_camber, id),
    KEY released_by_update (workshop_id, archived, released, released_at, id),
    KEY released_by_name (workshop_id, archived, released, name, id),
    KEY released_by_thickness (workshop_id, archived, released, released_thickness, id),
    KEY released_by_camber (workshop_id, archived, released, released_camber, id),
    CONSTRAINT sections_workshop FOREIGN KEY (workshop_id) REFERENCES workshops (id),
    CONSTRAINT sections_updated_by FOREIGN KEY (workshop_id, updated_by) REFERENCES people (workshop_id, id),
    CONSTRAINT sections_released_by FOREIGN KEY (workshop_id, released_by) REFERENCES people (workshop_id, id),
    CONSTRAINT sections_name_given CHECK (char_length(trim(name)) > 0),
    CONSTRAINT sections_latest_status CHECK (latest_status IN ('draft', 'released', 'superseded', 'withdrawn')),
    CONSTRAINT sections_latest_kind CHECK (latest_kind IN ('naca4', 'cst')),
    CONSTRAINT sections_released_whole CHECK (
      (released_number IS NULL) = (released_kind IS NULL)
      AND (released_number IS NULL) = (released_description IS NULL)
      AND (released_number IS NULL) = (released_thickness IS NULL)
      AND (released_number IS NULL) = (released_camber IS NULL)
      AND (released_number IS NULL) = (released_at IS NULL)
      AND (released_number IS NULL) = (released_by IS NULL)
    )
  ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_ci`;

/** The shape is stored as the canonical text whose SHA-256 the checksum is, so the database can check it itself. */
const createVersions = `
  CREATE TABLE IF NOT EXISTS section_versions (
    workshop_id uuid NOT NULL,
    id uuid NOT NULL PRIMARY KEY,
    section_id uuid NOT NULL,
    number int unsigned NOT NULL,
    based_on int unsigned NULL,
    shape json NOT NULL,
    checksum char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    kind varchar(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    description varchar(120) NOT NULL,
    thickness double NOT NULL,
    camber double NOT NULL,
    note varchar(500) NOT NULL DEFAULT '',
    author_id uuid NOT NULL,
    created_at datetime(3) NOT NULL,
    status varchar(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'draft',
    status_reason varchar(500) NOT NULL DEFAULT '',
    status_by uuid NULL,
    status_at datetime(3) NULL,
    idempotency_key uuid NULL,
    request_checksum char(64) CHARACTER SET ascii COLLATE ascii_bin NULL,
    released_section uuid AS (if(status = 'released', section_id, NULL)) PERSISTENT,
    UNIQUE KEY versions_number (workshop_id, section_id, number),
    UNIQUE KEY versions_one_released (workshop_id, released_section),
    UNIQUE KEY versions_idempotency (workshop_id, idempotency_key),
    CONSTRAINT versions_section FOREIGN KEY (workshop_id, section_id) REFERENCES sections (workshop_id, id),
    CONSTRAINT versions_author FOREIGN KEY (workshop_id, author_id) REFERENCES people (workshop_id, id),
    CONSTRAINT versions_status_by FOREIGN KEY (workshop_id, status_by) REFERENCES people (workshop_id, id),
    CONSTRAINT versions_based_on FOREIGN KEY (workshop_id, section_id, based_on)
      REFERENCES section_versions (workshop_id, section_id, number),
    CONSTRAINT versions_numbered CHECK (number >= 1 AND (based_on IS NULL OR based_on < number)),
    CONSTRAINT versions_first CHECK ((number = 1) = (based_on IS NULL)),
    CONSTRAINT versions_checksum CHECK (checksum = convert(sha2(shape, 256) USING ascii)),
    CONSTRAINT versions_kind CHECK (kind IN ('naca4', 'cst')),
    CONSTRAINT versions_status CHECK (status IN ('draft', 'released', 'superseded', 'withdrawn')),
    CONSTRAINT versions_status_known CHECK (
      (status = 'draft') = (status_at IS NULL) AND (status = 'draft') = (status_by IS NULL)
    ),
    CONSTRAINT versions_key_whole CHECK ((idempotency_key IS NULL) = (request_checksum IS NULL))
  ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_ci`;

const createDrafts = `
  CREATE TABLE IF NOT EXISTS section_drafts (
    workshop_id uuid NOT NULL,
    section_id uuid NOT NULL,
    person_id uuid NOT NULL,
    based_on int unsigned NOT NULL,
    shape json NOT NULL,
    chord_mm double NOT NULL,
    updated_at datetime(3) NOT NULL,
    PRIMARY KEY (workshop_id, section_id, person_id),
    CONSTRAINT drafts_person FOREIGN KEY (workshop_id, person_id) REFERENCES people (workshop_id, id),
    CONSTRAINT drafts_based_on FOREIGN KEY (workshop_id, section_id, based_on)
      REFERENCES section_versions (workshop_id, section_id, number),
    CONSTRAINT drafts_chord CHECK (chord_mm > 0)
  ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_ci`;

export async function up(knex: Knex): Promise<void> {
  await knex.raw(createSections);
  await knex.raw(createVersions);
  for (const which of ['latest', 'released']) {
    await knex.raw(`
      ALTER TABLE sections ADD CONSTRAINT sections_${which} FOREIGN KEY IF NOT EXISTS (workshop_id, id, ${which}_number)
        REFERENCES section_versions (workshop_id, section_id, number)`);
  }
  await knex.raw(createDrafts);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS section_drafts');
  await knex.raw('ALTER TABLE IF EXISTS sections DROP FOREIGN KEY IF EXISTS sections_latest');
  await knex.raw('ALTER TABLE IF EXISTS sections DROP FOREIGN KEY IF EXISTS sections_released');
  await knex.raw('DROP TABLE IF EXISTS section_versions');
  await knex.raw('DROP TABLE IF EXISTS sections');
}
