import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { WORKSPACE_STATE } from '../workspace-state';

/** Numbered drawing notes: assumptions and cautions of a sheet. Invented demo data say so by themselves. */
@Component({
  selector: 'slant-sheet-notes',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ol class="notes" aria-label="Notes">
      @for (note of all(); track note) {
        <li>{{ note }}</li>
      }
    </ol>
  `,
  styleUrl: './sheet.scss',
})
export class SheetNotes {
  private readonly state = inject(WORKSPACE_STATE);
  readonly notes = input.required<readonly string[]>();
  protected readonly all = computed(() => (this.state.panel()?.project.invented ? [...this.notes(), 'Demo data, invented.'] : this.notes()));
}
