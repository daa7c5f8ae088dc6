import { PUBLISHED_MASKS } from '../../../../shared/antenna/masks/published-masks';
import type { Requirement } from '../../../../shared/model/design-document';
import type { Figures } from '../../../../shared/model/figures';
import type { Mask } from '../../../../shared/model/mask';
import type { MaskFindings } from '../../../../shared/model/mask-figures';
import type { ChoiceOption } from '../fields/choice-row';
import { figureText } from '../strip-figures';
import type { RequirementFigure } from './requirement-how';

/** What a mask of the requirement is held against. */
export type MaskUse = 'gain' | 'cross-polar' | 'density';

interface MaskVerdict {
  readonly margin: Figures['maskMargin'];
  readonly findings: MaskFindings | string;
}

interface MaskOfUse {
  readonly pointer: string;
  readonly title: string;
  readonly name: string;
  readonly unit: string;
  readonly kinds: readonly ChoiceOption[];
  readonly whenNone: string;
  /** The note on its margin; the mask of the gain has its own behind the figure of the strip. */
  readonly how: RequirementFigure | null;
  /** What the traces show. */
  readonly traced: string;
  /** What the predicted gain is raised by to be drawn against it; null where gain is not what is held against it. */
  shiftDb(figures: Figures): number | null;
  verdict(figures: Figures): MaskVerdict | null;
}

const ANY_LEVEL: readonly ChoiceOption[] = [
  { value: 'none', label: 'None' },
  { value: 'custom', label: 'Points' },
  { value: 'formula', label: 'Formula' },
];
const WITH_PUBLISHED: readonly ChoiceOption[] = [...ANY_LEVEL, { value: 'published', label: 'Published' }];

export const MASK_USES: Readonly<Record<MaskUse, MaskOfUse>> = {
  gain: {
    pointer: '/requirement/mask',
    title: 'Sidelobe mask',
    name: 'mask',
    unit: 'dBi',
    kinds: WITH_PUBLISHED,
    whenNone: 'No mask is set. A mask is the highest level allowed at each angle off the beam: points joined by straight lines, a formula, or a published envelope.',
    how: null,
    traced: 'the predicted gain',
    shiftDb: () => 0,
    verdict: ({ maskMargin, maskFindings }) => ({ margin: maskMargin, findings: maskFindings ?? 'Not evaluated.' }),
  },
  'cross-polar': {
    pointer: '/requirement/crossPolarMask',
    title: 'Cross-polar mask',
    name: 'cross-polar mask',
    unit: 'dBi',
    kinds: WITH_PUBLISHED,
    whenNone: 'No cross-polar mask is set. It is held against the cross-polar gain of the vector model; the scalar model has none, and then it is not evaluated.',
    how: 'cross-polar-mask',
    traced: '',
    shiftDb: () => null,
    verdict: ({ crossPolarMaskMargin }) => (crossPolarMaskMargin ? { margin: crossPolarMaskMargin, findings: marginSentence(crossPolarMaskMargin) } : null),
  },
  density: {
    pointer: '/requirement/transmitter/densityMask',
    title: 'EIRP density mask',
    name: 'EIRP density mask',
    unit: 'dBW',
    kinds: ANY_LEVEL,
    whenNone: 'No limit of EIRP density is set. It is dBW in the reference bandwidth at each angle off the beam.',
    how: 'eirp-density',
    traced: 'the predicted EIRP density',
    shiftDb: ({ eirpDensityDbw, gainDbi }) => (typeof eirpDensityDbw === 'number' && typeof gainDbi === 'number' ? eirpDensityDbw - gainDbi : null),
    verdict: ({ eirpDensityMargin }) => (eirpDensityMargin ? { margin: eirpDensityMargin, findings: marginSentence(eirpDensityMargin) } : null),
  },
};

function marginSentence(margin: NonNullable<Figures['crossPolarMaskMargin']>): string {
  if ('reason' in margin) return `Not evaluated: ${margin.reason}.`;
  return `Least margin ${figureText(Number(margin.marginDb), 2)} dB, towards θ ${figureText(Number(margin.thetaDeg), 1)}°, φ ${figureText(Number(margin.phiDeg), 1)}°, over the hemisphere in front of the panel.`;
}

/** The published envelopes by their short names. */
export const PUBLISHED_CHOICES = PUBLISHED_MASKS.map(({ id, title }) => ({ value: id, label: title.replace(/^(?:ITU-R|47 CFR) /, '') }));

const FALLEN_BACK_GAIN_DBI = 30;
/** How far below the co-polar levels a first cross-polar mask lies. */
const FIRST_CROSS_BELOW_DB = 15;

/** What stands first under a kind that was chosen; undefined for none. */
export function firstMask(kind: string, use: MaskUse, { minGainDbi, transmitter }: Requirement): Mask | undefined {
  const shift = use === 'density' ? densityShiftDb(transmitter) : use === 'cross-polar' ? -FIRST_CROSS_BELOW_DB : 0;
  const peak = (minGainDbi ?? FALLEN_BACK_GAIN_DBI) + shift;
  switch (kind) {
    case 'custom':
      return { kind: 'custom', points: [[5, peak - 12], [30, peak - 28], [90, peak - 34]] };
    case 'formula':
      return {
        kind: 'formula',
        segments: [
          { fromDeg: 5, toDeg: 48, expression: `${32 + shift} - 25*log10(theta)` },
          { fromDeg: 48, toDeg: 180, expression: String(shift - 10) },
        ],
      };
    case 'published':
      return { kind: 'published', id: PUBLISHED_MASKS[0].id };
    default:
      return undefined;
  }
}

/** Whole decibels are near enough for a first proposal. */
function densityShiftDb(transmitter: Requirement['transmitter']): number {
  if (transmitter?.occupiedBandwidthGHz === undefined) return 0;
  const ratio = transmitter.occupiedBandwidthGHz / (transmitter.referenceBandwidthGHz ?? 4e-6);
  return Math.round(10 * Math.log10(transmitter.powerW / ratio));
}
