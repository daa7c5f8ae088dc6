import { ChangeDetectionStrategy, Component, inject, signal, viewChild } from '@angular/core';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { SessionClient } from '../api/session-client';
import { FaultNote } from '../ui/fault-note';
import type { CallFault } from './call-fault';
import { callFault } from './call-fault';
import { Entrance } from './entrance';
import { NewPasswordField } from './new-password-field';

/** Opened from the letter; the token stands in the fragment, which no server log sees. */
@Component({
  selector: 'slant-new-password-page',
  imports: [Entrance, FaultNote, NewPasswordField, RouterLink],
  templateUrl: './new-password-page.html',
  styleUrl: './form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewPasswordPage {
  private readonly client = inject(SessionClient);
  protected readonly token = inject(ActivatedRoute).snapshot.fragment ?? '';
  private readonly password = viewChild(NewPasswordField);
  protected readonly busy = signal(false);
  protected readonly done = signal(false);
  protected readonly fault = signal<CallFault | null>(null);

  protected async set(event: Event): Promise<void> {
    event.preventDefault();
    if (this.busy()) return;
    this.busy.set(true);
    this.fault.set(null);
    try {
      await this.client.completeReset(this.token, this.password()?.value() ?? '');
      this.done.set(true);
    } catch (error) {
      this.fault.set(callFault(error));
    } finally {
      this.busy.set(false);
    }
  }
}
