import type { BandPoint, BandResult } from '../../../../shared/model/band-run';

const NOT_REACHED = { kind: 'not-reached', reason: 'not reached within the band: the gain falls that far on neither side', edgeGHz: 27, atLeastGHz: 2 };

const point = (frequencyGHz: number, gainDbi: number, squintDeg: number): BandPoint => ({
  frequencyGHz,
  gainAtBeamDbi: gainDbi,
  gainDbi: gainDbi + 0.4,
  directivityAtBeamDbi: gainDbi + 1,
  pointingErrorDeg: Math.abs(squintDeg),
  squintAlongDeg: squintDeg,
  squintAcrossDeg: 0,
  sidelobeDb: -18,
  beamwidthAlongDeg: 3.4,
  beamwidthAcrossDeg: 3.1,
  cellLossDb: -0.3,
  phaseErrorRmsDeg: 21,
  verdicts: [],
  covered: frequencyGHz < 29,
  spatial: { gainAtBeamDbi: gainDbi + 0.8, gainDbi: gainDbi + 0.9, pointingErrorDeg: 0.1 },
});

/** A band of an invented panel, for specs: 27 to 29 GHz, gain 29, 30.5, 28.2 dBi. */
export const SAMPLE_BAND: BandResult = {
  bandGHz: [27, 29],
  designFrequencyGHz: 28,
  points: [point(27, 29, 0.6), point(28, 30.5, 0.01), point(29, 28.2, -0.55)],
  bandwidths: [
    { dropDb: 1, lowerGHz: 27.333, upperGHz: 28.435, widthGHz: 1.102, widthPercent: 3.94 },
    { dropDb: 3, lowerGHz: NOT_REACHED, upperGHz: NOT_REACHED, widthGHz: NOT_REACHED, widthPercent: NOT_REACHED },
  ],
  lines: [
    { line: 'gain', sense: 'at-least', limit: 29, unit: 'dBi', value: 28.2, margin: -0.8, verdict: 'falls-short', frequencyGHz: 29 },
    { line: 'cross-polar', sense: 'at-least', limit: 25, unit: 'dB', value: { kind: 'scalar-model', reason: 'no cross-polar field' }, margin: { kind: 'scalar-model', reason: 'no cross-polar field' }, verdict: 'not-evaluated', reason: 'no cross-polar field', frequencyGHz: 27 },
  ],
  extremes: {
    highestGainAtBeamDbi: { value: 30.5, frequencyGHz: 28 },
    lowestGainAtBeamDbi: { value: 28.2, frequencyGHz: 29 },
    largestPointingErrorDeg: { value: 0.6, frequencyGHz: 27 },
    highestSidelobeDb: { kind: 'no-sidelobe', reason: 'no lobe besides the beam' },
  },
};
