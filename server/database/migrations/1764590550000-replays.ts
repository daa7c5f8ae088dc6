import type { MigrationInterface, QueryRunner } from 'typeorm';

export class Replays1764590550000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE TABLE "replay" (
      "person_id" uuid NOT NULL, "key" text NOT NULL, "request_hash" text NOT NULL, "created_at" timestamptz NOT NULL, "answer" jsonb,
      CONSTRAINT "replay_pk" PRIMARY KEY ("person_id", "key"),
      CONSTRAINT "replay_of" FOREIGN KEY ("person_id") REFERENCES "person" ("id"),
      CONSTRAINT "replay_key_length" CHECK (char_length("key") BETWEEN 8 AND 200))`);
    await runner.query(`CREATE INDEX "replay_age" ON "replay" ("created_at")`);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE "replay"');
  }
}
