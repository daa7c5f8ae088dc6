import type { MigrationInterface } from 'typeorm';
import { PeopleAndTeams1764590400000 } from './migrations/1764590400000-people-and-teams';
import { Audit1764590500000 } from './migrations/1764590500000-audit';
import { Replays1764590550000 } from './migrations/1764590550000-replays';
import { Library1764590600000 } from './migrations/1764590600000-library';
import { ProjectsAndRevisions1764590700000 } from './migrations/1764590700000-projects-and-revisions';
import { Runs1764590800000 } from './migrations/1764590800000-runs';
import { Queue1764590810000 } from './migrations/1764590810000-queue';

/**
 * Every migration, one line each, oldest first. One file per feature and change: `migrations/<timestamp>-<what>.ts`
 * with a class `<What><timestamp>`. Append-only tables get a trigger with `refuse_change()`, made in the audit migration.
 * Never edit a migration that has been released; add another.
 */
export const migrations: readonly (new () => MigrationInterface)[] = [
  PeopleAndTeams1764590400000,
  Audit1764590500000,
  Replays1764590550000,
  Library1764590600000,
  ProjectsAndRevisions1764590700000,
  Runs1764590800000,
  Queue1764590810000,
];
