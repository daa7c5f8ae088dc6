import { ChangeDetectionStrategy, Component, Injectable, inject } from '@angular/core';
import { MAT_DIALOG_DATA, MatDialog, MatDialogRef } from '@angular/material/dialog';
import { firstValueFrom } from 'rxjs';

export interface Question {
  readonly title: string;
  readonly text: string;
  /** What the button does: "Discard the edition", not "OK". */
  readonly deed: string;
  /** True when it cannot be undone. */
  readonly final?: boolean;
}

@Component({
  selector: 'slant-confirm-dialog',
  template: `
    <div class="dialog">
      <h2>{{ question.title }}</h2>
      <p>{{ question.text }}</p>
      <div class="dialog-actions">
        <button type="button" class="button" (click)="answer(false)">Cancel</button>
        <button type="button" class="button filled" [class.danger]="question.final" (click)="answer(true)">{{ question.deed }}</button>
      </div>
    </div>
  `,
  styles: `
    .danger {
      background: var(--fail);
      border-color: var(--fail);
      color: var(--paper);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConfirmDialog {
  protected readonly question = inject<Question>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<ConfirmDialog, boolean>>(MatDialogRef);

  protected answer(yes: boolean): void {
    this.dialog.close(yes);
  }
}

/** Asks before what cannot be undone. */
@Injectable({ providedIn: 'root' })
export class Confirm {
  private readonly dialog = inject(MatDialog);

  async ask(question: Question): Promise<boolean> {
    const dialog = this.dialog.open<ConfirmDialog, Question, boolean>(ConfirmDialog, { data: question, width: '420px', ariaLabel: question.title });
    return (await firstValueFrom(dialog.afterClosed())) === true;
  }
}
