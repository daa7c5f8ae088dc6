import { json, type Express, type Request, type RequestHandler, type Response } from 'express';
import multer from 'multer';
import type { Authenticate } from './authentication';
import { hasRole, type Caller } from './caller';
import { requireIfMatch } from './etag';
import { runOnce, type ReplayStore } from './idempotency';
import { refuseForeignOrigin, requireForgeryToken } from './forgery-guard';
import { faultsOfJson } from './json-limits';
import { requestIdOf } from './problem-reply';
import { InvalidInput, MethodNotAllowed, NotAllowed, NotSignedIn, UnsupportedType, type Fault } from './problems';
import { addressKey, rateLimiters, rateLimits, type RateLimit } from './rate-limits';
import type { Policy, RateClass, Route, RouteContext, UploadedFile } from './route';
import { parseBody, parseParameters } from './schema-faults';
import { sendAnswer, type AnswerOptions } from './send-answer';
import { isOverdue, timeLimitOf, timeLimitStep } from './time-limit';

const MAX_BODY_BYTES = 1024 * 1024;

export interface MountOptions extends AnswerOptions {
  readonly authenticate: Authenticate;
  readonly secret: string;
  readonly secure: boolean;
  readonly publicOrigin: string;
  readonly replays: ReplayStore;
  readonly rateLimits?: Readonly<Record<RateClass, RateLimit>>;
}

/** Handlers made here; a test walks the router and finds any other. */
const mounted = new WeakSet<RequestHandler>();
export const isMountedRoute = (handler: RequestHandler): boolean => mounted.has(handler);

/** Who sent a request, remembered between the steps of its route. */
const callers = new WeakMap<Request, Caller | null>();

function refuseByPolicy(policy: Policy, caller: Caller | null): void {
  if (policy.kind === 'public') return;
  if (caller === null) throw new NotSignedIn();
  if (policy.sessionOnly === true && caller.tokenScopes !== null) {
    throw new NotAllowed('A personal token cannot do this; sign in with your password.');
  }
  if (caller.tokenScopes !== null && !caller.tokenScopes.includes(policy.scope)) {
    throw new NotAllowed(`The personal token lacks the scope "${policy.scope}".`);
  }
  if (policy.roles !== undefined && !hasRole(caller, ...policy.roles)) {
    throw new NotAllowed(`This needs the role ${policy.roles.join(' or ')}.`);
  }
}

function identifyStep(options: MountOptions): RequestHandler {
  return async (request, _response, next) => {
    refuseForeignOrigin(request, options.publicOrigin);
    callers.set(request, await options.authenticate(request));
    next();
  };
}

function guardStep(route: Route, options: MountOptions): RequestHandler {
  return (request, _response, next) => {
    const caller = callers.get(request) ?? null;
    refuseByPolicy(route.policy, caller);
    if (route.policy.kind === 'signed-in' || route.policy.forgery === 'token') {
      requireForgeryToken(request, { ...options, sessionId: caller?.sessionId ?? null });
    }
    if (route.versioned === true) requireIfMatch(request.headers['if-match']);
    next();
  };
}

function bodySteps(route: Route): RequestHandler[] {
  if (route.upload !== undefined) {
    const { maxFileBytes, maxFiles } = route.upload;
    const limits = { fileSize: maxFileBytes, files: maxFiles, fields: 40, fieldSize: MAX_BODY_BYTES, parts: maxFiles + 40 };
    const form = multer({ storage: multer.memoryStorage(), limits, defParamCharset: 'utf8' }).any();
    return [requireType('multipart/form-data'), form];
  }
  if (route.body === undefined) return [];
  return [requireType('application/json'), json({ limit: route.maxBodyBytes ?? MAX_BODY_BYTES, strict: false, type: 'application/json' })];
}

const requireType =
  (mediaType: string): RequestHandler =>
  (request, _response, next) =>
    next(request.is(mediaType) ? undefined : new UnsupportedType([mediaType]));

