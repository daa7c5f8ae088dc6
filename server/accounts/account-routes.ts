import { idParams } from '../../shared/contracts/common';
import {
  accountChange,
  currentSession,
  newToken,
  passwordChange,
  passwordResetCompletion,
  passwordResetRequest,
  tokenCreated,
  tokenList,
} from '../../shared/contracts/session';
import { NotSignedIn } from '../http/problems';
import { Reply } from '../http/reply';
import { defineRoute, type Route } from '../http/route';
import type { AccountService } from './account-service';
import type { PasswordService } from './password-service';
import { ownSessionPolicy } from './session-routes';
import type { SessionService } from './session-service';
import type { TokenService } from './token-service';

interface Parts {
  readonly account: AccountService;
  readonly passwords: PasswordService;
  readonly sessions: SessionService;
  readonly tokens: TokenService;
}

const passwordRoutes = ({ passwords }: Parts): readonly Route[] => [
  defineRoute({
    method: 'put',
    path: '/api/account/password',
    summary: 'Change your password, knowing the present one',
    policy: ownSessionPolicy,
    rate: 'sign-in',
    body: passwordChange,
    handler: ({ caller, body }) => passwords.change(caller, body),
  }),
  defineRoute({
    method: 'post',
    path: '/api/password-resets',
    summary: 'Ask for a letter with a link to set a new password; the answer is the same for every address',
    policy: { kind: 'public' },
    rate: 'letter',
    status: 202,
    body: passwordResetRequest,
    handler: ({ body }) => passwords.request(body.email),
  }),
  defineRoute({
    method: 'post',
    path: '/api/password-resets/completion',
    summary: 'Set a new password with the token of a letter; ends every session',
    policy: { kind: 'public' },
    rate: 'sign-in',
    body: passwordResetCompletion,
    handler: ({ body }) => passwords.complete(body.token, body.newPassword),
  }),
];

export const accountRoutes = (parts: Parts): readonly Route[] => [
  defineRoute({
    method: 'put',
    path: '/api/account',
    summary: 'Change your name',
    policy: ownSessionPolicy,
    body: accountChange,
    reply: currentSession,
    handler: async ({ caller, body }) => {
      if (caller.sessionId === null) throw new NotSignedIn();
      await parts.account.rename(caller, body.name);
      return parts.sessions.current(caller.sessionId);
    },
  }),
  ...passwordRoutes(parts),
  defineRoute({
    method: 'get',
    path: '/api/tokens',
    summary: 'Your personal tokens in this team',
    policy: ownSessionPolicy,
    reply: tokenList,
    handler: async ({ caller }) => ({ items: await parts.tokens.list(caller) }),
  }),
  defineRoute({
    method: 'post',
    path: '/api/tokens',
    summary: 'Make a personal token; its secret is shown this once',
    policy: ownSessionPolicy,
    status: 201,
    body: newToken,
    reply: tokenCreated,
    handler: async ({ caller, body }) => {
      const created = await parts.tokens.create(caller, body);
      return new Reply(created, { location: `/api/tokens/${created.id}` });
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/tokens/:id',
    summary: 'Revoke a personal token',
    policy: ownSessionPolicy,
    params: idParams,
    handler: ({ caller, params }) => parts.tokens.revoke(caller, params.id),
  }),
];
