import { type Knex } from 'knex';

const options = 'ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_ci';
const ascii = (length: number) => `varchar(${length}) CHARACTER SET ascii COLLATE ascii_bin`;
const checksumType = 'char(64) CHARACTER SET ascii COLLATE ascii_bin';
const statuses = "('draft', 'released', 'superseded', 'withdrawn')";

/** Each kind of reader has a list that is sorted without touching the versions. Statements can be run again after a kill. */
const createSheets = `
  CREATE TABLE IF NOT EXISTS cut_sheets (
    workshop_id uuid NOT NULL,
    id uuid NOT NULL PRIMARY KEY,
    name varchar(60) NOT NULL,
    purpose varchar(200) NOT NULL DEFAULT '',
    latest_number int unsigned NULL,
    latest_status ${ascii(12)} NOT NULL,
    updated_at datetime(3) NOT NULL,
    updated_by uuid NOT NULL,
    released_number int unsigned NULL,
    released_at datetime(3) NULL,
    released_by uuid NULL,
    released_count int unsigned NOT NULL DEFAULT 0,
    created_at datetime(3) NOT NULL,
    archived_at datetime(3) NULL,
    archived boolean AS (archived_at IS NOT NULL) PERSISTENT,
    released boolean AS (released_number IS NOT NULL) PERSISTENT,
    UNIQUE KEY sheets_in_workshop (workshop_id, id),
    KEY sheets_by_update (workshop_id, archived, updated_at, id),
    KEY sheets_by_name (workshop_id, archived, name, id),
    KEY released_sheets_by_update (workshop_id, archived, released, released_at, id),
    KEY released_sheets_by_name (workshop_id, archived, released, name, id),
    CONSTRAINT sheets_workshop FOREIGN KEY (workshop_id) REFERENCES workshops (id),
    CONSTRAINT sheets_updated_by FOREIGN KEY (workshop_id, updated_by) REFERENCES people (workshop_id, id),
    CONSTRAINT sheets_released_by FOREIGN KEY (workshop_id, released_by) REFERENCES people (workshop_id, id),
    CONSTRAINT sheets_name_given CHECK (char_length(trim(name)) > 0),
    CONSTRAINT sheets_latest_status CHECK (latest_status IN ${statuses}),
    CONSTRAINT sheets_released_whole CHECK (
      (released_number IS NULL) = (released_at IS NULL) AND (released_number IS NULL) = (released_by IS NULL)
    )
  ) ${options}`;

/** Columns that name a machine or material, null where the plan has none; the kinds in the key keep a laser from cutting foam. */
const things = [
  { name: 'machine', table: 'machines', kinds: "('wire', 'bow')" },
  { name: 'material', table: 'materials', kinds: "('foam')" },
  { name: 'rib_machine', table: 'machines', kinds: "('laser', 'router')" },
  { name: 'rib_material', table: 'materials', kinds: "('sheet')" },
] as const;
const thingColumns = things.map(({ name }) => `${name}_id uuid NULL, ${name}_kind ${ascii(12)} NULL,`);
const thingRules = things.map(
  ({ name, table, kinds }) => `
    CONSTRAINT sheet_versions_${name} FOREIGN KEY (workshop_id, ${name}_id, ${name}_kind)
      REFERENCES ${table} (workshop_id, id, kind),
    CONSTRAINT sheet_versions_${name}_kind CHECK (
      (${name}_id IS NULL) = (${name}_kind IS NULL) AND (${name}_kind IS NULL OR ${name}_kind IN ${kinds})
    ),`,
);

/**
 * `document` is the canonical text of plan and pinned plan whose SHA-256 the checksum is; the columns beside it repeat what lists
 * and keys need. A section version that a sheet is pinned to can therefore never go away.
 */
