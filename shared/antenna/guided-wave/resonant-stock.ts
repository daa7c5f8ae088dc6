import type { Cells } from '../../model/design-document';
import type { CellAssignment, CellStock, ReferenceQuery } from '../cell-stock';
import { chosenField, type CoupledField } from './resonant-cell';

const REFERENCES = 360;

/** Resonant cells above a guided wave: strength and phase on one circle, the same at every frequency. */
export function resonantStock(cells: Extract<Cells, { kind: 'resonant' }>): CellStock {
  const assign = (targetRad: Float64Array): CellAssignment => {
    const count = targetRad.length;
    const made = { cellIndex: new Int32Array(count), phaseRad: new Float64Array(count), magnitude: new Float64Array(count) };
    const field: CoupledField = { magnitude: 0, phaseRad: 0 };
    for (let n = 0; n < count; n++) {
      made.cellIndex[n] = chosenField(cells, targetRad[n], field);
      made.phaseRad[n] = field.phaseRad;
      made.magnitude[n] = field.magnitude;
    }
    return made;
  };
  return {
    assign,
    respond: (assignment) => assignment,
    searchReferenceRad: (query) => bestReferenceRad(cells, query),
    warnings: () => [],
  };
}

/** Cells looked at for one reference; more are sampled evenly, which their number makes good. */
const MOST_SAMPLED = 40_000;

function bestReferenceRad(cells: Extract<Cells, { kind: 'resonant' }>, { targetRad, weightRe, weightIm }: ReferenceQuery): number {
  const stride = Math.max(1, Math.ceil(targetRad.length / MOST_SAMPLED));
  const field: CoupledField = { magnitude: 0, phaseRad: 0 };
  let [best, most] = [0, -1];
  for (let i = 0; i < REFERENCES; i++) {
    const reference = (2 * Math.PI * i) / REFERENCES;
    let [re, im] = [0, 0];
    for (let n = 0; n < targetRad.length; n += stride) {
      chosenField(cells, targetRad[n] + reference, field);
      const [cosine, sine] = [field.magnitude * Math.cos(field.phaseRad), field.magnitude * Math.sin(field.phaseRad)];
      re += weightRe[n] * cosine - weightIm[n] * sine;
      im += weightRe[n] * sine + weightIm[n] * cosine;
    }
    const power = re * re + im * im;
    // Equal up to rounding counts as equal: the smallest reference stands.
    if (power > most * (1 + 1e-9)) [best, most] = [reference, power];
  }
  return best;
}
