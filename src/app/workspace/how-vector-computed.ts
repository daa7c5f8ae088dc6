import type { HowComputed } from './how-computed';

/** Figures that only the vector model has, each with how it is computed. */
export type VectorFigureId = 'budget' | 'crossPolar';

const PLANES = 'TE and TM of the plane of incidence of each cell, i its angle; a the arriving and b = S a the leaving power waves, |a|² and |b|² power per area';
const LIMITS =
  'Each cell as in an endless lattice of its like, at its own angle of incidence; between the angles given S₁₁ and S₂₂ by polynomials in sin² θ, S₁₂ relative to the half sum of their phases, which keeps the cell passive. No edge diffraction, no field of the mount';

export const HOW_VECTOR_COMPUTED: Readonly<Record<VectorFigureId, HowComputed>> = {
  budget: {
    title: 'Gain budget',
    formula: [
      'area 4πN A cos θ₀ / λ²;  spillover ∫|E|² cos i dA / P_h;  cell loss Σ|b|² / Σ|a|²',
      'projection A Σ(|s|² + |t|²) / (cos θ₀ P_out) · P_cap / (P_h η_s)',
      'cross-polar Σ|s|² / Σ(|s|² + |t|²);  taper (Σ|s|)² / (N Σ|s|²);  phase |Σs|² / (Σ|s|)²;  cell factor C²',
      'sum = 4π |A C Σs / λ|² / P_h, the gain at the beam',
    ],
    meaning:
      'Every loss between the area and the gain in the wanted direction, once. s and t are what a cell sends there, co- and cross-polar. The taper is that of the leaving amplitudes, so it differs from the taper of the incident ones on the strip. The projection is what sampling at cell centres leaves with power waves; in the aperture form it is the power that the form gains or loses, and may be positive.',
    conventions: `${PLANES}. P_h the power of the horn in all polarisations, π [1/(2q_E + 1) + 1/(2q_H + 1)]; of a plane wave what it brings to the cells. IEEE sense of circular polarisation, Ludwig's third definition for x and y`,
    validity: `${LIMITS}. Power waves conserve energy to some hundredths of a dB; the aperture form does not at oblique angles, up to 0.7 dB for a beam at 35°.`,
    source: 'Derived: the items multiply to the gain identically. Checks k5-20-01 to k5-20-08, k5-30-01 to -03, rm2-lim-01; vector-prediction.spec.ts',
  },
  crossPolar: {
    title: 'Cross-polar discrimination',
    formula: ['XPD = 10 log (|E_co|² / |E_cross|²)', 'x: co = E_θ cos φ − E_φ sin φ;  rhcp: (E_θ + jE_φ)/√2', 'axial ratio: XPD = 20 log [(AR + 1)/(AR − 1)]'],
    meaning:
      'At the beam: in the wanted direction, and this is what the requirement is held against, in the worst of several beams. Worst: the smallest local ratio on straight rays of (u, v) from the co-polar peak out to half its power. Highest: the largest cross-polar level there, against the co-polar peak.',
    conventions: "Ludwig's third definition, its x or y along the axes of the panel; circular senses of the IEEE, outward; time exp(+jωt)",
    validity: `${LIMITS}. From 100 dB on the cross-polar field vanishes by symmetry, and 200 dB is the most that is told. Where the cells are described by one response, the level is that of the geometry alone; a remark says so.`,
    source: 'A. C. Ludwig, IEEE Trans. AP 21(1), 116–119, 1973 (from memory). Checks k5-20-01 to -04, rm2-far-01, rm2-far-02, cp-03, cp-04',
  },
};
