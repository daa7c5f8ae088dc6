import type { MigrationInterface, QueryRunner } from 'typeorm';

const hash = (column: string): string => `"${column}" ~ '^[0-9a-f]{64}$'`;
const name = (column: string): string => `char_length("${column}") BETWEEN 1 AND 120`;

const projects = [
  `CREATE TABLE "project" (
    "id" uuid NOT NULL, "team_id" uuid NOT NULL, "name" text NOT NULL, "version" integer NOT NULL, "invented" boolean NOT NULL,
    "created_at" timestamptz NOT NULL, "created_by" uuid NOT NULL,
    CONSTRAINT "project_pk" PRIMARY KEY ("id"),
    CONSTRAINT "project_of" FOREIGN KEY ("team_id") REFERENCES "team" ("id"),
    CONSTRAINT "project_created_by" FOREIGN KEY ("created_by") REFERENCES "person" ("id"),
    CONSTRAINT "project_name" CHECK (${name('name')}),
    CONSTRAINT "project_version" CHECK ("version" > 0))`,
  `CREATE INDEX "project_team" ON "project" ("team_id")`,
  `CREATE TABLE "panel" (
    "id" uuid NOT NULL, "team_id" uuid NOT NULL, "project_id" uuid NOT NULL, "name" text NOT NULL, "created_at" timestamptz NOT NULL,
    CONSTRAINT "panel_pk" PRIMARY KEY ("id"),
    CONSTRAINT "panel_of" FOREIGN KEY ("team_id") REFERENCES "team" ("id"),
    CONSTRAINT "panel_project" FOREIGN KEY ("project_id") REFERENCES "project" ("id"),
    CONSTRAINT "panel_name" CHECK (${name('name')}))`,
  `CREATE INDEX "panel_team_project" ON "panel" ("team_id", "project_id")`,
  `CREATE TABLE "draft" (
    "panel_id" uuid NOT NULL, "team_id" uuid NOT NULL, "version" integer NOT NULL, "design" jsonb NOT NULL, "hash" text NOT NULL,
    "edition_id" uuid, "changed_at" timestamptz NOT NULL, "changed_by" uuid NOT NULL,
    CONSTRAINT "draft_pk" PRIMARY KEY ("panel_id"),
    CONSTRAINT "draft_panel" FOREIGN KEY ("panel_id") REFERENCES "panel" ("id"),
    CONSTRAINT "draft_of" FOREIGN KEY ("team_id") REFERENCES "team" ("id"),
    CONSTRAINT "draft_edition_of" FOREIGN KEY ("edition_id") REFERENCES "edition" ("id"),
    CONSTRAINT "draft_changed_by" FOREIGN KEY ("changed_by") REFERENCES "person" ("id"),
    CONSTRAINT "draft_version" CHECK ("version" > 0),
    CONSTRAINT "draft_hash" CHECK (${hash('hash')}))`,
  `CREATE INDEX "draft_edition" ON "draft" ("team_id", "edition_id")`,
];

const revisions = [
  // The database itself refuses a body that does not have its hash.
  `CREATE TABLE "content" (
    "team_id" uuid NOT NULL, "hash" text NOT NULL, "body" bytea NOT NULL,
    CONSTRAINT "content_pk" PRIMARY KEY ("team_id", "hash"),
    CONSTRAINT "content_of" FOREIGN KEY ("team_id") REFERENCES "team" ("id"),
    CONSTRAINT "content_hash" CHECK ("hash" = encode(sha256("body"), 'hex')))`,
  `CREATE TABLE "revision" (
    "id" uuid NOT NULL, "team_id" uuid NOT NULL, "panel_id" uuid NOT NULL, "number" integer NOT NULL, "hash" text NOT NULL,
    "parent_id" uuid, "parent_number" integer, "restored_from_number" integer, "edition_id" uuid,
    "panel_name" text NOT NULL, "project_name" text NOT NULL, "author_id" uuid NOT NULL, "author_name" text NOT NULL,
    "message" text NOT NULL, "created_at" timestamptz NOT NULL,
    CONSTRAINT "revision_pk" PRIMARY KEY ("id"),
    CONSTRAINT "revision_number" UNIQUE ("panel_id", "number"),
    CONSTRAINT "revision_panel" FOREIGN KEY ("panel_id") REFERENCES "panel" ("id"),
    CONSTRAINT "revision_of" FOREIGN KEY ("team_id") REFERENCES "team" ("id"),
    CONSTRAINT "revision_parent" FOREIGN KEY ("parent_id") REFERENCES "revision" ("id"),
    CONSTRAINT "revision_edition_of" FOREIGN KEY ("edition_id") REFERENCES "edition" ("id"),
    CONSTRAINT "revision_author" FOREIGN KEY ("author_id") REFERENCES "person" ("id"),
    CONSTRAINT "revision_hash" CHECK (${hash('hash')}),
    CONSTRAINT "revision_numbers" CHECK ("number" > 0 AND "parent_number" < "number" AND "restored_from_number" < "number"),
    CONSTRAINT "revision_lineage" CHECK (num_nulls("parent_id", "parent_number") IN (0, 2)))`,
  `CREATE INDEX "revision_team" ON "revision" ("team_id", "panel_id")`,
  `CREATE INDEX "revision_edition" ON "revision" ("team_id", "edition_id")`,
  `CREATE TABLE "revision_part" (
    "revision_id" uuid NOT NULL, "role" text NOT NULL, "team_id" uuid NOT NULL, "content_hash" text NOT NULL,
    CONSTRAINT "revision_part_pk" PRIMARY KEY ("revision_id", "role"),
    CONSTRAINT "revision_part_revision" FOREIGN KEY ("revision_id") REFERENCES "revision" ("id"),
    CONSTRAINT "revision_part_content" FOREIGN KEY ("team_id", "content_hash") REFERENCES "content" ("team_id", "hash"),
    CONSTRAINT "revision_part_role" CHECK ("role" IN ('design', 'edition')))`,
  ...['content', 'revision', 'revision_part'].flatMap((table) => [
    `CREATE TRIGGER "${table}_append_only" BEFORE UPDATE OR DELETE ON "${table}" FOR EACH ROW EXECUTE FUNCTION refuse_change()`,
    `CREATE TRIGGER "${table}_no_truncate" BEFORE TRUNCATE ON "${table}" FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()`,
  ]),
];

const results = [
  `CREATE TABLE "result" (
    "team_id" uuid NOT NULL, "content_hash" text NOT NULL, "kind" text NOT NULL, "engine_version" text NOT NULL,
    "body" jsonb NOT NULL, "created_at" timestamptz NOT NULL,
    CONSTRAINT "result_pk" PRIMARY KEY ("team_id", "content_hash", "kind", "engine_version"),
    CONSTRAINT "result_of" FOREIGN KEY ("team_id") REFERENCES "team" ("id"),
    CONSTRAINT "result_hash" CHECK (${hash('content_hash')}))`,
  `CREATE INDEX "result_age" ON "result" ("created_at")`,
];

export class ProjectsAndRevisions1764590700000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    for (const statement of [...projects, ...revisions, ...results]) await runner.query(statement);
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const table of ['result', 'revision_part', 'revision', 'content', 'draft', 'panel', 'project']) await runner.query(`DROP TABLE "${table}"`);
  }
}
