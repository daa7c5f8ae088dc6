import { CONTRIBUTORS } from '../../model/tolerance-contributors';
import type { ContributorId, MaterialDrift, ToleranceContributor } from '../../model/tolerance-run';
import { coPolarResponse, incidenceWeigher, type PolarResponse } from '../cell-response';
import type { EditionAtFrequency } from '../edition-at-frequency';
import { nearestBranchRad } from '../../math/unwrap-phase';
import type { PlacedDesign } from '../place-cells';
import type { PreparedEdition } from '../prepare-edition';
import { spreadSi, type Deviations } from './deviations';
import { feedShift } from './feed-shift';
import { heightPhaseRad, panelShapes } from './panel-bow';
import { sizeResponse, type ResponseChange, type SizeResponse } from './size-response';
import { shiftedEdition } from './substrate-shift';

/** Changes at every position: added to the phase, and to the logarithm of what the cell radiates. */
export interface CellChanges {
  readonly phaseRad: Float64Array;
  readonly logMagnitude: Float64Array;
}

/** Adds what one group of deviations changes. */
type Effect = (deviations: Deviations, changes: CellChanges) => void;

/** How a design answers to deviations. Prepared once, used for every trial. */
export interface ToleranceModel {
  /** Fills in the changes by deviations; dead cells are not among them. */
  changesBy(deviations: Deviations, changes: CellChanges): void;
  /** Contributors that cannot act on this design, and why. */
  readonly notApplied: readonly { readonly id: ContributorId; readonly reason: string }[];
  /** Cells whose response stays when they are etched larger or smaller, for want of a neighbour of another size. */
  readonly cellsWithoutNeighbour: number;
}

export interface ToleranceSubject {
  readonly placed: PlacedDesign;
  readonly edition?: PreparedEdition;
  readonly contributors: readonly ToleranceContributor[];
  readonly material: MaterialDrift;
}

/** Steps of the slopes with permittivity, thickness (share of it) and temperature. */
const PERMITTIVITY_STEP = 0.02;
const THICKNESS_STEP_SHARE = 0.01;
const TEMPERATURE_STEP_K = 10;
/** Sizes are followed this many deviations away. */
const REACH = 6;

/** Prepares the answers of a design to the contributors given. */
export function toleranceModel(subject: ToleranceSubject): ToleranceModel {
  const notApplied: { id: ContributorId; reason: string }[] = [];
  const sizes = sizesOf(subject);
  const effects: Effect[] = [...sizeEffects(sizes), ...shapeEffects(subject), ...substrateEffects(subject), ...feedEffects(subject), scatterEffect];
  for (const { id, spread } of subject.contributors) {
    const reason = obstacle(id, subject);
    if (reason !== null && spread > 0) notApplied.push({ id, reason });
  }
  return {
    notApplied,
    cellsWithoutNeighbour: sizes?.withoutNeighbour ?? 0,
    changesBy: (deviations, changes) => {
      changes.phaseRad.fill(0);
      changes.logMagnitude.fill(0);
      for (const effect of effects) effect(deviations, changes);
    },
  };
}

/** Why a contributor cannot act on this design; null where it can. */
function obstacle(id: ContributorId, { placed, edition }: ToleranceSubject): string | null {
  const { needs } = CONTRIBUTORS[id];
  if (needs === 'geometry' && edition === undefined) return 'only the cells of an edition have a geometry';
  if (['permittivity', 'thickness', 'temperature'].includes(id) && placed.si.operation === 'transmit') {
    return 'the estimate holds for cells on metal, and these transmit';
  }
  if (['etch-random', 'etch-common'].includes(id) && (edition?.edition.cells.length ?? 0) < 2) return 'the edition has one size alone';
  if (needs === 'horn' && placed.si.illumination.kind !== 'horn') return 'there is no horn to move';
  return null;
}

const wanted = (subject: ToleranceSubject, id: ContributorId): boolean =>
  obstacle(id, subject) === null && subject.contributors.some((contributor) => contributor.id === id && contributor.spread > 0);

function sizesOf(subject: ToleranceSubject): SizeResponse | null {
  const { placed, edition, contributors } = subject;
  if (edition === undefined || !(wanted(subject, 'etch-random') || wanted(subject, 'etch-common'))) return null;
  const reachM = REACH * contributors.filter(({ id }) => id.startsWith('etch-')).reduce((sum, contributor) => sum + spreadSi(contributor), 0);
  return sizeResponse(placed, edition, reachM);
}

function sizeEffects(sizes: SizeResponse | null): Effect[] {
  if (sizes === null) return [];
  const change: ResponseChange = { phaseRad: 0, logMagnitude: 0 };
  const effect: Effect = (deviations, { phaseRad, logMagnitude }) => {
    const common = deviations.panel.get('etch-common') ?? 0;
    const own = deviations.cells.get('etch-random');
    if (common === 0 && own === undefined) return;
    for (let n = 0; n < phaseRad.length; n++) {
      change.phaseRad = 0;
      change.logMagnitude = 0;
      sizes.addChange(n, common + (own?.[n] ?? 0), change);
      phaseRad[n] += change.phaseRad;
      logMagnitude[n] += change.logMagnitude;
    }
  };
  return [effect];
}

