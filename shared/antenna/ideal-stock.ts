import type { Cells } from '../model/design-document';
import { bestReferenceIndex } from './reference-search';
import type { CellStock, ReferenceQuery } from './cell-stock';

type IdealCells = Extract<Cells, { kind: 'ideal' }>;

const TURN_RAD = 2 * Math.PI;
// A target half way between two levels goes up even when rounding has left it a hair below.
const TIE_TURNS = 1e-10;
const FEWEST_REFERENCES = 32;

/** Ideal cells: the target phase itself, or the nearest of N levels 360/N apart from 0, ties upward; lossless, the same at every frequency. */
export function idealStock({ levels }: IdealCells): CellStock {
  return {
    assign: (targetRad) => {
      const magnitude = new Float64Array(targetRad.length).fill(1);
      if (levels === null) return { cellIndex: new Int32Array(targetRad.length).fill(-1), phaseRad: targetRad.slice(), magnitude };
      const cellIndex = new Int32Array(targetRad.length);
      const phaseRad = new Float64Array(targetRad.length);
      for (let n = 0; n < targetRad.length; n++) {
        cellIndex[n] = modulo(levelOf(targetRad[n], levels), levels);
        phaseRad[n] = (cellIndex[n] * TURN_RAD) / levels;
      }
      return { cellIndex, phaseRad, magnitude };
    },
    // The phases are frozen: an ideal cell has no geometry that could change with frequency.
    respond: (assignment) => assignment,
    searchReferenceRad: (query) => (levels === null ? 0 : searchLevels(query, levels)),
    warnings: () => [],
  };
}

function levelOf(targetRad: number, levels: number): number {
  return Math.floor((targetRad / TURN_RAD) * levels + 0.5 + TIE_TURNS * levels);
}

function modulo(value: number, count: number): number {
  return value - count * Math.floor(value / count);
}

/**
 * The choice repeats, turned by one level, after 360/N; within that every cell steps up exactly once, so all references
 * in steps of at most one degree are judged in one pass over the cells.
 */
function searchLevels(query: ReferenceQuery, levels: number): number {
  const stepRad = TURN_RAD / levels;
  const count = Math.max(FEWEST_REFERENCES, Math.ceil(360 / levels));
  const re = new Float64Array(count + 1);
  const im = new Float64Array(count + 1);
  for (let n = 0; n < query.targetRad.length; n++) {
    const level = levelOf(query.targetRad[n], levels);
    const untilNext = (level + 0.5) * stepRad - query.targetRad[n];
    const change = Math.min(count, Math.max(1, Math.ceil(((untilNext - TIE_TURNS * TURN_RAD) / stepRad) * count)));
    addTurned({ re, im }, 0, query, { n, phaseRad: level * stepRad, sign: 1 });
    addTurned({ re, im }, change, query, { n, phaseRad: level * stepRad, sign: -1 });
    addTurned({ re, im }, change, query, { n, phaseRad: (level + 1) * stepRad, sign: 1 });
  }
  return (bestReferenceIndex(re, im, count) * stepRad) / count;
}

function addTurned(
  sums: { re: Float64Array; im: Float64Array },
  at: number,
  query: ReferenceQuery,
  term: { n: number; phaseRad: number; sign: 1 | -1 },
): void {
  const cosine = term.sign * Math.cos(term.phaseRad);
  const sine = term.sign * Math.sin(term.phaseRad);
  sums.re[at] += query.weightRe[term.n] * cosine - query.weightIm[term.n] * sine;
  sums.im[at] += query.weightRe[term.n] * sine + query.weightIm[term.n] * cosine;
}
