import type { RunDetail, RunKind, RunSource, RunSummary } from '../../shared/contracts/runs';
import { runProgress, type ProgressRow, type RunSurroundings } from './run-progress';

/** A stored run, as far as people see it. */
export interface StoredRun extends ProgressRow {
  readonly id: string;
  readonly kind: RunKind;
  readonly panelId: string;
  readonly panelName: string;
  readonly parameters: object;
  readonly contentHash: string;
  readonly engineVersion: string;
  readonly draftVersion: number | null;
  readonly revisionId: string | null;
  readonly revisionNumber: number | null;
  readonly createdAt: Date;
  readonly createdBy: string;
  readonly createdByName: string;
  readonly finishedAt: Date | null;
  readonly failureMessage: string | null;
  readonly failureId: string | null;
  readonly reused: boolean;
}

export function runSummaryOf(run: StoredRun, around: RunSurroundings): RunSummary {
  return {
    id: run.id,
    kind: run.kind,
    panelId: run.panelId,
    panelName: run.panelName,
    source: sourceOf(run),
    contentHash: run.contentHash,
    engineVersion: run.engineVersion,
    createdAt: run.createdAt.toISOString(),
    createdBy: { id: run.createdBy, name: run.createdByName },
    startedAt: run.startedAt?.toISOString() ?? null,
    finishedAt: run.finishedAt?.toISOString() ?? null,
    progress: runProgress(run, around),
    failure: run.failureMessage === null || run.failureId === null ? null : { message: run.failureMessage, id: run.failureId },
    reused: run.reused,
  };
}

export function runDetailOf(run: StoredRun, around: RunSurroundings, result: object | null): RunDetail {
  // Parameters and result were made by the schema and the merge of this very kind.
  const answer = { kind: run.kind, parameters: run.parameters, result } as RunDetail['answer'];
  return { ...runSummaryOf(run, around), answer };
}

function sourceOf({ draftVersion, revisionId, revisionNumber }: StoredRun): RunSource {
  if (revisionId !== null && revisionNumber !== null) return { kind: 'revision', revisionId, number: revisionNumber };
  return { kind: 'draft', version: draftVersion ?? 0 };
}
