import { TestBed } from '@angular/core/testing';
import { PlotTools } from './plot-tools';
import type { ExportablePlot } from './plot-export';

const heading = { title: 'Cut', subject: 'Panel A', state: 'Revision 4', hash: 'debfe0abb702', date: '2026-12-01' };

describe('PlotTools', () => {
  const saved: { name: string; content: Blob }[] = [];
  let clicked: jest.SpyInstance;

  beforeEach(() => {
    saved.length = 0;
    let last: Blob | undefined;
    URL.createObjectURL = (content: Blob | MediaSource) => {
      last = content as Blob;
      return 'blob:test';
    };
    URL.revokeObjectURL = () => undefined;
    clicked = jest.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(function (this: HTMLAnchorElement) {
      if (last) saved.push({ name: this.download, content: last });
    });
  });
  afterEach(() => clicked.mockRestore());

  async function shown(plot: ExportablePlot): Promise<{ press(label: string): Promise<void>; text(): string }> {
    const fixture = TestBed.createComponent(PlotTools);
    fixture.componentRef.setInput('plot', plot);
    fixture.componentRef.setInput('heading', heading);
    await fixture.whenStable();
    const element = fixture.nativeElement as HTMLElement;
    return {
      press: async (label) => {
        element.querySelector<HTMLButtonElement>(`button[aria-label="${label}"]`)?.click();
        await fixture.whenStable();
        await new Promise((done) => setTimeout(done));
        fixture.detectChanges();
      },
      text: () => element.textContent ?? '',
    };
  }

  const plot: ExportablePlot = {
    exportPicture: async () => ({ width: 10, height: 10, markup: '<path d="M0 0"/>' }),
    exportTable: () => ({ columns: [{ head: 'gain, dBi', values: [34.76] }] }),
  };

  it('saves the data shown as CSV and the picture as SVG, named by title and revision', async () => {
    const { press, text } = await shown(plot);
    await press('Save Cut as CSV');
    await press('Save Cut as SVG');
    expect(saved.map(({ name, content }) => [name, content.type])).toEqual([
      ['cut-revision-4-debfe0ab.csv', 'text/csv;charset=utf-8'],
      ['cut-revision-4-debfe0ab.svg', 'image/svg+xml'],
    ]);
    expect(text()).toContain('SVG saved');
  });

  it('says why a plot could not be saved', async () => {
    const { press, text } = await shown({ ...plot, exportPicture: () => Promise.reject(new Error('the plot is not drawn yet')) });
    await press('Save Cut as SVG');
    expect(text()).toContain('SVG not saved: the plot is not drawn yet');
    expect(saved).toEqual([]);
  });
});
