import type { RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import type { RateClass } from './route';
import { TooMany } from './problems';

export interface RateLimit {
  readonly windowSeconds: number;
  readonly count: number;
  /** Count only refusals: someone who signs in rightly is no attacker. */
  readonly failuresOnly?: true;
}

/** Per person, or per address for those not signed in; kept in each process. Sign-in has a delay per account besides. */
export const rateLimits: Readonly<Record<RateClass, RateLimit>> = {
  general: { windowSeconds: 60, count: 3000 },
  'sign-in': { windowSeconds: 300, count: 40, failuresOnly: true },
  letter: { windowSeconds: 300, count: 40 },
  upload: { windowSeconds: 60, count: 60 },
  compute: { windowSeconds: 60, count: 1200 },
  export: { windowSeconds: 60, count: 120 },
};

/** Key of whoever sends: set by the mounting once the caller is known. */
export type RateKey = (request: Parameters<RequestHandler>[0]) => string;

export function rateLimiters(keyOf: RateKey, limits: Readonly<Record<RateClass, RateLimit>>): Readonly<Record<RateClass, RequestHandler>> {
  const byAddress: RateKey = (request) => addressKey(request.ip);
  const limiter = ({ windowSeconds, count, failuresOnly }: RateLimit, key: RateKey = keyOf): RequestHandler =>
    rateLimit({
      windowMs: windowSeconds * 1000,
      limit: count,
      standardHeaders: 'draft-8',
      legacyHeaders: false,
      skipSuccessfulRequests: failuresOnly === true,
      keyGenerator: (request) => key(request),
      handler: (_request, _response, next) => next(new TooMany(windowSeconds)),
    });
  return {
    general: limiter(limits.general),
    // By address even for someone who holds a session: guesses are of other people's passwords.
    'sign-in': limiter(limits['sign-in'], byAddress),
    letter: limiter(limits.letter, byAddress),
    upload: limiter(limits.upload),
    compute: limiter(limits.compute),
    export: limiter(limits.export),
  };
}

/** An IPv6 subscriber owns a whole /56, so the limit is for that. */
export const addressKey = (address: string | undefined): string => ipKeyGenerator(address ?? 'unknown');
