import { type Knex } from 'knex';

/** A record of who took which file; like a version, a record is neither changed nor deleted. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS downloads (
      workshop_id uuid NOT NULL,
      id uuid NOT NULL PRIMARY KEY,
      section_id uuid NOT NULL,
      version_number int unsigned NOT NULL,
      person_id uuid NOT NULL,
      file_name varchar(200) NOT NULL,
      format varchar(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      options json NOT NULL,
      checksum char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      downloaded_at datetime(3) NOT NULL,
      KEY downloads_of_version (workshop_id, section_id, version_number, downloaded_at, id),
      CONSTRAINT downloads_version FOREIGN KEY (workshop_id, section_id, version_number)
        REFERENCES section_versions (workshop_id, section_id, number),
      CONSTRAINT downloads_person FOREIGN KEY (workshop_id, person_id) REFERENCES people (workshop_id, id),
      CONSTRAINT downloads_format CHECK (format IN ('dat', 'dxf', 'svg')),
      CONSTRAINT downloads_checksum CHECK (checksum REGEXP '^[0-9a-f]{64}$')
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_ci`);
  for (const [trigger, event] of [
    ['downloads_fixed', 'UPDATE'],
    ['downloads_kept', 'DELETE'],
  ]) {
    await knex.raw(`
      CREATE OR REPLACE TRIGGER ${trigger} BEFORE ${event} ON downloads FOR EACH ROW
        SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A download record is neither changed nor deleted.'`);
  }
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS downloads');
}
