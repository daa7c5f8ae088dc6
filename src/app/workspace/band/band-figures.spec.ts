import { gainFigure, sidelobeFigure, squintFigure } from './band-figures';
import { SAMPLE_BAND } from './sample-band';

describe('figures of a band', () => {
  it('draw gain where it is wanted, at the peak and of the paths alone, over the least gain required', () => {
    const figure = gainFigure(SAMPLE_BAND, { minGainDbi: 29 }, 2);
    expect(figure.lines.map(({ label }) => label)).toEqual(['wanted direction', 'peak', 'spatial part alone']);
    expect(figure.levels).toEqual([{ at: 29, label: '≥ 29.0 dBi' }]);
    expect(figure.chosen).toEqual({ at: 2, label: '29.000 GHz' });
    expect([figure.y.from <= 28.2, figure.y.to >= 31.4]).toEqual([true, true]);
  });

  it('leave out a frequency without a value instead of drawing zero', () => {
    const [first, ...others] = SAMPLE_BAND.points;
    const holed = { ...SAMPLE_BAND, points: [{ ...first, sidelobeDb: { kind: 'no-sidelobe', reason: 'none' } }, ...others] };
    expect(sidelobeFigure(holed, {}, 0).lines[0].x).toEqual([28, 29]);
    expect(sidelobeFigure(holed, {}, 0).chosen).toBeUndefined();
  });

  it('draw the pointing tolerance on both sides', () => {
    expect(squintFigure(SAMPLE_BAND, { pointingToleranceDeg: 0.5 }, null).levels?.map(({ at }) => at)).toEqual([0.5, -0.5]);
  });
});
