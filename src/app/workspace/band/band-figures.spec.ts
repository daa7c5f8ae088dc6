import { gainFigure, sidelobeFigure, squintFigure } from './band-figures';
import { SAMPLE_BAND } from './sample-band';

describe('figures of a band', () => {
  it('draw gain where it is wanted, at the peak and of the paths alone, over the least gain required', () => {
    const figure = gainFigure(SAMPLE_BAND, { limits: { minGainDbi: 29 }, chosen: 2, against: null });
    expect(figure.lines.map(({ label }) => label)).toEqual(['wanted direction', 'peak', 'spatial part alone']);
    expect(figure.levels).toEqual([{ at: 29, label: '≥ 29.0 dBi' }]);
    expect(figure.chosen).toEqual({ at: 2, label: '29.000 GHz' });
    expect([figure.y.from <= 28.2, figure.y.to >= 31.4]).toEqual([true, true]);
  });

  it('leave out a frequency without a value instead of drawing zero', () => {
    const [first, ...others] = SAMPLE_BAND.points;
    const holed = { ...SAMPLE_BAND, points: [{ ...first, sidelobeDb: { kind: 'no-sidelobe', reason: 'none' } }, ...others] };
    expect(sidelobeFigure(holed, { limits: {}, chosen: 0, against: null }).lines[0].x).toEqual([28, 29]);
    expect(sidelobeFigure(holed, { limits: {}, chosen: 0, against: null }).chosen).toBeUndefined();
  });

  it('lay another run over the first curve, by its name', () => {
    const against = { label: 'revision 2', result: SAMPLE_BAND };
    const figure = gainFigure(SAMPLE_BAND, { limits: {}, chosen: null, against });
    expect(figure.lines.at(-1)).toMatchObject({ label: 'wanted direction, revision 2', ink: 'copper', y: [29, 30.5, 28.2] });
  });

  it('draw the pointing tolerance on both sides', () => {
    expect(squintFigure(SAMPLE_BAND, { limits: { pointingToleranceDeg: 0.5 }, chosen: null, against: null }).levels?.map(({ at }) => at)).toEqual([0.5, -0.5]);
  });
});