interface ParsedParts {
  readonly params: unknown;
  readonly query: unknown;
  readonly body: unknown;
}

/** Parses params, query and body, and names the faults of all three together. */
function parseParts(route: Route, request: Request): ParsedParts {
  const faults: Fault[] = [];
  const dataOf = (result: ReturnType<typeof parseBody> | null): unknown => {
    if (result?.success === false) faults.push(...result.faults);
    return result?.success === true ? result.data : undefined;
  };
  const parameters = (schema: Route['params'], given: unknown): unknown => {
    faults.push(...faultsOfJson(given).map(({ pointer, detail }) => ({ pointer: pointer.replace(/^#\/?/, ''), detail })));
    return dataOf(schema === undefined ? null : parseParameters(schema, given));
  };
  const params = parameters(route.params, { ...request.params });
  const query = parameters(route.query, { ...request.query });
  const given: unknown = route.upload === undefined ? request.body : { ...request.body };
  const unfit = route.body === undefined ? [] : faultsOfJson(given);
  faults.push(...unfit);
  const body = dataOf(route.body === undefined || unfit.length > 0 ? null : parseBody(route.body, given));
  if (faults.length > 0) throw new InvalidInput(faults);
  return { params, query, body };
}

function uploadedFiles(request: Request): UploadedFile[] {
  const files = Array.isArray(request.files) ? request.files : [];
  return files.map((file) => ({ field: file.fieldname, originalName: file.originalname, bytes: file.buffer }));
}

function contextOf(route: Route, request: Request, response: Response): RouteContext<Policy, unknown, unknown, unknown> {
  const late = timeLimitOf(response);
  const gone = new AbortController();
  response.on('close', () => {
    if (!response.writableFinished) gone.abort();
  });
  return {
    ...parseParts(route, request),
    caller: callers.get(request) ?? null,
    files: uploadedFiles(request),
    ifMatch: route.versioned === true ? requireIfMatch(request.headers['if-match']) : '',
    cookies: request.cookies as Record<string, string>,
    header: (name) => request.get(name),
    wants: (mediaType) => (request.headers.accept ?? '').split(',').some((part) => part.split(';')[0]?.trim() === mediaType),
    address: request.ip ?? '',
    requestId: requestIdOf(response),
    signal: AbortSignal.any([gone.signal, ...(late === undefined ? [] : [late])]),
  };
}

/** Puts the routes on the application, each behind the steps that `route.ts` lists. */
export function mountRoutes(app: Express, routes: readonly Route[], options: MountOptions): void {
  const personKey = (request: Request): string => callers.get(request)?.person.id ?? addressKey(request.ip);
  const limiters = rateLimiters(personKey, options.rateLimits ?? rateLimits);
  const identify = identifyStep(options);
  for (const route of routes) {
    const answer: RequestHandler = async (request, response) => {
      const context = contextOf(route, request, response);
      const result = route.idempotent === true ? await runOnce(options.replays, route, context) : await route.run(context);
      // Whoever asked has been told already that it took too long.
      if (!isOverdue(response)) await sendAnswer(route, result, response, options);
    };
    const steps = [timeLimitStep(route), identify, limiters[route.rate ?? 'general'], guardStep(route, options), ...bodySteps(route), answer];
    for (const step of steps) mounted.add(step);
    app[route.method](route.path, ...steps);
  }
  for (const [path, allowed] of methodsByPath(routes)) {
    const refuse: RequestHandler = () => {
      throw new MethodNotAllowed(allowed);
    };
    mounted.add(refuse);
    app.all(path, refuse);
  }
}

function methodsByPath(routes: readonly Route[]): Map<string, string[]> {
  const methods = new Map<string, string[]>();
  for (const route of routes) methods.set(route.path, [...(methods.get(route.path) ?? []), route.method.toUpperCase()]);
  return methods;
}

/** The caller of a request that went through the steps, for the log. */
export const callerOf = (request: Request): Caller | null => callers.get(request) ?? null;
