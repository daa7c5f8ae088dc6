import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Response } from 'express';
import { isEventStream, type EventStreams } from './event-streams';
import { BytesReply, Reply, type CookieChange, type ReplyOptions } from './reply';
import type { Route } from './route';

function setCookie(response: Response, cookie: CookieChange): void {
  const frame = { path: cookie.path, httpOnly: cookie.httpOnly, secure: cookie.secure, sameSite: 'strict' as const };
  if (cookie.value === null) response.clearCookie(cookie.name, frame);
  else response.cookie(cookie.name, cookie.value, { ...frame, maxAge: cookie.maxAgeSeconds * 1000 });
}

function applyOptions(response: Response, options: ReplyOptions, usualStatus: number): void {
  response.status(options.status ?? usualStatus);
  for (const [name, value] of Object.entries(options.headers ?? {})) response.setHeader(name, value);
  if (options.etag !== undefined) response.setHeader('ETag', options.etag);
  if (options.location !== undefined) response.setHeader('Location', options.location);
  for (const cookie of options.cookies ?? []) setCookie(response, cookie);
}

/** RFC 6266: a plain name for old readers, the exact one in RFC 5987 form. */
export function attachmentHeader(fileName: string): string {
  const plain = fileName.replace(/[^\w.\- ]/g, '_');
  const exact = encodeURIComponent(fileName).replace(/['()*]/g, (mark) => `%${mark.charCodeAt(0).toString(16).toUpperCase()}`);
  return `attachment; filename="${plain}"; filename*=UTF-8''${exact}`;
}

async function sendBytes(answer: BytesReply, response: Response, streams: EventStreams): Promise<void> {
  response.setHeader('Content-Type', answer.contentType);
  if (answer.options.fileName !== undefined) {
    response.setHeader('Content-Disposition', attachmentHeader(answer.options.fileName));
    // A file someone made is never to run as a page of ours, even when opened in place.
    response.setHeader('Content-Security-Policy', "default-src 'none'; sandbox");
  }
  if (isEventStream(answer.contentType)) {
    // Neither compression nor a proxy may hold events back.
    response.setHeader('Cache-Control', 'no-store, no-transform');
    response.setHeader('X-Accel-Buffering', 'no');
    response.flushHeaders();
    streams.add(response);
  }
  if (answer.body instanceof Readable) {
    // The log, compression and the pipeline itself listen for the end: more than Node's ten, but no more with time.
    response.setMaxListeners(20);
    // A caller who went away ends the pipeline too; `problem-reply` tells that from a body that broke off.
    await pipeline(answer.body, response);
    return;
  }
  response.setHeader('Content-Length', answer.body.byteLength);
  response.end(answer.body);
}

export interface AnswerOptions {
  /** Parse every JSON answer with its reply schema and fail on a difference: for tests. */
  readonly checkReplies: boolean;
  readonly eventStreams: EventStreams;
}

/** Turns what a handler returned into the answer. */
export async function sendAnswer(route: Route, result: unknown, response: Response, options: AnswerOptions): Promise<void> {
  const usualStatus = route.status ?? (route.reply === undefined && route.bytes === undefined ? 204 : 200);
  if (result instanceof BytesReply) {
    applyOptions(response, result.options, usualStatus);
    await sendBytes(result, response, options.eventStreams);
    return;
  }
  const [body, replyOptions]: [unknown, ReplyOptions] = result instanceof Reply ? [result.body, result.options] : [result, {}];
  applyOptions(response, replyOptions, usualStatus);
  if (body === undefined) {
    response.end();
    return;
  }
  if (options.checkReplies) route.reply?.parse(body);
  response.type('application/json').send(JSON.stringify(body));
}
