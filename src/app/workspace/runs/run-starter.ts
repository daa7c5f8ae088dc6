import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { RunDesk } from './run-desk';
import { RunProgressBar } from './run-progress-bar';

/** Starts a run, says why it cannot or what went wrong, and shows the one under way. */
@Component({
  selector: 'slant-run-starter',
  imports: [RunProgressBar],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <div class="deeds">
      <button type="button" class="button primary" [attr.aria-disabled]="whyNot() !== null" [attr.title]="whyNot()" (click)="start()">Start run</button>
      @if (whyNot(); as reason) {
        <span class="label">{{ reason }}</span>
      }
    </div>
    @if (desk.trouble(); as text) {
      <p class="fail" role="alert">{{ text }}</p>
    }
    @if (desk.underWay(); as run) {
      <slant-run-progress-bar [run]="run" (cancelled)="desk.cancel($event)" />
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: var(--s3);
      min-width: 0;
    }
    .deeds {
      display: flex;
      flex-wrap: wrap;
      gap: var(--s3);
      align-items: center;
    }
  `,
})
export class RunStarter {
  protected readonly desk = inject(RunDesk);
  /** Null where a run can be started. */
  readonly whyNot = input.required<string | null>();
  readonly started = output();

  protected start(): void {
    if (this.whyNot() === null) this.started.emit();
  }
}
