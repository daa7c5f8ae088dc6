import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Response } from 'express';
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

async function sendBytes(answer: BytesReply, response: Response): Promise<void> {
  response.setHeader('Content-Type', answer.contentType);
  if (answer.options.fileName !== undefined) {
    response.setHeader('Content-Disposition', attachmentHeader(answer.options.fileName));
    // A file someone made is never to run as a page of ours, even when opened in place.
    response.setHeader('Content-Security-Policy', "default-src 'none'; sandbox");
  }
  if (answer.body instanceof Readable) {
    // A caller who went away ends the pipeline too; `problem-reply` tells that from a body that broke off.
    await pipeline(answer.body, response);
    return;
  }
  response.setHeader('Content-Length', answer.body.byteLength);
  response.end(answer.body);
}

/** Turns what a handler returned into the answer. */
export async function sendAnswer(route: Route, result: unknown, response: Response, checkReplies: boolean): Promise<void> {
  const usualStatus = route.status ?? (route.reply === undefined && route.bytes === undefined ? 204 : 200);
  if (result instanceof BytesReply) {
    applyOptions(response, result.options, usualStatus);
    await sendBytes(result, response);
    return;
  }
  const [body, options]: [unknown, ReplyOptions] = result instanceof Reply ? [result.body, result.options] : [result, {}];
  applyOptions(response, options, usualStatus);
  if (body === undefined) {
    response.end();
    return;
  }
  if (checkReplies) route.reply?.parse(body);
  response.type('application/json').send(JSON.stringify(body));
}
