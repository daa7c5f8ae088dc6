import type { ErrorRequestHandler, RequestHandler, Response } from 'express';
import type { Logger } from 'pino';
import type { Problem as ProblemBody } from '../../shared/contracts/common';
import type { Cause } from './problems';
import { isOverdue } from './time-limit';
import {
  BadRequest,
  InvalidInput,
  MethodNotAllowed,
  NotAllowed,
  NotFound,
  Problem,
  StaleVersion,
  TooLarge,
  TooMany,
  Unavailable,
  UnsupportedType,
} from './problems';

/** Every cause has its status and title here: a missing one does not compile. */
const answers: Readonly<Record<Cause, { readonly status: number; readonly title: string }>> = {
  'bad-request': { status: 400, title: 'The request cannot be read' },
  'invalid-input': { status: 422, title: 'Some values are not valid' },
  'not-signed-in': { status: 401, title: 'Not signed in' },
  'not-allowed': { status: 403, title: 'Not allowed' },
  'not-found': { status: 404, title: 'Not found' },
  'method-not-allowed': { status: 405, title: 'This method does not work here' },
  conflict: { status: 409, title: 'The present state does not allow this' },
  superseded: { status: 409, title: 'A newer request took its place' },
  'stale-version': { status: 412, title: 'Changed in the meantime' },
  'version-required': { status: 428, title: 'The version is missing' },
  'too-large': { status: 413, title: 'Too large' },
  'too-slow': { status: 408, title: 'The request came too slowly' },
  'unsupported-type': { status: 415, title: 'This media type is not accepted' },
  'not-acceptable': { status: 406, title: 'No such representation' },
  'too-many': { status: 429, title: 'Too many requests' },
  unavailable: { status: 503, title: 'Not available at the moment' },
};

export const statusOf = (problem: Problem): number => answers[problem.kind].status;

/** Databases and pools that are out of reach for the moment. SQLSTATE classes 08 and 57P, and Node's socket errors. */
const passingCodes = /^(08\w{3}|57P0[123]|53300|ECONNREFUSED|ECONNRESET|EPIPE)$/;

/** A statement that ran into its time limit: SQLSTATE 57014. */
const TIMED_OUT = '57014';

function codeOf(error: unknown): string | null {
  if (typeof error !== 'object' || error === null) return null;
  if ('code' in error && typeof error.code === 'string') return error.code;
  return 'driverError' in error ? codeOf(error.driverError) : null;
}

/** Errors of the libraries in front of the handlers, by their documented marks; null for any other. */
function fromLibrary(error: unknown): Problem | null {
  if (!(error instanceof Error)) return null;
  const code = codeOf(error);
  if (code !== null && passingCodes.test(code)) return new Unavailable('The database is not available at the moment.');
  if (code === TIMED_OUT) return new Unavailable('The database took too long.');
  // pg-pool gives this error no code.
  if (error.message.includes('timeout exceeded when trying to connect')) {
    return new Unavailable('Too much is going on at the moment.', 2);
  }
  if (code !== null && code.startsWith('LIMIT_')) return new TooLarge('The upload has too many or too large parts.');
  const type = 'type' in error ? error.type : undefined;
  if (type === 'entity.too.large') return new TooLarge('The body is larger than this address accepts.');
  if (type === 'entity.parse.failed') return new BadRequest('The body is not readable JSON.');
  if (type === 'charset.unsupported' || type === 'encoding.unsupported') return new UnsupportedType(['UTF-8']);
  if (error instanceof URIError) return new BadRequest('The address is not readable.');
  const status = 'status' in error ? error.status : undefined;
  return typeof status === 'number' && status >= 400 && status < 500 ? new BadRequest('The request is not readable.') : null;
}

function addHeaders(response: Response, problem: Problem): void {
  if (problem instanceof StaleVersion) response.setHeader('ETag', problem.current);
  if (problem instanceof TooMany || problem instanceof Unavailable) {
    response.setHeader('Retry-After', String(problem.retryAfterSeconds));
  }
  if (problem instanceof MethodNotAllowed) response.setHeader('Allow', problem.allowed.join(', '));
}

function problemBody(problem: Problem, instance: string, requestId: string): ProblemBody & { current?: unknown } {
  const { status, title } = answers[problem.kind];
  return {
    type: `/problems/${problem.kind}`,
    title,
    status,
    detail: problem.message,
    instance,
    requestId,
    ...(problem instanceof StaleVersion && problem.body !== undefined ? { current: problem.body } : {}),
    ...(problem instanceof InvalidInput ? { errors: problem.faults.map((fault) => ({ ...fault })) } : {}),
  };
}

export const requestIdOf = (response: Response): string => String(response.getHeader('X-Request-Id') ?? '');

/** The one place where an error becomes an answer. Nothing of an unknown error leaves the server but its request id. */
export function problemReply(logger: Logger): ErrorRequestHandler {
  // Express knows an error handler by its four parameters.
  return (error: unknown, request, response, _next) => {
    const requestId = requestIdOf(response);
    if (response.destroyed) {
      logger.debug({ err: error, requestId }, 'the caller went away');
      return;
    }
    if (isOverdue(response) && response.headersSent) {
      logger.debug({ err: error, requestId }, 'ended after its time was over');
      return;
    }
    if (response.headersSent) {
      // Cut the connection: a body that just ended would look complete.
      logger.error({ err: error, requestId }, 'the answer broke off');
      response.destroy();
      return;
    }
    const instance = request.originalUrl.split('?')[0] ?? '';
    const problem = error instanceof Problem ? error : fromLibrary(error);
    response.setHeader('Cache-Control', 'no-store');
    response.type('application/problem+json');
    if (problem === null) {
      logger.error({ err: error, requestId }, 'unexpected error');
      const body: ProblemBody = {
        type: '/problems/unexpected',
        title: 'Unexpected error',
        status: 500,
        detail: 'The server met a fault of its own. It is logged under the request id.',
        instance,
        requestId,
      };
      response.status(500).send(JSON.stringify(body));
      return;
    }
    if (problem instanceof NotAllowed) logger.warn({ requestId, path: instance, reason: problem.message }, 'access denied');
    if (!(error instanceof Problem)) logger.warn({ err: error, requestId }, 'request refused by a library');
    addHeaders(response, problem);
    const body = problemBody(problem, instance, requestId);
    response.status(body.status).send(JSON.stringify(body));
  };
}

/** The last stop under /api. */
export const unknownAddress: RequestHandler = () => {
  throw new NotFound('address');
};
