import { type Knex } from 'knex';

/** Statements can be run again, because MariaDB keeps what a migration did before it was killed. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS workshops (
      id uuid NOT NULL PRIMARY KEY,
      name varchar(120) NOT NULL,
      created_at datetime(3) NOT NULL,
      CONSTRAINT workshops_name_given CHECK (char_length(trim(name)) > 0)
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_ci`);
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS people (
      workshop_id uuid NOT NULL,
      id uuid NOT NULL PRIMARY KEY,
      email varchar(254) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
      name varchar(120) NOT NULL,
      role varchar(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      password_hash varchar(255) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      session_epoch int unsigned NOT NULL DEFAULT 1,
      preferences json NOT NULL,
      active boolean NOT NULL DEFAULT true,
      created_at datetime(3) NOT NULL,
      UNIQUE KEY people_in_workshop (workshop_id, id),
      UNIQUE KEY people_email (email),
      CONSTRAINT people_workshop FOREIGN KEY (workshop_id) REFERENCES workshops (id),
      CONSTRAINT people_role CHECK (role IN ('owner', 'designer', 'builder', 'technician')),
      CONSTRAINT people_email_lower CHECK (email = lower(email)),
      CONSTRAINT people_active CHECK (active IN (0, 1))
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_ci`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS people');
  await knex.raw('DROP TABLE IF EXISTS workshops');
}
