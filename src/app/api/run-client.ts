import { HttpClient, HttpErrorResponse } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { tap } from 'rxjs';
import { problem } from '../../../shared/contracts/common';
import { runDetail, runPage, runProgress } from '../../../shared/contracts/runs';
import type { RunDetail, RunKind, RunProgress, RunRequest, RunSummary } from '../../../shared/contracts/runs';
import { callOutcome } from './call-outcome';
import type { CallOutcome } from './call-outcome';

const LISTED = 20;
const TOO_MANY = 429;

/** What a watcher is told. */
export interface RunListener {
  told(progress: RunProgress): void;
  /** The stream is closed for good, before the run was over: ask again by `read`. */
  lost(): void;
}

/** Runs of a panel: computations that take longer than a request. */
@Injectable({ providedIn: 'root' })
export class RunClient {
  private readonly http = inject(HttpClient);

  /** The newest of one kind, newest first. */
  async list(panelId: string, kind: RunKind): Promise<CallOutcome<readonly RunSummary[]>> {
    const outcome = await callOutcome(this.http.get<unknown>(this.ofPanel(panelId), { params: { kind, limit: LISTED } }), runPage);
    return outcome.kind === 'found' ? { kind: 'found', value: outcome.value.items } : outcome;
  }

  read(runId: string): Promise<CallOutcome<RunDetail>> {
    return callOutcome(this.http.get<unknown>(this.path(runId)), runDetail);
  }

  /** The same key makes a repeated attempt one run. */
  async start(panelId: string, request: RunRequest, idempotencyKey: string): Promise<CallOutcome<RunDetail>> {
    const headers = { 'Idempotency-Key': idempotencyKey };
    let tooMany: CallOutcome<RunDetail> | null = null;
    const call = this.http.post<unknown>(this.ofPanel(panelId), request, { headers }).pipe(
      tap({
        error: (error: unknown) => {
          // Elsewhere "too many" passes by itself; here a person has to end or await a run first.
          const told = error instanceof HttpErrorResponse && error.status === TOO_MANY ? problem.safeParse(error.error) : null;
          if (told?.success === true) tooMany = { kind: 'refused', problem: told.data };
        },
      }),
    );
    const outcome = await callOutcome(call, runDetail);
    return tooMany ?? outcome;
  }

  cancel(runId: string): Promise<CallOutcome<RunDetail>> {
    return callOutcome(this.http.post<unknown>(`${this.path(runId)}/cancellation`, null), runDetail);
  }

  /** Tells of progress until the returned function is called. The browser takes a broken stream up again by itself. */
  watch(runId: string, listener: RunListener): () => void {
    const source = new EventSource(`${this.path(runId)}/events`);
    source.addEventListener('progress', (event: MessageEvent<string>) => listener.told(runProgress.parse(JSON.parse(event.data))));
    source.addEventListener('error', () => {
      if (source.readyState === EventSource.CLOSED) listener.lost();
    });
    return () => source.close();
  }

  private ofPanel(panelId: string): string {
    return `/api/panels/${encodeURIComponent(panelId)}/runs`;
  }

  private path(runId: string): string {
    return `/api/runs/${encodeURIComponent(runId)}`;
  }
}
