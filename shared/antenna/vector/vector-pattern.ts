import type { Polarisation } from '../../model/design-document';
import type { Direction } from '../../waves/conventions';
import type { ApertureField } from '../aperture-field';
import { apertureSpectrum } from '../aperture-spectrum';
import { farFieldOf } from '../far-field';
import type { FieldValue } from '../interpolated-far-field';
import type { LatticeGrid, PanelLattice } from '../panel-lattice';
import { radiatedPower } from '../radiated-power';
import { blendedPower, elementPower, type BlendWeights, type PatternBlend, type RadiationPattern } from '../radiation-pattern';
import { sharedCellFactor, type CellFactor } from './cell-factor';
import { hemispherePower, type PatternReach, type PowerLine } from './hemisphere-power';
import { waveWeights, type Reradiation } from './reradiation';
import type { VectorLight, VectorWaves } from './vector-light';

/** How the far field of leaving waves is reckoned. */
export interface VectorForm {
  readonly polarisation: Polarisation;
  readonly reradiation: Reradiation;
  readonly cellFactor: Exclude<CellFactor, 'incident'>;
  /** What the cell factor `beam` refers to. */
  readonly beam: Direction;
}

export interface VectorPatternQuery {
  readonly lattice: PanelLattice;
  readonly light: Pick<VectorLight, 'cosIncidence' | 'cosAzimuth' | 'sinAzimuth'>;
  readonly pathM: Float64Array;
  readonly leaving: VectorWaves;
  readonly wavenumber: number;
  readonly form: VectorForm;
}

/** The wanted polarisation and the one orthogonal to it; both are divided by the power of both. */
export interface VectorPattern {
  readonly co: RadiationPattern;
  readonly cross: RadiationPattern;
  /** Integral of |E|^2 over the hemisphere, all polarisations, in the units of |E|^2 R^2. */
  readonly radiatedPower: number;
}

/**
 * Far field of a panel as two array factors, F of the wanted and G of the other polarisation, with |E|^2 R^2 as their scale.
 * With power waves Ludwig's co-polar part is sqrt(cos theta) F and the cross-polar one sqrt(cos theta) G, circular ones alike up to a phase:
 * E_theta = sqrt(cos theta) f.rho, E_phi = sqrt(cos theta) f.phi, so turning by phi gives back f_x and f_y. The power is then the integral of
 * cos theta (|F|^2 + |G|^2) du dv / cos theta, exact by the kernel of the scalar model with exponent 1/2 for each of the two. All
 * other forms mix F and G by smooth weights, and their power is found by quadrature.
 */
export function vectorPattern(query: VectorPatternQuery): VectorPattern {
  const { lattice, wavenumber, form } = query;
  const [co, cross] = polarisedApertures(query).map((field) => {
    const spectrum = apertureSpectrum(field);
    return { spectrum, farField: farFieldOf(field, spectrum, wavenumber) };
  });
  if (form.reradiation === 'power-wave' && form.cellFactor === 'none') {
    const power = radiatedPower(co.spectrum, wavenumber, 0.5) + radiatedPower(cross.spectrum, wavenumber, 0.5);
    const shared = { wavenumber, radiateExponent: 0.5, radiatedPower: power };
    return { co: { ...co, ...shared }, cross: { ...cross, ...shared }, radiatedPower: power };
  }
  const weigh = blendWeigher(query);
  const blended = (own: typeof co, other: typeof co, weights: PatternBlend['weigh']): RadiationPattern => ({
    ...own,
    wavenumber,
    radiateExponent: 0.5,
    radiatedPower: 1,
    blend: { ...other, weigh: weights },
  });
  const coPattern = blended(co, cross, weigh.co);
  const crossPattern = blended(cross, co, weigh.cross);
  const power = hemispherePower((u) => bothLines({ co: coPattern, cross: crossPattern }, u), patternReach(lattice.grid, wavenumber));
  return { co: { ...coPattern, radiatedPower: power }, cross: { ...crossPattern, radiatedPower: power }, radiatedPower: power };
}

function patternReach({ columnCount, rowCount, stepXM, stepYM }: LatticeGrid, wavenumber: number): PatternReach {
  // A cell factor reaches over a cell, a staggered row over half of one more.
  return { alongX: wavenumber * (columnCount + 0.5) * stepXM, alongY: wavenumber * rowCount * stepYM };
}

/** Power of both polarisations along a line of constant u. */
function bothLines({ co, cross }: Pick<VectorPattern, 'co' | 'cross'>, u: number): PowerLine {
  const own = co.farField.lineAt(u);
  const other = cross.farField.lineAt(u);
  return (v, w) => {
    const [f, g] = [own(v), other(v)];
    return polarPower(co, { u, v, w }, f, g) + polarPower(cross, { u, v, w }, g, f);
  };
}

function polarPower(pattern: RadiationPattern, direction: Direction, own: FieldValue, other: FieldValue): number {
  if (pattern.blend) return blendedPower(pattern.blend, direction, own, other);
  return (own.re * own.re + own.im * own.im) * elementPower(direction.w, pattern.radiateExponent);
}

/** Co- and cross-polar power, |E|^2 R^2, in a direction in front of the panel. */
export function bothPowers({ co, cross }: Pick<VectorPattern, 'co' | 'cross'>, direction: Direction): [number, number] {
  const f = co.farField.fieldAt(direction.u, direction.v);
  const g = cross.farField.fieldAt(direction.u, direction.v);
  return [polarPower(co, direction, f, g), polarPower(cross, direction, g, f)];
}

