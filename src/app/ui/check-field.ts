import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';

/** A check box as a square cell filled with copper. */
@Component({
  selector: 'slant-check-field',
  template: `
    <label>
      <input #box type="checkbox" [attr.aria-label]="name()" [checked]="checked()" [disabled]="disabled()" (change)="ask(box)" />
      <span class="box" aria-hidden="true"></span>
      <span>{{ label() }}</span>
    </label>
  `,
  styles: `
    label {
      position: relative;
      display: inline-flex;
      align-items: center;
      gap: 8px;
      min-height: var(--hit);
      font-size: var(--size-small);
      cursor: pointer;
    }
    input {
      position: absolute;
      opacity: 0;
      width: var(--hit);
      height: var(--hit);
      margin: 0;
      cursor: pointer;
    }
    .box {
      flex: none;
      width: 12px;
      height: 12px;
      border: 1px solid var(--rule-strong);
      background: var(--raised);
    }
    input:checked + .box {
      border-color: var(--copper);
      background: linear-gradient(var(--copper), var(--copper)) center / 6px 6px no-repeat var(--raised);
    }
    input:focus-visible + .box {
      outline: 2px solid var(--copper);
      outline-offset: 2px;
    }
    input:disabled ~ span {
      color: var(--muted);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CheckField {
  readonly label = input.required<string>();
  /** What a screen reader says where there is no visible label. */
  readonly name = input<string | null>(null);
  readonly checked = input.required<boolean>();
  readonly disabled = input(false);
  readonly changed = output<boolean>();

  /** Shows what holds, not what was wished: the box moves when its owner says so. */
  protected ask(box: HTMLInputElement): void {
    box.checked = this.checked();
    this.changed.emit(!this.checked());
  }
}
