import type { Cells } from '../../model/design-document';
import type { Warning } from '../../model/figures';
import { wrapRad } from '../../units/angles';
import type { CellAssignment, CellResponses } from '../cell-stock';
import { complexError } from '../edition-choice';
import { allowedLister, editionSite, steeringKey, type EditionSite } from '../edition-stock';
import { editionWarnings } from '../edition-warnings';
import { permittedNodes } from '../excluded-nodes';
import { regionFilter } from '../excluded-regions';
import { searchStateReferenceRad } from '../reference-search';
import { arrivingXY, newCoPolarWeights, type CoPolarWeights, type MatrixAxes } from './co-polar-weights';
import { crossTermsGiven } from './cross-terms';
import { allNodes, matrixSampler, newMatrixSample, type MatrixSample, type ThetaRule } from './matrix-response';
import { MOST_KEPT_MATRICES, keptPositionMatrices, listPositionMatrices, readMatrix, type PositionMatrices } from './position-matrices';
import { waveWeights } from './reradiation';
import { newVectorWaves, type VectorWaves } from './vector-light';
import type { VectorSite, VectorStock } from './vector-stock';

type EditionCells = Extract<Cells, { kind: 'edition' }>;

interface MatrixSite extends EditionSite {
  readonly vector: VectorSite;
  readonly axes: MatrixAxes;
  readonly thetaRule: ThetaRule;
}

/** Errors nearer than this are equal, so that rounding does not decide a tie; the smallest index then stands. */
const SAME_ERROR = 1e-9;

/** Cells of an edition with a 2x2 response, each at its own angle of incidence. */
export function matrixStock(cells: Cells, vector: VectorSite, thetaRule: ThetaRule = 'poly'): VectorStock {
  if (cells.kind !== 'edition') throw new TypeError(`cells of kind ${cells.kind} have no matrix`);
  const own = matrixSite(cells, vector, thetaRule);
  return {
    assign: (targetRad) => assignCells(own, targetRad),
    respond: (assignment, frequencyHz) => (frequencyHz === own.designFrequencyHz ? assignment : sentResponses(own, assignment, frequencyHz)),
    searchReferenceRad: (query) => {
      const fill = sentStates(own);
      return searchStateReferenceRad({ query, rule: own.rule, capacity: own.edition.edition.cells.length, statesAt: (n, states) => fillAllowed(own, fill, n, states) });
    },
    warnings: (assignment, frequencyHz) => [...editionWarnings(own, assignment, frequencyHz), ...crossTermWarnings(own)],
    leaving: (assignment, frequencyHz) => leavingWaves(own, assignment, frequencyHz),
    sendStates: (n, states) => sentStates(own)(n, states),
  };
}

function matrixSite(cells: EditionCells, vector: VectorSite, thetaRule: ThetaRule): MatrixSite {
  const site = editionSite(cells, vector);
  return { ...site, vector, thetaRule, axes: site.edition.ports.kind === 'x-and-y' ? 'x-y' : 'te-tm' };
}

/** q of one sampled response, as [re, im]. */
function sent(g: CoPolarWeights, s: MatrixSample): [number, number] {
  return [
    g.g11Re * s.s11Re - g.g11Im * s.s11Im + g.g12Re * s.s12Re - g.g12Im * s.s12Im + g.g21Re * s.s21Re - g.g21Im * s.s21Im + g.g22Re * s.s22Re - g.g22Im * s.s22Im,
    g.g11Re * s.s11Im + g.g11Im * s.s11Re + g.g12Re * s.s12Im + g.g12Im * s.s12Re + g.g21Re * s.s21Im + g.g21Im * s.s21Re + g.g22Re * s.s22Im + g.g22Im * s.s22Re,
  ];
}

interface PositionSampler {
  at(n: number): void;
  sample(cell: number, out: MatrixSample): MatrixSample;
}

/**
 * Responses of cells at the angles of the positions. At another frequency cells are placed already: inside a region excluded
 * there they do what the laboratory gave, as `editionWarnings` says.
 */
