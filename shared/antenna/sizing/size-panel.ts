import { dbToPowerRatio } from '../../units/decibels';
import { SPEED_OF_LIGHT_M_PER_S } from '../../units/constants';
import type { Direction } from '../../waves/conventions';
import { hornSampler } from '../horn-field';
import { hornCapturedShare } from '../horn-spillover';
import { outlineAreaM2, largestDimensionM, outlineTrace } from '../outline';
import { integrateOverOutline } from '../outline-integral';
import type { SiHorn, SiOutline } from '../si-design';
import { feedExponentOfEdgeTaper } from './feed-efficiency';

/** What a panel has to do and how it is to be lit. */
export interface SizingQuery {
  readonly gainDbi: number;
  /** What cells, quantisation and tolerances are expected to cost, positive. */
  readonly allowanceDb: number;
  readonly designFrequencyHz: number;
  /** Highest frequency at which no grating lobe may come up. */
  readonly highestFrequencyHz: number;
  readonly beams: readonly Direction[];
  readonly edgeTaperDb: number;
  /** Distance of the horn from the centre over the largest dimension. */
  readonly focalRatio: number;
  /** Width over height. */
  readonly aspectRatio: number;
  readonly shape: 'rectangle' | 'ellipse';
  /** Rows of a triangular lattice may stand further apart. */
  readonly lattice: 'rectangular' | 'triangular';
  readonly operation: 'reflect' | 'transmit';
}

export interface SizingAdvice {
  readonly widthM: number;
  readonly heightM: number;
  readonly focalDistanceM: number;
  readonly hornPositionM: readonly [number, number, number];
  readonly feedExponent: number;
  readonly periodM: number;
  /** Of the horn from the normal, on the other side of the first beam. */
  readonly offsetRad: number;
  readonly largestIncidenceRad: number;
  readonly steepestScanRad: number;
  /** Spillover times taper. */
  readonly illuminationEfficiency: number;
  /** Which of the two conditions makes the period small. */
  readonly periodLimitedBy: 'scan' | 'incidence';
}

/** Periods are rounded down to this. */
const PERIOD_STEP_M = 1e-5;
/** No panel is sized below this many wavelengths: array theory says little of it. */
const LEAST_WAVELENGTHS = 2;

/**
 * A panel for a gain: area = G lambda^2 / (4 pi cos theta eta) with eta = spillover times taper of the proposed horn on
 * the proposed outline, integrated; the largest projection loss of the beams counts. The horn stands at the specular angle of
 * the first beam, where squint is least and its shadow falls beside the beam; a transmitting panel is lit along its normal.
 * The period keeps grating lobes away for the steepest beam and lets the cell send back one order at the steepest incidence,
 * lambda / (1 + sin), at the highest frequency. An estimate: the prediction of the panel then says what it does.
 */
export function sizePanel(query: SizingQuery): SizingAdvice {
  const { beams, focalRatio, edgeTaperDb, operation } = query;
  const steepestSine = Math.max(...beams.map(({ u, v }) => Math.hypot(u, v)));
  const least = Math.sqrt(Math.max(0, 1 - steepestSine * steepestSine));
  const offset = operation === 'reflect' ? beams[0] : { u: 0, v: 0, w: 1 };
  const unit = unitOutline(query);
  const feedExponent = proposedExponent(unit, focalRatio, edgeTaperDb);
  const horn = proposedHorn(query, focalRatio * largestDimensionM(unit), feedExponent, offset);
  const illuminationEfficiency = illuminationEfficiencyOf(horn, unit);
  const wavelengthM = SPEED_OF_LIGHT_M_PER_S / query.designFrequencyHz;
  const areaM2 = (dbToPowerRatio(query.gainDbi + query.allowanceDb) * wavelengthM * wavelengthM) / (4 * Math.PI * least * illuminationEfficiency);
  const scale = Math.max(Math.sqrt(areaM2 / outlineAreaM2(unit)), LEAST_WAVELENGTHS * wavelengthM);
  const incidenceRad = steepestIncidenceRad(horn, unit);
  const period = proposedPeriod(query, steepestSine, Math.sin(incidenceRad));
  const { position } = horn;
  return {
    widthM: scale * Math.sqrt(query.aspectRatio),
    heightM: scale / Math.sqrt(query.aspectRatio),
    focalDistanceM: scale * focalRatio * largestDimensionM(unit),
    hornPositionM: [scale * position.xM, scale * position.yM, scale * position.zM],
    feedExponent,
    offsetRad: Math.acos(Math.min(1, offset.w)),
    largestIncidenceRad: incidenceRad,
    steepestScanRad: Math.asin(steepestSine),
    illuminationEfficiency,
    ...period,
  };
}

