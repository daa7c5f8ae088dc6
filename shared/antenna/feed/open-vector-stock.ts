import type { VectorStock } from '../vector/vector-stock';

/** Null field in the vector model: no wave leaves a shadowed cell. */
export function openVectorStock(stock: VectorStock, shadow: Uint8Array | undefined): VectorStock {
  if (!shadow) return stock;
  const opened = (waves: Float64Array): Float64Array => waves.map((part, n) => (shadow[n] === 1 ? 0 : part));
  return {
    ...stock,
    leaving: (assignment, frequencyHz) => {
      const { teRe, teIm, tmRe, tmIm } = stock.leaving(assignment, frequencyHz);
      return { teRe: opened(teRe), teIm: opened(teIm), tmRe: opened(tmRe), tmIm: opened(tmIm) };
    },
  };
}
