import { type Knex } from 'knex';

/** Columns of a version that are fixed once it is saved. */
const fixed = [
  'workshop_id',
  'id',
  'section_id',
  'number',
  'based_on',
  'shape',
  'checksum',
  'kind',
  'description',
  'thickness',
  'camber',
  'note',
  'author_id',
  'created_at',
  'idempotency_key',
  'request_checksum',
];

/** Compared byte by byte: the column's own collation would let "Note" become "note". */
const unchanged = fixed.map((column) => `binary NEW.${column} <=> binary OLD.${column}`).join(' AND ');

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE OR REPLACE TRIGGER section_versions_fixed BEFORE UPDATE ON section_versions FOR EACH ROW
    BEGIN
      IF NOT (${unchanged}) THEN
        SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A saved version never changes.';
      END IF;
      IF NEW.status = OLD.status AND NOT (
        binary NEW.status_reason <=> binary OLD.status_reason
        AND NEW.status_by <=> OLD.status_by AND NEW.status_at <=> OLD.status_at
      ) THEN
        SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'The record of a status never changes.';
      END IF;
      IF NEW.status <> OLD.status AND NOT (
        (OLD.status = 'draft' AND NEW.status = 'released')
        OR (OLD.status = 'released' AND NEW.status IN ('superseded', 'withdrawn'))
      ) THEN
        SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A version goes from draft to released to superseded or withdrawn.';
      END IF;
    END`);
  await knex.raw(`
    CREATE OR REPLACE TRIGGER section_versions_kept BEFORE DELETE ON section_versions FOR EACH ROW
      SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A saved version is never deleted.'`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TRIGGER IF EXISTS section_versions_kept');
  await knex.raw('DROP TRIGGER IF EXISTS section_versions_fixed');
}