/** Of unit geometric mean: everything of the illumination scales with the panel. */
function unitOutline({ shape, aspectRatio }: SizingQuery): SiOutline {
  return { kind: shape, centre: { xM: 0, yM: 0 }, widthM: Math.sqrt(aspectRatio), heightM: 1 / Math.sqrt(aspectRatio) };
}

/** From the edge of the round panel of the same area. */
function proposedExponent(unit: SiOutline, focalRatio: number, edgeTaperDb: number): number {
  const radius = Math.sqrt(outlineAreaM2(unit) / Math.PI);
  return Math.max(0.5, feedExponentOfEdgeTaper(edgeTaperDb, Math.atan(radius / (focalRatio * largestDimensionM(unit)))));
}

function proposedHorn({ operation }: SizingQuery, distance: number, exponent: number, offset: Direction): SiHorn {
  const side = operation === 'reflect' ? 1 : -1;
  // + 0 turns a negative zero of a broadside beam into zero.
  const position = { xM: -distance * offset.u + 0, yM: -distance * offset.v + 0, zM: side * distance * offset.w };
  return { kind: 'horn', position, aim: { xM: 0, yM: 0, zM: 0 }, exponentE: exponent, exponentH: exponent, polarisation: 'x' };
}

/** Spillover times |integral of a|^2 / (A integral of a^2), a with the receive exponent 1/2 that conserves energy. */
function illuminationEfficiencyOf(horn: SiHorn, outline: SiOutline): number {
  const sampleAt = hornSampler(horn);
  const amplitude = (xM: number, yM: number): number => {
    const { field, cosIncidence } = sampleAt(xM, yM);
    return field * Math.sqrt(cosIncidence);
  };
  const effort = { nodes: 12, partM: Math.abs(horn.position.zM) / Math.sqrt(horn.exponentE + 1), pivot: { xM: 0, yM: 0 } };
  const sum = integrateOverOutline(outline, amplitude, effort);
  const squares = integrateOverOutline(outline, (xM, yM) => amplitude(xM, yM) ** 2, effort);
  return (hornCapturedShare(horn, outline).fraction * sum * sum) / (outlineAreaM2(outline) * squares);
}

function steepestIncidenceRad({ position }: SiHorn, outline: SiOutline): number {
  const farthest = outlineTrace(outline, 360).reduce((far, { xM, yM }) => Math.max(far, Math.hypot(xM - position.xM, yM - position.yM)), 0);
  return Math.atan2(farthest, Math.abs(position.zM));
}

/** Largest spacing of a triangular lattice against a square one: 2/sqrt 3, E. D. Sharp, IRE TAP 9(2), 1961 (from memory). */
const TRIANGULAR_GAIN = 2 / Math.sqrt(3);

function proposedPeriod({ highestFrequencyHz, lattice }: SizingQuery, scanSine: number, incidenceSine: number): Pick<SizingAdvice, 'periodM' | 'periodLimitedBy'> {
  const wavelengthM = SPEED_OF_LIGHT_M_PER_S / highestFrequencyHz;
  const largest = wavelengthM / (1 + Math.max(scanSine, incidenceSine));
  const side = lattice === 'triangular' ? TRIANGULAR_GAIN * largest : largest;
  return { periodM: Math.floor(side / PERIOD_STEP_M + 1e-9) * PERIOD_STEP_M, periodLimitedBy: scanSine > incidenceSine ? 'scan' : 'incidence' };
}
