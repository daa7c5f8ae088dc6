import { idParams } from '../../shared/contracts/common';
import {
  invitation,
  invitationAcceptance,
  invitationList,
  invitationToken,
  invitationWelcome,
  member,
  memberChange,
  newInvitation,
  peopleList,
  team,
  teamChange,
} from '../../shared/contracts/team';
import { currentSession } from '../../shared/contracts/session';
import { Reply } from '../http/reply';
import { defineRoute, type Route } from '../http/route';
import type { InvitationService } from './invitation-service';
import type { TeamService } from './team-service';

interface Parts {
  readonly teams: TeamService;
  readonly invitations: InvitationService;
}

const memberPolicy = { kind: 'signed-in', scope: 'read' } as const;
const administratorPolicy = { kind: 'signed-in', roles: ['administrator'], scope: 'team' } as const;

export const teamRoutes = ({ teams }: Parts): readonly Route[] => [
  defineRoute({
    method: 'get',
    path: '/api/team',
    summary: 'The team you work in',
    policy: memberPolicy,
    reply: team,
    handler: ({ caller }) => teams.describe(caller),
  }),
  defineRoute({
    method: 'patch',
    path: '/api/team',
    summary: 'Rename the team',
    policy: administratorPolicy,
    body: teamChange,
    reply: team,
    handler: ({ caller, body }) => teams.rename(caller, body.name),
  }),
  defineRoute({
    method: 'get',
    path: '/api/team/people',
    summary: 'Who works in the team',
    policy: memberPolicy,
    reply: peopleList,
    handler: async ({ caller }) => ({ items: await teams.people(caller) }),
  }),
  defineRoute({
    method: 'patch',
    path: '/api/team/people/:id',
    summary: 'Change the roles of a person, or disable or enable them',
    policy: administratorPolicy,
    params: idParams,
    body: memberChange,
    reply: member,
    handler: ({ caller, params, body }) => teams.changeMember(caller, params.id, body),
  }),
];

export const invitationRoutes = ({ invitations }: Parts): readonly Route[] => [
  defineRoute({
    method: 'get',
    path: '/api/team/invitations',
    summary: 'Invitations that are still open',
    policy: administratorPolicy,
    reply: invitationList,
    handler: async ({ caller }) => ({ items: await invitations.list(caller) }),
  }),
  defineRoute({
    method: 'post',
    path: '/api/team/invitations',
    summary: 'Invite an address into the team; sends a letter',
    policy: administratorPolicy,
    rate: 'letter',
    status: 201,
    body: newInvitation,
    reply: invitation,
    handler: async ({ caller, body }) => {
      const made = await invitations.invite(caller, body);
      return new Reply(made, { location: `/api/team/invitations/${made.id}` });
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/team/invitations/:id',
    summary: 'Withdraw an invitation',
    policy: administratorPolicy,
    params: idParams,
    handler: ({ caller, params }) => invitations.withdraw(caller, params.id),
  }),
  defineRoute({
    method: 'post',
    path: '/api/invitations/lookup',
    summary: 'What an invitation is for; the token travels in the body so that no log keeps it',
    policy: { kind: 'public' },
    rate: 'sign-in',
    body: invitationToken,
    reply: invitationWelcome,
    handler: ({ body }) => invitations.lookUp(body.token),
  }),
  defineRoute({
    method: 'post',
    path: '/api/invitations/acceptance',
    summary: 'Accept an invitation: joins the team and signs in',
    policy: { kind: 'public' },
    rate: 'sign-in',
    body: invitationAcceptance,
    reply: currentSession,
    handler: async ({ body, address, header }) => {
      const { session, cookies } = await invitations.accept(body, { address, userAgent: header('user-agent') ?? '' });
      return new Reply(session, { cookies });
    },
  }),
];
