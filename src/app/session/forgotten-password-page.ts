import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { SessionClient } from '../api/session-client';
import { FaultNote } from '../ui/fault-note';
import type { CallFault } from './call-fault';
import { callFault } from './call-fault';
import { Entrance } from './entrance';
import { SessionStore } from './session-store';

@Component({
  selector: 'slant-forgotten-password-page',
  imports: [Entrance, FaultNote, RouterLink],
  templateUrl: './forgotten-password-page.html',
  styleUrl: './form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ForgottenPasswordPage {
  private readonly client = inject(SessionClient);
  private readonly store = inject(SessionStore);
  protected readonly letterBox = computed(() => this.store.about()?.letterBox === true);
  protected readonly busy = signal(false);
  protected readonly sentTo = signal<string | null>(null);
  protected readonly fault = signal<CallFault | null>(null);

  protected async send(event: Event, email: string): Promise<void> {
    event.preventDefault();
    if (this.busy()) return;
    this.busy.set(true);
    this.fault.set(null);
    try {
      await this.client.requestReset(email);
      this.sentTo.set(email);
    } catch (error) {
      this.fault.set(callFault(error));
    } finally {
      this.busy.set(false);
    }
  }
}
