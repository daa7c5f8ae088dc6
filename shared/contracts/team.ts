import '../model/zod-jitless';
import * as z from 'zod';
import { emailAddress, id, isoTime, page, personName, role } from './common';

/**
 * GET    /api/team                        team                 (the chosen team of the session)
 * PATCH  /api/team                        teamChange           administrator
 * GET    /api/team/people                 peopleList           any member
 * PATCH  /api/team/people/:id             memberChange         administrator (own administrator role cannot be dropped by the last one)
 * GET    /api/team/invitations            invitationList       administrator
 * POST   /api/team/invitations            newInvitation        administrator -> 201 invitation; sends a letter
 * DELETE /api/team/invitations/:id        withdraws it         administrator
 * POST   /api/invitations/lookup          invitationToken -> invitationWelcome    public
 * POST   /api/invitations/acceptance      invitationAcceptance -> currentSession  public; signs in
 * GET    /api/audit                       auditPage            administrator      ?after=&limit=
 */

export const team = z.strictObject({ id, name: z.string(), peopleCount: z.number().int(), createdAt: isoTime });
export const teamChange = z.strictObject({ name: z.string().trim().min(1).max(120) });

export const member = z.strictObject({
  id,
  name: z.string(),
  email: z.string(),
  roles: z.array(role),
  disabled: z.boolean(),
  lastSeenAt: isoTime.nullable(),
  joinedAt: isoTime,
});
export const peopleList = z.strictObject({ items: z.array(member) });
export const memberChange = z.strictObject({ roles: z.array(role).optional(), disabled: z.boolean().optional() });

export const invitation = z.strictObject({
  id,
  email: z.string(),
  roles: z.array(role),
  invitedBy: personName,
  createdAt: isoTime,
  expiresAt: isoTime,
});
export const invitationList = z.strictObject({ items: z.array(invitation) });
export const newInvitation = z.strictObject({ email: emailAddress, roles: z.array(role).min(1) });
export const invitationToken = z.strictObject({ token: z.string().min(20).max(200) });
export const invitationWelcome = z.strictObject({
  teamName: z.string(),
  email: z.string(),
  roles: z.array(role),
  /** True when the address already has an account: then only its password is asked. */
  knownPerson: z.boolean(),
});
export const invitationAcceptance = z.strictObject({
  token: z.string().min(20).max(200),
  name: z.string().trim().min(1).max(120).optional(),
  password: z.string().min(1).max(256),
});

export const auditRow = z.strictObject({
  sequence: z.number().int(),
  at: isoTime,
  person: personName.nullable(),
  action: z.string(),
  object: z.string(),
  detail: z.record(z.string(), z.unknown()),
  hash: z.string(),
});
export const auditPage = page(auditRow).extend({ chainIntact: z.boolean() });

export type Team = z.infer<typeof team>;
export type Member = z.infer<typeof member>;
export type Invitation = z.infer<typeof invitation>;
export type InvitationWelcome = z.infer<typeof invitationWelcome>;
export type AuditRow = z.infer<typeof auditRow>;
