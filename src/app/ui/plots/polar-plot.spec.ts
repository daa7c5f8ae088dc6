import { TestBed } from '@angular/core/testing';
import type { CutFigure } from './cut-figure';
import { PolarPlot } from './polar-plot';

const figure: CutFigure = {
  title: 'cut along the beam', angleTitle: 'θ, °', levelTitle: 'gain, dBi',
  main: { label: 'draft', angleDeg: [-90, 0, 20, 90], levelDb: [-20, 10, 34, -10] },
  overlay: { label: 'revision 3', angleDeg: [-90, 90], levelDb: [-20, 0] },
  forbidden: [{ angleDeg: [24, 90], levelDb: [18, -2] }], forbiddenLabel: 'forbidden by the mask', least: null,
  marks: [{ name: '1', angleDeg: 20, levelDb: 34 }],
  fromDeg: -90, toDeg: 90, floorDb: -20, topDb: 40,
};

async function shown(width: number, height: number): Promise<{ element: HTMLElement; plot: PolarPlot }> {
  jest.spyOn(HTMLElement.prototype, 'getBoundingClientRect').mockReturnValue({ width } as DOMRect);
  const fixture = TestBed.createComponent(PolarPlot);
  fixture.componentRef.setInput('figure', figure);
  fixture.componentRef.setInput('height', height);
  await fixture.whenStable();
  return { element: fixture.nativeElement as HTMLElement, plot: fixture.componentInstance };
}

describe('PolarPlot', () => {
  afterEach(() => jest.restoreAllMocks());

  it('shows trace, overlay and mask, and names angles inside the half disc', async () => {
    const { element } = await shown(236, 150);
    expect(['.main', '.overlay', '.edge'].map((part) => element.querySelectorAll(part).length)).toEqual([1, 1, 1]);
    expect(element.textContent).toContain('gain, dBi against θ, °');
    expect(element.querySelectorAll('.balloon')).toHaveLength(0);
  });
  it('has room for balloons in its full width', async () => {
    const { element } = await shown(800, 460);
    expect(element.querySelector('.balloon-text')?.textContent).toBe('1');
  });
  it('hands out the samples of both traces', async () => {
    const { plot } = await shown(236, 150);
    expect(plot.exportTable().columns.map(({ head }) => head)).toEqual(['θ, °', 'gain, dBi (draft)', 'θ, ° (revision 3)', 'gain, dBi (revision 3)']);
  });
});
