import { letterList } from '../../shared/contracts/session';
import { NotFound } from '../http/problems';
import { defineRoute, type Route } from '../http/route';
import type { InvitationService } from '../teams/invitation-service';
import type { TeamService } from '../teams/team-service';
import type { LetterService } from './letter-service';

interface Parts {
  readonly letters: LetterService;
  readonly teams: TeamService;
  readonly invitations: InvitationService;
}

export const letterRoutes = ({ letters, teams, invitations }: Parts): readonly Route[] => [
  defineRoute({
    method: 'get',
    path: '/api/development/letters',
    summary: "Letters to the team's people, while this server's own letter box receives the mail",
    // Letters hold links that open accounts, so only who runs the team reads them, and only those of the team.
    policy: { kind: 'signed-in', roles: ['administrator'], scope: 'team', sessionOnly: true },
    reply: letterList,
    handler: async ({ caller }) => {
      if (!letters.usesLetterBox) throw new NotFound('letter box');
      await letters.settled();
      const addresses = [...(await teams.addresses(caller.teamId)), ...(await invitations.addresses(caller.teamId))];
      return { items: letters.received(new Set(addresses)) };
    },
  }),
];
