import { Injectable, inject } from '@angular/core';
import type { Requirement } from '../../../../shared/model/design-document';
import { editValue } from '../design-field-edit';
import { PendingEntries } from '../fields/pending-entries';
import { WORKSPACE_STATE } from '../workspace-state';

/** Puts whole parts of the requirement in place and takes them away, each as one named step. */
@Injectable({ providedIn: null })
export class RequirementParts {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);

  put<Part extends 'transmitter' | 'link' | 'receiver'>(part: Part, value: Requirement[Part], name: string): void {
    const pointer = `/requirement/${part}`;
    this.pending.dropBelow(pointer);
    const edit = editValue(this.state.design(), pointer, value);
    if (edit.kind === 'changed') this.state.change(name, () => edit.design);
  }
}
