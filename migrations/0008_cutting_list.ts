import { type Knex } from 'knex';

const options = 'ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_ci';
const ascii = (length: number) => `varchar(${length}) CHARACTER SET ascii COLLATE ascii_bin`;
const checksumType = 'char(64) CHARACTER SET ascii COLLATE ascii_bin';
const parts = "('core', 'ribs', 'templates')";
const version = `FOREIGN KEY (workshop_id, sheet_id, version_number)
      REFERENCES cut_sheet_versions (workshop_id, sheet_id, number)`;
const person = (column: string) => `FOREIGN KEY (workshop_id, ${column}) REFERENCES people (workshop_id, id)`;
const machine = 'FOREIGN KEY (workshop_id, machine_id) REFERENCES machines (workshop_id, id)';

/**
 * `happened_at` is what the tablet said, `received_at` when it reached the server; `standing` is how the version stood then.
 * Statements can be run again after a kill.
 */
const createLogs = `
  CREATE TABLE IF NOT EXISTS cut_logs (
    workshop_id uuid NOT NULL,
    id uuid NOT NULL PRIMARY KEY,
    sheet_id uuid NOT NULL,
    version_number int unsigned NOT NULL,
    part ${ascii(12)} NOT NULL,
    action ${ascii(12)} NOT NULL,
    quantity int unsigned NOT NULL,
    reason varchar(500) NOT NULL DEFAULT '',
    machine_id uuid NULL,
    person_id uuid NOT NULL,
    happened_at datetime(3) NOT NULL,
    received_at datetime(3) NOT NULL,
    standing ${ascii(12)} NOT NULL,
    idempotency_key uuid NOT NULL,
    request_checksum ${checksumType} NOT NULL,
    UNIQUE KEY cut_logs_in_workshop (workshop_id, id),
    UNIQUE KEY cut_logs_idempotency (workshop_id, idempotency_key),
    KEY cut_logs_by_time (workshop_id, happened_at, id),
    KEY cut_logs_of_version (workshop_id, sheet_id, version_number, happened_at, id),
    CONSTRAINT cut_logs_version ${version},
    CONSTRAINT cut_logs_machine ${machine},
    CONSTRAINT cut_logs_person ${person('person_id')},
    CONSTRAINT cut_logs_part CHECK (part IN ${parts}),
    CONSTRAINT cut_logs_action CHECK (action IN ('started', 'done', 'scrapped')),
    CONSTRAINT cut_logs_quantity CHECK (quantity BETWEEN 1 AND 500),
    CONSTRAINT cut_logs_reason CHECK (action <> 'scrapped' OR char_length(trim(reason)) > 0),
    CONSTRAINT cut_logs_standing CHECK (standing IN ('draft', 'released', 'superseded', 'withdrawn'))
  ) ${options}`;

/** What the entries of a part come to, counted again with every entry, so that lists need not read them. */
const createProgress = `
  CREATE TABLE IF NOT EXISTS cut_progress (
    workshop_id uuid NOT NULL,
    sheet_id uuid NOT NULL,
    version_number int unsigned NOT NULL,
    part ${ascii(12)} NOT NULL,
    done int unsigned NOT NULL,
    scrapped int unsigned NOT NULL,
    open int unsigned NOT NULL,
    open_log_id uuid NULL,
    begun boolean AS (open > 0) PERSISTENT,
    PRIMARY KEY (workshop_id, sheet_id, version_number, part),
    KEY cut_progress_begun (workshop_id, begun),
    CONSTRAINT cut_progress_version ${version},
    CONSTRAINT cut_progress_log FOREIGN KEY (workshop_id, open_log_id) REFERENCES cut_logs (workshop_id, id),
    CONSTRAINT cut_progress_part CHECK (part IN ${parts}),
    CONSTRAINT cut_progress_open CHECK ((open = 0) = (open_log_id IS NULL))
  ) ${options}`;