/** Aperture fields of the wanted and the other polarisation: x and y, or (x + j y)/sqrt 2 and (x - j y)/sqrt 2, times the cell's area over lambda. */
function polarisedApertures({ lattice, light, pathM, leaving, wavenumber, form }: VectorPatternQuery): [ApertureField, ApertureField] {
  const { grid, count, column, row, cellAreaM2 } = lattice;
  const own = emptyAperture(grid);
  const other = emptyAperture(grid);
  const scale = (cellAreaM2 * wavenumber) / (2 * Math.PI);
  const isCircular = form.polarisation === 'rhcp' || form.polarisation === 'lhcp';
  const swapped = form.polarisation === 'y' || form.polarisation === 'lhcp';
  const [first, second] = swapped ? [other, own] : [own, other];
  for (let n = 0; n < count; n++) {
    const c = light.cosAzimuth[n];
    const s = light.sinAzimuth[n];
    const { te, tm } = waveWeights(form.reradiation, light.cosIncidence[n]);
    const [teRe, teIm] = [te * leaving.teRe[n], te * leaving.teIm[n]];
    const [tmRe, tmIm] = [tm * leaving.tmRe[n], tm * leaving.tmIm[n]];
    const [xRe, xIm] = [c * tmRe - s * teRe, c * tmIm - s * teIm];
    const [yRe, yIm] = [s * tmRe + c * teRe, s * tmIm + c * teIm];
    const turnRe = scale * Math.cos(wavenumber * pathM[n]);
    const turnIm = -scale * Math.sin(wavenumber * pathM[n]);
    const at = row[n] * grid.columnCount + column[n];
    if (isCircular) {
      store(first, at, [(xRe - yIm) * Math.SQRT1_2, (xIm + yRe) * Math.SQRT1_2], [turnRe, turnIm]);
      store(second, at, [(xRe + yIm) * Math.SQRT1_2, (xIm - yRe) * Math.SQRT1_2], [turnRe, turnIm]);
    } else {
      store(first, at, [xRe, xIm], [turnRe, turnIm]);
      store(second, at, [yRe, yIm], [turnRe, turnIm]);
    }
  }
  return [own, other];
}

function emptyAperture(grid: LatticeGrid): ApertureField {
  return { grid, re: new Float64Array(grid.columnCount * grid.rowCount), im: new Float64Array(grid.columnCount * grid.rowCount) };
}

function store(field: ApertureField, at: number, [re, im]: readonly [number, number], [turnRe, turnIm]: readonly [number, number]): void {
  field.re[at] = re * turnRe - im * turnIm;
  field.im[at] = re * turnIm + im * turnRe;
}

/**
 * Weights of F and G in the co- and the cross-polar field. Power waves: sqrt(cos theta) of its own. Aperture, with
 * E_theta = f.rho and E_phi = cos theta f.phi: for x co = (1 - v^2/(1 + w)) F + u v/(1 + w) G, for the circular senses
 * (1 + w)/2 F + (u +- j v)^2/(2 (1 + w)) G; both are smooth at broadside. All times the cell factor.
 */
function blendWeigher({ lattice, wavenumber, form }: VectorPatternQuery): { co: PatternBlend['weigh']; cross: PatternBlend['weigh'] } {
  const { grid } = lattice;
  const perWavelength = wavenumber / (2 * Math.PI);
  const factor = sharedCellFactor(form.cellFactor, { sideX: grid.stepXM * perWavelength, sideY: grid.stepYM * perWavelength, beam: form.beam });
  const obliquity = form.reradiation === 'power-wave' ? powerWaveWeights : apertureWeights(form.polarisation);
  const crossObliquity = form.reradiation === 'power-wave' ? powerWaveWeights : apertureWeights(ORTHOGONAL[form.polarisation]);
  const scaled = (weigh: PatternBlend['weigh']): PatternBlend['weigh'] => (u, v, w, out) => {
    weigh(u, v, w, out);
    const c = factor(u, v);
    out.own *= c;
    out.otherRe *= c;
    out.otherIm *= c;
    return out;
  };
  return { co: scaled(obliquity), cross: scaled(crossObliquity) };
}

export const ORTHOGONAL: Readonly<Record<Polarisation, Polarisation>> = { x: 'y', y: 'x', rhcp: 'lhcp', lhcp: 'rhcp' };

function powerWaveWeights(_u: number, _v: number, w: number, out: BlendWeights): BlendWeights {
  out.own = Math.sqrt(w);
  out.otherRe = 0;
  out.otherIm = 0;
  return out;
}

/** Ludwig's component along x of a field whose own array factor is that of x, or the like for another polarisation. */
function apertureWeights(polarisation: Polarisation): PatternBlend['weigh'] {
  const isCircular = polarisation === 'rhcp' || polarisation === 'lhcp';
  const turn = polarisation === 'lhcp' ? -1 : 1;
  return (u, v, w, out) => {
    const t = 1 / (1 + w);
    if (isCircular) {
      out.own = (1 + w) / 2;
      out.otherRe = ((u * u - v * v) * t) / 2;
      out.otherIm = turn * u * v * t;
      return out;
    }
    out.own = 1 - (polarisation === 'x' ? v * v : u * u) * t;
    out.otherRe = u * v * t;
    out.otherIm = 0;
    return out;
  };
}
