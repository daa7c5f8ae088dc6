import type { MigrationInterface, QueryRunner } from 'typeorm';

const finite = (column: string): string => `"${column}" >= 0 AND "${column}" < 'Infinity'`;

const tables = [
  `CREATE TABLE "run" (
    "id" uuid NOT NULL, "team_id" uuid NOT NULL, "panel_id" uuid NOT NULL, "panel_name" text NOT NULL, "kind" text NOT NULL,
    "parameters" jsonb NOT NULL, "design" jsonb NOT NULL, "edition_id" uuid, "content_hash" text NOT NULL, "result_key" text NOT NULL,
    "engine_version" text NOT NULL, "draft_version" integer, "revision_id" uuid, "revision_number" integer, "state" text NOT NULL,
    "created_at" timestamptz NOT NULL, "created_by" uuid NOT NULL, "created_by_name" text NOT NULL, "started_at" timestamptz, "finished_at" timestamptz,
    "chunk_count" integer NOT NULL, "done_count" integer NOT NULL, "planned_seconds" double precision NOT NULL, "done_seconds" double precision NOT NULL,
    "restart_count" integer NOT NULL, "reused" boolean NOT NULL, "failure_message" text, "failure_id" uuid,
    CONSTRAINT "run_pk" PRIMARY KEY ("id"),
    CONSTRAINT "run_of" FOREIGN KEY ("team_id") REFERENCES "team" ("id"),
    CONSTRAINT "run_panel" FOREIGN KEY ("panel_id") REFERENCES "panel" ("id"),
    CONSTRAINT "run_edition_of" FOREIGN KEY ("edition_id") REFERENCES "edition" ("id"),
    CONSTRAINT "run_revision" FOREIGN KEY ("revision_id") REFERENCES "revision" ("id"),
    CONSTRAINT "run_created_by" FOREIGN KEY ("created_by") REFERENCES "person" ("id"),
    CONSTRAINT "run_hashes" CHECK ("content_hash" ~ '^[0-9a-f]{64}$' AND "result_key" ~ '^[0-9a-f]{64}$'),
    CONSTRAINT "run_source" CHECK (num_nulls("draft_version", "revision_id") = 1 AND num_nulls("revision_id", "revision_number") IN (0, 2)),
    CONSTRAINT "run_state" CHECK ("state" IN ('queued', 'running', 'done', 'failed', 'cancelled')),
    CONSTRAINT "run_counts" CHECK ("chunk_count" >= 0 AND "done_count" BETWEEN 0 AND "chunk_count" AND "restart_count" >= 0),
    CONSTRAINT "run_seconds" CHECK (${finite('planned_seconds')} AND ${finite('done_seconds')}),
    CONSTRAINT "run_over" CHECK (("state" IN ('queued', 'running')) = ("finished_at" IS NULL)),
    CONSTRAINT "run_failure" CHECK (num_nulls("failure_message", "failure_id") IN (0, 2) AND ("state" = 'failed') = ("failure_id" IS NOT NULL)))`,
  `CREATE INDEX "run_team_panel" ON "run" ("team_id", "panel_id", "created_at")`,
  `CREATE INDEX "run_waiting" ON "run" ("state", "team_id")`,
  // One computation of a thing at a time: who asks for it meanwhile gets the run that is under way.
  `CREATE UNIQUE INDEX "run_active_key" ON "run" ("team_id", "result_key", "engine_version", "revision_id") NULLS NOT DISTINCT WHERE "state" IN ('queued', 'running')`,
  `CREATE TABLE "run_chunk" (
    "run_id" uuid NOT NULL, "number" integer NOT NULL, "team_id" uuid NOT NULL, "chunk" jsonb NOT NULL, "seconds" double precision NOT NULL,
    "state" text NOT NULL, "attempt" integer NOT NULL, "worker" text, "part" bytea,
    CONSTRAINT "run_chunk_pk" PRIMARY KEY ("run_id", "number"),
    CONSTRAINT "run_chunk_run" FOREIGN KEY ("run_id") REFERENCES "run" ("id") ON DELETE CASCADE,
    CONSTRAINT "run_chunk_seconds" CHECK (${finite('seconds')}),
    CONSTRAINT "run_chunk_state" CHECK ("state" IN ('waiting', 'sent', 'running', 'done')),
    CONSTRAINT "run_chunk_part" CHECK (("state" = 'done') = ("part" IS NOT NULL)))`,
  `CREATE INDEX "run_chunk_team" ON "run_chunk" ("team_id", "state")`,
  `CREATE TABLE "run_worker" (
    "id" uuid NOT NULL, "name" text NOT NULL, "threads" integer NOT NULL, "seen_at" timestamptz NOT NULL,
    CONSTRAINT "run_worker_pk" PRIMARY KEY ("id"),
    CONSTRAINT "run_worker_threads" CHECK ("threads" > 0))`,
];

export class Runs1764590800000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    for (const statement of tables) await runner.query(statement);
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const table of ['run_worker', 'run_chunk', 'run']) await runner.query(`DROP TABLE "${table}"`);
  }
}
