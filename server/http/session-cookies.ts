import { createHmac } from 'node:crypto';
import type { CookieChange } from './reply';

export interface CookieNames {
  readonly access: string;
  readonly refresh: string;
  readonly forgery: string;
}

/** Path of the refresh cookie: it travels only where it is used. */
const REFRESH_PATH = '/api/session';

/**
 * `__Host-` and `__Secure-` prefixes bind a cookie to https; a server reached by plain http on loopback cannot set them.
 * The refresh cookie has a path of its own, which `__Host-` does not allow. Angular reads XSRF-TOKEN by that name.
 */
export const cookieNames = (secure: boolean): CookieNames =>
  secure
    ? { access: '__Host-slantwise-access', refresh: '__Secure-slantwise-refresh', forgery: 'XSRF-TOKEN' }
    : { access: 'slantwise-access', refresh: 'slantwise-refresh', forgery: 'XSRF-TOKEN' };

export interface SessionSecrets {
  readonly accessToken: string;
  readonly refreshToken: string;
  readonly forgeryToken: string;
}

/** The cookies last as long as the session may; the server decides earlier whether it still holds. */
export function sessionCookies(secrets: SessionSecrets, secure: boolean, maxAgeSeconds: number): CookieChange[] {
  const names = cookieNames(secure);
  const frame = { secure, maxAgeSeconds };
  return [
    { ...frame, name: names.access, value: secrets.accessToken, path: '/', httpOnly: true },
    { ...frame, name: names.refresh, value: secrets.refreshToken, path: REFRESH_PATH, httpOnly: true },
    { ...frame, name: names.forgery, value: secrets.forgeryToken, path: '/', httpOnly: false },
  ];
}

export const clearedCookies = (secure: boolean): CookieChange[] =>
  sessionCookies({ accessToken: '', refreshToken: '', forgeryToken: '' }, secure, 0).map((cookie) => ({ ...cookie, value: null }));

/** The forgery token of a session: `<session id>.<HMAC>`. Only someone who can read our cookies can send it back. */
export function forgeryToken(secret: string, sessionId: string): string {
  const mac = createHmac('sha256', secret).update(`forgery:${sessionId}`).digest('base64url');
  return `${sessionId}.${mac}`;
}
