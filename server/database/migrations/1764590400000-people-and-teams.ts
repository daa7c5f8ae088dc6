import type { MigrationInterface, QueryRunner } from 'typeorm';

const roles = `ARRAY['designer','lab','reviewer','fabricator','range','administrator']::text[]`;
const scopes = `ARRAY['read','predict','design','library','team']::text[]`;

/** Statements of one table each; constraint names are ours, so that a later migration can find them. */
const up = [
  `CREATE TABLE "team" (
    "id" uuid NOT NULL, "name" text NOT NULL, "created_at" timestamptz NOT NULL,
    CONSTRAINT "team_pk" PRIMARY KEY ("id"),
    CONSTRAINT "team_name_length" CHECK (char_length("name") BETWEEN 1 AND 120))`,
  `CREATE TABLE "person" (
    "id" uuid NOT NULL, "email" text NOT NULL, "name" text NOT NULL, "password_hash" text NOT NULL, "created_at" timestamptz NOT NULL,
    CONSTRAINT "person_pk" PRIMARY KEY ("id"),
    CONSTRAINT "person_email" UNIQUE ("email"),
    CONSTRAINT "person_email_lower" CHECK ("email" = lower("email") AND char_length("email") <= 254),
    CONSTRAINT "person_name_length" CHECK (char_length("name") BETWEEN 1 AND 120))`,
  `CREATE TABLE "membership" (
    "team_id" uuid NOT NULL, "person_id" uuid NOT NULL, "roles" text[] NOT NULL, "joined_at" timestamptz NOT NULL,
    "disabled_at" timestamptz, "last_seen_at" timestamptz,
    CONSTRAINT "membership_pk" PRIMARY KEY ("team_id", "person_id"),
    CONSTRAINT "membership_team" FOREIGN KEY ("team_id") REFERENCES "team" ("id"),
    CONSTRAINT "membership_of" FOREIGN KEY ("person_id") REFERENCES "person" ("id"),
    CONSTRAINT "membership_roles" CHECK ("roles" <@ ${roles}))`,
  `CREATE INDEX "membership_person" ON "membership" ("person_id")`,
  `CREATE TABLE "invitation" (
    "id" uuid NOT NULL, "team_id" uuid NOT NULL, "email" text NOT NULL, "roles" text[] NOT NULL, "hash" text NOT NULL,
    "invited_by" uuid, "created_at" timestamptz NOT NULL, "expires_at" timestamptz NOT NULL, "accepted_at" timestamptz,
    CONSTRAINT "invitation_pk" PRIMARY KEY ("id"),
    CONSTRAINT "invitation_hash" UNIQUE ("hash"),
    CONSTRAINT "invitation_to" FOREIGN KEY ("team_id") REFERENCES "team" ("id"),
    CONSTRAINT "invitation_from" FOREIGN KEY ("invited_by") REFERENCES "person" ("id"),
    CONSTRAINT "invitation_roles" CHECK ("roles" <@ ${roles} AND cardinality("roles") > 0))`,
  `CREATE INDEX "invitation_team" ON "invitation" ("team_id")`,
  `CREATE TABLE "session" (
    "id" uuid NOT NULL, "person_id" uuid NOT NULL, "team_id" uuid NOT NULL, "created_at" timestamptz NOT NULL,
    "last_used_at" timestamptz NOT NULL, "ends_at" timestamptz NOT NULL, "revoked_at" timestamptz,
    "address" text NOT NULL, "browser" text NOT NULL,
    CONSTRAINT "session_pk" PRIMARY KEY ("id"),
    CONSTRAINT "session_membership" FOREIGN KEY ("team_id", "person_id") REFERENCES "membership" ("team_id", "person_id"),
    CONSTRAINT "session_order" CHECK ("ends_at" > "created_at"))`,
  `CREATE INDEX "session_person" ON "session" ("person_id")`,
  `CREATE TABLE "refresh_token" (
    "hash" text NOT NULL, "session_id" uuid NOT NULL, "created_at" timestamptz NOT NULL, "used_at" timestamptz,
    CONSTRAINT "refresh_token_pk" PRIMARY KEY ("hash"),
    CONSTRAINT "refresh_token_of" FOREIGN KEY ("session_id") REFERENCES "session" ("id") ON DELETE CASCADE)`,
  `CREATE INDEX "refresh_token_session" ON "refresh_token" ("session_id")`,
  `CREATE TABLE "personal_token" (
    "id" uuid NOT NULL, "person_id" uuid NOT NULL, "team_id" uuid NOT NULL, "name" text NOT NULL, "scopes" text[] NOT NULL,
    "hash" text NOT NULL, "created_at" timestamptz NOT NULL, "expires_at" timestamptz NOT NULL, "last_used_at" timestamptz,
    CONSTRAINT "personal_token_pk" PRIMARY KEY ("id"),
    CONSTRAINT "personal_token_hash" UNIQUE ("hash"),
    CONSTRAINT "personal_token_membership" FOREIGN KEY ("team_id", "person_id") REFERENCES "membership" ("team_id", "person_id"),
    CONSTRAINT "personal_token_scopes" CHECK ("scopes" <@ ${scopes} AND cardinality("scopes") > 0))`,
  `CREATE INDEX "personal_token_person" ON "personal_token" ("person_id")`,
  `CREATE TABLE "password_reset" (
    "hash" text NOT NULL, "person_id" uuid NOT NULL, "created_at" timestamptz NOT NULL, "expires_at" timestamptz NOT NULL,
    "used_at" timestamptz,
    CONSTRAINT "password_reset_pk" PRIMARY KEY ("hash"),
    CONSTRAINT "password_reset_of" FOREIGN KEY ("person_id") REFERENCES "person" ("id"))`,
  `CREATE INDEX "password_reset_person" ON "password_reset" ("person_id")`,
  `CREATE TABLE "sign_in_attempt" (
    "address_hash" text NOT NULL, "failures" integer NOT NULL, "next_at" timestamptz NOT NULL,
    CONSTRAINT "sign_in_attempt_pk" PRIMARY KEY ("address_hash"),
    CONSTRAINT "sign_in_attempt_count" CHECK ("failures" >= 0))`,
  `CREATE TABLE "letter" (
    "id" uuid NOT NULL, "recipient" text NOT NULL, "subject" text NOT NULL, "sealed_text" bytea NOT NULL,
    "created_at" timestamptz NOT NULL, "attempts" integer NOT NULL, "next_attempt_at" timestamptz, "sent_at" timestamptz, "last_error" text,
    CONSTRAINT "letter_pk" PRIMARY KEY ("id"),
    CONSTRAINT "letter_attempts" CHECK ("attempts" >= 0))`,
  `CREATE INDEX "letter_due" ON "letter" ("next_attempt_at") WHERE sent_at IS NULL`,
];

const down = ['letter', 'sign_in_attempt', 'password_reset', 'personal_token', 'refresh_token', 'session', 'invitation', 'membership', 'person', 'team'];

export class PeopleAndTeams1764590400000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    for (const statement of up) await runner.query(statement);
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const table of down) await runner.query(`DROP TABLE "${table}"`);
  }
}
