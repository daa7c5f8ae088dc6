import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { ViewTitle } from '../../ui/view-title';
import { RunDesk } from './run-desk';
import { RunHistory } from './run-history';
import { RunSheet } from './run-sheet';

/** The earlier runs of a sheet, once they are read. */
@Component({
  selector: 'slant-run-records',
  imports: [RunHistory, ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <slant-view-title text="Earlier runs" />
    @if (desk.history(); as runs) {
      <slant-run-history
        [runs]="runs"
        [shown]="desk.shown()?.id ?? null"
        [draftHash]="sheet.draftHash()"
        [comparable]="comparable()"
        [against]="desk.against()?.id ?? null"
        (chosen)="desk.show($event)"
        (compared)="desk.compare($event)"
      />
    } @else if (!desk.trouble()) {
      <p class="label" role="status">Reading the runs…</p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: var(--s3);
      min-width: 0;
    }
  `,
})
export class RunRecords {
  protected readonly desk = inject(RunDesk);
  protected readonly sheet = inject(RunSheet);
  /** Another result may be laid over the shown one. */
  readonly comparable = input(false);
}
