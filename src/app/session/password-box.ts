import type { ElementRef } from '@angular/core';
import { ChangeDetectionStrategy, Component, input, signal, viewChild } from '@angular/core';

/** A password with a button that shows it. The label outside points at `boxId`; managers and pasting work. */
@Component({
  selector: 'slant-password-box',
  template: `
    <input
      #field
      required
      [id]="boxId()"
      [type]="shown() ? 'text' : 'password'"
      [attr.name]="boxId()"
      [attr.autocomplete]="purpose()"
      [attr.aria-invalid]="faulty()"
      [attr.aria-describedby]="describedBy()"
    />
    <button type="button" [attr.aria-label]="shown() ? 'Hide the password' : 'Show the password'" (click)="shown.set(!shown())">{{ shown() ? 'Hide' : 'Show' }}</button>
  `,
  styles: `
    :host {
      position: relative;
      display: block;
    }
    input {
      width: 100%;
      min-height: 36px;
      padding: 3px 60px 3px 8px;
      border: 1px solid var(--rule-strong);
      border-radius: var(--corner);
      background: var(--raised);
      color: var(--ink);
      font: inherit;
    }
    input[aria-invalid='true'] {
      border-color: var(--fail);
    }
    button {
      position: absolute;
      inset: 1px 1px 1px auto;
      min-width: 52px;
      border: 0;
      background: none;
      color: var(--muted);
      font: 400 var(--size-label) var(--font-figure);
      cursor: pointer;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PasswordBox {
  private readonly field = viewChild.required<ElementRef<HTMLInputElement>>('field');
  readonly boxId = input.required<string>();
  readonly purpose = input<'current-password' | 'new-password'>('current-password');
  readonly faulty = input(false);
  readonly describedBy = input<string | null>(null);
  protected readonly shown = signal(false);

  value(): string {
    return this.field().nativeElement.value;
  }

  /** Puts the cursor there with the whole password marked, to be typed over. */
  select(): void {
    this.field().nativeElement.focus();
    this.field().nativeElement.select();
  }
}
