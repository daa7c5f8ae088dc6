import type { PlacedDesign } from '../place-cells';

/**
 * The same panel with every cell frozen at its ideal phase, lossless and the same at every frequency: what the pattern
 * then loses away from the design frequency is lost to the paths alone (differential spatial phase delay;
 * D. M. Pozar, Electronics Letters 39(21), 1490-1491, 2003, from memory).
 */
export function spatialDesign(placed: PlacedDesign): PlacedDesign {
  const { targetRad } = placed;
  const assignment = { cellIndex: new Int32Array(targetRad.length).fill(-1), phaseRad: targetRad, magnitude: new Float64Array(targetRad.length).fill(1) };
  return { ...placed, assignment, stock: { ...placed.stock, respond: (given) => given, warnings: () => [] } };
}
