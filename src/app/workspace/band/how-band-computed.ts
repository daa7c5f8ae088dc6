import type { HowComputed } from '../how-computed';

/** Figures of a band run, each with how it is computed. */
export type BandFigureId = 'gain' | 'squint' | 'bandwidth' | 'worst';

const FROZEN = 'The cells are chosen at the design frequency and do not change; at another frequency each does what its data say there. Beyond the data the nearest frequency given stands in, and the table marks it';

export const HOW_BAND_COMPUTED: Readonly<Record<BandFigureId, HowComputed>> = {
  gain: {
    title: 'Gain over the band and its spatial part',
    formula: [
      'aₙ(f) = A Γₙ(f) exp(−jk(f)Rₙ(f));  gain as in a prediction, at every f',
      'spatial part: Γₙ(f) = exp(jφₙ target at f₀), lossless',
      'phase centre: position + d(f) towards the aim, d linear between the points given',
    ],
    meaning: 'Gain at the wanted direction, which stays, and at the peak, which wanders. The spatial part alone is what the paths cost a panel whose cells would keep their phases (differential spatial phase delay); what lies between is the work of the cells.',
    conventions: 'k = 2πf/c; exp(+jωt). At the rim of a disc of diameter D lit from height F: 2πS(f − f₀)/c with S = √(F² + D²/4) − F',
    validity: `${FROZEN}. Angles of incidence are those of the phase centre at its position in the design.`,
    source: 'D. M. Pozar, Electronics Letters 39(21), 1490–1491, 2003; J. Huang, J. A. Encinar, Reflectarray Antennas, 2007, ch. 3 (from memory); checks dspd-01, dspd-02, band-point.spec.ts',
  },
  squint: {
    title: 'Squint',
    formula: ['along = arctan(p·e / p·b), across = arcsin(p·n)', 'fixed gradient: u(f) = u_i + (f₀/f)(u₀ − u_i)'],
    meaning: 'How far the lobe nearest to the wanted direction b stands off it: along, in the plane that holds b and the z axis, positive away from z; across, positive towards rising φ.',
    conventions: 'p the direction of the lobe, e and n the tangents along and across at b',
    validity: 'The formula holds for a plane wave and phases that do not change with frequency; the run follows the pattern itself. At the specular angle nothing squints.',
    source: 'From k u = k u_i − ∇φ with a gradient that does not change; checks squint-01, band-point.spec.ts',
  },
  bandwidth: {
    title: 'Gain bandwidth',
    formula: ['from and to: G(f) = G max − 1 dB, or − 3 dB, on both sides of the highest gain', 'width in percent of the design frequency'],
    meaning: 'The band around the highest gain at the wanted direction within which that gain has fallen by no more. The first fall on each side counts, not a later rise.',
    conventions: 'Linear in dB between the frequencies computed',
    validity: 'Within the band computed. An edge that is not reached there has no number: nothing is known beyond.',
    source: 'Definition; check gain-bandwidth.spec.ts',
  },
  worst: {
    title: 'Worst case in the band',
    formula: ['margin of a line = min over f of its margin at f'],
    meaning: 'Each line of the requirement at the frequency where it is worst, by name. A line meets only if it was judged and met at every frequency.',
    conventions: 'Margin positive when met; one frequency at which a line cannot be judged leaves it not evaluated, unless it falls short elsewhere',
    validity: 'At the frequencies computed; between them a narrow resonance of the cells can hide. More frequencies narrow the gaps.',
    source: 'Definition; check band-point.spec.ts',
  },
};
