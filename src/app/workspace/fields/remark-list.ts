import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { WORKSPACE_STATE } from '../workspace-state';
import { remarksAt } from './field-remarks';

/** Remarks and faults of one field or of a group of fields, beside it. */
@Component({
  selector: 'slant-remark-list',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (remark of remarks(); track remark.text) {
      <p [class]="'remark ' + remark.weight" [attr.role]="remark.weight === 'fault' ? 'alert' : null">
        <b>{{ words[remark.weight] }}</b> {{ remark.text }}
      </p>
    }
  `,
  styleUrl: './remark-list.scss',
})
export class RemarkList {
  private readonly state = inject(WORKSPACE_STATE);
  readonly pointers = input.required<readonly string[]>();
  protected readonly words = { fault: 'Not valid:', serious: 'Serious:', warn: 'Check:', note: 'Note:' };
  protected readonly remarks = computed(() => {
    const saved = this.state.saveState();
    return remarksAt(this.pointers(), {
      warnings: this.state.prediction()?.head.warnings ?? [],
      failure: this.state.failure(),
      faults: saved.kind === 'not-valid' ? saved.faults : [],
    });
  });
}
