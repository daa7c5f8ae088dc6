import { movedCut, wholeCut, windowOfRelayout, zoomedCut } from './cut-window';
import { SAMPLE_CUT } from './sample-cut';

const whole = wholeCut(SAMPLE_CUT);

describe('window of a cut', () => {
  it('keeps the angle under the pointer while zooming', () => {
    const zoomed = zoomedCut(SAMPLE_CUT, whole, 20, 2);
    expect(zoomed?.fromDeg).toBeCloseTo(-35, 9);
    expect(zoomed?.toDeg).toBeCloseTo(55, 9);
    expect(zoomed && (20 - zoomed.fromDeg) / 90).toBeCloseTo((20 + 90) / 180, 9);
  });
  it('is the whole cut again when zoomed out, and never narrower than half a degree', () => {
    expect(zoomedCut(SAMPLE_CUT, whole, 20, 0.5)).toBeNull();
    const narrow = zoomedCut(SAMPLE_CUT, whole, 20, 1e6);
    expect(narrow && narrow.toDeg - narrow.fromDeg).toBeCloseTo(0.5, 9);
  });
  it('cannot be moved past the ends of the cut', () => {
    const part = { ...whole, fromDeg: 0, toDeg: 60 };
    expect(movedCut(SAMPLE_CUT, part, 0.25)).toMatchObject({ fromDeg: 15, toDeg: 75 });
    expect(movedCut(SAMPLE_CUT, part, 2)).toMatchObject({ fromDeg: 30, toDeg: 90 });
  });
  it('takes what a drawn box says and ignores other messages', () => {
    expect(windowOfRelayout({ 'xaxis.range[0]': 10, 'xaxis.range[1]': 30, 'yaxis.range[0]': 0, 'yaxis.range[1]': 40 }, whole)).toEqual({ fromDeg: 10, toDeg: 30, floorDb: 0, topDb: 40 });
    expect(windowOfRelayout({ 'xaxis.autorange': true }, whole)).toBeNull();
    expect(windowOfRelayout({ dragmode: 'pan' }, whole)).toBeUndefined();
  });
});
