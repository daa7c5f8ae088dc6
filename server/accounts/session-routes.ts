import { idParams } from '../../shared/contracts/common';
import { chooseTeam, currentSession, sessionList, signIn as signInBody } from '../../shared/contracts/session';
import type { Caller } from '../http/caller';
import { forgerySession } from '../http/forgery-guard';
import { NotAllowed, NotSignedIn } from '../http/problems';
import { Reply } from '../http/reply';
import { defineRoute, type Route } from '../http/route';
import { cookieNames } from '../http/session-cookies';
import type { Browser, OpenedSession, SessionService } from './session-service';
import type { SignInService } from './sign-in-service';

interface Parts {
  /** Whether cookies are those of https. */
  readonly secure: boolean;
  readonly sessions: SessionService;
  readonly signIn: SignInService;
}

/** A person at a screen; no personal token may act on sessions. */
export const ownSessionPolicy = { kind: 'signed-in', scope: 'read', sessionOnly: true } as const;

interface Sender {
  readonly address: string;
  readonly header: (name: string) => string | undefined;
}
export const browserOf = ({ address, header }: Sender): Browser => ({ address, userAgent: header('user-agent') ?? '' });

export const sessionReply = ({ session, cookies }: OpenedSession): Reply<OpenedSession['session']> => new Reply(session, { cookies });

function requireSessionId(caller: Caller): string {
  if (caller.sessionId === null) throw new NotSignedIn();
  return caller.sessionId;
}

export const sessionRoutes = ({ secure, sessions, signIn }: Parts): readonly Route[] => {
  const refreshCookie = cookieNames(secure).refresh;
  return [
    defineRoute({
      method: 'post',
      path: '/api/session',
      summary: 'Sign in with address and password; sets the session cookies',
      policy: { kind: 'public' },
      rate: 'sign-in',
      body: signInBody,
      reply: currentSession,
      handler: async ({ body, caller, ...sender }) => {
        const person = await signIn.verify(body.email, body.password);
        return sessionReply(await sessions.openFor(person, { browser: browserOf(sender), replaces: caller }));
      },
    }),
    defineRoute({
      method: 'post',
      path: '/api/session/refresh',
      summary: 'Exchange the refresh cookie for a new access cookie and the next refresh cookie',
      policy: { kind: 'public', forgery: 'token' },
      reply: currentSession,
      handler: async ({ cookies, header }) => {
        const token = cookies[refreshCookie];
        if (token === undefined) throw new NotSignedIn('There is no session to refresh.');
        if (forgerySession(header('x-xsrf-token')) !== token.split('.')[0]) throw new NotAllowed('The X-XSRF-TOKEN header does not belong to this session.');
        return sessionReply(await sessions.refresh(token));
      },
    }),
    defineRoute({
      method: 'get',
      path: '/api/session',
      summary: 'Who is signed in, in which team, until when',
      policy: ownSessionPolicy,
      reply: currentSession,
      handler: ({ caller }) => sessions.current(requireSessionId(caller)),
    }),
    defineRoute({
      method: 'delete',
      path: '/api/session',
      summary: 'Sign out',
      policy: { kind: 'public', forgery: 'token' },
      handler: async ({ caller, cookies }) => {
        await sessions.signOut(caller, cookies[refreshCookie]);
        return new Reply(undefined, { cookies: sessions.clearedCookies });
      },
    }),
    defineRoute({
      method: 'put',
      path: '/api/session/team',
      summary: 'Work in another of your teams',
      policy: ownSessionPolicy,
      body: chooseTeam,
      reply: currentSession,
      handler: async ({ caller, body, ...sender }) => sessionReply(await sessions.chooseTeam(caller, body.teamId, browserOf(sender))),
    }),
  ];
};

/** One's own signed-in browsers. */
export const sessionListRoutes = ({ sessions }: Pick<Parts, 'sessions'>): readonly Route[] => [
  defineRoute({
    method: 'get',
    path: '/api/sessions',
    summary: 'Where you are signed in',
    policy: ownSessionPolicy,
    reply: sessionList,
    handler: async ({ caller }) => ({ items: await sessions.list(caller) }),
  }),
  defineRoute({
    method: 'delete',
    path: '/api/sessions/:id',
    summary: 'End one of your sessions',
    policy: ownSessionPolicy,
    params: idParams,
    handler: ({ caller, params }) => sessions.revokeOwn(caller, params.id),
  }),
  defineRoute({
    method: 'delete',
    path: '/api/sessions',
    summary: 'End all of your sessions but this one',
    policy: ownSessionPolicy,
    handler: ({ caller }) => sessions.revokeOthers(caller),
  }),
];
