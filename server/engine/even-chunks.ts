import type { PlannedChunk } from './run-type';

/** Items `from` to `to`, the last not included. */
export interface ItemRange {
  readonly from: number;
  readonly to: number;
}

const TARGET_SECONDS = 1;

/**
 * Splits equal items into chunks of about a second, as even as they can be. Depends on the estimate alone, so the same
 * question is always split the same way.
 */
export function evenChunks(itemCount: number, secondsPerItem: number): PlannedChunk<ItemRange>[] {
  const perChunk = Math.max(1, Math.floor(TARGET_SECONDS / secondsPerItem));
  const chunkCount = Math.ceil(itemCount / perChunk);
  return Array.from({ length: chunkCount }, (_, i) => {
    const from = Math.floor((i * itemCount) / chunkCount);
    const to = Math.floor(((i + 1) * itemCount) / chunkCount);
    return { chunk: { from, to }, seconds: (to - from) * secondsPerItem };
  });
}
