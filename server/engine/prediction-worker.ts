import { move, transferableSymbol, valueSymbol } from 'piscina';
import { createTaskAnswerer } from './answer-task';
import { buffersOf } from './prediction-buffers';
import type { PredictionTask } from './prediction-task';

const answerTask = createTaskAnswerer();

/** Runs in a thread. Its name is the name of the pool's task. Arrays are handed over, not copied. */
export function runPrediction(task: PredictionTask): unknown {
  const outcome = answerTask(task);
  return move({ [transferableSymbol]: buffersOf(outcome), [valueSymbol]: outcome } as Parameters<typeof move>[0]);
}