const createVersions = `
  CREATE TABLE IF NOT EXISTS cut_sheet_versions (
    workshop_id uuid NOT NULL,
    id uuid NOT NULL PRIMARY KEY,
    sheet_id uuid NOT NULL,
    number int unsigned NOT NULL,
    based_on int unsigned NULL,
    document json NOT NULL,
    checksum ${checksumType} NOT NULL,
    short_code char(9) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    root_section_id uuid NOT NULL,
    root_number int unsigned NOT NULL,
    root_chord_mm double NOT NULL,
    tip_section_id uuid NOT NULL,
    tip_number int unsigned NOT NULL,
    tip_chord_mm double NOT NULL,
    span_mm double NOT NULL,
    ${thingColumns.join('\n    ')}
    quantity int unsigned NOT NULL,
    parts set('core', 'ribs', 'templates') NOT NULL,
    errors int unsigned NOT NULL,
    warnings int unsigned NOT NULL,
    note varchar(500) NOT NULL DEFAULT '',
    author_id uuid NOT NULL,
    created_at datetime(3) NOT NULL,
    status ${ascii(12)} NOT NULL DEFAULT 'draft',
    status_reason varchar(500) NOT NULL DEFAULT '',
    status_by uuid NULL,
    status_at datetime(3) NULL,
    idempotency_key uuid NULL,
    request_checksum ${checksumType} NULL,
    released_sheet uuid AS (if(status = 'released', sheet_id, NULL)) PERSISTENT,
    UNIQUE KEY sheet_versions_number (workshop_id, sheet_id, number),
    UNIQUE KEY sheet_versions_one_released (workshop_id, released_sheet),
    UNIQUE KEY sheet_versions_idempotency (workshop_id, idempotency_key),
    KEY sheet_versions_by_code (workshop_id, short_code),
    KEY sheet_versions_by_checksum (workshop_id, checksum),
    CONSTRAINT sheet_versions_sheet FOREIGN KEY (workshop_id, sheet_id) REFERENCES cut_sheets (workshop_id, id),
    CONSTRAINT sheet_versions_root FOREIGN KEY (workshop_id, root_section_id, root_number)
      REFERENCES section_versions (workshop_id, section_id, number),
    CONSTRAINT sheet_versions_tip FOREIGN KEY (workshop_id, tip_section_id, tip_number)
      REFERENCES section_versions (workshop_id, section_id, number),${thingRules.join('')}
    CONSTRAINT sheet_versions_author FOREIGN KEY (workshop_id, author_id) REFERENCES people (workshop_id, id),
    CONSTRAINT sheet_versions_status_by FOREIGN KEY (workshop_id, status_by) REFERENCES people (workshop_id, id),
    CONSTRAINT sheet_versions_based_on FOREIGN KEY (workshop_id, sheet_id, based_on)
      REFERENCES cut_sheet_versions (workshop_id, sheet_id, number),
    CONSTRAINT sheet_versions_numbered CHECK (number >= 1 AND (based_on IS NULL OR based_on < number)),
    CONSTRAINT sheet_versions_first CHECK ((number = 1) = (based_on IS NULL)),
    CONSTRAINT sheet_versions_checksum CHECK (checksum = convert(sha2(document, 256) USING ascii)),
    CONSTRAINT sheet_versions_document CHECK (
      json_value(document, '$.number') <=> number
      AND json_value(document, '$.plan.panel.root.sectionId') <=> lower(root_section_id)
      AND json_value(document, '$.plan.panel.root.versionNumber') <=> root_number
      AND json_value(document, '$.plan.panel.tip.sectionId') <=> lower(tip_section_id)
      AND json_value(document, '$.plan.panel.tip.versionNumber') <=> tip_number
    ),
    CONSTRAINT sheet_versions_lengths CHECK (root_chord_mm > 0 AND tip_chord_mm > 0 AND span_mm > 0 AND quantity >= 1),
    CONSTRAINT sheet_versions_status CHECK (status IN ${statuses}),
    CONSTRAINT sheet_versions_status_known CHECK (
      (status = 'draft') = (status_at IS NULL) AND (status = 'draft') = (status_by IS NULL)
    ),
    CONSTRAINT sheet_versions_released_sound CHECK (status = 'draft' OR errors = 0),
    CONSTRAINT sheet_versions_key_whole CHECK ((idempotency_key IS NULL) = (request_checksum IS NULL))
  ) ${options}`;

