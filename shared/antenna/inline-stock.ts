import type { Cells } from '../model/design-document';
import { radFromDeg } from '../units/angles';
import type { CellStock } from './cell-stock';
import { nearestPhaseTable } from './nearest-phase-table';
import { searchStateReferenceRad } from './reference-search';

/** A what-if table: phases and magnitudes that hold at every frequency and incidence. Chosen by nearest phase; ties to the smallest index. */
export function inlineStock({ cells }: Extract<Cells, { kind: 'inline' }>): CellStock {
  const statePhaseRad = Float64Array.from(cells, (cell) => radFromDeg(cell.phaseDeg));
  const stateMagnitude = Float64Array.from(cells, (cell) => cell.magnitude);
  const nearest = nearestPhaseTable(statePhaseRad);
  return {
    assign: (targetRad) => {
      const cellIndex = new Int32Array(targetRad.length);
      const phaseRad = new Float64Array(targetRad.length);
      const magnitude = new Float64Array(targetRad.length);
      for (let n = 0; n < targetRad.length; n++) {
        const chosen = nearest(targetRad[n]);
        cellIndex[n] = chosen;
        phaseRad[n] = statePhaseRad[chosen];
        magnitude[n] = stateMagnitude[chosen];
      }
      return { cellIndex, phaseRad, magnitude };
    },
    respond: (assignment) => assignment,
    searchReferenceRad: (query) =>
      searchStateReferenceRad({
        query,
        rule: 'nearest-phase',
        capacity: cells.length,
        statesAt: (_n, states) => {
          states.count = cells.length;
          states.phaseRad.set(statePhaseRad);
          states.magnitude.set(stateMagnitude);
        },
      }),
    warnings: () => [],
  };
}
