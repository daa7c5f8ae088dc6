import type { Cells } from '../../model/design-document';
import type { Warning } from '../../model/figures';
import type { CellAssignment, CellResponses, CellStock } from '../cell-stock';
import { newVectorWaves, type VectorWaves } from './vector-light';
import type { VectorSite, VectorStock } from './vector-stock';

/** Below this share of the wanted polarisation a cell's own magnitude cannot be read back from what it sends into the beam. */
const UNREADABLE = 1e-12;

/**
 * Cells of one complex response Gamma for all polarisations, S = Gamma I: q = Gamma q_1 with q_1 that of response 1. Their choice is that
 * of the scalar model for targets less arg q_1.
 */
export function isotropicStock(inner: CellStock, cells: Cells, site: VectorSite): VectorStock {
  const count = site.light.amplitude.length;
  const unitPhase = new Float64Array(count);
  const unitSize = new Float64Array(count);
  for (let n = 0; n < count; n++) {
    const [re, im] = site.weigher.ofUnit(n);
    unitPhase[n] = Math.atan2(im, re);
    unitSize[n] = Math.hypot(re, im);
  }
  const ownOf = (sent: CellAssignment): CellAssignment => ({
    cellIndex: sent.cellIndex,
    phaseRad: sent.phaseRad.map((phase, n) => phase - unitPhase[n]),
    magnitude: sent.magnitude.map((size, n) => (unitSize[n] > UNREADABLE ? size / unitSize[n] : size === 0 ? 0 : 1)),
  });
  const sentOf = ({ phaseRad, magnitude }: CellResponses): CellResponses => ({
    phaseRad: phaseRad.map((phase, n) => phase + unitPhase[n]),
    magnitude: magnitude.map((size, n) => size * unitSize[n]),
  });
  return {
    assign: (targetRad) => {
      const own = inner.assign(targetRad.map((phase, n) => phase - unitPhase[n]));
      return { cellIndex: own.cellIndex, ...sentOf(own) };
    },
    respond: (assignment, frequencyHz) => sentOf(inner.respond(ownOf(assignment), frequencyHz)),
    searchReferenceRad: ({ targetRad, weightRe, weightIm }) =>
      inner.searchReferenceRad({
        targetRad: targetRad.map((phase, n) => phase - unitPhase[n]),
        weightRe: weightRe.map((re, n) => unitSize[n] * (re * Math.cos(unitPhase[n]) - weightIm[n] * Math.sin(unitPhase[n]))),
        weightIm: weightIm.map((im, n) => unitSize[n] * (im * Math.cos(unitPhase[n]) + weightRe[n] * Math.sin(unitPhase[n]))),
      }),
    warnings: (assignment, frequencyHz) => [...inner.warnings(ownOf(assignment), frequencyHz), ...diagonalWarning(cells, site)],
    leaving: (assignment, frequencyHz) => scaledWaves(site, inner.respond(ownOf(assignment), frequencyHz)),
    sendStates: (n, states) => {
      for (let i = 0; i < states.count; i++) {
        states.phaseRad[i] += unitPhase[n];
        states.magnitude[i] *= unitSize[n];
      }
    },
  };
}

function scaledWaves({ waves }: VectorSite, { phaseRad, magnitude }: CellResponses): VectorWaves {
  const leaving = newVectorWaves(phaseRad.length);
  for (let n = 0; n < phaseRad.length; n++) {
    const re = magnitude[n] * Math.cos(phaseRad[n]);
    const im = magnitude[n] * Math.sin(phaseRad[n]);
    leaving.teRe[n] = re * waves.teRe[n] - im * waves.teIm[n];
    leaving.teIm[n] = re * waves.teIm[n] + im * waves.teRe[n];
    leaving.tmRe[n] = re * waves.tmRe[n] - im * waves.tmIm[n];
    leaving.tmIm[n] = re * waves.tmIm[n] + im * waves.tmRe[n];
  }
  return leaving;
}

function diagonalWarning(cells: Cells, { edition }: VectorSite): Warning[] {
  if (cells.kind === 'ideal') return [];
  const whose = edition && cells.kind === 'edition' ? `The cells of ${edition.edition.description.name} are` : 'The what-if table is';
  return [
    {
      code: 'cross-terms',
      pointer: '#/cells',
      severity: 'note',
      message: `${whose} described by one response for every polarisation: the vector model takes it for both, with no cross term, so the cross-polar level is that of the geometry alone.`,
      numbers: {},
    },
  ];
}
