import type { BandPoint } from '../../model/band-run';
import { noFigure } from '../no-figure';
import { gainBandwidth } from './gain-bandwidth';

const point = (frequencyGHz: number, gainAtBeamDbi: BandPoint['gainAtBeamDbi']): BandPoint => ({
  frequencyGHz,
  gainAtBeamDbi,
  gainDbi: gainAtBeamDbi,
  directivityAtBeamDbi: gainAtBeamDbi,
  pointingErrorDeg: 0,
  squintAlongDeg: 0,
  squintAcrossDeg: 0,
  sidelobeDb: -20,
  beamwidthAlongDeg: 3,
  beamwidthAcrossDeg: 3,
  cellLossDb: 0,
  phaseErrorRmsDeg: 0,
  verdicts: [],
  covered: true,
});

const gains = (levels: readonly number[]): BandPoint[] => levels.map((level, i) => point(27 + i * 0.5, level));

describe('gainBandwidth', () => {
  it('interpolates both edges in dB and gives the width in GHz and in percent of the design frequency', () => {
    const found = gainBandwidth(gains([26, 28, 30, 28.5, 25]), 1, 28);
    expect(found.lowerGHz).toBeCloseTo(27.75, 12);
    expect(found.upperGHz).toBeCloseTo(28 + 0.5 * (1 / 1.5), 12);
    expect(found.widthGHz).toBeCloseTo(28 + 1 / 3 - 27.75, 12);
    expect(found.widthPercent).toBeCloseTo((100 * (1 / 3 + 0.25)) / 28, 12);
  });

  it('says that an edge is not reached, and how wide the band is at least', () => {
    const found = gainBandwidth(gains([29.5, 29.8, 30, 28]), 1, 28);
    expect(found.lowerGHz).toEqual({ kind: 'not-reached', reason: 'the gain has not fallen by 1 dB at 27 GHz, where the computed band ends', edgeGHz: 27 });
    expect(found.widthGHz).toEqual({ kind: 'not-reached', reason: 'not reached within the band: the gain falls that far only on the upper side', atLeastGHz: 1.25 });
    expect(gainBandwidth(gains([29.5, 30, 29.8]), 3, 28).widthGHz).toMatchObject({ reason: 'not reached within the band: the gain falls that far on neither side', atLeastGHz: 1 });
  });

  it('ends at the first fall, not at a later rise', () => {
    expect(gainBandwidth(gains([30, 28, 30, 28]), 1, 28)).toMatchObject({ upperGHz: 27.25 });
  });

  it('gives no number where a frequency has no gain', () => {
    const found = gainBandwidth([point(27, 30), point(28, noFigure('null', 'the pattern is zero in the wanted direction'))], 1, 28);
    expect(found.widthPercent).toEqual({ kind: 'no-gain', reason: 'there is no gain at 28 GHz: the pattern is zero in the wanted direction' });
  });
});
