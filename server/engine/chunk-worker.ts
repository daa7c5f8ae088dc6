import { createChunkAnswerer } from './answer-chunk';
import type { ChunkOutcome, ChunkTask } from './chunk-task';

const answerChunk = createChunkAnswerer();

/** Runs in a thread. Its name is the name of the pool's task. */
export function runChunk(task: ChunkTask): ChunkOutcome {
  return answerChunk(task);
}
