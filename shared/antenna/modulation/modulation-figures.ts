import type { DesignDocument } from '../../model/design-document';
import type { ModulationFigures } from '../../model/law-figures';
import { sequenceOf } from './modulated-stock';
import { harmonicAmplitude, sequencePower } from './switching-sequence';

/** Orders listed to either side of the carrier. */
const LISTED = 7;

/** How a switching sequence spreads the power over its harmonics, and which of them the other figures are of. */
export function modulationFigures(cells: Extract<DesignDocument['cells'], { kind: 'modulated' }>, shown: number): ModulationFigures {
  const sequence = sequenceOf(cells);
  const shareOf = (order: number): number => {
    const { re, im } = harmonicAmplitude(sequence, order);
    return re * re + im * im;
  };
  return {
    harmonic: shown,
    offsetMHz: shown * cells.modulationMHz,
    shownShare: shareOf(shown),
    harmonics: Array.from({ length: 2 * LISTED + 1 }, (_, i) => ({ order: i - LISTED, share: shareOf(i - LISTED) })),
    wholePower: sequencePower(sequence),
  };
}
