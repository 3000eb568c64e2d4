import { type Knex } from 'knex';

/** Machines and materials look the same to the database: a name, a kind, and settings whose form the kind decides. */
function createItems(table: 'machines' | 'materials', kinds: readonly string[]): string {
  return `
    CREATE TABLE IF NOT EXISTS ${table} (
      workshop_id uuid NOT NULL,
      id uuid NOT NULL PRIMARY KEY,
      name varchar(60) NOT NULL,
      kind varchar(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      settings json NOT NULL,
      revision int unsigned NOT NULL DEFAULT 1,
      created_at datetime(3) NOT NULL,
      updated_at datetime(3) NOT NULL,
      updated_by uuid NOT NULL,
      archived_at datetime(3) NULL,
      UNIQUE KEY ${table}_of_kind (workshop_id, id, kind),
      UNIQUE KEY ${table}_name (workshop_id, name),
      CONSTRAINT ${table}_workshop FOREIGN KEY (workshop_id) REFERENCES workshops (id),
      CONSTRAINT ${table}_updated_by FOREIGN KEY (workshop_id, updated_by) REFERENCES people (workshop_id, id),
      CONSTRAINT ${table}_name_given CHECK (char_length(trim(name)) > 0),
      CONSTRAINT ${table}_kind CHECK (kind IN (${kinds.map((kind) => `'${kind}'`).join(', ')})),
      CONSTRAINT ${table}_settings_of_kind CHECK (json_value(settings, '$.kind') <=> kind),
      CONSTRAINT ${table}_revision CHECK (revision >= 1)
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_ci`;
}

/** The kinds stand in the keys, so that a kerf can be of such a pair only as cuts at all. */
const createKerfs = `
  CREATE TABLE IF NOT EXISTS kerfs (
    workshop_id uuid NOT NULL,
    machine_id uuid NOT NULL,
    machine_kind varchar(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    material_id uuid NOT NULL,
    material_kind varchar(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    kerf_mm double NOT NULL,
    speed_mm_min double NULL,
    is_default boolean NOT NULL,
    measured_on date NULL,
    person_id uuid NOT NULL,
    revision int unsigned NOT NULL DEFAULT 1,
    updated_at datetime(3) NOT NULL,
    PRIMARY KEY (workshop_id, machine_id, material_id),
    CONSTRAINT kerfs_machine FOREIGN KEY (workshop_id, machine_id, machine_kind)
      REFERENCES machines (workshop_id, id, kind),
    CONSTRAINT kerfs_material FOREIGN KEY (workshop_id, material_id, material_kind)
      REFERENCES materials (workshop_id, id, kind),
    CONSTRAINT kerfs_person FOREIGN KEY (workshop_id, person_id) REFERENCES people (workshop_id, id),
    CONSTRAINT kerfs_pair CHECK ((machine_kind IN ('wire', 'bow')) = (material_kind = 'foam')),
    CONSTRAINT kerfs_width CHECK (kerf_mm > 0 AND kerf_mm <= 6),
    CONSTRAINT kerfs_speed CHECK (
      (machine_kind = 'bow') = (speed_mm_min IS NULL) AND (speed_mm_min IS NULL OR speed_mm_min > 0)
    ),
    CONSTRAINT kerfs_measured CHECK (is_default IN (0, 1) AND (is_default = 1) = (measured_on IS NULL)),
    CONSTRAINT kerfs_revision CHECK (revision >= 1)
  ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_ci`;

export async function up(knex: Knex): Promise<void> {
  await knex.raw(createItems('machines', ['wire', 'bow', 'laser', 'router']));
  await knex.raw(createItems('materials', ['foam', 'sheet']));
  await knex.raw(createKerfs);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS kerfs');
  await knex.raw('DROP TABLE IF EXISTS materials');
  await knex.raw('DROP TABLE IF EXISTS machines');
}
