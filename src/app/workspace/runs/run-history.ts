import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { RunSummary } from '../../../../shared/contracts/runs';
import { utcText } from '../revisions/revision-rows';
import { sourceText, tookText } from './run-text';

/** Earlier runs of a kind: of what, by whom, when, how long, how it ended; the result of one is shown. */
@Component({
  selector: 'slant-run-history',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './run-history.html',
  styles: `
    :host {
      display: block;
      min-width: 0;
    }
    .scroll-box {
      max-height: 264px;
    }
    tr.chosen td {
      background: var(--raised);
    }
    .reason {
      display: block;
      max-width: 44ch;
      font-family: var(--font-text);
      letter-spacing: normal;
      white-space: normal;
      color: var(--muted);
      font-size: var(--size-label);
      line-height: var(--line-label);
    }
  `,
})
export class RunHistory {
  readonly runs = input.required<readonly RunSummary[]>();
  /** Id of the run whose result is shown. */
  readonly shown = input<string | null>(null);
  /** Hash of the draft as it is saved: runs of other contents say so. */
  readonly draftHash = input<string | null>(null);
  /** Id of the run laid over the shown one, where the sheet offers that. */
  readonly against = input<string | null>(null);
  readonly comparable = input(false);
  readonly chosen = output<string>();
  /** A run to lay over the shown one; null for none. */
  readonly compared = output<string | null>();

  protected readonly utc = utcText;
  protected readonly of = sourceText;
  protected readonly took = tookText;
}
