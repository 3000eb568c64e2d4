import { type Knex } from 'knex';

/** `default_of` is empty but for the default, so that its key lets each workshop have one default at most. */
const createFlightConditions = `
  CREATE TABLE IF NOT EXISTS flight_conditions (
    workshop_id uuid NOT NULL,
    id uuid NOT NULL PRIMARY KEY,
    name varchar(60) NOT NULL,
    settings json NOT NULL,
    is_default boolean NOT NULL DEFAULT 0,
    default_of uuid AS (IF(is_default = 1, workshop_id, NULL)) PERSISTENT,
    revision int unsigned NOT NULL DEFAULT 1,
    created_at datetime(3) NOT NULL,
    updated_at datetime(3) NOT NULL,
    updated_by uuid NOT NULL,
    archived_at datetime(3) NULL,
    UNIQUE KEY flight_conditions_of_workshop (workshop_id, id),
    UNIQUE KEY flight_conditions_name (workshop_id, name),
    UNIQUE KEY flight_conditions_default (default_of),
    CONSTRAINT flight_conditions_workshop FOREIGN KEY (workshop_id) REFERENCES workshops (id),
    CONSTRAINT flight_conditions_updated_by FOREIGN KEY (workshop_id, updated_by)
      REFERENCES people (workshop_id, id),
    CONSTRAINT flight_conditions_name_given CHECK (char_length(trim(name)) > 0),
    CONSTRAINT flight_conditions_mass CHECK (json_value(settings, '$.massKg') > 0),
    CONSTRAINT flight_conditions_default_in_use CHECK (is_default IN (0, 1) AND NOT (is_default = 1 AND archived_at IS NOT NULL)),
    CONSTRAINT flight_conditions_revision CHECK (revision >= 1)
  ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_ci`;

export async function up(knex: Knex): Promise<void> {
  await knex.raw(createFlightConditions);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS flight_conditions');
}
