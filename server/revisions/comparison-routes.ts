import type { Role } from '../../shared/contracts/common';
import { comparison, comparisonQuery } from '../../shared/contracts/comparisons';
import { NotAcceptable } from '../http/problems';
import { BytesReply, MAX_JSON_NUMBERS } from '../http/reply';
import { defineRoute, type Route } from '../http/route';
import { COMPUTE_SECONDS } from '../http/time-limit';
import { comparisonBlockOf, comparisonReplyOf } from './comparison-reply';
import { comparedNumberBound, type ComparisonService } from './comparison-service';

const BLOCK = 'application/octet-stream';
/** Drafts may be compared, and a fabricator sees none. */
const readers: readonly Role[] = ['designer', 'lab', 'reviewer', 'range', 'administrator'];

export const comparisonRoutes = ({ comparisons }: { comparisons: ComparisonService }): readonly Route[] => [
  defineRoute({
    method: 'get',
    path: '/api/comparisons',
    summary: 'Compare two states, each `revision:<id>` or `draft:<panel id>`; as JSON, or as a binary block with Accept: application/octet-stream',
    policy: { kind: 'signed-in', roles: readers, scope: 'read' },
    rate: 'compute',
    timeLimitSeconds: COMPUTE_SECONDS,
    query: comparisonQuery,
    reply: comparison,
    bytes: [BLOCK],
    handler: async ({ caller, query, wants, signal }) => {
      const pair = await comparisons.pair(caller.teamId, query);
      const asBlock = wants(BLOCK);
      const numbers = comparedNumberBound(pair);
      if (!asBlock && numbers > MAX_JSON_NUMBERS) {
        throw new NotAcceptable(`Up to ${numbers} numbers are too many for JSON, the limit is ${MAX_JSON_NUMBERS}: ask with Accept: ${BLOCK}.`);
      }
      const computed = await comparisons.compare(caller.teamId, pair, signal);
      return asBlock ? new BytesReply(comparisonBlockOf(computed), BLOCK) : comparisonReplyOf(computed);
    },
  }),
];
