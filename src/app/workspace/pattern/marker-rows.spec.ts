import { designMask } from '../../../../shared/antenna/masks/design-mask';
import { cutMarkers } from './cut-markers';
import { deltaText, markerRows, markersOf } from './marker-rows';
import { MASKED_DESIGN, sampleCut } from './sample-pattern';

const cut = sampleCut();
const found = cutMarkers({ label: '', angleDeg: cut.angleDeg, levelDb: cut.gainDbi }, cut.beamDeg);
if (!found) throw new Error('the sample has no markers');
const mask = designMask(MASKED_DESIGN, { frequencyGHz: 28, gainDbi: 28 });
const markers = markersOf({ cut, found, design: MASKED_DESIGN, mask, ownDeg: [-40.05, 12] });

describe('markers', () => {
  it('are numbered from the peak on, with one\'s own last', () => {
    expect(markers.map(({ name, what }) => `${name} ${what}`)).toEqual([
      '1 peak', '2 half power', '3 half power', '4 sidelobe', '5 sidelobe', '6 least margin', '7 first null', '8 first null', '9 set by you', '10 set by you',
    ]);
  });
  it('measure the peak against the least gain and sidelobes against the mask', () => {
    expect(markers[0].marginDb).toBeCloseTo(found.peak.levelDb - 25, 9);
    expect(markers[5].marginDb).toBeLessThanOrEqual(Math.min(...markers.slice(3, 5).map(({ marginDb }) => marginDb ?? Infinity)) + 1e-9);
  });
  it('are relative to the peak in the table', () => {
    const rows = markerRows(markers);
    expect([rows[0].relative, rows[1].relative]).toEqual(['0.00', '\u22123.01']);
    expect(rows[1]).toMatchObject({ margin: '–', kept: null });
    expect(rows[0].kept).toBe(markers[0].levelDbi >= 25);
  });
  it('tell the step between the last two that were set', () => {
    expect(deltaText(markers)).toMatch(/^Δ 9 → 10: \+52\.05°, [+\u2212]\d+\.\d\d dB$/);
    expect(deltaText(markers.slice(0, 9))).toBeNull();
  });
  it('leave out what lies outside the cut', () => {
    expect(markersOf({ cut, found, design: MASKED_DESIGN, mask, ownDeg: [120] }).some(({ own }) => own)).toBe(false);
  });
});
