import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { role } from '../../../shared/contracts/common';
import type { Role } from '../../../shared/contracts/common';
import type { Invitation, Member, Team } from '../../../shared/contracts/team';
import { TeamClient } from '../api/team-client';
import type { CallFault } from '../session/call-fault';
import { callFault } from '../session/call-fault';
import { SessionStore } from '../session/session-store';
import { CheckField } from '../ui/check-field';
import { Confirm } from '../ui/confirm';
import { EmptyState } from '../ui/empty-state';
import { FaultNote } from '../ui/fault-note';
import { AskName } from '../ui/name-dialog';
import { SheetFrame } from '../ui/sheet-frame';
import { UtcTime } from '../ui/utc-time';
import { ViewTitle } from '../ui/view-title';
import { WhyNot } from '../ui/why-not';
import { ROLE_DUTIES } from './role-duties';

/** Who works in the team and as what. Administrators change it; everybody may look. */
@Component({
  selector: 'slant-team-page',
  imports: [CheckField, EmptyState, FaultNote, RouterLink, SheetFrame, UtcTime, ViewTitle, WhyNot],
  templateUrl: './team-page.html',
  styleUrl: './team-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TeamPage {
  private readonly client = inject(TeamClient);
  private readonly session = inject(SessionStore);
  private readonly confirm = inject(Confirm);
  private readonly names = inject(AskName);
  protected readonly roles = role.options;
  protected readonly duties = ROLE_DUTIES;
  protected readonly team = signal<Team | null>(null);
  protected readonly people = signal<readonly Member[]>([]);
  protected readonly invitations = signal<readonly Invitation[]>([]);
  protected readonly wantedRoles = signal<readonly Role[]>(['designer']);
  protected readonly fault = signal<CallFault | null>(null);
  protected readonly done = signal<string | null>(null);
  /** A letter was written that nobody sends. */
  protected readonly letterWaits = signal(false);
  protected readonly isAdministrator = computed(() => this.session.hasRole('administrator'));
  protected readonly whyNot = computed(() => (this.isAdministrator() ? null : `This needs the role administrator. You work as ${this.session.roles().join(', ')}.`));
  protected readonly ownId = computed(() => this.session.current()?.person.id);

  constructor() {
    void this.attempt(async () => undefined, null);
  }

  private async load(): Promise<void> {
    const [team, people] = await Promise.all([this.client.team(), this.client.people()]);
    this.team.set(team);
    this.people.set(people);
    if (this.isAdministrator()) this.invitations.set(await this.client.invitations());
  }

  protected async rename(): Promise<void> {
    const name = await this.names.ask({ title: 'Rename the team', label: 'Name', deed: 'Rename', value: this.team()?.name ?? '' });
    if (name !== undefined) await this.attempt(() => this.client.rename(name), `The team is called ${name}.`);
  }

  protected async toggleRole(member: Member, changed: Role): Promise<void> {
    const roles = member.roles.includes(changed) ? member.roles.filter((held) => held !== changed) : [...member.roles, changed];
    await this.attempt(() => this.client.changeMember(member.id, { roles }), `${member.name} works as ${roles.join(', ') || 'nothing yet'}.`);
  }

  protected async setDisabled(member: Member, disabled: boolean): Promise<void> {
    if (disabled) {
      const sure = await this.confirm.ask({ title: `Disable ${member.name}?`, text: 'Every session of theirs in this team ends at once. Their work stays, and they can be enabled again.', deed: 'Disable' });
      if (!sure) return;
    }
    await this.attempt(() => this.client.changeMember(member.id, { disabled }), `${member.name} is ${disabled ? 'disabled' : 'enabled'}.`);
  }

  protected toggleWanted(wanted: Role): void {
    this.wantedRoles.update((roles) => (roles.includes(wanted) ? roles.filter((held) => held !== wanted) : [...roles, wanted]));
  }

  protected async invite(event: Event, field: HTMLInputElement): Promise<void> {
    event.preventDefault();
    const email = field.value.trim();
    const way = this.session.current()?.letterBox ? 'No mail server is set: its letter stands on the Letters page, and its link has to be handed over.' : 'A letter with it is on its way.';
    if (await this.attempt(() => this.client.invite(email, this.wantedRoles()), `${email} is invited for seven days. ${way}`)) {
      field.value = '';
      this.letterWaits.set(this.session.current()?.letterBox === true);
    }
  }

  protected async withdraw(invitation: Invitation): Promise<void> {
    await this.attempt(() => this.client.withdraw(invitation.id), `The invitation of ${invitation.email} is withdrawn.`);
  }

  private async attempt(work: () => Promise<unknown>, done: string | null): Promise<boolean> {
    this.fault.set(null);
    this.done.set(null);
    this.letterWaits.set(false);
    try {
      await work();
      await this.load();
      this.done.set(done);
      return true;
    } catch (error) {
      this.fault.set(callFault(error));
      return false;
    }
  }
}
