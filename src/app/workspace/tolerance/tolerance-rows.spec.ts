import { sampleToleranceResult } from '../../../../shared/antenna/tolerance/sample-tolerance';
import type { ToleranceResult } from '../../../../shared/model/tolerance-run';
import { envelopeFigure, intervalText, rankingBars, readMeasures, yieldRows, yieldSentence } from './tolerance-rows';

const result = sampleToleranceResult();
const sure: ToleranceResult = { ...result, trials: 20, allLines: { met: 20, of: 20, low: 0.8389, high: 1 } };

describe('the words of a tolerance run', () => {
  it('give each line of the requirement its limit, spread, yield and interval', () => {
    const [gain, , , crossPolar] = yieldRows(result);
    const share = result.lines[0].share;
    if (!('met' in share)) throw new Error('the gain is judged');
    expect(gain).toMatchObject({ name: 'Gain', limit: '≥ 29.05 dBi', share: `${share.met} of 20`, interval: intervalText(share), reason: null });
    expect(gain.p5 < gain.p50 && gain.p50 < gain.p95).toBe(true);
    expect(crossPolar).toMatchObject({ word: 'open', share: '–', reason: 'the trials are computed by the scalar model, which does not hold this line' });
  });

  it('do not take all of a few trials for certainty', () => {
    expect(yieldSentence(sure)).toBe('20 of 20 panels meet every line judged, 100.0 %; 95 % interval 83.9 to 100.0 %. 20 of 20 does not prove 100 %: the true share may be as low as 83.9 %.');
    expect(yieldSentence(result)).not.toContain('does not prove');
    expect(yieldSentence({ ...result, allLines: null, lines: [] })).toBe('The requirement has no limit, so nothing is judged.');
  });

  it('call a yield high or low only where its whole interval is', () => {
    const word = (low: number, high: number): string => yieldRows({ ...result, lines: [{ ...result.lines[0], share: { met: 1, of: 2, low, high } }] })[0].word;
    expect([word(0.91, 0.99), word(0.8, 0.95), word(0.2, 0.6)]).toEqual(['high', 'between', 'low']);
  });

  it('rank contributors by what they do to the measure chosen, those that do not act last', () => {
    expect(rankingBars(result, 'gainDbi').map(({ name }) => name)).toEqual(['Phase scatter, cell by cell', 'Panel bowed', 'Etch, cell by cell']);
    expect(rankingBars(result, 'sidelobeDb')[0].name).toBe('Panel bowed');
    expect(rankingBars(result, 'gainDbi')[2]).toEqual({ name: 'Etch, cell by cell', value: null, text: 'only the cells of an edition have a geometry' });
  });

  it('offer only measures that were read', () => {
    expect(readMeasures(result.spreads)).toEqual(['gainDbi', 'sidelobeDb', 'pointingDeg']);
  });

  it('draw the cut as drawn first, with the limit of the gain', () => {
    const figure = envelopeFigure(result.cuts[0], 29.05);
    expect(figure.lines.map(({ label }) => label)).toEqual(['as drawn', '5 of 100 stay below', 'half stay below', '95 of 100 stay below']);
    expect(figure.levels).toEqual([{ at: 29.05, label: 'least 29.1 dBi' }]);
    expect(figure.y.to - figure.y.from).toBe(60);
  });
});
