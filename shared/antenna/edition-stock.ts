import type { Cells } from '../model/design-document';
import { bandFit, bandReferenceRad, type BandFitSite } from './assignment/band-fit';
import { levelSubset } from './assignment/level-subset';
import { candidateBins } from './candidate-bins';
import { coPolarResponse, incidenceWeigher, type PolarResponse } from './cell-response';
import type { CellAssignment, CellResponses, CellStock, ReferenceQuery, StockSite } from './cell-stock';
import { chooseListed, editionChooser, type CellChooser } from './edition-choice';
import { crossResponseWarning } from './cross-response-warning';
import { editionWarnings } from './edition-warnings';
import { permittedNodes, type PermittedNodes } from './excluded-nodes';
import { regionFilter, type RegionFilter } from './excluded-regions';
import { InvalidDesign, type DesignFault } from './invalid-design';
import { nearestPhaseTable } from './nearest-phase-table';
import { MOST_KEPT_STATES, copyStates, keptPositionStates, listPositionStates, type PositionStates } from './position-states';
import type { PreparedEdition } from './prepare-edition';
import { newCellStates, searchStateReferenceRad, type CellRule, type CellStates } from './reference-search';
import type { SiDesign } from './si-design';

type EditionCells = Extract<Cells, { kind: 'edition' }>;

/** An edition's cells at the site of one design. */
export interface EditionSite extends StockSite {
  readonly edition: PreparedEdition;
  readonly rule: CellRule;
  /** Frequencies of its own for a band fit; the edges of the band where there are none. */
  readonly fitFrequenciesHz: readonly number[];
  /** Indices of cells that may be used at the design frequency, rising; regions by angle come on top. */
  readonly allowed: Int32Array;
  readonly regions: RegionFilter;
  /** The edition at the design frequency, with no excluded angle in it. */
  readonly permitted: PermittedNodes;
}

/** Cells of a published edition, each at its own angle of incidence and with the illumination's polarisation. */
export function editionStock(cells: EditionCells, site: StockSite): CellStock {
  const own = editionSite(cells, site);
  const states = statesOfSteering(own);
  return {
    assign: (targetRad) => (own.rule === 'band-fit' ? assignOverBand(own, targetRad) : states ? assignListed(states(), own.rule, targetRad) : assignCells(own, targetRad)),
    respond: (assignment, frequencyHz) => (frequencyHz === own.designFrequencyHz ? assignment : respondAt(own, assignment, frequencyHz)),
    searchReferenceRad: (query) => (own.rule === 'band-fit' ? bandReferenceRad(bandSite(own, query.targetRad)) : searchReferenceRad(own, query, states?.())),
    warnings: (assignment, frequencyHz) => [...editionWarnings(own, assignment, frequencyHz), ...crossResponseWarning(own, assignment, frequencyHz)],
  };
}

/** Checks that the edition is at hand, fits the panel and leaves cells to choose from. */
export function editionSite(cells: EditionCells, site: StockSite): EditionSite {
  const { edition } = site;
  if (!edition) throw new InvalidDesign([{ pointer: '#/cells/editionId', detail: `edition ${cells.editionId} is not at hand` }]);
  const { description } = edition.edition;
  const faults = [...operationFaults(edition, site.si.operation), ...strangers(cells, edition)];
  if (faults.length > 0) throw new InvalidDesign(faults);
  const excluded = new Set(cells.excludedCells);
  const at = edition.atFrequency(site.designFrequencyHz);
  const allowed = Int32Array.from(edition.edition.cells.keys()).filter((k) => at.usable[k] === 1 && !excluded.has(edition.edition.cells[k].id));
  if (allowed.length === 0) {
    const detail = `no cell of ${description.name} is left at ${site.designFrequencyHz / 1e9} GHz: ${excluded.size} are excluded, the others have missing points`;
    throw new InvalidDesign([{ pointer: '#/cells/excludedCells', detail }]);
  }
  const regions = regionFilter(edition.edition, edition.azimuths, site.designFrequencyHz);
  const { polarisation } = site.si.illumination;
  const chosen = cells.levels === undefined ? allowed : levelSubset({ edition, at, polarisation, allowed, levels: cells.levels });
  return { ...site, edition, rule: cells.rule, fitFrequenciesHz: (cells.fitFrequenciesGHz ?? []).map((ghz) => ghz * 1e9), allowed: chosen, regions, permitted: permittedNodes(edition, regions, at) };
}

function operationFaults({ edition: { description } }: PreparedEdition, operation: SiDesign['operation']): DesignFault[] {
  if (description.operation === operation) return [];
  return [{ pointer: '#/cells/editionId', detail: `the cells of ${description.name} ${description.operation}, the panel is to ${operation}` }];
}

/** A name that the edition does not hold would exclude nothing, unnoticed. */
function strangers({ excludedCells }: EditionCells, { edition }: PreparedEdition): DesignFault[] {
  const known = new Set(edition.cells.map(({ id }) => id));
  return excludedCells.flatMap((id, i) =>
    known.has(id) ? [] : [{ pointer: `#/cells/excludedCells/${i}`, detail: `there is no cell ${JSON.stringify(id)} in ${edition.description.name}` }],
  );
}

