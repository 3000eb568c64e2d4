import { type Knex } from 'knex';

/** Sessions end whenever what they rest on changes, whoever changes it: the database itself counts the epoch up. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE OR REPLACE TRIGGER people_session_epoch BEFORE UPDATE ON people FOR EACH ROW
    BEGIN
      IF NEW.role <> OLD.role OR NEW.active <> OLD.active OR NEW.password_hash <> OLD.password_hash THEN
        SET NEW.session_epoch = OLD.session_epoch + 1;
      END IF;
    END`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TRIGGER IF EXISTS people_session_epoch');
}
