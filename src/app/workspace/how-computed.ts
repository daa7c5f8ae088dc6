import type { StripFigureId } from './strip-figures';

/** How a headline figure is computed, for the note that opens from it. */
export interface HowComputed {
  readonly title: string;
  /** One line of formula each, in the symbols of the trade. */
  readonly formula: readonly string[];
  readonly meaning: string;
  readonly conventions: string;
  readonly validity: string;
  readonly source: string;
}

const ARRAY_SOURCE = 'C. A. Balanis, Antenna Theory, 4th ed., 2016, ch. 2 and 6 (from memory, equation numbers not checked)';
const GEOMETRY = 'Panel in z = 0, +z outward; θ from +z, φ from +x towards +y; time exp(+jωt), wave exp(−jk·r)';
const ARRAY_LIMITS = 'Array theory: no coupling beyond what the cell data hold, no edge diffraction; blockage by the horn and its mount only where their radius is given';

export const HOW_COMPUTED: Readonly<Record<StripFigureId, HowComputed>> = {
  gain: {
    title: 'Gain at the peak',
    formula: [
      'F(u, v) = cos^b θ Σ Aₙ Γₙ exp(−jkRₙ) exp(+jk(xₙu + yₙv))',
      'D = 4π |F|² / ∫ |F|² dΩ over the outward hemisphere',
      'G (dBi) = D + spillover + cell loss',
      'cell loss = 10 log (Σ|AΓ|² / Σ A²)',
    ],
    meaning: 'The highest lobe anywhere in the hemisphere, refined between samples. Directivity already holds taper and phase error, so neither is counted again.',
    conventions: `${GEOMETRY}; b is the radiate exponent, in field`,
    validity: `${ARRAY_LIMITS}. Spillover is the share of the power of a cos^q horn (power cos^2q) that misses the outline; what hits a keep-out counts as hitting the panel, and a remark on the Panel sheet says how many dB that is.`,
    source: ARRAY_SOURCE,
  },
  beamwidth: {
    title: 'Half-power beamwidth',
    formula: ['|F(θ)|² = ½ |F(peak)|² on both sides of the peak of the cut'],
    meaning: 'Full width on two great circles through the wanted direction: along, the one that contains z, and across, the one at right angles to it.',
    conventions: 'Half power is the ratio 0.5 (−3.0103 dB), interpolated between samples',
    validity: 'Exists only where the cut falls to half power on both sides within the hemisphere; otherwise the reason stands in its place.',
    source: 'IEEE Std 145 (terms, from memory)',
  },
  sidelobe: {
    title: 'Sidelobe level',
    formula: ['SLL = max |F|² outside the lobe of the wanted beam − |F(beam)|², in dB'],
    meaning: 'The highest local maximum in the whole hemisphere other than the lobe of the wanted beam, relative to that lobe. A stronger image or grating lobe shows above 0 dB.',
    conventions: 'Relative to the peak of the wanted beam; negative when lower',
    validity: ARRAY_LIMITS,
    source: 'IEEE Std 145 (terms, from memory)',
  },
  mask: {
    title: 'Mask margin',
    formula: [
      'margin = min over directions outside the beam of [mask(α) − G(θ, φ)]',
      'S.580-6: margin of the peak that leaves one sidelobe peak in ten worse',
      '25.209: + 3 dB from 7° on, and the excess passed in 10 % of 7° to 180°; + 6 dB in a declared spillover region',
    ],
    meaning: 'The least distance in dB between the mask and the gain over the hemisphere; α is the angle off the wanted beam. Negative when the pattern reaches into the mask.',
    conventions: 'Absolute level in dBi; between the points of a custom mask straight lines in angle and dB; theta of a formula in degrees; D of a published envelope is the largest dimension of the panel',
    validity: 'Judged only where the mask is defined, in front of the panel alone; F.699 from φm on, because inside it describes the main lobe. Share of angles: the highest level of all planes at each angle, in rings of one and a half samples. Blockage, specular and spillover radiation as far as the pattern holds them.',
    source: 'ITU-R S.465-6, S.580-6, F.699-8, 47 CFR 25.209(a), each with edition and state of checking on the Requirement sheet; checks mask-01 to mask-05 and mask-margin.spec.ts',
  },
  pointing: {
    title: 'Pointing error',
    formula: ['ε = arccos(b · p)'],
    meaning: 'Angle between the wanted direction b and the local maximum p nearest to it.',
    conventions: GEOMETRY,
    validity: 'The factor cos^b θ of a cell pulls the peak towards boresight; that pull is part of the error.',
    source: ARRAY_SOURCE,
  },
  efficiency: {
    title: 'Aperture efficiency',
    formula: ['η = G λ² / (4π A)'],
    meaning: 'Gain at the peak, as a ratio, against a uniformly lit loss-free aperture of the same area at boresight.',
    conventions: 'A is the count of cells times the area of one cell',
    validity: 'The projected area falls with cos θ, so a steered beam cannot reach 100 %.',
    source: 'IEEE Std 145 (terms, from memory)',
  },
  'phase-error': {
    title: 'RMS phase error',
    formula: ['σ = √(Σ eₙ² / N),  eₙ = wrap(φ achieved − φ target)', 'phase loss = |Σ A exp(je)|² / |Σ A|²'],
    meaning: 'What the choice of cells leaves of the target phase, each cell counted once. The phase loss beside it is weighted by the illumination.',
    conventions: 'Wrapped to ±180°; positive when the achieved phase leads. At another frequency the target is what the same law needs there, with the reference phase that fits the cells best: the constant that all cells share costs nothing. Map, table and RMS hold the same errors',
    validity: 'Of the cell data at the incidence of each position, where the edition covers it; the Cells sheet says where it does not.',
    source: 'Definition',
  },
  cells: {
    title: 'Cells',
    formula: ['columns = floor(W / pₓ), rows = floor(H / p_y), less the keep-outs'],
    meaning: 'Positions of the lattice whose centre lies inside or on the outline and outside every keep-out. Evanescent cells ask for a tangential wavenumber above k, which does not travel.',
    conventions: 'Ordered row by row from the lowest y, within a row from the lowest x',
    validity: 'At most 1 000 000 cells.',
    source: 'Definition',
  },
};
