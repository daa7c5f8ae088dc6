import { Injectable, inject } from '@angular/core';
import { WorkspaceStore } from '../workspace-store';

/** Reads the open panel again after the server changed its draft. */
@Injectable()
export class PanelReopener {
  private readonly store = inject(WorkspaceStore, { optional: true });

  async reopen(): Promise<void> {
    const panel = this.store?.panel();
    if (this.store && panel) await this.store.open(panel.id, this.store.viewOnlyReason());
  }
}