/** Lists the cells allowed at one angle. The same array every time where no region applies. */
export function allowedLister(site: EditionSite): (incidenceRad: number, azimuthRad: number) => Int32Array {
  const { allowed, regions, edition } = site;
  if (regions.isEmpty) return () => allowed;
  const barred = new Uint8Array(edition.edition.cells.length);
  return (incidenceRad, azimuthRad) => {
    barred.fill(0);
    return regions.mark(incidenceRad, azimuthRad, barred) ? allowed.filter((k) => barred[k] === 0) : allowed;
  };
}

function assignCells(site: EditionSite, targetRad: Float64Array): CellAssignment {
  const { light, edition, rule, permitted: { at } } = site;
  const weigh = incidenceWeigher(edition, site.si.illumination.polarisation);
  const candidatesAt = candidateLister(site, targetRad.length);
  const choose = answersAlike(site) && rule === 'nearest-phase' ? tableChooser(site) : editionChooser(at, rule);
  const assignment: CellAssignment = emptyAssignment(targetRad.length);
  const response: PolarResponse = { magnitude: 0, phaseRad: 0 };
  for (let n = 0; n < targetRad.length; n++) {
    const weights = weigh(light.incidenceRad[n], light.azimuthRad[n]);
    const chosen = choose(targetRad[n], weights, candidatesAt(targetRad[n], light.incidenceRad[n], light.azimuthRad[n]), response);
    assignment.cellIndex[n] = chosen;
    if (chosen < 0) continue;
    assignment.magnitude[n] = response.magnitude;
    assignment.phaseRad[n] = response.phaseRad;
  }
  return assignment;
}

/** From this many positions on, listing the candidates by bins of angle and target costs less than it saves. */
const BINNED_FROM = 30_000;

/** Cells to choose from at a position: those allowed there, narrowed by bins where the panel is large. */
function candidateLister(site: EditionSite, count: number): (targetRad: number, incidenceRad: number, azimuthRad: number) => Int32Array {
  const { edition, rule, regions, allowed, light } = site;
  if (count >= BINNED_FROM && rule === 'nearest-phase' && regions.isEmpty && edition.sineSquaredNodes.length > 1) {
    const largestIncidenceRad = light.incidenceRad.reduce((largest, incidence) => Math.max(largest, incidence), 0);
    const at = edition.atFrequency(site.designFrequencyHz);
    return candidateBins({ prepared: edition, at, polarisation: site.si.illumination.polarisation, allowed, largestIncidenceRad });
  }
  const allowedAt = allowedLister(site);
  return (_targetRad, incidenceRad, azimuthRad) => allowedAt(incidenceRad, azimuthRad);
}

function emptyAssignment(count: number): CellAssignment {
  return { cellIndex: new Int32Array(count), phaseRad: new Float64Array(count), magnitude: new Float64Array(count) };
}

/** With one response per cell, whatever the angle, the phases are sorted once. Valid while no region takes cells away. */
function tableChooser(site: EditionSite): CellChooser {
  const at = site.edition.atFrequency(site.designFrequencyHz);
  const tables = new Map<Int32Array, (targetRad: number) => number>();
  return (targetRad, weights, allowed, chosen) => {
    if (allowed.length === 0) return -1;
    let table = tables.get(allowed);
    if (!table) {
      table = nearestPhaseTable(Float64Array.from(allowed, (k) => at.phaseRad[k]));
      if (tables.size < 2) tables.set(allowed, table);
    }
    const best = allowed[table(targetRad)];
    if (chosen) coPolarResponse(at, best, weights, chosen);
    return best;
  };
}

/** Inside a region of the other frequency, cells are placed already: there they do what the laboratory gave, as `editionWarnings` says. */
function respondAt(site: EditionSite, assignment: CellAssignment, frequencyHz: number): CellResponses {
  const given = site.edition.atFrequency(frequencyHz);
  const regions = regionFilter(site.edition.edition, site.edition.azimuths, frequencyHz);
  const permitted = regions.isEmpty ? given : permittedNodes(site.edition, regions, given).at;
  const barred = new Uint8Array(site.edition.edition.cells.length);
  const weigh = incidenceWeigher(site.edition, site.si.illumination.polarisation);
  const { cellIndex } = assignment;
  const phaseRad = new Float64Array(cellIndex.length);
  const magnitude = new Float64Array(cellIndex.length);
  const response: PolarResponse = { magnitude: 0, phaseRad: 0 };
  for (let n = 0; n < cellIndex.length; n++) {
    if (cellIndex[n] < 0) continue;
    const [incidenceRad, azimuthRad] = [site.light.incidenceRad[n], site.light.azimuthRad[n]];
    barred.fill(0);
    const at = regions.mark(incidenceRad, azimuthRad, barred) && barred[cellIndex[n]] ? given : permitted;
    coPolarResponse(at, cellIndex[n], weigh(incidenceRad, azimuthRad), response);
    phaseRad[n] = response.phaseRad;
    magnitude[n] = response.magnitude;
  }
  return { phaseRad, magnitude };
}

