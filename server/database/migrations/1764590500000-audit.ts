import type { MigrationInterface, QueryRunner } from 'typeorm';

const up = [
  `CREATE TABLE "audit_row" (
    "team_id" uuid NOT NULL, "sequence" integer NOT NULL, "at" timestamptz NOT NULL, "person_id" uuid,
    "action" text NOT NULL, "object" text NOT NULL, "detail" jsonb NOT NULL, "previous_hash" text NOT NULL, "hash" text NOT NULL,
    CONSTRAINT "audit_row_pk" PRIMARY KEY ("team_id", "sequence"),
    CONSTRAINT "audit_row_team" FOREIGN KEY ("team_id") REFERENCES "team" ("id"),
    CONSTRAINT "audit_row_person" FOREIGN KEY ("person_id") REFERENCES "person" ("id"),
    CONSTRAINT "audit_row_sequence" CHECK ("sequence" > 0),
    CONSTRAINT "audit_row_hash" CHECK ("hash" ~ '^[0-9a-f]{64}$'))`,
  // Shared by every append-only table: use it in a trigger as below.
  `CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      RAISE EXCEPTION 'rows of % are never changed or removed', TG_TABLE_NAME USING ERRCODE = 'integrity_constraint_violation';
    END $$`,
  `CREATE TRIGGER "audit_row_append_only" BEFORE UPDATE OR DELETE ON "audit_row" FOR EACH ROW EXECUTE FUNCTION refuse_change()`,
  `CREATE TRIGGER "audit_row_no_truncate" BEFORE TRUNCATE ON "audit_row" FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()`,
];

export class Audit1764590500000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    for (const statement of up) await runner.query(statement);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE "audit_row"');
    await runner.query('DROP FUNCTION refuse_change()');
  }
}
