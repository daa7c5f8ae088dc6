import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MAT_DIALOG_DATA, MatDialogRef } from '@angular/material/dialog';
import { HOW_COMPUTED } from '../how-computed';
import type { StripFigure } from '../strip-figures';

/** How one headline figure is computed, with the figure as it stands. */
@Component({
  selector: 'slant-how-computed-dialog',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './how-computed-dialog.html',
  styleUrl: './dialogs.scss',
})
export class HowComputedDialog {
  protected readonly figure = inject<StripFigure>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<HowComputedDialog>>(MatDialogRef);
  protected readonly how = HOW_COMPUTED[this.figure.id];

  protected close(): void {
    this.dialog.close();
  }
}