function positionSampler(site: MatrixSite, frequencyHz: number): PositionSampler {
  const { light, edition, thetaRule, designFrequencyHz } = site;
  if (frequencyHz === designFrequencyHz) {
    const listed = matricesOfSteering(site);
    if (listed) return listedSampler(listed);
    const sampler = matrixSampler(edition, site.permitted, thetaRule);
    return { at: (n) => sampler.setAngle(light.incidenceRad[n], light.azimuthRad[n]), sample: sampler.sample };
  }
  const regions = regionFilter(edition.edition, edition.azimuths, frequencyHz);
  const given = matrixSampler(edition, allNodes(edition, frequencyHz), thetaRule);
  const permitted = regions.isEmpty ? given : matrixSampler(edition, permittedNodes(edition, regions, edition.atFrequency(frequencyHz)), thetaRule);
  const barred = new Uint8Array(edition.edition.cells.length);
  return {
    at: (n) => {
      given.setAngle(light.incidenceRad[n], light.azimuthRad[n]);
      permitted.setAngle(light.incidenceRad[n], light.azimuthRad[n]);
      barred.fill(0);
      regions.mark(light.incidenceRad[n], light.azimuthRad[n], barred);
    },
    sample: (cell, out) => (barred[cell] ? given : permitted).sample(cell, out),
  };
}

function listedSampler(listed: PositionMatrices): PositionSampler {
  let position = 0;
  return {
    at: (n) => {
      position = n;
    },
    sample: (cell, out) => readMatrix(listed, position, cell, out),
  };
}

/** The responses at every position, reckoned once for all beams; nothing for panels too large to keep them. */
function matricesOfSteering(site: MatrixSite): PositionMatrices | undefined {
  const { light, edition, permitted, thetaRule, allowed } = site;
  if (light.incidenceRad.length * allowed.length > MOST_KEPT_MATRICES) return undefined;
  const cellCount = edition.edition.cells.length;
  return keptPositionMatrices(edition, `${thetaRule} ${steeringKey(site)}`, light, () =>
    listPositionMatrices({ sampler: matrixSampler(edition, permitted, thetaRule), incidenceRad: light.incidenceRad, azimuthRad: light.azimuthRad, allowed, cellCount }, newMatrixSample()),
  );
}

/** What a cell sends into the beam from a position, at a frequency. */
function sender(site: MatrixSite, frequencyHz: number): { at(n: number): void; q(cell: number): [number, number] } {
  const sampler = positionSampler(site, frequencyHz);
  const weights = newCoPolarWeights();
  const matrix = newMatrixSample();
  return {
    at: (n) => {
      sampler.at(n);
      site.vector.weigher.weigh(n, site.axes, weights);
    },
    q: (cell) => sent(weights, sampler.sample(cell, matrix)),
  };
}

function assignCells(site: MatrixSite, targetRad: Float64Array): CellAssignment {
  const { light, rule } = site;
  const from = sender(site, site.designFrequencyHz);
  const allowedAt = allowedLister(site);
  const count = targetRad.length;
  const assignment: CellAssignment = { cellIndex: new Int32Array(count).fill(-1), phaseRad: new Float64Array(count), magnitude: new Float64Array(count) };
  for (let n = 0; n < count; n++) {
    from.at(n);
    let least = Infinity;
    for (const k of allowedAt(light.incidenceRad[n], light.azimuthRad[n])) {
      const [re, im] = from.q(k);
      const phaseRad = Math.atan2(im, re);
      const magnitude = Math.hypot(re, im);
      const error = rule === 'nearest-phase' ? Math.abs(wrapRad(phaseRad - targetRad[n])) : complexError({ phaseRad, magnitude }, targetRad[n]);
      // Candidates come in rising order, so an equal one later never takes over.
      if (error >= least - SAME_ERROR) continue;
      least = error;
      assignment.cellIndex[n] = k;
      assignment.phaseRad[n] = phaseRad;
      assignment.magnitude[n] = magnitude;
    }
  }
  return assignment;
}

function sentResponses(site: MatrixSite, { cellIndex }: CellAssignment, frequencyHz: number): CellResponses {
  const from = sender(site, frequencyHz);
  const phaseRad = new Float64Array(cellIndex.length);
  const magnitude = new Float64Array(cellIndex.length);
  for (let n = 0; n < cellIndex.length; n++) {
    if (cellIndex[n] < 0) continue;
    from.at(n);
    const [re, im] = from.q(cellIndex[n]);
    phaseRad[n] = Math.atan2(im, re);
    magnitude[n] = Math.hypot(re, im);
  }
  return { phaseRad, magnitude };
}

