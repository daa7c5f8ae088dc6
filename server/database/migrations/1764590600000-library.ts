import type { MigrationInterface, QueryRunner } from 'typeorm';

const hash = (column: string): string => `"${column}" ~ '^[0-9a-f]{64}$'`;
const finite = (column: string): string => `"${column}" > '-Infinity' AND "${column}" < 'Infinity'`;

const up = [
  `CREATE TABLE "cell_family" (
    "id" uuid NOT NULL, "team_id" uuid NOT NULL, "name" text NOT NULL, "created_at" timestamptz NOT NULL,
    CONSTRAINT "cell_family_pk" PRIMARY KEY ("id"),
    CONSTRAINT "cell_family_name" UNIQUE ("team_id", "name"),
    CONSTRAINT "cell_family_of" FOREIGN KEY ("team_id") REFERENCES "team" ("id"),
    CONSTRAINT "cell_family_name_length" CHECK (char_length("name") BETWEEN 1 AND 120))`,
  `CREATE INDEX "cell_family_team" ON "cell_family" ("team_id")`,
  `CREATE TABLE "edition" (
    "id" uuid NOT NULL, "team_id" uuid NOT NULL, "family_id" uuid NOT NULL, "number" integer, "hash" text NOT NULL,
    "description" jsonb NOT NULL, "cells" jsonb NOT NULL, "mapping" jsonb NOT NULL, "messages" jsonb NOT NULL, "quality" jsonb NOT NULL,
    "verdict" text NOT NULL, "cell_count" integer NOT NULL, "file_count" integer NOT NULL,
    "from_ghz" double precision NOT NULL, "to_ghz" double precision NOT NULL,
    "thetas_deg" double precision[] NOT NULL, "phis_deg" double precision[] NOT NULL, "responses" bytea NOT NULL,
    "note" text NOT NULL, "accepted_by" uuid NOT NULL, "accepted_at" timestamptz NOT NULL,
    "publish_note" text, "published_by" uuid, "published_at" timestamptz,
    CONSTRAINT "edition_pk" PRIMARY KEY ("id"),
    CONSTRAINT "edition_number" UNIQUE ("family_id", "number"),
    CONSTRAINT "edition_family" FOREIGN KEY ("family_id") REFERENCES "cell_family" ("id"),
    CONSTRAINT "edition_of" FOREIGN KEY ("team_id") REFERENCES "team" ("id"),
    CONSTRAINT "edition_accepted_by" FOREIGN KEY ("accepted_by") REFERENCES "person" ("id"),
    CONSTRAINT "edition_published_by" FOREIGN KEY ("published_by") REFERENCES "person" ("id"),
    CONSTRAINT "edition_hash" CHECK (${hash('hash')}),
    CONSTRAINT "edition_band" CHECK (${finite('from_ghz')} AND ${finite('to_ghz')} AND "from_ghz" > 0 AND "to_ghz" >= "from_ghz"),
    CONSTRAINT "edition_counts" CHECK ("cell_count" > 0 AND "file_count" > 0 AND "number" > 0),
    CONSTRAINT "edition_verdict" CHECK ("verdict" IN ('pass', 'warn', 'fail', 'not-evaluated')),
    CONSTRAINT "edition_published" CHECK (num_nulls("number", "publish_note", "published_by", "published_at") IN (0, 4)))`,
  `CREATE INDEX "edition_team" ON "edition" ("team_id")`,
  `CREATE TABLE "kept_file" (
    "team_id" uuid NOT NULL, "sha256" text NOT NULL, "body" bytea NOT NULL,
    CONSTRAINT "kept_file_pk" PRIMARY KEY ("team_id", "sha256"),
    CONSTRAINT "kept_file_of" FOREIGN KEY ("team_id") REFERENCES "team" ("id"),
    CONSTRAINT "kept_file_hash" CHECK (${hash('sha256')}))`,
  `CREATE TABLE "edition_file" (
    "edition_id" uuid NOT NULL, "name" text NOT NULL, "team_id" uuid NOT NULL, "sha256" text NOT NULL, "bytes" integer NOT NULL,
    CONSTRAINT "edition_file_pk" PRIMARY KEY ("edition_id", "name"),
    CONSTRAINT "edition_file_edition" FOREIGN KEY ("edition_id") REFERENCES "edition" ("id") ON DELETE CASCADE,
    CONSTRAINT "edition_file_body" FOREIGN KEY ("team_id", "sha256") REFERENCES "kept_file" ("team_id", "sha256"))`,
  `CREATE INDEX "edition_file_content" ON "edition_file" ("team_id", "sha256")`,
  // A published edition is what revisions stand on: neither it nor its files may change or go.
  `CREATE TRIGGER "edition_immutable" BEFORE UPDATE OR DELETE ON "edition" FOR EACH ROW
    WHEN (OLD."number" IS NOT NULL) EXECUTE FUNCTION refuse_change()`,
  `CREATE TRIGGER "edition_no_truncate" BEFORE TRUNCATE ON "edition" FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()`,
  // Until then only the act of publishing changes it.
  `CREATE FUNCTION refuse_edition_edit() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF ROW(NEW."id", NEW."team_id", NEW."family_id", NEW."hash", NEW."description", NEW."cells", NEW."mapping", NEW."quality",
             NEW."responses", NEW."note", NEW."accepted_by", NEW."accepted_at")
         IS DISTINCT FROM
         ROW(OLD."id", OLD."team_id", OLD."family_id", OLD."hash", OLD."description", OLD."cells", OLD."mapping", OLD."quality",
             OLD."responses", OLD."note", OLD."accepted_by", OLD."accepted_at") THEN
        RAISE EXCEPTION 'the content of an edition is never changed' USING ERRCODE = 'integrity_constraint_violation';
      END IF;
      RETURN NEW;
    END $$`,
  `CREATE TRIGGER "edition_content" BEFORE UPDATE ON "edition" FOR EACH ROW EXECUTE FUNCTION refuse_edition_edit()`,
  `CREATE FUNCTION refuse_published_file_change() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF EXISTS (SELECT 1 FROM "edition" WHERE "id" = OLD."edition_id" AND "number" IS NOT NULL) THEN
        RAISE EXCEPTION 'files of a published edition are never changed or removed' USING ERRCODE = 'integrity_constraint_violation';
      END IF;
      RETURN COALESCE(NEW, OLD);
    END $$`,
  `CREATE TRIGGER "edition_file_immutable" BEFORE UPDATE OR DELETE ON "edition_file" FOR EACH ROW EXECUTE FUNCTION refuse_published_file_change()`,
  `CREATE TRIGGER "kept_file_immutable" BEFORE UPDATE ON "kept_file" FOR EACH ROW EXECUTE FUNCTION refuse_change()`,
];

export class Library1764590600000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    for (const statement of up) await runner.query(statement);
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const table of ['edition_file', 'kept_file', 'edition', 'cell_family']) await runner.query(`DROP TABLE "${table}"`);
    for (const name of ['refuse_edition_edit', 'refuse_published_file_change']) await runner.query(`DROP FUNCTION ${name}()`);
  }
}