function shapeEffects(subject: ToleranceSubject): Effect[] {
  const { placed } = subject;
  const shapes = panelShapes(placed.lattice);
  const byId = { lift: shapes.lift, 'tilt-x': shapes.tiltX, 'tilt-y': shapes.tiltY, bow: shapes.bow } as const;
  const cosBeam = placed.si.beams[0].direction.w;
  const { incidenceRad, tangentialIndex } = placed.light;
  // A guided wave comes along with the panel: what changes is the way to the beam.
  const cosIncidence = incidenceRad.map((rad) => (tangentialIndex === undefined ? Math.cos(rad) : 0));
  return (Object.keys(byId) as (keyof typeof byId)[])
    .filter((id) => wanted(subject, id))
    .map((id) => {
      const slope = byId[id].map((height, n) => heightPhaseRad(placed.designWavenumber, placed.si.operation, cosIncidence[n], cosBeam)(height));
      return slopeEffect(id, { phaseRad: slope, logMagnitude: null });
    });
}

interface Slopes {
  readonly phaseRad: Float64Array;
  readonly logMagnitude: Float64Array | null;
}

/** A deviation of the whole panel to which every cell answers in proportion. */
function slopeEffect(id: ContributorId, slopes: Slopes): Effect {
  return (deviations, { phaseRad, logMagnitude }) => {
    const value = deviations.panel.get(id);
    if (value === undefined) return;
    for (let n = 0; n < phaseRad.length; n++) phaseRad[n] += value * slopes.phaseRad[n];
    if (slopes.logMagnitude === null) return;
    for (let n = 0; n < phaseRad.length; n++) logMagnitude[n] += value * slopes.logMagnitude[n];
  };
}

function substrateEffects(subject: ToleranceSubject): Effect[] {
  const { placed, edition, material } = subject;
  if (edition === undefined) return [];
  const frequencyHz = placed.si.designFrequencyHz;
  const { thicknessMm, relativePermittivity } = edition.edition.description.substrate;
  // No medium is thinner than vacuum.
  const permitted = (by: number): number => Math.max(1 - relativePermittivity, by);
  const slope = (id: ContributorId, step: number, at: (by: number) => EditionAtFrequency): Effect[] =>
    wanted(subject, id) ? [slopeEffect(id, slopesBetween(subject, edition, { above: at(step), below: at(-step), apart: 2 * step }))] : [];
  return [
    ...slope('permittivity', PERMITTIVITY_STEP, (by) => shiftedEdition(edition, frequencyHz, { permittivity: permitted(by) })),
    ...slope('thickness', THICKNESS_STEP_SHARE * thicknessMm * 1e-3, (thicknessM) => shiftedEdition(edition, frequencyHz, { thicknessM })),
    // Grown by one part in a thousand a cell does at f what it did at f times 1.001: all of electromagnetics scales so.
    ...slope('temperature', TEMPERATURE_STEP_K, (kelvin) => edition.atFrequency(frequencyHz * (1 + 1e-6 * material.expansionPpmPerK * kelvin))),
    ...slope('temperature', TEMPERATURE_STEP_K, (kelvin) => shiftedEdition(edition, frequencyHz, { permittivity: permitted(1e-6 * material.permittivityPpmPerK * kelvin * relativePermittivity) })),
  ];
}

/** How the placed cells' responses change between two states of their edition, per unit. */
function slopesBetween({ placed }: ToleranceSubject, edition: PreparedEdition, pair: { above: EditionAtFrequency; below: EditionAtFrequency; apart: number }): Slopes {
  const { light, assignment, si } = placed;
  const weigh = incidenceWeigher(edition, si.illumination.polarisation);
  const phaseRad = new Float64Array(assignment.cellIndex.length);
  const logMagnitude = new Float64Array(phaseRad.length);
  const above: PolarResponse = { magnitude: 0, phaseRad: 0 };
  const below: PolarResponse = { magnitude: 0, phaseRad: 0 };
  for (let n = 0; n < phaseRad.length; n++) {
    const cell = assignment.cellIndex[n];
    if (cell < 0) continue;
    const weights = weigh(light.incidenceRad[n], light.azimuthRad[n]);
    coPolarResponse(pair.above, cell, weights, above);
    coPolarResponse(pair.below, cell, weights, below);
    phaseRad[n] = (nearestBranchRad(above.phaseRad, below.phaseRad) - below.phaseRad) / pair.apart;
    logMagnitude[n] = above.magnitude > 0 && below.magnitude > 0 ? Math.log(above.magnitude / below.magnitude) / pair.apart : 0;
  }
  return { phaseRad, logMagnitude };
}

function feedEffects(subject: ToleranceSubject): Effect[] {
  const { placed, edition } = subject;
  const { illumination } = placed.si;
  if (illumination.kind !== 'horn' || !(['feed-axial', 'feed-x', 'feed-y'] as const).some((id) => wanted(subject, id))) return [];
  const shift = feedShift(placed, illumination, edition);
  const effect: Effect = ({ panel }, changes) => {
    const axial = panel.get('feed-axial') ?? 0;
    const x = panel.get('feed-x') ?? 0;
    const y = panel.get('feed-y') ?? 0;
    if (axial === 0 && x === 0 && y === 0) return;
    const { xM, yM, zM } = shift.backwards;
    shift.addChanges({ xM: axial * xM + x, yM: axial * yM + y, zM: axial * zM }, changes.phaseRad, changes.logMagnitude);
  };
  return [effect];
}

const scatterEffect: Effect = ({ cells }, { phaseRad }) => {
  const scatter = cells.get('phase-scatter');
  if (scatter === undefined) return;
  for (let n = 0; n < phaseRad.length; n++) phaseRad[n] += scatter[n];
};
