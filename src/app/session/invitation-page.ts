import { ChangeDetectionStrategy, Component, inject, signal, viewChild } from '@angular/core';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import type { InvitationWelcome } from '../../../shared/contracts/team';
import { SessionClient } from '../api/session-client';
import { FaultNote } from '../ui/fault-note';
import type { CallFault } from './call-fault';
import { callFault } from './call-fault';
import { Entrance } from './entrance';
import { NewPasswordField } from './new-password-field';
import { PasswordBox } from './password-box';
import { SessionStore } from './session-store';

/** First sign-in: who was invited chooses a name and a password, or proves to be the person known by the address. */
@Component({
  selector: 'slant-invitation-page',
  imports: [Entrance, FaultNote, NewPasswordField, PasswordBox, RouterLink],
  templateUrl: './invitation-page.html',
  styleUrl: './form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InvitationPage {
  private readonly client = inject(SessionClient);
  private readonly store = inject(SessionStore);
  private readonly router = inject(Router);
  private readonly token = inject(ActivatedRoute).snapshot.fragment ?? '';
  private readonly newPassword = viewChild(NewPasswordField);
  protected readonly welcome = signal<InvitationWelcome | null>(null);
  protected readonly busy = signal(false);
  protected readonly fault = signal<CallFault | null>(null);

  constructor() {
    void this.lookUp();
  }

  private async lookUp(): Promise<void> {
    try {
      this.welcome.set(await this.client.lookUpInvitation(this.token));
    } catch (error) {
      this.fault.set(callFault(error));
    }
  }

  protected async accept(event: Event, name: string | undefined, knownPassword: string | undefined): Promise<void> {
    event.preventDefault();
    if (this.busy()) return;
    this.busy.set(true);
    this.fault.set(null);
    try {
      const password = knownPassword ?? this.newPassword()?.value() ?? '';
      this.store.take(await this.client.acceptInvitation({ token: this.token, ...(name === undefined ? {} : { name }), password }));
      await this.router.navigateByUrl('/projects');
    } catch (error) {
      this.fault.set(callFault(error));
    } finally {
      this.busy.set(false);
    }
  }
}
