import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MAT_DIALOG_DATA, MatDialogRef } from '@angular/material/dialog';
import type { ChosenSide } from '../design-differences';
import type { DraftConflict } from '../draft-store';

export type ConflictChoices = Readonly<Record<string, ChosenSide>>;

/** Both versions of every field that two people left differently, and a choice for each. */
@Component({
  selector: 'slant-conflict-dialog',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './conflict-dialog.html',
  styleUrl: './dialogs.scss',
})
export class ConflictDialog {
  protected readonly conflict = inject<DraftConflict>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<ConflictDialog, ConflictChoices>>(MatDialogRef);
  protected readonly choices = signal<ConflictChoices>(Object.fromEntries(this.conflict.fields.map(({ pointer, proposed }) => [pointer, proposed])));
  protected readonly contested = computed(() => this.conflict.fields.filter(({ changedBy }) => changedBy === 'both').length);
  protected readonly sides: readonly ChosenSide[] = ['mine', 'theirs'];
  protected readonly who = this.conflict.current.changedBy.name;

  protected choose(pointer: string, side: ChosenSide): void {
    this.choices.update((choices) => ({ ...choices, [pointer]: side }));
  }

  protected chooseAll(side: ChosenSide): void {
    this.choices.set(Object.fromEntries(this.conflict.fields.map(({ pointer }) => [pointer, side])));
  }

  protected join(): void {
    this.dialog.close(this.choices());
  }

  protected later(): void {
    this.dialog.close();
  }
}
