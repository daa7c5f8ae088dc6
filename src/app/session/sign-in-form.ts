import { ChangeDetectionStrategy, Component, inject, input, output, signal } from '@angular/core';
import type { CallFault } from './call-fault';
import { callFault } from './call-fault';
import { SessionStore } from './session-store';

/** Address and password. Used by the sign-in page and, when a session ends in the middle of work, by the overlay. */
@Component({
  selector: 'slant-sign-in-form',
  templateUrl: './sign-in-form.html',
  styleUrl: './form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInForm {
  private readonly store = inject(SessionStore);
  /** Filled in and fixed when the same person must sign in again. */
  readonly fixedEmail = input<string | null>(null);
  readonly signedIn = output<void>();
  protected readonly busy = signal(false);
  protected readonly fault = signal<CallFault | null>(null);
  protected readonly shown = signal(false);

  protected async submit(event: Event, email: string, password: string): Promise<void> {
    event.preventDefault();
    if (this.busy()) return;
    this.busy.set(true);
    this.fault.set(null);
    try {
      await this.store.signIn(email, password);
      this.signedIn.emit();
    } catch (error) {
      this.fault.set(callFault(error));
    } finally {
      this.busy.set(false);
    }
  }
}
