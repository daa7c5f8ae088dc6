import { ChangeDetectionStrategy, Component, input, viewChild } from '@angular/core';
import { PasswordBox } from './password-box';

/** A field for a new password with its rule beside it; managers and pasting work. */
@Component({
  selector: 'slant-new-password-field',
  imports: [PasswordBox],
  template: `
    <div class="text-field">
      <label class="label" [attr.for]="name()">{{ label() }}</label>
      <slant-password-box purpose="new-password" [boxId]="name()" [faulty]="fault() !== null" [describedBy]="name() + '-rule'" />
    </div>
    <p class="rule" [id]="name() + '-rule'" [class.field-fault]="fault() !== null" [attr.role]="fault() === null ? null : 'alert'">
      {{ fault() ?? 'At least 15 characters; a few words are fine. Common passwords, keyboard runs and your own name are refused.' }}
    </p>
  `,
  styles: `
    :host {
      display: grid;
      gap: var(--s1);
    }
    .rule {
      color: var(--muted);
      font-size: var(--size-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewPasswordField {
  readonly label = input('New password');
  readonly name = input('newPassword');
  readonly fault = input<string | null>(null);
  private readonly box = viewChild.required(PasswordBox);

  value(): string {
    return this.box().value();
  }
}
