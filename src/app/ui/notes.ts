import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** Numbered drawing notes: assumptions and cautions stand here, not in banners. */
@Component({
  selector: 'slant-notes',
  template: `
    <ol aria-label="Notes">
      @for (note of notes(); track note) {
        <li>{{ note }}</li>
      }
    </ol>
  `,
  styles: `
    ol {
      padding: 0;
      list-style: none;
      counter-reset: note;
      color: var(--muted);
      font-size: var(--size-label);
      line-height: var(--line-label);
    }
    li {
      position: relative;
      padding-left: 18px;
      counter-increment: note;
    }
    li::before {
      content: counter(note);
      position: absolute;
      left: 0;
      font-family: var(--font-figure);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Notes {
  readonly notes = input.required<readonly string[]>();
}