/** What stands in a person's form, right or wrong. */
const createDrafts = `
  CREATE TABLE IF NOT EXISTS cut_sheet_drafts (
    workshop_id uuid NOT NULL,
    sheet_id uuid NOT NULL,
    person_id uuid NOT NULL,
    based_on int unsigned NOT NULL,
    form json NOT NULL,
    updated_at datetime(3) NOT NULL,
    PRIMARY KEY (workshop_id, sheet_id, person_id),
    CONSTRAINT sheet_drafts_person FOREIGN KEY (workshop_id, person_id) REFERENCES people (workshop_id, id),
    CONSTRAINT sheet_drafts_based_on FOREIGN KEY (workshop_id, sheet_id, based_on)
      REFERENCES cut_sheet_versions (workshop_id, sheet_id, number)
  ) ${options}`;

/** The files of released versions, as bytes that are handed out for ever. */
const createFiles = `
  CREATE TABLE IF NOT EXISTS cut_files (
    workshop_id uuid NOT NULL,
    sheet_id uuid NOT NULL,
    version_number int unsigned NOT NULL,
    name ${ascii(49)} NOT NULL,
    place smallint unsigned NOT NULL,
    part ${ascii(12)} NOT NULL,
    download_name varchar(200) NOT NULL,
    media_type ${ascii(80)} NOT NULL,
    bytes mediumblob NOT NULL,
    checksum ${checksumType} NOT NULL,
    PRIMARY KEY (workshop_id, sheet_id, version_number, name),
    UNIQUE KEY cut_files_place (workshop_id, sheet_id, version_number, place),
    UNIQUE KEY cut_files_download_name (workshop_id, sheet_id, version_number, download_name),
    KEY cut_files_by_checksum (workshop_id, checksum),
    CONSTRAINT cut_files_version FOREIGN KEY (workshop_id, sheet_id, version_number)
      REFERENCES cut_sheet_versions (workshop_id, sheet_id, number),
    CONSTRAINT cut_files_name CHECK (name REGEXP '^[a-z0-9-]{1,40}[.][a-z0-9]{1,8}$' AND name <> 'all.zip'),
    CONSTRAINT cut_files_part CHECK (part IN ('core', 'ribs', 'templates', 'sheet')),
    CONSTRAINT cut_files_checksum CHECK (checksum = convert(sha2(bytes, 256) USING ascii))
  ) ${options}`;

/** Who took which file; `all.zip` and the files of drafts are not kept, but what was taken is. */
const createDownloads = `
  CREATE TABLE IF NOT EXISTS cut_downloads (
    workshop_id uuid NOT NULL,
    id uuid NOT NULL PRIMARY KEY,
    sheet_id uuid NOT NULL,
    version_number int unsigned NOT NULL,
    person_id uuid NOT NULL,
    name ${ascii(49)} NOT NULL,
    file_name varchar(200) NOT NULL,
    checksum ${checksumType} NOT NULL,
    downloaded_at datetime(3) NOT NULL,
    KEY cut_downloads_of_version (workshop_id, sheet_id, version_number, downloaded_at, id),
    KEY cut_downloads_by_checksum (workshop_id, checksum),
    CONSTRAINT cut_downloads_version FOREIGN KEY (workshop_id, sheet_id, version_number)
      REFERENCES cut_sheet_versions (workshop_id, sheet_id, number),
    CONSTRAINT cut_downloads_person FOREIGN KEY (workshop_id, person_id) REFERENCES people (workshop_id, id),
    CONSTRAINT cut_downloads_checksum CHECK (checksum REGEXP '^[0-9a-f]{64}$')
  ) ${options}`;

export async function up(knex: Knex): Promise<void> {
  await knex.raw(createSheets);
  await knex.raw(createVersions);
  const shown = ['latest', 'released'].map(
    (which) => `
      ADD CONSTRAINT sheets_${which} FOREIGN KEY IF NOT EXISTS (workshop_id, id, ${which}_number)
        REFERENCES cut_sheet_versions (workshop_id, sheet_id, number)`,
  );
  await knex.raw(`ALTER TABLE cut_sheets ${shown.join(',')}`);
  await knex.raw(createDrafts);
  await knex.raw(createFiles);
  await knex.raw(createDownloads);
  await createTriggers(knex);
}

