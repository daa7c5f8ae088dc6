import type { HowComputed } from '../how-computed';

/** Figures of a tolerance run, each with how it is computed. */
export type ToleranceFigureId = 'trials' | 'yield' | 'ranking' | 'substrate';

export const HOW_TOLERANCE_COMPUTED: Readonly<Record<ToleranceFigureId, HowComputed>> = {
  trials: {
    title: 'Trials',
    formula: [
      'aₙ → aₙ (1 + Δaₙ) exp(jδₙ), dead cells 0',
      'etch: φ(size + growth) − φ(size), linear between neighbouring cells of the edition',
      'height z: δ = kz (cos θ_i + cos θ₀);  bow z = b (1 − ρ²/ρ_max²)',
      'feed: δ = −k (R′ − R), amplitude and incidence to second order along x, y, z',
    ],
    meaning: 'Each trial is one panel made: every contributor draws its deviation, and gain, lobes and pointing are read off the pattern as for the panel drawn. Gain is absolute: a panel that receives less radiates less.',
    conventions: 'Draw n of trial t and channel c is mix(K + G(n + 1)), K = mix(mix(seed + G(t + 1)) + G(c + 1)), modulo 2⁶⁴: neither the order nor the number of workers matters. Normal draws are Φ⁻¹ of it',
    validity: 'Scalar model at the design frequency; cells stay those chosen. A height acts by the direction of the first beam. Deviations are independent of each other.',
    source: 'AS 241 (M. J. Wichura, 1988) and SplitMix64, from memory; checks rnd-01, tol-01, tol-02, tol-03, tol-05',
  },
  yield: {
    title: 'Yield',
    formula: ['p = met / of', 'centre (p + z²/2n) / (1 + z²/n), half width z √(p(1 − p)/n + z²/4n²) / (1 + z²/n), z = 1.96'],
    meaning: 'Share of the trials that meet a line, and the interval that holds the true share in 95 of 100 runs. It does not shrink to nothing where all or none meet it.',
    conventions: 'P5, P50, P95: values that 5, 50 and 95 of 100 trials stay below, linear at rank (n − 1)p',
    validity: 'Says how sure the count is, not how right the spreads are.',
    source: 'E. B. Wilson, J. Am. Stat. Assoc. 22, 1927 (from memory); check tol-06',
  },
  ranking: {
    title: 'What hurts most',
    formula: ['change = P5 of the trials with one contributor − value as drawn (P95 for sidelobes and pointing)'],
    meaning: 'The value on the bad side that 1 panel in 20 goes beyond when one contributor varies and all others are as drawn, with the draws it has among the others.',
    conventions: 'A loss of gain is negative; a rise of sidelobes is positive',
    validity: 'Changes do not add up: what two contributors do together is in the yield.',
    source: 'Definition; merge-tolerance.spec.ts',
  },
  substrate: {
    title: 'Permittivity, thickness, temperature',
    formula: [
      'Y_sheet = Y − Y_slab(h, ε);  thickness: Y′ = Y_sheet + Y_slab(h′, ε)',
      'permittivity: Y′(f) = √r Y_sheet(f√r) + Y_slab(h, ε′),  r = (ε′ + 1) / (ε + 1)',
      'temperature: f → f (1 + αΔT), and ε → ε (1 + τΔT)',
    ],
    meaning: 'ESTIMATE. Each cell is taken for a thin sheet of patches on a grounded slab; what the edition leaves when the slab is taken out stays, or scales with the medium around it.',
    conventions: 'Normalised admittances at the incidence of the cell, TE and TM; slopes, so proportional to the deviation',
    validity: 'Reflecting cells of one layer on metal. Fields from patch edges to the metal are left out: for 3.4 % of thickness the estimate says 13.3° near resonance where full-wave data say 7.8°; 1° apart elsewhere.',
    source: 'Grid of patches: O. Luukkonen et al., IEEE TAP 56(6), 2008 (from memory); substrate-shift.spec.ts against published values of a dense grid',
  },
};
