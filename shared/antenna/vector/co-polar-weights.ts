import { polarisationRows, waveWeights, type PolarisationRows } from './reradiation';
import type { VectorLight } from './vector-light';
import type { VectorForm } from './vector-pattern';

/**
 * What a cell's response does to the wanted beam: q = g11 s11 + g12 s12 + g21 s21 + g22 s22, q = c.E_n over |c| and the arriving amplitude.
 * Of a passive cell |q| is at most 1 with power waves. Reused between positions.
 */
export interface CoPolarWeights {
  g11Re: number;
  g11Im: number;
  g12Re: number;
  g12Im: number;
  g21Re: number;
  g21Im: number;
  g22Re: number;
  g22Im: number;
}

export function newCoPolarWeights(): CoPolarWeights {
  return { g11Re: 0, g11Im: 0, g12Re: 0, g12Im: 0, g21Re: 0, g21Im: 0, g22Re: 0, g22Im: 0 };
}

/** Which axes a response is given in: TE and TM of the plane of incidence, or x and y of the panel. */
export type MatrixAxes = 'te-tm' | 'x-y';

export interface CoPolarWeigher {
  /** Arriving amplitude of what is re-radiated: |a| of power waves, the tangential |E| of an aperture. */
  amplitudeAt(n: number): number;
  /** Weights of a response between TE and TM, or between x and y. */
  weigh(n: number, axes: MatrixAxes, out: CoPolarWeights): CoPolarWeights;
  /** q of a cell of response 1 for all polarisations, written as [re, im]. */
  ofUnit(n: number): readonly [number, number];
}

export function coPolarWeigher(light: VectorLight, form: VectorForm): CoPolarWeigher {
  const rows = polarisationRows(form.beam, form.polarisation, form.reradiation);
  const length = Math.hypot(rows.coX.re, rows.coX.im, rows.coY.re, rows.coY.im);
  const scratch = newCoPolarWeights();
  const amplitudeAt = (n: number): number => {
    const { te, tm } = waveWeights(form.reradiation, light.cosIncidence[n]);
    return Math.hypot(te * light.teRe[n], te * light.teIm[n], tm * light.tmRe[n], tm * light.tmIm[n]);
  };
  const weigh = (n: number, axes: MatrixAxes, out: CoPolarWeights): CoPolarWeights => {
    const amplitude = amplitudeAt(n);
    const scale = amplitude === 0 ? 0 : 1 / (amplitude * length);
    if (axes === 'te-tm') fillTeTm(out, { light, rows, form, n, scale });
    else fillXY(out, { light, rows, form, n, scale });
    return out;
  };
  return {
    amplitudeAt,
    weigh,
    ofUnit: (n) => {
      weigh(n, 'te-tm', scratch);
      return [scratch.g11Re + scratch.g22Re, scratch.g11Im + scratch.g22Im];
    },
  };
}

interface Position {
  readonly light: VectorLight;
  readonly rows: PolarisationRows;
  readonly form: VectorForm;
  readonly n: number;
  readonly scale: number;
}

function fillTeTm(out: CoPolarWeights, { light, rows, form, n, scale }: Position): void {
  const c = light.cosAzimuth[n];
  const s = light.sinAzimuth[n];
  const { te, tm } = waveWeights(form.reradiation, light.cosIncidence[n]);
  // c.phi_i and c.rho, with phi_i = (-s, c) and rho = (c, s).
  const alongTeRe = scale * te * (c * rows.coY.re - s * rows.coX.re);
  const alongTeIm = scale * te * (c * rows.coY.im - s * rows.coX.im);
  const alongTmRe = scale * tm * (c * rows.coX.re + s * rows.coY.re);
  const alongTmIm = scale * tm * (c * rows.coX.im + s * rows.coY.im);
  const [teRe, teIm, tmRe, tmIm] = [light.teRe[n], light.teIm[n], light.tmRe[n], light.tmIm[n]];
  out.g11Re = alongTeRe * teRe - alongTeIm * teIm;
  out.g11Im = alongTeRe * teIm + alongTeIm * teRe;
  out.g12Re = alongTeRe * tmRe - alongTeIm * tmIm;
  out.g12Im = alongTeRe * tmIm + alongTeIm * tmRe;
  out.g21Re = alongTmRe * teRe - alongTmIm * teIm;
  out.g21Im = alongTmRe * teIm + alongTmIm * teRe;
  out.g22Re = alongTmRe * tmRe - alongTmIm * tmIm;
  out.g22Im = alongTmRe * tmIm + alongTmIm * tmRe;
}

/** The matrix acts on what is re-radiated, so that with power waves a passive one stays passive at any incidence. */
function fillXY(out: CoPolarWeights, { light, rows, form, n, scale }: Position): void {
  const [xRe, xIm, yRe, yIm] = arrivingXY(light, form, n);
  out.g11Re = scale * (rows.coX.re * xRe - rows.coX.im * xIm);
  out.g11Im = scale * (rows.coX.re * xIm + rows.coX.im * xRe);
  out.g12Re = scale * (rows.coX.re * yRe - rows.coX.im * yIm);
  out.g12Im = scale * (rows.coX.re * yIm + rows.coX.im * yRe);
  out.g21Re = scale * (rows.coY.re * xRe - rows.coY.im * xIm);
  out.g21Im = scale * (rows.coY.re * xIm + rows.coY.im * xRe);
  out.g22Re = scale * (rows.coY.re * yRe - rows.coY.im * yIm);
  out.g22Im = scale * (rows.coY.re * yIm + rows.coY.im * yRe);
}

/** Arriving power wave, or tangential field, along x and y: xRe, xIm, yRe, yIm. */
export function arrivingXY(light: VectorLight, { reradiation }: Pick<VectorForm, 'reradiation'>, n: number): readonly [number, number, number, number] {
  const c = light.cosAzimuth[n];
  const s = light.sinAzimuth[n];
  const { te, tm } = waveWeights(reradiation, light.cosIncidence[n]);
  return [
    c * tm * light.tmRe[n] - s * te * light.teRe[n],
    c * tm * light.tmIm[n] - s * te * light.teIm[n],
    s * tm * light.tmRe[n] + c * te * light.teRe[n],
    s * tm * light.tmIm[n] + c * te * light.teIm[n],
  ];
}
