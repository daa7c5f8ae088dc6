import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { exportPreview, revisionDetail, revisionList } from '../../../shared/contracts/projects';
import type { ExportPreview, RevisionDetail, RevisionListItem } from '../../../shared/contracts/projects';
import { callOutcome } from './call-outcome';
import type { CallOutcome } from './call-outcome';
import { failedCall } from './failed-call';

export interface ExportedArchive {
  readonly bytes: Blob;
  /** Null where the answer came without it. */
  readonly sha256: string | null;
}

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

  /** The whole archive as it would be handed over, with the hash that the server gives it. */
  async archive(revisionId: string): Promise<CallOutcome<ExportedArchive>> {
    try {
      const { body, headers } = await firstValueFrom(this.http.get(`${this.path(revisionId)}/export`, { responseType: 'blob', observe: 'response' }));
      return { kind: 'found', value: { bytes: body ?? new Blob(), sha256: sha256Of(headers.get('Repr-Digest')) } };
    } catch (error) {
      const failure = failedCall(error);
      return failure.kind === 'unreachable' ? failure : { kind: 'refused', problem: failure.problem };
    }
  }

  private path(revisionId: string): string {
    return `/api/revisions/${encodeURIComponent(revisionId)}`;
  }
}

/** Hexadecimal digits from "sha-256=:<base64>:", RFC 9530. */
function sha256Of(digest: string | null): string | null {
  const [, base64] = /sha-256=:([A-Za-z0-9+/]+=*):/.exec(digest ?? '') ?? [];
  return base64 === undefined ? null : Array.from(atob(base64), (letter) => letter.charCodeAt(0).toString(16).padStart(2, '0')).join('');
}
