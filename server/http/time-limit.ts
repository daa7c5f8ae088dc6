import type { RequestHandler, Response } from 'express';
import { RequestTooSlow, Unavailable } from './problems';
import type { Route } from './route';

/** Enough for anything that answers JSON; what takes longer says so in its route. */
export const DEFAULT_TIME_LIMIT_SECONDS = 60;

/** Of what waits in line for the engine, which itself ends a computation after two minutes. */
export const COMPUTE_SECONDS = 180;

const ends = new WeakMap<Response, AbortController>();

/**
 * Ends a request that takes longer than its route allows, from its headers to the head of its answer: with 408 when its body has
 * not come by then, else with 503. An answer under way is left alone: a large download takes as long as its reader.
 */
export function timeLimitStep({ timeLimitSeconds = DEFAULT_TIME_LIMIT_SECONDS }: Pick<Route, 'timeLimitSeconds'>): RequestHandler {
  return (request, response, next) => {
    const end = new AbortController();
    ends.set(response, end);
    const timer = setTimeout(() => {
      if (response.headersSent) return;
      end.abort();
      // What is still to come of a body is not read any more.
      if (!request.complete) response.setHeader('Connection', 'close');
      next(request.complete ? new Unavailable(`This took longer than ${timeLimitSeconds} s and was given up.`) : new RequestTooSlow(timeLimitSeconds));
    }, timeLimitSeconds * 1000);
    timer.unref();
    response.on('close', () => clearTimeout(timer));
    next();
  };
}

/** Fires when the time of a request is over. */
export const timeLimitOf = (response: Response): AbortSignal | undefined => ends.get(response)?.signal;

/** Whether the request was answered already because its time was over: then nothing more is to be said. */
export const isOverdue = (response: Response): boolean => timeLimitOf(response)?.aborted ?? false;
