import type { HowComputed } from './how-computed';

/** Figures of one target phase or one way of lighting, each with how it is computed. */
export type LawFigureId = 'focus' | 'vortex';

const EDGES = 'Array theory: no coupling beyond what the cell data hold, no edge diffraction';

export const HOW_LAWS_COMPUTED: Readonly<Record<LawFigureId, HowComputed>> = {
  focus: {
    title: 'Level along the axis of a focus',
    formula: ['S(s) = |Σ aₙ (z/rₙ)^b exp(−jk rₙ) / rₙ|²', 'rise = S(maximum) / S(focus), in dB'],
    meaning: 'The level on the line from the centre of the panel through the focus. Spreading draws its maximum towards the panel, so it stands nearer than the focus; the depth is where it falls to half.',
    conventions: 'rₙ from cell n to the point at distance s; aₙ the field of the cells in use, losses and phase errors included; b the radiate exponent, in field',
    validity: `${EDGES}. Spherical waves from every cell: not within about a wavelength of the panel.`,
    source: 'J. W. Sherman, IRE Trans. AP 10(4), 399–408, 1962 (from memory); checks foc-01 and foc-02',
  },
  vortex: {
    title: 'Ring and purity of a vortex',
    formula: ['target phase = k(R − r·b) + l α', 'purity = |c_l|² / Σ |c_m|²,  c_m = mean of F exp(−jmγ) about the beam'],
    meaning: 'The ring is the angle off the beam at which the mean level about it is highest; the purity is the share of the power on that ring that turns with the wanted order l. On the axis there is a null, so figures at the beam are those of the null.',
    conventions: 'α is the azimuth of the cell about the axis of the beam, γ that of the direction, both from the side of x against the clock',
    validity: `${EDGES}. Near the axis the phase changes faster than any travelling wave: those cells count as evanescent.`,
    source: 'Fourier series about the axis, by definition; checked on its own properties, no published check',
  },
};
