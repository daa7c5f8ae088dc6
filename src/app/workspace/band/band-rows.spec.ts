import { bandTable, bandwidthRows, extremeRows, lineRows, pointRows } from './band-rows';
import { SAMPLE_BAND } from './sample-band';

describe('rows of a band', () => {
  it('name the frequency of the worst case of each line', () => {
    expect(lineRows(SAMPLE_BAND)).toEqual([
      { line: 'gain', name: 'Gain', limit: '≥ 29.00 dBi', value: '28.20', margin: '\u22120.80', at: '29.000', word: 'falls-short', reason: null },
      { line: 'cross-polar', name: 'Cross-polar discrimination', limit: '≥ 25.00 dB', value: '–', margin: '–', at: '27.000', word: 'not-evaluated', reason: 'no cross-polar field' },
    ]);
  });

  it('tell a discrimination that is rounding alone as a bound', () => {
    const line = { ...SAMPLE_BAND.lines[1], value: 200, margin: 175 };
    expect(lineRows({ ...SAMPLE_BAND, lines: [line, { ...line, value: 30, margin: 5 }] }).map(({ value, margin }) => [value, margin])).toEqual([['> 100.00', '> +75.00'], ['30.00', '+5.00']]);
  });

  it('say what is not reached and how wide the band is at least', () => {
    expect(bandwidthRows(SAMPLE_BAND)).toEqual([
      { name: '1\u00a0dB', from: '27.333', to: '28.435', width: '1.102 (3.9 %)', reason: null },
      { name: '3\u00a0dB', from: 'not reached', to: 'not reached', width: '> 2.000', reason: 'not reached within the band: the gain falls that far on neither side' },
    ]);
  });

  it('give an extreme with its frequency, or the reason why there is none', () => {
    expect(extremeRows(SAMPLE_BAND)[2]).toEqual({ name: 'Largest pointing error, °', value: '0.600', at: '27.000' });
    expect(extremeRows(SAMPLE_BAND)[3]).toEqual({ name: 'Highest sidelobe, dB', value: 'no lobe besides the beam', at: '–' });
  });

  it('give every point with its full values to a file, and an empty place where there is none', () => {
    const { columns } = bandTable({ ...SAMPLE_BAND, points: SAMPLE_BAND.points.map((point) => ({ ...point, sidelobeDb: { kind: 'none', reason: 'none' } })) });
    expect(columns.find(({ head }) => head === 'gain in the wanted direction, dBi')?.values).toEqual([29, 30.5, 28.2]);
    expect(columns.find(({ head }) => head === 'highest sidelobe, dB')?.values).toEqual(['', '', '']);
    expect(columns.at(-1)?.values).toEqual(['yes', 'yes', 'no']);
  });

  it('mark frequencies beyond the data of the cells', () => {
    expect(pointRows(SAMPLE_BAND).map(({ frequency, covered }) => [frequency, covered])).toEqual([['27.000', true], ['28.000', true], ['29.000', false]]);
    expect(pointRows(SAMPLE_BAND)[2].cells.slice(0, 3)).toEqual(['28.20', '28.60', '\u22120.550']);
  });
});
