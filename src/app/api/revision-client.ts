import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { exportPreview, revisionDetail, revisionList } from '../../../shared/contracts/projects';
import type { ExportPreview, RevisionDetail, RevisionListItem } from '../../../shared/contracts/projects';
import { callOutcome } from './call-outcome';
import type { CallOutcome } from './call-outcome';
import { failedCall } from './failed-call';

/** Frozen revisions of a panel. They never change; a restoration makes a new one. */
@Injectable({ providedIn: 'root' })
export class RevisionClient {
  private readonly http = inject(HttpClient);

  /** Newest first. */
  async list(panelId: string): Promise<CallOutcome<readonly RevisionListItem[]>> {
    const outcome = await callOutcome(this.http.get<unknown>(`/api/panels/${encodeURIComponent(panelId)}/revisions`), revisionList);
    return outcome.kind === 'found' ? { kind: 'found', value: outcome.value.items } : outcome;
  }

  read(revisionId: string): Promise<CallOutcome<RevisionDetail>> {
    return callOutcome(this.http.get<unknown>(this.path(revisionId)), revisionDetail);
  }

  /** The same key makes a repeated attempt one revision. */
  restore(revisionId: string, message: string, idempotencyKey: string): Promise<CallOutcome<RevisionDetail>> {
    const headers = { 'Idempotency-Key': idempotencyKey };
    return callOutcome(this.http.post<unknown>(`${this.path(revisionId)}/restoration`, { message }, { headers }), revisionDetail);
  }

  exportPreview(revisionId: string): Promise<CallOutcome<ExportPreview>> {
    return callOutcome(this.http.get<unknown>(`${this.path(revisionId)}/export/preview`), exportPreview);
  }

  /** The whole archive as it would be handed over. */
  async archive(revisionId: string): Promise<CallOutcome<Blob>> {
    try {
      return { kind: 'found', value: await firstValueFrom(this.http.get(`${this.path(revisionId)}/export`, { responseType: 'blob' })) };
    } catch (error) {
      const failure = failedCall(error);
      return failure.kind === 'unreachable' ? failure : { kind: 'refused', problem: failure.problem };
    }
  }

  private path(revisionId: string): string {
    return `/api/revisions/${encodeURIComponent(revisionId)}`;
  }
}
