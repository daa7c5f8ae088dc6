import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { Role } from '../../../shared/contracts/common';
import { auditPage, invitation, invitationList, member, peopleList, team } from '../../../shared/contracts/team';
import type { AuditRow, Invitation, Member, Team } from '../../../shared/contracts/team';

export interface AuditPage {
  readonly items: readonly AuditRow[];
  readonly next: string | null;
  readonly chainIntact: boolean;
}

/** The team, its people, its invitations and its audit log. Rejects with HttpErrorResponse: see `failed-call.ts`. */
@Injectable({ providedIn: 'root' })
export class TeamClient {
  private readonly http = inject(HttpClient);

  async team(): Promise<Team> {
    return team.parse(await firstValueFrom(this.http.get('/api/team')));
  }

  async rename(name: string): Promise<Team> {
    return team.parse(await firstValueFrom(this.http.patch('/api/team', { name })));
  }

  async people(): Promise<readonly Member[]> {
    return peopleList.parse(await firstValueFrom(this.http.get('/api/team/people'))).items;
  }

  async changeMember(id: string, change: { roles?: readonly Role[]; disabled?: boolean }): Promise<Member> {
    return member.parse(await firstValueFrom(this.http.patch(`/api/team/people/${encodeURIComponent(id)}`, change)));
  }

  async invitations(): Promise<readonly Invitation[]> {
    return invitationList.parse(await firstValueFrom(this.http.get('/api/team/invitations'))).items;
  }

  async invite(email: string, roles: readonly Role[]): Promise<Invitation> {
    return invitation.parse(await firstValueFrom(this.http.post('/api/team/invitations', { email, roles })));
  }

  withdraw = (id: string): Promise<unknown> => firstValueFrom(this.http.delete(`/api/team/invitations/${encodeURIComponent(id)}`));

  async audit(after: string | null): Promise<AuditPage> {
    const params: Record<string, string> = { limit: '100', ...(after === null ? {} : { after }) };
    return auditPage.parse(await firstValueFrom(this.http.get('/api/audit', { params })));
  }
}
