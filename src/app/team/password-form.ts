import { ChangeDetectionStrategy, Component, inject, signal, viewChild } from '@angular/core';
import { SessionClient } from '../api/session-client';
import type { CallFault } from '../session/call-fault';
import { callFault } from '../session/call-fault';
import { NewPasswordField } from '../session/new-password-field';
import { PasswordBox } from '../session/password-box';
import { CheckField } from '../ui/check-field';
import { FaultNote } from '../ui/fault-note';
import { ViewTitle } from '../ui/view-title';

@Component({
  selector: 'slant-password-form',
  imports: [CheckField, FaultNote, NewPasswordField, PasswordBox, ViewTitle],
  template: `
    <section aria-label="Password">
      <slant-view-title text="Password" />
      <form (submit)="change($event, current)" novalidate>
        <div class="text-field">
          <label class="label" for="currentPassword">Current password</label>
          <slant-password-box #current boxId="currentPassword" [faulty]="!!fault()?.fields?.['currentPassword']" [describedBy]="fault()?.fields?.['currentPassword'] ? 'current-fault' : null" />
        </div>
        @if (fault()?.fields?.['currentPassword']; as text) {
          <p class="field-fault" id="current-fault" role="alert">{{ text }}</p>
        }
        <slant-new-password-field [fault]="fault()?.fields?.['newPassword'] ?? null" />
        <slant-check-field label="End my other sessions" [checked]="endOthers()" (changed)="endOthers.set($event)" />
        @if (fault(); as problem) {
          @if (!problem.fields['currentPassword'] && !problem.fields['newPassword']) {
            <slant-fault-note [text]="problem.detail" [requestId]="problem.requestId" />
          }
        }
        @if (done()) {
          <p role="status" class="pass">The password is changed.</p>
        }
        <button type="submit" class="button">Change the password</button>
      </form>
    </section>
  `,
  styles: `
    form {
      display: grid;
      gap: var(--s3);
      max-width: 380px;
      margin-top: var(--s2);
    }
    .button {
      justify-self: start;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PasswordForm {
  private readonly client = inject(SessionClient);
  private readonly newPassword = viewChild.required(NewPasswordField);
  protected readonly endOthers = signal(true);
  protected readonly fault = signal<CallFault | null>(null);
  protected readonly done = signal(false);

  protected async change(event: Event, current: PasswordBox): Promise<void> {
    event.preventDefault();
    this.fault.set(null);
    this.done.set(false);
    try {
      await this.client.changePassword({ currentPassword: current.value(), newPassword: this.newPassword().value(), endOtherSessions: this.endOthers() });
      this.done.set(true);
    } catch (error) {
      this.fault.set(callFault(error));
    }
  }
}
