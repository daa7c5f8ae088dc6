import type { DesignDocument } from '../../../shared/model/design-document';

/** How many steps can be taken back. */
export const STEP_LIMIT = 100;
/** Changes with the same key within this time are one step. */
export const MERGE_WINDOW_MS = 1000;

export interface DraftStep {
  /** What was done, in the words of the undo button: "Steer beam". */
  readonly name: string;
  readonly before: DesignDocument;
  readonly after: DesignDocument;
  readonly mergeKey: string | null;
  readonly at: number;
}

export interface DraftHistory {
  readonly design: DesignDocument;
  /** Oldest first. */
  readonly done: readonly DraftStep[];
  /** The next to be redone last. */
  readonly undone: readonly DraftStep[];
}

export interface DraftChange {
  readonly name: string;
  readonly design: DesignDocument;
  readonly at: number;
  readonly mergeKey?: string;
}

export function beginHistory(design: DesignDocument): DraftHistory {
  return { design, done: [], undone: [] };
}

/** The history after one more change; a change to the design as it stands is none. */
export function recordChange(history: DraftHistory, change: DraftChange): DraftHistory {
  if (change.design === history.design) return history;
  const last = history.done.at(-1);
  const step: DraftStep = {
    name: change.name,
    before: history.design,
    after: change.design,
    mergeKey: change.mergeKey ?? null,
    at: change.at,
  };
  if (last && continues(last, step)) {
    return { design: change.design, done: [...history.done.slice(0, -1), { ...step, before: last.before }], undone: [] };
  }
  return { design: change.design, done: [...history.done, step].slice(-STEP_LIMIT), undone: [] };
}

function continues(last: DraftStep, step: DraftStep): boolean {
  // The window runs from the latest change, so a slow drag stays one step as long as it moves.
  return step.mergeKey !== null && last.mergeKey === step.mergeKey && last.after === step.before && step.at - last.at <= MERGE_WINDOW_MS;
}

export function undoStep(history: DraftHistory): DraftHistory {
  const step = history.done.at(-1);
  if (!step) return history;
  return { design: step.before, done: history.done.slice(0, -1), undone: [...history.undone, step] };
}

export function redoStep(history: DraftHistory): DraftHistory {
  const step = history.undone.at(-1);
  if (!step) return history;
  // A redone step never merges with what follows.
  return { design: step.after, done: [...history.done, { ...step, mergeKey: null }], undone: history.undone.slice(0, -1) };
}
