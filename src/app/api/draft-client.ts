import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { Observable } from 'rxjs';
import type { Problem } from '../../../shared/contracts/common';
import { draftSaved, panelDetail, revisionDetail } from '../../../shared/contracts/projects';
import type { DraftSaved, PanelDetail, RevisionDetail } from '../../../shared/contracts/projects';
import type { DesignDocument } from '../../../shared/model/design-document';
import { failedCall } from './failed-call';

export type SaveOutcome =
  | { readonly kind: 'saved'; readonly saved: DraftSaved }
  | { readonly kind: 'stale'; readonly current: PanelDetail }
  | { readonly kind: 'refused'; readonly detail: string; readonly faults: readonly { readonly pointer: string; readonly detail: string }[] }
  /** No answer, or one that says nothing about the draft: to be tried again. */
  | { readonly kind: 'unreachable' };

export type PanelOutcome =
  | { readonly kind: 'found'; readonly panel: PanelDetail }
  | { readonly kind: 'refused'; readonly problem: Problem }
  | { readonly kind: 'unreachable' };

export type RevisionOutcome =
  | { readonly kind: 'found'; readonly revision: RevisionDetail }
  | { readonly kind: 'refused'; readonly problem: Problem }
  | { readonly kind: 'unreachable' };

/** A draft to be frozen: the ETag says which state, the key makes a repeated call one revision. */
export interface FreezeRequest {
  readonly panelId: string;
  readonly message: string;
  readonly etag: string;
  readonly idempotencyKey: string;
}

/** The draft of a panel, with the ETag that guards it. */
@Injectable({ providedIn: 'root' })
export class DraftClient {
  private readonly http = inject(HttpClient);

  async read(panelId: string): Promise<PanelOutcome> {
    try {
      const body = await firstValueFrom(this.http.get<unknown>(`/api/panels/${encodeURIComponent(panelId)}`));
      return { kind: 'found', panel: panelDetail.parse(body) };
    } catch (error) {
      const failure = failedCall(error);
      return failure.kind === 'unreachable' ? failure : { kind: 'refused', problem: failure.problem };
    }
  }

  async save(panelId: string, design: DesignDocument, etag: string): Promise<SaveOutcome> {
    const headers = { 'If-Match': etag };
    try {
      const body = await firstValueFrom(this.http.put<unknown>(`/api/panels/${encodeURIComponent(panelId)}/draft`, { design }, { headers }));
      return { kind: 'saved', saved: draftSaved.parse(body) };
    } catch (error) {
      return saveFailure(error);
    }
  }

  /** Freezes the draft as the next revision. */
  freeze({ panelId, message, etag, idempotencyKey }: FreezeRequest): Promise<RevisionOutcome> {
    const headers = { 'If-Match': etag, 'Idempotency-Key': idempotencyKey };
    return revisionOutcome(this.http.post<unknown>(`/api/panels/${encodeURIComponent(panelId)}/revisions`, { message }, { headers }));
  }

  readRevision(revisionId: string): Promise<RevisionOutcome> {
    return revisionOutcome(this.http.get<unknown>(`/api/revisions/${encodeURIComponent(revisionId)}`));
  }
}

async function revisionOutcome(call: Observable<unknown>): Promise<RevisionOutcome> {
  try {
    return { kind: 'found', revision: revisionDetail.parse(await firstValueFrom(call)) };
  } catch (error) {
    const failure = failedCall(error);
    return failure.kind === 'unreachable' ? failure : { kind: 'refused', problem: failure.problem };
  }
}

function saveFailure(error: unknown): SaveOutcome {
  const failure = failedCall(error);
  if (failure.kind === 'unreachable') return failure;
  const { problem, body } = failure;
  if (problem.status === 412) return { kind: 'stale', current: panelDetail.parse(body['current']) };
  // The work waits until the person has signed in again; the session says so by itself.
  if (problem.status === 401 || problem.status >= 500) return { kind: 'unreachable' };
  const faults = (problem.errors ?? []).map(({ pointer, detail }) => ({ pointer: pointer.replace(/^#?\/design/, ''), detail }));
  return { kind: 'refused', detail: problem.detail, faults };
}
