import type { BandPoint, GainBandwidth } from '../../model/band-run';
import type { Figure } from '../../model/figures';
import { isNumber, noFigure } from '../no-figure';

interface Sample {
  readonly frequencyGHz: number;
  readonly gainDbi: number;
}

/**
 * The band around the highest gain at the wanted direction within which that gain has fallen by no more than `dropDb`.
 * The edges are interpolated linearly in dB between the frequencies computed. An edge that the computed band does not
 * reach has no number: nothing is known beyond it.
 */
export function gainBandwidth(points: readonly BandPoint[], dropDb: number, designFrequencyGHz: number): GainBandwidth {
  const missing = points.find((point) => !isNumber(point.gainAtBeamDbi));
  if (missing !== undefined) {
    const reason = isNumber(missing.gainAtBeamDbi) ? '' : missing.gainAtBeamDbi.reason;
    const none = noFigure('no-gain', `there is no gain at ${missing.frequencyGHz} GHz: ${reason}`);
    return { dropDb, lowerGHz: none, upperGHz: none, widthGHz: none, widthPercent: none };
  }
  const samples = points.map(({ frequencyGHz, gainAtBeamDbi }): Sample => ({ frequencyGHz, gainDbi: isNumber(gainAtBeamDbi) ? gainAtBeamDbi : -Infinity }));
  const top = samples.reduce((best, sample, i) => (sample.gainDbi > samples[best].gainDbi ? i : best), 0);
  const limitDbi = samples[top].gainDbi - dropDb;
  const lowerGHz = crossing(samples.slice(0, top + 1).reverse(), limitDbi, dropDb);
  const upperGHz = crossing(samples.slice(top), limitDbi, dropDb);
  const widthGHz = widthOf(lowerGHz, upperGHz);
  return { dropDb, lowerGHz, upperGHz, widthGHz, widthPercent: isNumber(widthGHz) ? (100 * widthGHz) / designFrequencyGHz : widthGHz };
}

/** Where the gain, followed from its highest value outwards, first falls below the limit. */
function crossing(outwards: readonly Sample[], limitDbi: number, dropDb: number): Figure {
  for (let i = 1; i < outwards.length; i++) {
    const [inside, outside] = [outwards[i - 1], outwards[i]];
    if (outside.gainDbi >= limitDbi) continue;
    const share = (inside.gainDbi - limitDbi) / (inside.gainDbi - outside.gainDbi);
    return inside.frequencyGHz + share * (outside.frequencyGHz - inside.frequencyGHz);
  }
  const edge = outwards[outwards.length - 1].frequencyGHz;
  return { ...noFigure('not-reached', `the gain has not fallen by ${dropDb} dB at ${edge} GHz, where the computed band ends`), edgeGHz: edge };
}

function widthOf(lowerGHz: Figure, upperGHz: Figure): Figure {
  if (isNumber(lowerGHz) && isNumber(upperGHz)) return upperGHz - lowerGHz;
  const from = isNumber(lowerGHz) ? lowerGHz : Number(lowerGHz['edgeGHz']);
  const to = isNumber(upperGHz) ? upperGHz : Number(upperGHz['edgeGHz']);
  const open = [lowerGHz, upperGHz].filter((edge) => !isNumber(edge)).length === 2 ? 'on neither side' : `only on the ${isNumber(lowerGHz) ? 'lower' : 'upper'} side`;
  return { ...noFigure('not-reached', `not reached within the band: the gain falls that far ${open}`), atLeastGHz: to - from };
}
