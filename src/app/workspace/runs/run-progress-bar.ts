import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { RunSummary } from '../../../../shared/contracts/runs';
import { queueText, timeLeftText } from './run-text';

/** A run under way: how far it is, what it does, how long it will take, its place in the queue, and the way to cancel it. */
@Component({
  selector: 'slant-run-progress-bar',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <div class="bar" role="progressbar" aria-label="Progress of the run" aria-valuemin="0" aria-valuemax="100" [attr.aria-valuenow]="percent()" [attr.aria-valuetext]="words()">
      <span class="done" [style.width.%]="percent()"></span>
    </div>
    <span class="figure">{{ percent() }} %</span>
    <button type="button" class="button quiet" (click)="cancelled.emit(run().id)">Cancel run</button>
    <p class="label" role="status">{{ words() }}</p>
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr) auto auto;
      align-items: center;
      gap: 2px 10px;
    }
    .bar {
      height: 8px;
      border: 1px solid var(--rule-strong);
      background: var(--raised);
    }
    .done {
      display: block;
      height: 100%;
      background: var(--copper);
    }
    p {
      grid-column: 1 / -1;
    }
    .button {
      min-height: var(--hit);
    }
  `,
})
export class RunProgressBar {
  readonly run = input.required<RunSummary>();
  readonly cancelled = output<string>();

  protected readonly percent = computed(() => Math.round(this.run().progress.fraction * 100));
  protected readonly words = computed(() => {
    const { progress } = this.run();
    return [progress.stage, queueText(progress), timeLeftText(progress)].filter((part) => part !== '').join('; ');
  });
}
