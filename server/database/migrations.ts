import type { MigrationInterface } from 'typeorm';

/**
 * Every migration, one line each, oldest first. One file per feature and change: `migrations/<timestamp>-<what>.ts`
 * with a class `<What><timestamp>`. Never edit one that has been released; add another.
 */
export const migrations: readonly (new () => MigrationInterface)[] = [
];