const createInspections = `
  CREATE TABLE IF NOT EXISTS inspections (
    workshop_id uuid NOT NULL,
    id uuid NOT NULL PRIMARY KEY,
    sheet_id uuid NOT NULL,
    version_number int unsigned NOT NULL,
    mark varchar(40) NOT NULL DEFAULT '',
    measured ${ascii(12)} NOT NULL,
    machine_id uuid NULL,
    within_tolerance boolean NOT NULL,
    note varchar(500) NOT NULL DEFAULT '',
    person_id uuid NOT NULL,
    happened_at datetime(3) NOT NULL,
    received_at datetime(3) NOT NULL,
    decision ${ascii(12)} NULL,
    decision_note varchar(500) NULL,
    decided_by uuid NULL,
    decided_at datetime(3) NULL,
    idempotency_key uuid NOT NULL,
    request_checksum ${checksumType} NOT NULL,
    waiting boolean AS (within_tolerance = 0 AND decision IS NULL) PERSISTENT,
    UNIQUE KEY inspections_in_workshop (workshop_id, id),
    UNIQUE KEY inspections_idempotency (workshop_id, idempotency_key),
    KEY inspections_by_time (workshop_id, happened_at, id),
    KEY inspections_waiting (workshop_id, waiting, happened_at, id),
    KEY inspections_of_version (workshop_id, sheet_id, version_number, happened_at, id),
    CONSTRAINT inspections_version ${version},
    CONSTRAINT inspections_machine ${machine},
    CONSTRAINT inspections_person ${person('person_id')},
    CONSTRAINT inspections_decided_by ${person('decided_by')},
    CONSTRAINT inspections_measured CHECK (measured IN ('core', 'with-skin')),
    CONSTRAINT inspections_within CHECK (within_tolerance IN (0, 1)),
    CONSTRAINT inspections_decision CHECK (
      (decision IS NULL) = (decided_by IS NULL) AND (decision IS NULL) = (decided_at IS NULL)
      AND (decision IS NULL) = (decision_note IS NULL)
      AND (decision IS NULL OR (decision IN ('accepted', 'rejected') AND within_tolerance = 0))
    )
  ) ${options}`;

/** Lengths in mm, stations in fractions of chord; the deviation is measured less nominal. */
const createMeasurements = `
  CREATE TABLE IF NOT EXISTS inspection_measurements (
    workshop_id uuid NOT NULL,
    inspection_id uuid NOT NULL,
    place smallint unsigned NOT NULL,
    panel_end ${ascii(4)} NOT NULL,
    station double NOT NULL,
    nominal_mm double NOT NULL,
    tolerance_mm double NOT NULL,
    measured_mm double NOT NULL,
    deviation_mm double NOT NULL,
    within_tolerance boolean NOT NULL,
    PRIMARY KEY (workshop_id, inspection_id, place),
    UNIQUE KEY measurements_station (workshop_id, inspection_id, panel_end, station),
    CONSTRAINT measurements_inspection FOREIGN KEY (workshop_id, inspection_id)
      REFERENCES inspections (workshop_id, id),
    CONSTRAINT measurements_end CHECK (panel_end IN ('root', 'tip')),
    CONSTRAINT measurements_station_range CHECK (station BETWEEN 0 AND 1),
    CONSTRAINT measurements_lengths CHECK (nominal_mm > 0 AND tolerance_mm > 0 AND measured_mm >= 0),
    CONSTRAINT measurements_deviation CHECK (abs(deviation_mm - (measured_mm - nominal_mm)) < 1e-3),
    CONSTRAINT measurements_within CHECK (
      within_tolerance IN (0, 1) AND (within_tolerance = 1) = (abs(deviation_mm) <= tolerance_mm)
    )
  ) ${options}`;

const createPhotos = `
  CREATE TABLE IF NOT EXISTS photos (
    workshop_id uuid NOT NULL,
    id uuid NOT NULL PRIMARY KEY,
    inspection_id uuid NOT NULL,
    bytes mediumblob NOT NULL,
    byte_count int unsigned AS (octet_length(bytes)) PERSISTENT,
    checksum ${checksumType} NOT NULL,
    width int unsigned NOT NULL,
    height int unsigned NOT NULL,
    person_id uuid NOT NULL,
    created_at datetime(3) NOT NULL,
    KEY photos_of_inspection (workshop_id, inspection_id, created_at, id),
    CONSTRAINT photos_inspection FOREIGN KEY (workshop_id, inspection_id) REFERENCES inspections (workshop_id, id),
    CONSTRAINT photos_person ${person('person_id')},
    CONSTRAINT photos_checksum CHECK (checksum = convert(sha2(bytes, 256) USING ascii)),
    CONSTRAINT photos_size CHECK (width > 0 AND height > 0)
  ) ${options}`;

