/** States that a cell runs through in every period, each for its part of it. */
export interface SwitchingSequence {
  readonly states: readonly { readonly magnitude: number; readonly phaseRad: number }[];
  /** Where the states change, from 0 to 1, one more than states. */
  readonly edges: readonly number[];
}

export interface ComplexAmplitude {
  readonly re: number;
  readonly im: number;
}

/** Equal parts of the period for so many states. */
export function equalEdges(count: number): number[] {
  return Array.from({ length: count + 1 }, (_, i) => i / count);
}

/**
 * Fourier coefficient of Gamma(t) = sum a_m exp(j 2 pi m t / T): sum of Gamma_l (exp(-j 2 pi m tau_l) - exp(-j 2 pi m tau_(l-1))) /
 * (-j 2 pi m), and the mean for m = 0.
 */
export function harmonicAmplitude({ states, edges }: SwitchingSequence, order: number): ComplexAmplitude {
  let [re, im] = [0, 0];
  states.forEach(({ magnitude, phaseRad }, l) => {
    const width = edges[l + 1] - edges[l];
    // sinc form of the same: width sinc(m width) exp(-j 2 pi m middle), which stays exact for small m width.
    const middle = (edges[l + 1] + edges[l]) / 2;
    const x = Math.PI * order * width;
    const size = magnitude * width * (x === 0 ? 1 : Math.sin(x) / x);
    const phase = phaseRad - 2 * Math.PI * order * middle;
    re += size * Math.cos(phase);
    im += size * Math.sin(phase);
  });
  return { re, im };
}

/** The same for a sequence that starts a share of the period later: a_m exp(-j 2 pi m delay). */
export function delayedPhaseRad(order: number, delay: number): number {
  return -2 * Math.PI * order * delay;
}

/** Power over all harmonics, sum |a_m|^2 = sum of the parts of the period times |Gamma|^2: nothing is lost between them. */
export function sequencePower({ states, edges }: SwitchingSequence): number {
  return states.reduce((sum, { magnitude }, l) => sum + (edges[l + 1] - edges[l]) * magnitude * magnitude, 0);
}
