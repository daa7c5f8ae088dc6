import { equalText, forgerySession } from './forgery-guard';
import { clearedCookies, cookieNames, forgeryToken, sessionCookies } from './session-cookies';

describe('forgeryToken', () => {
  it('belongs to one session and one key', () => {
    const token = forgeryToken('key', 'session-1');
    expect(forgerySession(token)).toBe('session-1');
    expect(token).toBe(forgeryToken('key', 'session-1'));
    expect(token).not.toBe(forgeryToken('other key', 'session-1'));
    expect(token.split('.')[1]).not.toBe(forgeryToken('key', 'session-2').split('.')[1]);
  });
});

describe('equalText', () => {
  it('compares text of any lengths', () => {
    expect([equalText('abc', 'abc'), equalText('abc', 'abd'), equalText('abc', 'ab'), equalText('', '')]).toEqual([true, false, false, true]);
  });
});

describe('session cookies', () => {
  const secrets = { accessToken: 'a', refreshToken: 'r', forgeryToken: 'f' };

  it('carry Secure and the binding prefixes by https', () => {
    const cookies = sessionCookies(secrets, true, 60);
    expect(cookies.map(({ name, path }) => `${name} ${path}`)).toEqual(['__Host-slantwise-access /', '__Secure-slantwise-refresh /api/session', 'XSRF-TOKEN /']);
    expect(cookies.every(({ secure }) => secure)).toBe(true);
  });

  it('go without them on plain http, where no browser would keep them', () => {
    expect(Object.values(cookieNames(false))).toEqual(['slantwise-access', 'slantwise-refresh', 'XSRF-TOKEN']);
    expect(sessionCookies(secrets, false, 60).some(({ secure }) => secure)).toBe(false);
  });

  it('are hidden from scripts but for the forgery token, which the client must read', () => {
    expect(sessionCookies(secrets, true, 60).filter(({ httpOnly }) => !httpOnly).map(({ name }) => name)).toEqual(['XSRF-TOKEN']);
  });

  it('are cleared at the same paths they were set', () => {
    const places = (cookies: readonly { name: string; path: string }[]) => cookies.map(({ name, path }) => [name, path]);
    expect(places(clearedCookies(true))).toEqual(places(sessionCookies(secrets, true, 60)));
    expect(clearedCookies(true).every(({ value }) => value === null)).toBe(true);
  });
});
