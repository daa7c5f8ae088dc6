import { tableText } from './table-text';

function tableOf(html: string): HTMLTableElement {
  const host = document.createElement('div');
  host.innerHTML = `<table>${html}</table>`;
  return host.firstElementChild as HTMLTableElement;
}

describe('a table as text for a spreadsheet', () => {
  it('begins with the heads and their units and keeps numbers numbers', () => {
    const text = tableText(tableOf('<thead><tr><th>Col, row</th><th>Error, °</th><th>Times used</th></tr></thead><tbody><tr><td><button>3, 12</button></td><td>\u22124.25</td><td>1\u00a0600</td></tr><tr><td>4, 12</td><td>–</td><td>0</td></tr></tbody>'));
    expect(text).toBe('Col, row\tError, °\tTimes used\n3, 12\t-4.25\t1600\n4, 12\t\t0');
    expect(text.split('\n')[1].split('\t').slice(1).map(Number)).toEqual([-4.25, 1600]);
  });

  it('leaves out columns without a head, drawings, and what is only read aloud', () => {
    const html = '<thead><tr><th>Line</th><th><span hidden>Remove</span></th><th>Limit, dBi</th></tr></thead><tbody><tr><td>Gain <svg><text>x</text></svg><span class="visually-hidden">meets</span></td><td><button>×</button></td><td><input value="34" /></td></tr></tbody>';
    expect(tableText(tableOf(html))).toBe('Line\tLimit, dBi\nGain\t34');
  });
});
