import type { Request } from 'express';
import { Passport } from 'passport';
import { Strategy } from 'passport-jwt';
import * as z from 'zod';
import { ACCESS_AUDIENCE, CLOCK_SKEW_SECONDS, TOKEN_ALGORITHM, TOKEN_ISSUER } from './access-token';
import type { Caller } from './caller';
import { cookieNames, type CookieNames } from './session-cookies';

/** How the accounts look up who speaks. Null: nobody we know, or no longer. */
export interface Callers {
  bySession(sessionId: string, personId: string): Promise<Caller | null>;
  byToken(secret: string): Promise<Caller | null>;
}

const accessClaims = z.object({ sub: z.uuid(), sid: z.uuid(), typ: z.literal('access'), exp: z.number() });

export type Authenticate = (request: Request) => Promise<Caller | null>;

export const bearerOf = (request: Request): string | null => /^Bearer\s+(\S+)$/i.exec(request.headers.authorization ?? '')?.[1] ?? null;

function accessStrategy(secret: string, names: CookieNames, callers: Callers): Strategy {
  return new Strategy(
    {
      secretOrKey: secret,
      algorithms: [TOKEN_ALGORITHM],
      issuer: TOKEN_ISSUER,
      audience: ACCESS_AUDIENCE,
      jsonWebTokenOptions: { clockTolerance: CLOCK_SKEW_SECONDS },
      jwtFromRequest: (request: Request) => (request.cookies as Record<string, string | undefined>)[names.access] ?? null,
    },
    (payload: unknown, done: (error: unknown, caller: Caller | false) => void) => {
      const claims = accessClaims.safeParse(payload);
      if (!claims.success) {
        done(null, false);
        return;
      }
      callers.bySession(claims.data.sid, claims.data.sub).then(
        (caller) => done(null, caller ?? false),
        (error: unknown) => done(error, false),
      );
    },
  );
}

/** A personal token in the Authorization header wins; else the access token in its cookie, by passport-jwt. */
export function authentication(options: { secret: string; secure: boolean; callers: Callers }): Authenticate {
  const passport = new Passport();
  passport.use('access', accessStrategy(options.secret, cookieNames(options.secure), options.callers));
  return (request) => {
    if (request.headers.authorization !== undefined) {
      const secret = bearerOf(request);
      return secret === null ? Promise.resolve(null) : options.callers.byToken(secret);
    }
    return new Promise((resolve, reject) => {
      const settle = (error: unknown, caller: Caller | false | null | undefined): void => {
        if (error !== null && error !== undefined) reject(error);
        else resolve(caller ? caller : null);
      };
      const run = passport.authenticate('access', { session: false }, settle) as (
        request: Request,
        response: object,
        next: (error?: unknown) => void,
      ) => void;
      run(request, {}, (error) => settle(error ?? null, null));
    });
  };
}
