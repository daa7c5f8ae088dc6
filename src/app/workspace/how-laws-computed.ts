import type { HowComputed } from './how-computed';

/** Figures of one target phase or one way of lighting, each with how it is computed. */
export type LawFigureId = 'modulation' | 'assignment' | 'blockage' | 'specular' | 'focus' | 'vortex' | 'projections' | 'diffuse' | 'guidedWave';

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
  assignment: {
    title: 'Assignment over a band and between neighbours',
    formula: ['band fit: least Σ over f of |Γ(f) − exp(j(φ(f) + c(f)))|²', 'c(f) = arg Σ A²|Γ| exp(j(φ cell − φ(f))), c at the design frequency = reference phase'],
    meaning: 'Cells and common phases are chosen in turn until nothing changes, at most eight rounds. A common phase of the panel, and so any delay, costs nothing at any frequency. A searched reference phase is the one, in steps of 15°, that leaves the least over the whole band.',
    conventions: 'φ(f) is the target phase of the same law at f, each cell at its own angle of incidence. Fewer different cells: those nearest to N even phases, of all turns the one with the least squared error',
    validity: 'A local choice: another start could end lower. The step to a neighbour is that of the first parameter along rows and columns; steps are counted because the data hold for endless lattices of equal cells.',
    source: 'Least squares, by definition; checked on its own properties, no published check',
  },
  modulation: {
    title: 'Time-modulated cells',
    formula: ['Γ(t) = Σ a_m exp(j2πmt/T)', 'a_m = Σ Γ_l w_l sinc(m w_l) exp(−j2πm t_l), w_l and t_l width and middle of part l', 'cell n: a_m exp(−j2πm δₙ);  Σ |a_m|² = Σ w_l |Γ_l|²'],
    meaning: 'All cells run through the same states, cell n later by δₙ of the period, so that the steered harmonic has its target phase. Harmonic m of the same delays leaves at m over the steered order times the wavenumber. What goes into other harmonics stands as cell loss of the one shown.',
    conventions: 'Time exp(+jωt); harmonic m lies m times the modulation frequency above the carrier; sinc x = sin πx / πx',
    validity: 'Modulation slow against the carrier: k is that of the carrier for every harmonic. States switch at once, and the delays are continuous.',
    source: 'Fourier series, by definition; checks tm-01 to tm-04',
  },
  blockage: {
    title: 'Blockage by horn and mount',
    formula: ['blocked: α = (F − rₙ)·u₀ > 0 and |F − rₙ − αu₀| < radius', 'at the beam = 20 log |Σ open s / Σ s|', 'G = D of the open cells + spillover + cell loss + power not radiated'],
    meaning: 'Cells whose ray towards the first beam meets the disc of horn and mount re-radiate nothing. What the field at the beam loses is more than the power: the hole also costs taper, and that part stands in the directivity.',
    conventions: 'F is the phase centre; the disc stands across the beam. Only reflecting panels: the horn of a transmitting one is behind',
    validity: 'Null field: no scattering by horn and mount, no shadow on the way from the horn to the cells. In the vector model the power is part of the cell loss.',
    source: 'Blocked-aperture subtraction (from memory); checks block-01, blk-01, blk-02',
  },
  specular: {
    title: 'The specular part',
    formula: ['mean response = Σ A² Γ / Σ A²', 'behind the panel: G = horn gain where the ray misses the outline'],
    meaning: 'The part of the response that all cells share radiates as the mirror image of the feed, whatever their phases; its level is against a metal plate of the same size. The pattern holds it already. Spillover past the rim stands in cuts behind a reflecting panel.',
    conventions: 'Weighted by the power that falls on each cell',
    validity: 'A mean over the panel: a lobe that the chosen cells happen to make there adds to it. Spillover is not added to the field in front of the panel, nor are rims diffracting.',
    source: 'Derived; checks spec-01 and spill-dir-01',
  },
  projections: {
    title: 'Alternating projections',
    formula: ['F = FFT(a);  clip |F| to [L, U], keep its phase;  a = A exp(j arg FFT⁻¹(F))', 'cost J = Σ (|F| − clipped |F|)² / samples, as a share of Σ A²'],
    meaning: 'The cost before each clip cannot rise. Reached: within 0.05 dB of both bounds on every sample. Stalled: the cost falls by less than 1 % in a hundred iterations without that; another start, wider transitions or other amplitudes are then needed, not more iterations.',
    conventions: 'Bounds hold for the pattern with the element factor, taken as at least 0.1; a flat sector holds all the power (Parseval). Three to eight samples to a cell. Start: the analytic broad beam, or beams with a bend of 0.4 rad at the rim',
    validity: 'A local search: it finds a way down from its start, not the best of all. Between samples lobes may stand a little higher. Before cells are chosen; phases are frozen at other frequencies.',
    source: 'O. M. Bucci et al., IEE Proc. H 137(6), 349–357, 1990 (from memory); checks ap-01 and ap-02',
  },
  diffuse: {
    title: 'Peak of diffuse scattering',
    formula: ['peak = max |Σ Aₙ Γₙ exp(jk rₙ·u)|² / (Σ A)² over the hemisphere', 'bound: 1/N (Parseval), or λ² / (2πA) on lattices finer than λ/√2'],
    meaning: 'The array factor of the panel against that of a metal plate of the same size. The search makes the peak over the whole reciprocal cell of the blocks low, weighted by the pattern of one block.',
    conventions: 'States 360°/K apart, of what the cells add to the incident wave; refined between samples',
    validity: 'Boards of 4 × 4 single cells of two states are all tried; others are improved block after block from six seeded boards and may not be the best. Element factor left out.',
    source: 'Parseval; checks diff-01 and diff-02',
  },
  guidedWave: {
    title: 'A guided wave under the panel',
    formula: [
      'plane: exp(−(α + jkn)s);  radial: exp(−(α + jkn)ρ) / √ρ',
      'leaked share = 1 − exp(−2αL),  G = D + leaked share',
      'resonant cell: (j + exp(jψ)) / 2 = sin ζ exp(jζ)',
      'modulation efficiency = |Σ Aα exp(−jφ)|² / (Σ A)² over Σ A²|α|² / Σ A²',
    ],
    meaning: 'L is the way of the wave across the outline, or from the launch to its farthest point. Taper is that of the amplitudes on the cells, |ΣA|² / (N ΣA²), and stands in the directivity, as the modulation does. Spillover and edge taper belong to horns. The constant j/2 of resonant cells sends the guided wave out at u = n − mλ/d.',
    conventions: 'Target phase φ = kns − k r·b. Rules: projection ψ = φ gives the most field in the beam; nearest ψ = arg(exp(jφ) − j/2) the least distance; phase only takes ζ = φ below 180° and is off elsewhere',
    validity: 'Even leakage, whatever the cells are tuned to; one index at every frequency; no wave back from the far end; power left in the guide is lost',
    source: 'Leaky-wave theory and the circle of a resonance, derived; checks gw-01 to gw-05',
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
