import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { SessionClient } from '../api/session-client';
import type { CallFault } from '../session/call-fault';
import { callFault } from '../session/call-fault';
import { SessionStore } from '../session/session-store';
import { FaultNote } from '../ui/fault-note';
import { AskName } from '../ui/name-dialog';
import { SheetFrame } from '../ui/sheet-frame';
import { OwnSessions } from './own-sessions';
import { OwnTokens } from './own-tokens';
import { PasswordForm } from './password-form';

/** The own account: name, team, password, sessions, personal tokens. */
@Component({
  selector: 'slant-account-page',
  imports: [FaultNote, OwnSessions, OwnTokens, PasswordForm, SheetFrame],
  templateUrl: './account-page.html',
  styleUrl: './team-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AccountPage {
  private readonly client = inject(SessionClient);
  private readonly session = inject(SessionStore);
  private readonly names = inject(AskName);
  protected readonly current = this.session.current;
  protected readonly teams = computed(() => this.current()?.teams ?? []);
  protected readonly fault = signal<CallFault | null>(null);

  protected async rename(): Promise<void> {
    const name = await this.names.ask({ title: 'Your name', label: 'Name', deed: 'Change', value: this.current()?.person.name ?? '', hint: 'It stands in title blocks and in the audit log.' });
    if (name !== undefined) await this.attempt(async () => this.session.take(await this.client.rename(name)));
  }

  protected async chooseTeam(teamId: string): Promise<void> {
    await this.attempt(async () => this.session.take(await this.client.chooseTeam(teamId)));
  }

  private async attempt(work: () => Promise<void>): Promise<void> {
    try {
      await work();
      this.fault.set(null);
    } catch (error) {
      this.fault.set(callFault(error));
    }
  }
}
