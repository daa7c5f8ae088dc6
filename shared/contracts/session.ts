import '../model/zod-jitless';
import * as z from 'zod';
import { emailAddress, id, isoTime, role, scope } from './common';

/**
 * POST   /api/session            signIn -> currentSession       (sets the cookies; 401 with one text for every cause)
 * POST   /api/session/refresh    -> currentSession              (rotates the refresh cookie)
 * GET    /api/session            -> currentSession, or 401
 * DELETE /api/session            sign out
 * PUT    /api/session/team       chooseTeam -> currentSession
 * GET    /api/sessions           -> sessionList (own ones)      DELETE /api/sessions/:id, DELETE /api/sessions (all others)
 * PUT    /api/account            accountChange -> currentSession
 * PUT    /api/account/password   passwordChange
 * POST   /api/password-resets    passwordResetRequest -> 202 always
 * POST   /api/password-resets/completion   passwordResetCompletion
 * GET/POST /api/tokens           tokenList; newToken -> tokenCreated   DELETE /api/tokens/:id
 * GET    /api/development/letters   letterList (only while the local letter box receives the mail)
 */

export const password = z.string().min(15).max(256);

export const signIn = z.strictObject({ email: emailAddress, password: z.string().min(1).max(256) });

export const membership = z.strictObject({ teamId: id, teamName: z.string(), roles: z.array(role) });

export const currentSession = z.strictObject({
  person: z.strictObject({ id, name: z.string(), email: z.string() }),
  team: membership,
  teams: z.array(membership),
  sessionId: id,
  /** When the session ends if nothing happens, and when it ends in any case. */
  idleEndsAt: isoTime,
  endsAt: isoTime,
  demoMode: z.boolean(),
  /** True while letters go to the development letter box instead of a mail server. */
  letterBox: z.boolean(),
});

/** GET /api/about, public: what the sign-in page needs to know. */
export const about = z.strictObject({
  name: z.literal('Slantwise'),
  version: z.string(),
  demoMode: z.boolean(),
  letterBox: z.boolean(),
  /** Demo accounts by role, present only in demo mode. The password is printed where the server was started. */
  demoAccounts: z.array(z.strictObject({ email: z.string(), role })),
});

export const chooseTeam = z.strictObject({ teamId: id });
export const accountChange = z.strictObject({ name: z.string().trim().min(1).max(120) });
export const passwordChange = z.strictObject({ currentPassword: z.string().min(1).max(256), newPassword: password, endOtherSessions: z.boolean() });
export const passwordResetRequest = z.strictObject({ email: emailAddress });
export const passwordResetCompletion = z.strictObject({ token: z.string().min(20).max(200), newPassword: password });

export const ownSession = z.strictObject({
  id,
  current: z.boolean(),
  createdAt: isoTime,
  lastUsedAt: isoTime,
  address: z.string(),
  browser: z.string(),
});
export const sessionList = z.strictObject({ items: z.array(ownSession) });

export const personalToken = z.strictObject({
  id,
  name: z.string(),
  scopes: z.array(scope),
  createdAt: isoTime,
  expiresAt: isoTime,
  lastUsedAt: isoTime.nullable(),
});
export const tokenList = z.strictObject({ items: z.array(personalToken) });
export const newToken = z.strictObject({
  name: z.string().trim().min(1).max(120),
  scopes: z.array(scope).min(1),
  days: z.number().int().min(1).max(366),
});
/** The secret is shown once and kept only as a hash. */
export const tokenCreated = personalToken.extend({ secret: z.string() });

export const letter = z.strictObject({ id: z.string(), to: z.string(), subject: z.string(), text: z.string(), receivedAt: isoTime });
export const letterList = z.strictObject({ items: z.array(letter) });

export type CurrentSession = z.infer<typeof currentSession>;
export type About = z.infer<typeof about>;
export type OwnSession = z.infer<typeof ownSession>;
export type PersonalToken = z.infer<typeof personalToken>;
export type TokenCreated = z.infer<typeof tokenCreated>;
export type Letter = z.infer<typeof letter>;
