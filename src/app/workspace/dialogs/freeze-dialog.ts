import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { MAT_DIALOG_DATA, MatDialogRef } from '@angular/material/dialog';
import type { DesignDifference } from '../../../../shared/model/design-diff';

const LONGEST_MESSAGE = 2000;
const CHANGES_SHOWN = 8;

export interface FreezeQuestion {
  readonly number: number;
  readonly parentNumber: number | null;
  readonly changes: readonly DesignDifference[];
  /** Freezes; null when done, otherwise why it did not work. */
  freeze(message: string): Promise<string | null>;
}

/** Asks what the new revision is about, and freezes it. The dialog stays with the message when something goes wrong. */
@Component({
  selector: 'slant-freeze-dialog',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './freeze-dialog.html',
  styleUrl: './dialogs.scss',
})
export class FreezeDialog {
  protected readonly question = inject<FreezeQuestion>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<FreezeDialog, boolean>>(MatDialogRef);
  protected readonly longest = LONGEST_MESSAGE;
  protected readonly shown = this.question.changes.slice(0, CHANGES_SHOWN);
  protected readonly more = this.question.changes.length - this.shown.length;
  protected readonly fault = signal<string | null>(null);
  protected readonly working = signal(false);

  protected async freeze(event: Event, text: string): Promise<void> {
    event.preventDefault();
    const message = text.trim();
    if (message === '') {
      this.fault.set('Say in a few words what this revision is about');
      return;
    }
    this.working.set(true);
    const fault = await this.question.freeze(message);
    this.working.set(false);
    this.fault.set(fault);
    if (fault === null) this.dialog.close(true);
  }

  protected cancel(): void {
    this.dialog.close(false);
  }
}
