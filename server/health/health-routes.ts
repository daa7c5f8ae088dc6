import * as z from 'zod';
import { about, type About } from '../../shared/contracts/session';
import { Unavailable } from '../http/problems';
import { defineRoute, type Route } from '../http/route';

interface Parts {
  readonly describe: () => About;
  /** Database reachable, migrations complete, and not about to stop. */
  readonly isReady: () => Promise<boolean>;
}

const status = z.strictObject({ status: z.literal('ok') });
const everyone = { kind: 'public' } as const;

export const healthRoutes = ({ describe, isReady }: Parts): readonly Route[] => [
  defineRoute({
    method: 'get',
    path: '/api/health',
    summary: 'The process lives',
    policy: everyone,
    reply: status,
    handler: () => ({ status: 'ok' as const }),
  }),
  defineRoute({
    method: 'get',
    path: '/api/ready',
    summary: 'The process can serve: the database answers and its schema is complete',
    policy: everyone,
    reply: status,
    handler: async () => {
      if (!(await isReady())) throw new Unavailable('The database is not ready.', 2);
      return { status: 'ok' as const };
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/about',
    summary: 'What the sign-in page needs to know',
    policy: everyone,
    reply: about,
    handler: () => describe(),
  }),
];
