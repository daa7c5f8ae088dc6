import { radFromDeg } from '../../units/angles';
import { directionOf } from '../../waves/conventions';
import { isNumber } from '../no-figure';
import { FLOOR_DBI, type Cut } from '../pattern-cut';
import type { SiDesign } from '../si-design';
import { spilloverLevelDbi } from './spillover-direction';

/**
 * Behind a reflecting panel nothing of the panel's own field arrives in this model, but what passes its rim does: there the
 * gain is that of the horn in the directions that miss the outline. In front the horn's own field is not added.
 */
export function withRimSpillover(cut: Cut, { illumination, operation, panel }: SiDesign, gainOffsetDb: number): Cut {
  if (illumination.kind !== 'horn' || operation !== 'reflect') return cut;
  const gainDbi = cut.gainDbi.map((level, i) => {
    const direction = directionOf(radFromDeg(cut.thetaDeg[i]), radFromDeg(cut.phiDeg[i]));
    if (direction.w >= 0) return level;
    const past = spilloverLevelDbi(illumination, panel.outline, direction);
    return isNumber(past) ? Math.max(FLOOR_DBI, past) : level;
  });
  const directivityDbi = cut.directivityDbi.map((level, i) => (gainDbi[i] === cut.gainDbi[i] ? level : Math.max(FLOOR_DBI, gainDbi[i] - gainOffsetDb)));
  return { ...cut, gainDbi, directivityDbi };
}
