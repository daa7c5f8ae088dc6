import { accountRoutes } from './accounts/account-routes';
import { sessionListRoutes, sessionRoutes } from './accounts/session-routes';
import { auditRoutes } from './audit/audit-routes';
import { healthRoutes } from './health/health-routes';
import type { House } from './house';
import type { Route } from './http/route';
import { libraryRoutes } from './library/library-routes';
import { letterRoutes } from './notices/letter-routes';
import { predictionRoutes } from './predictions/prediction-routes';
import { projectRoutes } from './projects/project-routes';
import { comparisonRoutes } from './revisions/comparison-routes';
import { exportRoutes } from './revisions/export-routes';
import { revisionRoutes } from './revisions/revision-routes';
import { runRoutes } from './runs/run-routes';
import { invitationRoutes, teamRoutes } from './teams/team-routes';

/** Every feature's routes, one line each. */
export const features: readonly ((house: House) => readonly Route[])[] = [
  healthRoutes,
  sessionRoutes,
  sessionListRoutes,
  accountRoutes,
  teamRoutes,
  invitationRoutes,
  auditRoutes,
  letterRoutes,
  libraryRoutes,
  predictionRoutes,
  projectRoutes,
  revisionRoutes,
  comparisonRoutes,
  exportRoutes,
  runRoutes,
];
