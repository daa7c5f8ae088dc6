import { plotCsv, plotFileName, plotSvg } from './plot-export';
import type { PlotHeading } from './plot-export';

const heading: PlotHeading = {
  title: 'Cut along the beam, gain in dBi',
  subject: 'Merrow Point sea-rescue link, Panel A & B',
  state: 'Draft after revision 3',
  hash: 'debfe0abb702cc11',
  date: '2026-12-01',
};

describe('exported SVG', () => {
  const picture = { width: 500, height: 300, markup: '<text x="1" y="2">20 dBi</text>' };
  const document = new DOMParser().parseFromString(plotSvg(picture, heading), 'image/svg+xml');

  it('is well-formed and keeps its text selectable', () => {
    expect(document.querySelector('parsererror')).toBeNull();
    const texts = [...document.querySelectorAll('text')].map((node) => node.textContent);
    expect(texts).toEqual([heading.title, 'Merrow Point sea-rescue link, Panel A & B', 'Draft after revision 3; debfe0abb702; 2026-12-01', '20 dBi']);
  });
  it('stands on white and leaves room for the heading', () => {
    expect(document.querySelector('rect')?.getAttribute('fill')).toBe('#ffffff');
    expect(document.documentElement.getAttribute('viewBox')).toBe('0 0 524 382');
  });
});

describe('exported CSV', () => {
  it('gives title, revision, hash and date, then heads with units, then numbers without binary noise', () => {
    const table = { columns: [{ head: 'theta, °', values: [-90, 0.1 + 0.2] }, { head: 'cell', values: ['A "1"'] }, { head: 'gain, dBi', values: Float64Array.of(1.5, Number.NaN) }] };
    expect(plotCsv(table, heading).split('\r\n')).toEqual([
      '# Cut along the beam, gain in dBi',
      '# Merrow Point sea-rescue link, Panel A & B',
      '# Draft after revision 3; debfe0abb702; 2026-12-01',
      '"theta, °",cell,"gain, dBi"',
      '-90,"A ""1""",1.5',
      '0.3,,',
      '',
    ]);
  });
});

it('names files by title, state and hash in plain letters', () => {
  expect(plotFileName(heading, 'png')).toBe('cut-along-the-beam-gain-in-dbi-draft-after-revision-3-debfe0ab.png');
});
