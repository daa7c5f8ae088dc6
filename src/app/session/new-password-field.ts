import type { ElementRef} from '@angular/core';
import { ChangeDetectionStrategy, Component, input, signal, viewChild } from '@angular/core';

/** A field for a new password with its rule beside it; managers and pasting work. */
@Component({
  selector: 'slant-new-password-field',
  template: `
    <label class="text-field">
      <span>{{ label() }}</span>
      <input
        #field
        [type]="shown() ? 'text' : 'password'"
        autocomplete="new-password"
        [attr.name]="name()"
        [attr.aria-invalid]="fault() !== null"
        [attr.aria-describedby]="name() + '-rule'"
      />
    </label>
    <p class="rule" [id]="name() + '-rule'" [class.field-fault]="fault() !== null" [attr.role]="fault() === null ? null : 'alert'">
      {{ fault() ?? 'At least 15 characters; a few words are fine. No other rules.' }}
    </p>
    <label class="show"><input type="checkbox" [checked]="shown()" (change)="shown.set(!shown())" /> Show password</label>
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
    .show {
      display: inline-flex;
      align-items: center;
      gap: 8px;
      min-height: var(--hit);
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
  private readonly field = viewChild.required<ElementRef<HTMLInputElement>>('field');
  protected readonly shown = signal(false);

  value(): string {
    return this.field().nativeElement.value;
  }
}
