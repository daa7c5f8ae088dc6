import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { CutPlot } from './cut-plot';
import { PlotLibrary } from './plot-library';
import { SAMPLE_CUT } from './sample-cut';

interface Drawn {
  readonly data: readonly object[];
  readonly layout: { readonly xaxis?: { readonly range?: readonly number[] } };
}

/** Stands in for the plot library, which needs a real browser; keeps what it was asked to draw. */
class RecordingLibrary {
  readonly drawn: Drawn[] = [];
  relayout: (event: Record<string, unknown>) => void = () => undefined;
  load = async () => ({
    react: async (element: HTMLElement, data: readonly object[], layout: Drawn['layout']) => {
      Object.assign(element, { on: (_: string, listener: (event: Record<string, unknown>) => void) => (this.relayout = listener) });
      this.drawn.push({ data, layout });
    },
    purge: () => undefined,
    toImage: async () => '<?xml version="1.0"?><svg><text>20</text></svg>',
  });
}

describe('CutPlot', () => {
  let fixture: ComponentFixture<CutPlot>;
  let element: HTMLElement;
  let library: RecordingLibrary;
  beforeEach(async () => {
    jest.spyOn(Element.prototype, 'getBoundingClientRect').mockReturnValue({ width: 528, left: 0, top: 0 } as DOMRect);
    library = new RecordingLibrary();
    TestBed.configureTestingModule({ providers: [{ provide: PlotLibrary, useValue: library }] });
    fixture = TestBed.createComponent(CutPlot);
    fixture.componentRef.setInput('figure', SAMPLE_CUT);
    await fixture.whenStable();
    await fixture.whenStable();
    element = fixture.nativeElement as HTMLElement;
  });
  afterEach(() => jest.restoreAllMocks());

  const press = async (key: string, more: KeyboardEventInit = {}): Promise<void> => {
    element.querySelector('.stage')?.dispatchEvent(new KeyboardEvent('keydown', { key, cancelable: true, ...more }));
    await fixture.whenStable();
  };
  const readOut = (): string => element.querySelector('.read-out')?.textContent ?? '';
  const range = (): readonly number[] | undefined => library.drawn[library.drawn.length - 1].layout.xaxis?.range;

  it('draws the whole cut once the library is there', () => {
    expect(range()).toEqual([-90, 90]);
  });
  it('walks from the peak by samples and reads them in full, without calling them interpolated', async () => {
    await press('ArrowRight');
    const angle = SAMPLE_CUT.main.angleDeg[551];
    expect(readOut()).toContain(`${angle}°: ${SAMPLE_CUT.main.levelDb[551]} dBi; revision 3 `);
    expect(readOut()).not.toContain('interpolated');
  });
  it('says when a value lies between samples', async () => {
    fixture.componentInstance.cursorDeg.set(20.05);
    await fixture.whenStable();
    expect(readOut()).toMatch(/^20\.05°: .* dBi; revision 3 .*; interpolated$/);
  });
  it('zooms about the cursor by keys and shows all again by 0', async () => {
    fixture.componentInstance.cursorDeg.set(20);
    await press('+');
    expect(range()?.[0]).toBeCloseTo(-48.75, 6);
    await press('0');
    expect(range()).toEqual([-90, 90]);
  });
  it('takes over the box that was drawn in the plot', async () => {
    library.relayout({ 'xaxis.range[0]': 10, 'xaxis.range[1]': 30 });
    await fixture.whenStable();
    expect(fixture.componentInstance.window()).toMatchObject({ fromDeg: 10, toDeg: 30, floorDb: -20, topDb: 40 });
    element.querySelector<HTMLButtonElement>('button[aria-label="Move the window right"]')?.click();
    await fixture.whenStable();
    expect(range()).toEqual([15, 35]);
  });
  it('asks for a marker at the cursor', async () => {
    const wanted: number[] = [];
    fixture.componentInstance.marked.subscribe((angle) => wanted.push(angle));
    await press('Enter');
    fixture.componentInstance.cursorDeg.set(14.9);
    await press('Enter');
    expect(wanted).toEqual([14.9]);
  });
  it('hands out the very samples it draws, and a picture with text', async () => {
    expect(fixture.componentInstance.exportTable().columns[1].values).toBe(SAMPLE_CUT.main.levelDb);
    expect((await fixture.componentInstance.exportPicture()).markup).toBe('<svg><text>20</text></svg>');
  });
});

it('says when the plot library cannot be fetched', async () => {
  TestBed.configureTestingModule({ providers: [{ provide: PlotLibrary, useValue: { load: () => Promise.reject(new Error('offline')) } }] });
  const fixture = TestBed.createComponent(CutPlot);
  fixture.componentRef.setInput('figure', SAMPLE_CUT);
  await fixture.whenStable();
  await fixture.whenStable();
  expect((fixture.nativeElement as HTMLElement).querySelector('[role=alert]')?.textContent).toContain('could not be fetched: offline');
});
