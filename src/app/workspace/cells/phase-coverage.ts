export interface PhaseCoverage {
  /** From the lowest to the highest unwrapped phase. */
  readonly rangeDeg: number;
  /** Largest distance round the circle between neighbouring phases: half of it is the largest error of a cell. */
  readonly largestGapDeg: number;
}

/** How a set of cells covers the circle of wanted phases; null for no cells. */
export function phaseCoverage(unwrappedDeg: ArrayLike<number>): PhaseCoverage | null {
  if (unwrappedDeg.length === 0) return null;
  const phases = Array.from(unwrappedDeg);
  const onCircle = phases.map((phase) => ((phase % 360) + 360) % 360).sort((a, b) => a - b);
  const gaps = onCircle.map((phase, i) => (i === 0 ? phase + 360 - onCircle[onCircle.length - 1] : phase - onCircle[i - 1]));
  return { rangeDeg: Math.max(...phases) - Math.min(...phases), largestGapDeg: Math.max(...gaps) };
}

/** How often each cell of the library stands on the panel. */
export function cellUse(cellIndex: ArrayLike<number>, cellCount: number): Int32Array {
  const counts = new Int32Array(cellCount);
  for (let i = 0; i < cellIndex.length; i += 1) {
    const cell = cellIndex[i];
    if (cell >= 0 && cell < cellCount) counts[cell] += 1;
  }
  return counts;
}
