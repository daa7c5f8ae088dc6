import { ChangeDetectionStrategy, Component, Injectable, inject, signal } from '@angular/core';
import { MAT_DIALOG_DATA, MatDialog, MatDialogRef } from '@angular/material/dialog';
import { firstValueFrom } from 'rxjs';

export interface NameQuestion {
  readonly title: string;
  readonly label: string;
  readonly deed: string;
  readonly value?: string;
  readonly hint?: string;
}

@Component({
  selector: 'slant-name-dialog',
  template: `
    <form class="dialog" (submit)="answer($event, field.value)" novalidate>
      <h2>{{ question.title }}</h2>
      <label class="text-field">
        <span>{{ question.label }}</span>
        <input #field maxlength="120" cdkFocusInitial [value]="question.value ?? ''" [attr.aria-invalid]="empty()" />
      </label>
      @if (empty()) {
        <p class="field-fault" role="alert">Give it a name of 1 to 120 characters.</p>
      } @else if (question.hint) {
        <p class="muted">{{ question.hint }}</p>
      }
      <div class="dialog-actions">
        <button type="button" class="button" (click)="cancel()">Cancel</button>
        <button type="submit" class="button filled">{{ question.deed }}</button>
      </div>
    </form>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NameDialog {
  protected readonly question = inject<NameQuestion>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<NameDialog, string>>(MatDialogRef);
  protected readonly empty = signal(false);

  protected answer(event: Event, text: string): void {
    event.preventDefault();
    const name = text.trim();
    this.empty.set(name === '');
    if (name !== '') this.dialog.close(name);
  }

  protected cancel(): void {
    this.dialog.close();
  }
}

/** Asks for a name; undefined when the person thinks better of it. */
@Injectable({ providedIn: 'root' })
export class AskName {
  private readonly dialog = inject(MatDialog);

  ask(question: NameQuestion): Promise<string | undefined> {
    const dialog = this.dialog.open<NameDialog, NameQuestion, string>(NameDialog, { data: question, width: '420px', ariaLabel: question.title });
    return firstValueFrom(dialog.afterClosed());
  }
}
