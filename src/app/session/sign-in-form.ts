import type { ElementRef } from '@angular/core';
import { ChangeDetectionStrategy, Component, inject, input, output, signal, viewChild } from '@angular/core';
import { FaultNote } from '../ui/fault-note';
import type { CallFault } from './call-fault';
import { callFault } from './call-fault';
import { PasswordBox } from './password-box';
import { SessionStore } from './session-store';

/** Address and password. Used by the sign-in page and, when a session ends in the middle of work, by the overlay. */
@Component({
  selector: 'slant-sign-in-form',
  imports: [FaultNote, PasswordBox],
  templateUrl: './sign-in-form.html',
  styleUrl: './form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInForm {
  private readonly store = inject(SessionStore);
  private readonly email = viewChild.required<ElementRef<HTMLInputElement>>('email');
  private readonly password = viewChild.required(PasswordBox);
  /** Filled in and fixed when the same person must sign in again. */
  readonly fixedEmail = input<string | null>(null);
  readonly signedIn = output<void>();
  protected readonly busy = signal(false);
  protected readonly fault = signal<CallFault | null>(null);

  /** Takes an address as if typed; the password is next. */
  fill(email: string): void {
    this.email().nativeElement.value = email;
    this.password().select();
  }

  protected async submit(event: Event): Promise<void> {
    event.preventDefault();
    if (this.busy()) return;
    const email = this.email().nativeElement.value.trim();
    const password = this.password().value();
    if (email === '' || password === '') {
      this.fault.set({ detail: email === '' ? 'Type the e-mail address of your account.' : 'Type the password.', fields: {} });
      if (email === '') this.email().nativeElement.focus();
      else this.password().select();
      return;
    }
    this.busy.set(true);
    this.fault.set(null);
    try {
      await this.store.signIn(email, password);
      this.signedIn.emit();
    } catch (error) {
      this.fault.set(callFault(error));
      this.password().select();
    } finally {
      this.busy.set(false);
    }
  }
}
