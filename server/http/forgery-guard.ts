import { timingSafeEqual } from 'node:crypto';
import type { Request } from 'express';
import { bearerOf } from './authentication';
import { NotAllowed } from './problems';
import { cookieNames, forgeryToken } from './session-cookies';

export function equalText(left: string, right: string): boolean {
  const a = Buffer.from(left);
  const b = Buffer.from(right);
  return a.length === b.length && timingSafeEqual(a, b);
}

const readMethods = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses what a foreign page sent. Browsers say where a request comes from in Sec-Fetch-Site; older ones in Origin.
 * Programs that are no browser send neither and carry no one's cookies by accident.
 */
export function refuseForeignOrigin(request: Request, publicOrigin: string): void {
  if (readMethods.has(request.method) || bearerOf(request) !== null) return;
  const site = request.headers['sec-fetch-site'];
  if (site !== undefined) {
    if (site !== 'same-origin') throw new NotAllowed('This request came from another site.');
    return;
  }
  const origin = request.headers.origin;
  if (origin === undefined) return;
  const own = [publicOrigin, `${request.protocol}://${request.headers.host ?? ''}`];
  if (!own.includes(origin)) throw new NotAllowed('This request came from another site.');
}

/**
 * The double-submit check: header X-XSRF-TOKEN must be the token of the very session that the cookies carry.
 * @param sessionId the session of the request, or null where the route has yet to find it: then any session's token
 *   that we signed and that equals its cookie passes here, and the route compares the session.
 */
export function requireForgeryToken(request: Request, options: { secret: string; secure: boolean; sessionId: string | null }): void {
  if (readMethods.has(request.method) || bearerOf(request) !== null) return;
  const sent = String(request.headers['x-xsrf-token'] ?? '');
  const cookie = (request.cookies as Record<string, string | undefined>)[cookieNames(options.secure).forgery] ?? '';
  const sessionId = options.sessionId ?? forgerySession(sent);
  const expected = forgeryToken(options.secret, sessionId);
  if (sent === '' || !equalText(sent, expected) || (options.sessionId === null && !equalText(sent, cookie))) {
    throw new NotAllowed('The X-XSRF-TOKEN header does not belong to this session.');
  }
}

/** The session a forgery token names; whether it is ours, `requireForgeryToken` has checked. */
export const forgerySession = (sent: string | undefined): string => sent?.split('.')[0] ?? '';
