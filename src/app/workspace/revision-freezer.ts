import { Injectable, inject } from '@angular/core';
import { DraftClient } from '../api/draft-client';
import { DraftStore } from './draft-store';

/** Freezes the draft on the screen as the next revision. */
@Injectable()
export class RevisionFreezer {
  private readonly drafts = inject(DraftStore);
  private readonly client = inject(DraftClient);

  /** Null when done, otherwise why not. The same key makes a repeated attempt one revision. */
  async freeze(message: string, idempotencyKey: string): Promise<string | null> {
    const saved = await this.drafts.flush();
    const panel = this.drafts.panel();
    if (!panel) return 'The panel is closed';
    if (!saved) return 'The draft could not be saved first; see what the bar says';
    const outcome = await this.client.freeze({ panelId: panel.id, message, etag: panel.etag, idempotencyKey });
    if (outcome.kind === 'unreachable') return 'The server is out of reach; nothing was frozen, try again';
    if (outcome.kind === 'refused') {
      return outcome.problem.status === 412 ? 'Somebody else changed the draft meanwhile; read the panel again before freezing' : outcome.problem.detail.replace(/\.$/, '');
    }
    this.drafts.acceptRevision(outcome.revision, panel.etag);
    return null;
  }
}
