import { exampleDesign } from '../../../../shared/antenna/example-design';
import { changeLayer, changePlaces, comparisonNotes, cutDifferenceFigure, hemisphereDifference, overlaidCut, shiftText } from './comparison-plots';
import { isCompared } from './comparison-rows';
import { SAMPLE_COMPARISON } from './sample-comparison';

const { cells, cuts: [cut] } = SAMPLE_COMPARISON;
if (!isCompared(cells)) throw new Error('the sample compares cells');
const design = exampleDesign({ requirement: { ...exampleDesign().requirement, minGainDbi: 34, mask: { kind: 'custom', points: [[5, 18], [90, -2]] } } });

describe('map of changes', () => {
  it('leaves unchanged cells bare', () => {
    const { values, title } = changeLayer(cells, 'parameter');
    expect(title).toBe('Change of ring outer side');
    expect(Array.from(values, Number.isNaN)).toEqual([false, true, false, false]);
  });
  it('keeps colour for small changes when one cell goes round the whole curve', () => {
    expect(changeLayer(cells, 'parameter').scale.to).toBeLessThan(0.5);
    expect(changeLayer(cells, 'error').scale).toMatchObject({ from: -3, to: 3 });
  });
  it('stands on the lattice of the later side', () => {
    expect(changePlaces(cells, design)).toMatchObject({ pitchXMm: 15, pitchYMm: 15 });
  });
});

describe('cuts of two sides', () => {
  const figure = overlaidCut(SAMPLE_COMPARISON, cut, design);
  it('lie over each other with the mask of the later beam', () => {
    expect([figure.main.label, figure.overlay?.label]).toEqual(['revision 4', 'revision 3']);
    expect(figure.forbidden).toHaveLength(2);
    expect(figure.forbidden[1]).toMatchObject({ angleDeg: [30, 60, 90] });
    expect(figure.least).toMatchObject({ levelDb: 34, angleDeg: 0 });
  });
  it('are subtracted with gaps below the floor and clipped where nulls moved', () => {
    const { lines: [line] } = cutDifferenceFigure(SAMPLE_COMPARISON, cut);
    expect(Array.from(line.y)).toEqual([Number.NaN, -2, 10, 0.02, -2, Number.NaN, Number.NaN]);
  });
  it('say how far the earlier one was shifted', () => {
    expect(shiftText(SAMPLE_COMPARISON, cut)).toBe('3 shifted by Δu +0.0082');
    expect(shiftText(SAMPLE_COMPARISON, { ...cut, shiftU: 0 })).toBe('angle from each beam');
    expect(shiftText(SAMPLE_COMPARISON, { ...cut, request: { phiDeg: 0, thetaDeg: [-90, 90, 30] }, shiftU: 0 })).toBe('beams coincide');
  });
  it('tell in the notes how the beams were brought together', () => {
    const rest = 'gaps where either lies below \u221215 dBi, clipped at ±10 dB.';
    const first = (request: typeof cut.request, shiftU: number): string => comparisonNotes({ ...SAMPLE_COMPARISON, cuts: [{ ...cut, request, shiftU }] })[0];
    const plane = { phiDeg: 0, thetaDeg: [-90, 90, 30] as [number, number, number] };
    expect(first(cut.request, 0)).toBe(`Difference of cuts: each side in the plane of its own beam, compared by the angle from that beam; ${rest}`);
    expect(first(plane, 0)).toBe(`Difference of cuts: both sides in one plane, direction by direction; ${rest}`);
    expect(first(plane, 0.0082)).toBe(`Difference of cuts: in the plane of both beams revision 3 is moved by Δu +0.0082 onto the other beam and resampled linearly; across, the angle from each beam is compared; ${rest}`);
  });
  it('tell in the notes how the map was moved', () => {
    const second = (shiftU: number, shiftV: number): string => comparisonNotes({ ...SAMPLE_COMPARISON, uv: { ...SAMPLE_COMPARISON.uv, shiftU, shiftV } })[1];
    expect(second(0, 0)).toBe('Over the hemisphere the directions are subtracted as they are; moved nulls show as pairs.');
    expect(second(0.25, -0.1)).toBe('Over the hemisphere revision 3 is moved by Δu +0.2500, Δv \u22120.1000 so that the first beams coincide; what has no direction on one side stays bare.');
  });
  it('differ over the hemisphere on a scale centred on zero', () => {
    const { scale, levels } = hemisphereDifference(SAMPLE_COMPARISON);
    expect([scale.from, scale.to, levels.size]).toEqual([-1, 1, 2]);
  });
});
