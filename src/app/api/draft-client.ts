import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { Problem } from '../../../shared/contracts/common';
import { draftSaved, panelDetail } from '../../../shared/contracts/projects';
import type { DraftSaved, PanelDetail } from '../../../shared/contracts/projects';
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
