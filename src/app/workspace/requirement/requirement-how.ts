import type { HowComputed } from '../how-computed';

export type RequirementFigure = 'cross-polar-mask' | 'eirp' | 'eirp-density' | 'exposure' | 'link' | 'relay' | 'gain-over-temperature' | 'sizing';

/** How the figures of mask, transmitter, link and receiver are computed, and how a size is advised. */
export const REQUIREMENT_HOW: Readonly<Record<RequirementFigure, HowComputed>> = {
  'cross-polar-mask': {
    title: 'Cross-polar mask margin',
    formula: ['margin = min over directions of [mask(α) − Gx(θ, φ)]'],
    meaning: 'The least distance in dB between the mask and the cross-polar gain over the hemisphere, from the first angle of the mask outwards.',
    conventions: 'Cross-polar by Ludwig\'s third definition for x and y, the other sense for circular; levels in dBi, not relative to the beam',
    validity: 'Of the vector model alone. Under the scalar model the line is not evaluated, and never met.',
    source: 'Definition; check cross-polar-mask.spec.ts',
  },
  eirp: {
    title: 'EIRP',
    formula: ['EIRP = 10 log P − L + G'],
    meaning: 'Transmitter power less the loss to the horn plus the predicted gain in the first wanted beam.',
    conventions: 'dBW, power in W; the share of time is not in it',
    validity: 'As far as the predicted gain: blockage by the mount only where its radius is given, no mismatch beyond the loss that was entered.',
    source: 'IEEE Std 145 (terms, from memory); check transmission-figures.spec.ts',
  },
  'eirp-density': {
    title: 'EIRP density and its margin',
    formula: ['density = 10 log P − L + G(θ, φ) − 10 log (BW / Bref)', 'margin = min over directions of [mask(α) − density(θ, φ)]'],
    meaning: 'The EIRP in the reference bandwidth. The margin is the least distance to its mask over the hemisphere in front of the panel.',
    conventions: 'dBW in the reference bandwidth, 4 kHz where none is given',
    validity: 'A spectrum that is flat over the occupied bandwidth; a carrier with peaks has more.',
    source: 'Definition; check link-22',
  },
  exposure: {
    title: 'Exposure on the axis',
    formula: [
      'surface 4P/A;  near field 4ηP/A to D²/4λ',
      'between: near field × (D²/4λ) / R;  from 0.6 D²/λ: P G / (4πR²)',
      'η = G λ² / (4π A);  distance 0 where the near field is at or below the limit',
      'local limit of ICNIRP above 6 GHz: 55 f^−0.177 and 275 f^−0.177 W/m², f in GHz',
    ],
    meaning: 'The highest power density of the main beam at each distance, and the distance from which it stays at or below each published limit. P is the power after the loss, times the share of time.',
    conventions: 'For a round aperture 4ηP/A is 16ηP/(πD²). For other outlines the true area stands in the densities and the largest dimension in the ranges, which tells distances too long rather than too short. Local levels are means over 4 cm², above 30 GHz also over 1 cm² at twice the value; brief exposures have limits of their own (both from memory).',
    validity: 'An estimate of the main beam, not a survey. Not for panels that focus: for those the density at the focus is summed from the cells. Spillover, the specular direction and the space behind the horn are not in it.',
    source: 'FCC OET Bulletin 65, edition 97-01, 1997, eq. 11 to 18 (partly from memory); 47 CFR 1.1310; ICNIRP, Health Phys. 118(5), 2020 (whole-body levels from memory); checks rf-01 to rf-04',
  },
  link: {
    title: 'Received power',
    formula: ['Pr = P − L + G + Gfar − 20 log (4πd/λ) − other losses'],
    meaning: 'Power at the far antenna, on the first wanted beam.',
    conventions: 'dBm; free-space loss is 92.448 + 20 log f (GHz) + 20 log d (km)',
    validity: 'Beyond 2D²/λ of the panel; nearer, no value is given.',
    source: 'H. T. Friis, Proc. IRE 34(5), 254-256, 1946 (from memory); check link-01',
  },
  relay: {
    title: 'Received power over the panel',
    formula: [
      'σ = (4π/λ²) Ac² |Σ Γₙ (d₁/r₁ₙ)(d₂/r₂ₙ) exp(−jk(r₁ₙ + r₂ₙ))|² cos θi cos θs',
      'Pr = P Gt Gr λ² σ / [(4π)³ d₁² d₂²]',
    ],
    meaning: 'The bistatic radar equation with the cells summed over their true distances to source and receiver. It equals two hops of free-space loss with 4πσ/λ² between them.',
    conventions: 'Source in the direction of the plane wave, receiver on the first wanted beam, distances from the middle of the panel',
    validity: 'Both antennas in the far field of a cell, not necessarily of the panel; scalar responses of the cells.',
    source: 'Bistatic radar equation, physical optics of a plate (from memory); checks rcs-01 and link-21',
  },
  'gain-over-temperature': {
    title: 'G/T',
    formula: ['T = Ta/L + 290 K (1 − 1/L) + 290 K (F − 1)', 'G/T = G − L − 10 log T'],
    meaning: 'Gain in the first beam less the line, over the system temperature at the input of the amplifier.',
    conventions: 'dB/K; the line is at 290 K',
    validity: 'The antenna temperature is as entered: what the beam, its sidelobes and the spillover see is not computed.',
    source: 'H. T. Friis, Proc. IRE 32(7), 1944 (from memory); check link-02',
  },
  sizing: {
    title: 'Sizing advice',
    formula: [
      'A = G λ² / (4π cos θ η),  η = spillover × taper',
      'q = taper / (20 log cos θe) − 1 at the edge of the round panel of the same area',
      'period = λ / (1 + max(sin θ, sin θi)) at the upper band edge; × 2/√3 on a triangular lattice',
    ],
    meaning: 'Outline, horn and period for the gain wanted with the allowance added. Spillover and taper are integrated for the proposed horn on the proposed outline.',
    conventions: 'Field of the horn cos^q, power cos^2q; f/D over the largest dimension; the horn stands on the specular side of the first beam, a transmitting panel is lit along its normal',
    validity: 'Ideal cells that receive and radiate with cos^½: what cells, rounding and tolerances cost is the allowance. Blockage is not in it, so a beam near the normal loses more.',
    source: 'J. Huang, J. A. Encinar, Reflectarray Antennas, 2007, ch. 2 and 3 (from memory); E. D. Sharp, IRE TAP 9(2), 1961 (from memory); checks feed-05 and feed-07, size-panel.spec.ts',
  },
};