/** Columns of a version that may change after it is saved; the database computes one of them. */
const changing = ['status', 'status_reason', 'status_by', 'status_at', 'released_sheet'];

async function createTriggers(knex: Knex): Promise<void> {
  const [columns] = (await knex.raw('SHOW COLUMNS FROM cut_sheet_versions')) as [{ Field: string }[]];
  const fixed = columns.map(({ Field }) => Field).filter((name) => !changing.includes(name));
  const unchanged = fixed.map((column) => `binary NEW.${column} <=> binary OLD.${column}`).join(' AND ');
  const refuse = (message: string) => `SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = '${message}'`;
  await knex.raw(`
    CREATE OR REPLACE TRIGGER sheet_versions_fixed BEFORE UPDATE ON cut_sheet_versions FOR EACH ROW
    BEGIN
      IF NOT (${unchanged}) THEN ${refuse('A saved version never changes.')}; END IF;
      IF NEW.status = OLD.status AND NOT (
        binary NEW.status_reason <=> binary OLD.status_reason
        AND NEW.status_by <=> OLD.status_by AND NEW.status_at <=> OLD.status_at
      ) THEN ${refuse('The record of a status never changes.')}; END IF;
      IF NEW.status <> OLD.status AND NOT (
        (OLD.status = 'draft' AND NEW.status = 'released')
        OR (OLD.status = 'released' AND NEW.status IN ('superseded', 'withdrawn'))
      ) THEN ${refuse('A version goes from draft to released to superseded or withdrawn.')}; END IF;
      IF NEW.status = 'released' AND NOT EXISTS (
        SELECT 1 FROM cut_files f
        WHERE f.workshop_id = NEW.workshop_id AND f.sheet_id = NEW.sheet_id AND f.version_number = NEW.number
      ) THEN ${refuse('A version is released with its files.')}; END IF;
    END`);
  await knex.raw(`
    CREATE OR REPLACE TRIGGER cut_files_of_drafts BEFORE INSERT ON cut_files FOR EACH ROW
      IF EXISTS (
        SELECT 1 FROM cut_sheet_versions v
        WHERE v.workshop_id = NEW.workshop_id AND v.sheet_id = NEW.sheet_id AND v.number = NEW.version_number
          AND v.status <> 'draft'
      ) THEN ${refuse('A released version gets no further files.')}; END IF`);
  const kept = [
    ['sheet_versions_kept', 'DELETE', 'cut_sheet_versions', 'A saved version is never deleted.'],
    ['cut_files_fixed', 'UPDATE', 'cut_files', 'A file is neither changed nor deleted.'],
    ['cut_files_kept', 'DELETE', 'cut_files', 'A file is neither changed nor deleted.'],
    ['cut_downloads_fixed', 'UPDATE', 'cut_downloads', 'A download record is neither changed nor deleted.'],
    ['cut_downloads_kept', 'DELETE', 'cut_downloads', 'A download record is neither changed nor deleted.'],
  ] as const;
  for (const [trigger, event, table, message] of kept) {
    await knex.raw(
      `CREATE OR REPLACE TRIGGER ${trigger} BEFORE ${event} ON ${table} FOR EACH ROW ${refuse(message)}`,
    );
  }
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS cut_downloads');
  await knex.raw('DROP TABLE IF EXISTS cut_files');
  await knex.raw('DROP TABLE IF EXISTS cut_sheet_drafts');
  await knex.raw('ALTER TABLE IF EXISTS cut_sheets DROP FOREIGN KEY IF EXISTS sheets_latest');
  await knex.raw('ALTER TABLE IF EXISTS cut_sheets DROP FOREIGN KEY IF EXISTS sheets_released');
  await knex.raw('DROP TABLE IF EXISTS cut_sheet_versions');
  await knex.raw('DROP TABLE IF EXISTS cut_sheets');
}