type StateSender = (n: number, states: { count: number; index: Int32Array; phaseRad: Float64Array; magnitude: Float64Array }) => void;

function sentStates(site: MatrixSite): StateSender {
  const from = sender(site, site.designFrequencyHz);
  return (n, states) => {
    from.at(n);
    for (let i = 0; i < states.count; i++) {
      const [re, im] = from.q(states.index[i]);
      states.phaseRad[i] = Math.atan2(im, re);
      states.magnitude[i] = Math.hypot(re, im);
    }
  };
}

function fillAllowed(site: MatrixSite, fill: StateSender, n: number, states: Parameters<StateSender>[1]): void {
  const allowed = allowedLister(site)(site.light.incidenceRad[n], site.light.azimuthRad[n]);
  states.count = allowed.length;
  states.index.set(allowed);
  fill(n, states);
}

function leavingWaves(site: MatrixSite, { cellIndex }: CellAssignment, frequencyHz: number): VectorWaves {
  const { axes, vector } = site;
  const sampler = positionSampler(site, frequencyHz);
  const s = newMatrixSample();
  const leaving = newVectorWaves(cellIndex.length);
  for (let n = 0; n < cellIndex.length; n++) {
    if (cellIndex[n] < 0) continue;
    sampler.at(n);
    sampler.sample(cellIndex[n], s);
    if (axes === 'te-tm') throughPlane(s, vector, leaving, n);
    else throughAxes(s, vector, leaving, n);
  }
  return leaving;
}

/** b = S a between TE and TM. */
function throughPlane(s: MatrixSample, { waves }: VectorSite, leaving: VectorWaves, n: number): void {
  const [teRe, teIm, tmRe, tmIm] = [waves.teRe[n], waves.teIm[n], waves.tmRe[n], waves.tmIm[n]];
  leaving.teRe[n] = s.s11Re * teRe - s.s11Im * teIm + s.s12Re * tmRe - s.s12Im * tmIm;
  leaving.teIm[n] = s.s11Re * teIm + s.s11Im * teRe + s.s12Re * tmIm + s.s12Im * tmRe;
  leaving.tmRe[n] = s.s21Re * teRe - s.s21Im * teIm + s.s22Re * tmRe - s.s22Im * tmIm;
  leaving.tmIm[n] = s.s21Re * teIm + s.s21Im * teRe + s.s22Re * tmIm + s.s22Im * tmRe;
}

/** The matrix between x and y acts on what is re-radiated; the result goes back to the waves of the plane of incidence. */
function throughAxes(s: MatrixSample, { waves, form }: VectorSite, leaving: VectorWaves, n: number): void {
  const [xRe, xIm, yRe, yIm] = arrivingXY(waves, form, n);
  const outXRe = s.s11Re * xRe - s.s11Im * xIm + s.s12Re * yRe - s.s12Im * yIm;
  const outXIm = s.s11Re * xIm + s.s11Im * xRe + s.s12Re * yIm + s.s12Im * yRe;
  const outYRe = s.s21Re * xRe - s.s21Im * xIm + s.s22Re * yRe - s.s22Im * yIm;
  const outYIm = s.s21Re * xIm + s.s21Im * xRe + s.s22Re * yIm + s.s22Im * yRe;
  const c = waves.cosAzimuth[n];
  const a = waves.sinAzimuth[n];
  const { te, tm } = waveWeights(form.reradiation, waves.cosIncidence[n]);
  leaving.teRe[n] = (c * outYRe - a * outXRe) / te;
  leaving.teIm[n] = (c * outYIm - a * outXIm) / te;
  leaving.tmRe[n] = (c * outXRe + a * outYRe) / tm;
  leaving.tmIm[n] = (c * outXIm + a * outYIm) / tm;
}

function crossTermWarnings(site: MatrixSite): Warning[] {
  const { name } = site.edition.edition.description;
  const given = crossTermsGiven(site.edition);
  if (given === 'given') return [];
  const message =
    given === 'zero'
      ? `The description of ${name} holds no cross terms: its cells are taken not to couple their two polarisations.`
      : `${name} is described in planes of symmetry alone, where a cross term vanishes: between them its cells are taken not to couple TE and TM.`;
  return [{ code: 'cross-terms', pointer: '#/cells/editionId', severity: 'note', message, numbers: {} }];
}
