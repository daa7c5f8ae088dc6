import { designMask } from '../../../../shared/antenna/masks/design-mask';
import { patternCutFigure } from './pattern-cut-figure';
import type { CutFigureSource } from './pattern-cut-figure';
import { MASKED_DESIGN, sampleCut } from './sample-pattern';

const cut = sampleCut();
const source: CutFigureSource = {
  title: 'Cut along the beam', cut, showCross: true, design: MASKED_DESIGN, peakDbi: 28, form: 'absolute', depthDb: 50,
  parent: { label: 'revision 3, beam at 19.5°', cut, peakDbi: 27 }, mask: designMask(MASKED_DESIGN, { frequencyGHz: 28, gainDbi: 28 }), marks: [{ name: '1', angleDeg: 20, levelDb: 28 }],
};

describe('figure of a cut', () => {
  it('is absolute in dBi with room above the peak and down to the floor', () => {
    const figure = patternCutFigure(source);
    expect([figure.topDb, figure.floorDb, figure.levelTitle]).toEqual([40, -30, 'gain, dBi']);
    expect(figure.main.levelDb).toBe(cut.gainDbi);
    expect(figure.least).toMatchObject({ levelDb: 25, label: 'least gain, 25.0 dBi' });
  });
  it('is relative with trace, mask, least gain and markers moved by one and the same peak', () => {
    const figure = patternCutFigure({ ...source, form: 'relative' });
    expect([figure.topDb, figure.floorDb]).toEqual([10, -50]);
    expect(figure.main.levelDb[500]).toBeCloseTo(cut.gainDbi[500] - 28, 9);
    expect([figure.least?.levelDb, figure.marks[0].levelDb]).toEqual([-3, 0]);
    expect(figure.forbidden[1].levelDb[0]).toBeCloseTo(18 - 28, 0);
  });
  it('takes the parent against its own peak when relative', () => {
    const { overlay } = patternCutFigure({ ...source, form: 'relative' });
    expect(overlay?.levelDb[500]).toBeCloseTo(cut.gainDbi[500] - 27, 9);
  });
  it('draws the cross-polar field on the scale of the co-polar one, where there is one and it is wanted', () => {
    const crossGainDbi = Float64Array.from(cut.gainDbi, (level) => level - 20);
    const both = { ...source, cut: { ...cut, crossGainDbi }, form: 'relative' as const };
    expect(patternCutFigure(both).cross?.levelDb[500]).toBeCloseTo(cut.gainDbi[500] - 48, 9);
    expect(patternCutFigure(both).main.label).toBe('draft, co-polar');
    expect(patternCutFigure({ ...both, showCross: false }).cross).toBeUndefined();
    expect([patternCutFigure(source).cross, patternCutFigure(source).main.label]).toEqual([undefined, 'draft']);
  });
  it('shows no mask when it is switched off', () => {
    expect(patternCutFigure({ ...source, mask: null }).forbidden).toEqual([]);
  });
});
