import PgBoss from 'pg-boss';
import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Queues of chunks to compute, and of those that were begun too often without ever ending. */
const QUEUES = [
  ['run-chunk-dead', { policy: 'standard' }],
  ['run-chunk', { policy: 'standard', deadLetter: 'run-chunk-dead' }],
] as const;

/** The queue's own schema, `pgboss`, made by the statements that the package gives for its version. */
export class Queue1764590810000 implements MigrationInterface {
  /** The package's statements are a transaction of their own. */
  readonly transaction = false;

  async up(runner: QueryRunner): Promise<void> {
    await runner.query('DROP SCHEMA IF EXISTS "pgboss" CASCADE');
    await runner.query(PgBoss.getConstructionPlans());
    for (const [name, options] of QUEUES) await runner.query('SELECT pgboss.create_queue($1, $2)', [name, JSON.stringify(options)]);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP SCHEMA "pgboss" CASCADE');
  }
}
