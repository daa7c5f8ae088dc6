import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { Notes } from '../../ui/notes';
import { WORKSPACE_STATE } from '../workspace-state';

/** Numbered drawing notes: assumptions and cautions of a sheet. Invented demo data say so by themselves. */
@Component({
  selector: 'slant-sheet-notes',
  imports: [Notes],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<slant-notes [notes]="all()" />`,
})
export class SheetNotes {
  private readonly state = inject(WORKSPACE_STATE);
  readonly notes = input.required<readonly string[]>();
  protected readonly all = computed(() => (this.state.panel()?.project.invented ? [...this.notes(), 'Demo data, invented.'] : this.notes()));
}