/** What a kerf was before another took its place: `person_id` and `set_at` are of the earlier one. */
const createKerfHistory = `
  CREATE TABLE IF NOT EXISTS kerf_history (
    workshop_id uuid NOT NULL,
    machine_id uuid NOT NULL,
    material_id uuid NOT NULL,
    revision int unsigned NOT NULL,
    kerf_mm double NOT NULL,
    speed_mm_min double NULL,
    measured_on date NULL,
    person_id uuid NOT NULL,
    set_at datetime(3) NOT NULL,
    replaced_by uuid NOT NULL,
    replaced_at datetime(3) NOT NULL,
    PRIMARY KEY (workshop_id, machine_id, material_id, revision),
    CONSTRAINT kerf_history_machine ${machine},
    CONSTRAINT kerf_history_material FOREIGN KEY (workshop_id, material_id) REFERENCES materials (workshop_id, id),
    CONSTRAINT kerf_history_person ${person('person_id')},
    CONSTRAINT kerf_history_replaced_by ${person('replaced_by')}
  ) ${options}`;

const kept = [
  ['cut_logs', 'An entry of the cut log is neither changed nor deleted.'],
  ['inspection_measurements', 'A reading is neither changed nor deleted.'],
  ['photos', 'A photograph is neither changed nor deleted.'],
  ['kerf_history', 'An earlier kerf is neither changed nor deleted.'],
] as const;

const refuse = (message: string) => `SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = '${message}'`;

/** Of an inspection the answer alone is added later, once. */
async function createTriggers(knex: Knex): Promise<void> {
  for (const [table, message] of kept) {
    for (const [name, event] of [
      ['fixed', 'UPDATE'],
      ['kept', 'DELETE'],
    ]) {
      await knex.raw(
        `CREATE OR REPLACE TRIGGER ${table}_${name} BEFORE ${event} ON ${table} FOR EACH ROW ${refuse(message)}`,
      );
    }
  }
  const answer = ['decision', 'decision_note', 'decided_by', 'decided_at'];
  const [columns] = (await knex.raw('SHOW COLUMNS FROM inspections')) as [{ Field: string }[]];
  const fixed = columns.map(({ Field }) => Field).filter((name) => ![...answer, 'waiting'].includes(name));
  const unchanged = fixed.map((column) => `binary NEW.${column} <=> binary OLD.${column}`).join(' AND ');
  await knex.raw(`
    CREATE OR REPLACE TRIGGER inspections_fixed BEFORE UPDATE ON inspections FOR EACH ROW
    BEGIN
      IF NOT (${unchanged}) THEN ${refuse('An inspection never changes.')}; END IF;
      IF OLD.decision IS NOT NULL THEN ${refuse('An inspection is answered once.')}; END IF;
    END`);
  await knex.raw(
    `CREATE OR REPLACE TRIGGER inspections_kept BEFORE DELETE ON inspections FOR EACH ROW ${refuse('An inspection is never deleted.')}`,
  );
}

export async function up(knex: Knex): Promise<void> {
  for (const table of [
    createLogs,
    createProgress,
    createInspections,
    createMeasurements,
    createPhotos,
    createKerfHistory,
  ]) {
    await knex.raw(table);
  }
  await createTriggers(knex);
  await knex.raw('ALTER TABLE downloads ADD KEY IF NOT EXISTS downloads_by_checksum (workshop_id, checksum)');
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE IF EXISTS downloads DROP KEY IF EXISTS downloads_by_checksum');
  for (const table of [
    'kerf_history',
    'photos',
    'inspection_measurements',
    'inspections',
    'cut_progress',
    'cut_logs',
  ]) {
    await knex.raw(`DROP TABLE IF EXISTS ${table}`);
  }
}
