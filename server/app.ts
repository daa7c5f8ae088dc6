import { randomUUID } from 'node:crypto';
import compression from 'compression';
import cookieParser from 'cookie-parser';
import express, { type Express, type RequestHandler } from 'express';
import { pinoHttp } from 'pino-http';
import { features } from './features';
import type { House } from './house';
import { authentication } from './http/authentication';
import { callerOf, mountRoutes } from './http/mount-routes';
import { openApiRoute } from './http/open-api-route';
import { problemReply, unknownAddress } from './http/problem-reply';
import { noStore, securityHeaders } from './http/security-headers';
import { cookieNames } from './http/session-cookies';
import { staticClient } from './http/static-client';
import type { RateClass, Route } from './http/route';
import type { RateLimit } from './http/rate-limits';
import { version } from './version';

export interface AppOptions {
  readonly house: House;
  readonly checkReplies?: boolean;
  readonly rateLimits?: Readonly<Record<RateClass, RateLimit>>;
  /** Routes besides those of the features: for tests of the frame itself. */
  readonly moreRoutes?: readonly Route[];
}

/** Our own id for every request: one that a sender chose could forge lines of the log. */
const giveRequestId: RequestHandler = (_request, response, next) => {
  response.setHeader('X-Request-Id', randomUUID());
  next();
};

function requestLog(house: House): RequestHandler {
  return pinoHttp({
    logger: house.ground.logger,
    genReqId: (_request, response) => String(response.getHeader('X-Request-Id')),
    // Neither headers nor the query string are logged: they can hold cookies, tokens and names.
    serializers: {
      req: (request: { id: string; method: string; url: string }) => ({
        id: request.id,
        method: request.method,
        path: request.url.split('?')[0],
      }),
      res: (response: { statusCode: number }) => ({ statusCode: response.statusCode }),
    },
    customProps: (request) => {
      const caller = callerOf(request as express.Request);
      return caller === null ? {} : { personId: caller.person.id, teamId: caller.teamId };
    },
    customLogLevel: (_request, response, error) => (error || response.statusCode >= 500 ? 'error' : 'info'),
  });
}

/** All routes of this house, with the document that describes them. */
export function allRoutes(house: House, moreRoutes: readonly Route[] = []): readonly Route[] {
  const routes = [...features.flatMap((feature) => feature(house)), ...moreRoutes];
  return [...routes, openApiRoute(routes, version, cookieNames(house.secure).access)];
}

/** The whole application without a port, so that tests can drive it. */
export function createApp(options: AppOptions): Express {
  const { house } = options;
  const { secure } = house;
  const { config, logger } = house.ground;
  const app = express();
  app.disable('x-powered-by');
  app.set('query parser', 'simple');
  app.set('trust proxy', config.trustedProxyCount);
  // Tags are ours: made from versions, not from the bytes of an answer.
  app.set('etag', false);
  app.use(giveRequestId, requestLog(house), securityHeaders({ secure }), compression());
  app.use('/api', noStore, cookieParser());
  mountRoutes(app, allRoutes(house, options.moreRoutes), {
    authenticate: authentication({ secret: config.secret, secure, callers: house.callers }),
    secret: config.secret,
    secure,
    publicOrigin: new URL(config.publicUrl).origin,
    replays: house.replays,
    eventStreams: house.eventStreams,
    checkReplies: options.checkReplies ?? false,
    rateLimits: options.rateLimits,
  });
  app.use('/api', unknownAddress);
  app.use(staticClient(config.clientFolder));
  app.use(problemReply(logger));
  return app;
}

