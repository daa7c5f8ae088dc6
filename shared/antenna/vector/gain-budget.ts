import { degFromRad, wrapRad } from '../../units/angles';
import { powerRatioToDb } from '../../units/decibels';
import { sharedCellFactor } from './cell-factor';
import { polarisationRows, waveWeights } from './reradiation';
import { wavePower } from './vector-light';
import type { VectorLight } from './vector-light';
import type { VectorPatternQuery } from './vector-pattern';

/** Contributions of the cells to the wanted beam: s_n = c.E_n exp(j k(r_n.u0 - path)), t_n the same with the cross-polar row. */
export interface BeamTerms {
  readonly coRe: Float64Array;
  readonly coIm: Float64Array;
  readonly crossPower: number;
}

export interface BudgetQuery extends VectorPatternQuery {
  readonly light: VectorLight;
  /** Share of the source's power that hits the outline, and the source's power; 1 and the captured power for a plane wave. */
  readonly capturedShare: number;
  readonly sourcePower: number;
}

/** The gain at the wanted beam item by item, in dB; the items add up to the gain exactly. */
export interface GainBudget {
  /** 4 pi N A cos(theta0) / lambda^2. */
  readonly areaDbi: number;
  readonly spilloverDb: number;
  /** Power that leaves the cells over power that arrives; of a transmitting panel what is reflected is lost. */
  readonly cellLossDb: number;
  /** What re-radiation makes of the leaving power towards the beam: with power waves only the residue of sampling at cell centres. */
  readonly projectionDb: number;
  readonly crossPolarDb: number;
  /** Of the leaving amplitudes, so cell magnitudes and polarisation are part of it. */
  readonly taperDb: number;
  readonly phaseDb: number;
  readonly cellFactorDb: number;
}

export interface BudgetResult {
  readonly budget: GainBudget;
  readonly gainAtBeamDbi: number;
  /** Root mean square of the angles of s_n about that of their sum. */
  readonly phaseErrorRmsDeg: number;
}

/** Contributions at the beam that `query.form` names. */
export function beamTerms({ lattice, light, pathM, leaving, wavenumber, form }: VectorPatternQuery): BeamTerms {
  const { u, v } = form.beam;
  const rows = polarisationRows(form.beam, form.polarisation, form.reradiation);
  const coRe = new Float64Array(lattice.count);
  const coIm = new Float64Array(lattice.count);
  let crossPower = 0;
  for (let n = 0; n < lattice.count; n++) {
    const c = light.cosAzimuth[n];
    const s = light.sinAzimuth[n];
    const { te, tm } = waveWeights(form.reradiation, light.cosIncidence[n]);
    const [teRe, teIm] = [te * leaving.teRe[n], te * leaving.teIm[n]];
    const [tmRe, tmIm] = [tm * leaving.tmRe[n], tm * leaving.tmIm[n]];
    const [xRe, xIm] = [c * tmRe - s * teRe, c * tmIm - s * teIm];
    const [yRe, yIm] = [s * tmRe + c * teRe, s * tmIm + c * teIm];
    const sRe = rows.coX.re * xRe - rows.coX.im * xIm + rows.coY.re * yRe - rows.coY.im * yIm;
    const sIm = rows.coX.re * xIm + rows.coX.im * xRe + rows.coY.re * yIm + rows.coY.im * yRe;
    const tRe = rows.crossX.re * xRe - rows.crossX.im * xIm + rows.crossY.re * yRe - rows.crossY.im * yIm;
    const tIm = rows.crossX.re * xIm + rows.crossX.im * xRe + rows.crossY.re * yIm + rows.crossY.im * yRe;
    const phase = wavenumber * (lattice.xM[n] * u + lattice.yM[n] * v - pathM[n]);
    const [cosine, sine] = [Math.cos(phase), Math.sin(phase)];
    coRe[n] = sRe * cosine - sIm * sine;
    coIm[n] = sRe * sine + sIm * cosine;
    crossPower += tRe * tRe + tIm * tIm;
  }
  return { coRe, coIm, crossPower };
}

/**
 * The budget of the gain at the beam. Undefined where no cell sends anything of the wanted polarisation there.
 * With P_cap and P_out the arriving and leaving powers and P_h that of the source, the items are 4 pi N A cos theta0/lambda^2, eta_s,
 * P_out/P_cap, A sum(|s|^2 + |t|^2)/(cos theta0 P_out) P_cap/(P_h eta_s), sum|s|^2/sum(|s|^2 + |t|^2), (sum|s|)^2/(N sum|s|^2),
 * |sum s|^2/(sum|s|)^2 and C(u0, v0)^2; their product is 4 pi |A C sum s/lambda|^2/P_h, the gain, identically.
 */
export function gainBudget(query: BudgetQuery): BudgetResult | undefined {
  const { lattice, light, leaving, wavenumber, form, capturedShare, sourcePower } = query;
  const { coRe, coIm, crossPower } = beamTerms(query);
  const wavelengthM = (2 * Math.PI) / wavenumber;
  const { cellAreaM2, count, grid } = lattice;
  let [sumRe, sumIm, sizes, coPower] = [0, 0, 0, 0];
  for (let n = 0; n < count; n++) {
    const power = coRe[n] * coRe[n] + coIm[n] * coIm[n];
    sumRe += coRe[n];
    sumIm += coIm[n];
    sizes += Math.sqrt(power);
    coPower += power;
  }
  const coherent = sumRe * sumRe + sumIm * sumIm;
  const captured = cellAreaM2 * wavePower(light);
  const out = cellAreaM2 * wavePower(leaving);
  if (!(coherent > 0 && out > 0 && captured > 0)) return undefined;
  const both = coPower + crossPower;
  const { w } = form.beam;
  const site = { sideX: grid.stepXM / wavelengthM, sideY: grid.stepYM / wavelengthM, beam: form.beam };
  const factor = sharedCellFactor(form.cellFactor, site)(form.beam.u, form.beam.v);
  const budget: GainBudget = {
    areaDbi: powerRatioToDb((4 * Math.PI * count * cellAreaM2 * w) / (wavelengthM * wavelengthM)),
    spilloverDb: powerRatioToDb(capturedShare),
    cellLossDb: powerRatioToDb(out / captured),
    projectionDb: powerRatioToDb(((cellAreaM2 * both) / (w * out)) * (captured / (sourcePower * capturedShare))),
    crossPolarDb: powerRatioToDb(coPower / both),
    taperDb: powerRatioToDb((sizes * sizes) / (count * coPower)),
    phaseDb: powerRatioToDb(coherent / (sizes * sizes)),
    cellFactorDb: powerRatioToDb(factor * factor),
  };
  const field = (cellAreaM2 * factor) / wavelengthM;
  return {
    budget,
    gainAtBeamDbi: powerRatioToDb((4 * Math.PI * field * field * coherent) / sourcePower),
    phaseErrorRmsDeg: rmsAboutDeg(coRe, coIm, Math.atan2(sumIm, sumRe)),
  };
}

/** Cells that send nothing have no phase and do not count. */
function rmsAboutDeg(re: Float64Array, im: Float64Array, aboutRad: number): number {
  let squares = 0;
  let count = 0;
  for (let n = 0; n < re.length; n++) {
    if (re[n] === 0 && im[n] === 0) continue;
    squares += wrapRad(Math.atan2(im[n], re[n]) - aboutRad) ** 2;
    count += 1;
  }
  return degFromRad(Math.sqrt(squares / Math.max(1, count)));
}