/** The band with the design frequency first, under targets that hold the reference phase or, for its search, do not. */
function bandSite(site: EditionSite, targetRad: Float64Array): BandFitSite {
  const { edition, light, si, designFrequencyHz, targetAt } = site;
  if (!targetAt) throw new TypeError('a band fit needs the targets at other frequencies');
  const own = site.fitFrequenciesHz.length > 0 ? site.fitFrequenciesHz : (si.bandHz ?? []);
  const others = own.filter((hz) => Math.abs(hz - designFrequencyHz) > 1);
  const band = [{ frequencyHz: designFrequencyHz, targetRad }, ...others.map((frequencyHz) => ({ frequencyHz, targetRad: targetAt(frequencyHz) }))];
  return { edition, polarisation: si.illumination.polarisation, light, allowedAt: allowedLister(site), band };
}

function assignOverBand(site: EditionSite, targetRad: Float64Array): CellAssignment {
  const over = bandSite(site, targetRad);
  const { cellIndex, errorRmsRad } = bandFit(over, 0);
  const weigh = incidenceWeigher(site.edition, over.polarisation);
  const made = { ...emptyAssignment(targetRad.length), cellIndex, band: over.band.map(({ frequencyHz }, f) => ({ frequencyHz, errorRmsRad: errorRmsRad[f] })) };
  const response: PolarResponse = { magnitude: 0, phaseRad: 0 };
  for (let n = 0; n < cellIndex.length; n++) {
    if (cellIndex[n] < 0) continue;
    coPolarResponse(site.permitted.at, cellIndex[n], weigh(site.light.incidenceRad[n], site.light.azimuthRad[n]), response);
    made.magnitude[n] = response.magnitude;
    made.phaseRad[n] = response.phaseRad;
  }
  return made;
}

function searchReferenceRad(site: EditionSite, query: ReferenceQuery, listed: PositionStates | undefined): number {
  const capacity = site.edition.edition.cells.length;
  const statesAt = listed ? (n: number, states: CellStates): void => copyStates(listed, n, states) : stateFiller(site, site.permitted.at);
  return searchStateReferenceRad({ query, rule: site.rule, capacity, statesAt });
}

/**
 * Lists what the cells answer at every position, once for all beams; nothing for panels too large to keep it and for
 * editions whose cells answer alike at every angle, which a sorted table serves as well.
 */
function statesOfSteering(site: EditionSite): (() => PositionStates) | undefined {
  const { edition, light, allowed, permitted } = site;
  const positionCount = light.incidenceRad.length;
  const capacity = allowed.length;
  if (positionCount * capacity > MOST_KEPT_STATES || answersAlike(site)) return undefined;
  const list = (): PositionStates => listPositionStates({ positionCount, capacity, statesAt: stateFiller(site, permitted.at) }, newCellStates(capacity));
  const key = steeringKey(site);
  return () => keptPositionStates(edition, key, light, list);
}

/** Names all that the answers of the cells depend on, next to the edition and the angles. */
export function steeringKey({ si, designFrequencyHz, allowed }: EditionSite): string {
  return [si.illumination.polarisation, designFrequencyHz, ...allowed].join(' ');
}

/** One response per cell, whatever the angle. */
const answersAlike = ({ edition, permitted: { at } }: EditionSite): boolean => edition.sineSquaredNodes.length === 1 && at.nodeCount === 1 && at.entryCount === 1;

function assignListed(states: PositionStates, rule: CellRule, targetRad: Float64Array): CellAssignment {
  const assignment = emptyAssignment(targetRad.length);
  for (let n = 0; n < targetRad.length; n++) {
    const best = chooseListed(states, n, rule, targetRad[n]);
    assignment.cellIndex[n] = best < 0 ? -1 : states.index[best];
    if (best < 0) continue;
    assignment.magnitude[n] = states.magnitude[best];
    assignment.phaseRad[n] = states.phaseRad[best];
  }
  return assignment;
}

/** Fills in the responses of all allowed cells at a position. */
export function stateFiller(site: EditionSite, at: ReturnType<PreparedEdition['atFrequency']>): (n: number, states: CellStates) => void {
  const weigh = incidenceWeigher(site.edition, site.si.illumination.polarisation);
  const allowedAt = allowedLister(site);
  const response: PolarResponse = { magnitude: 0, phaseRad: 0 };
  return (n, states) => {
    const incidenceRad = site.light.incidenceRad[n];
    const azimuthRad = site.light.azimuthRad[n];
    const weights = weigh(incidenceRad, azimuthRad);
    const allowed = allowedAt(incidenceRad, azimuthRad);
    states.count = allowed.length;
    for (let i = 0; i < allowed.length; i++) {
      coPolarResponse(at, allowed[i], weights, response);
      states.index[i] = allowed[i];
      states.phaseRad[i] = response.phaseRad;
      states.magnitude[i] = response.magnitude;
    }
  };
}
