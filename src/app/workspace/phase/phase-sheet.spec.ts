import { PlotLibrary } from '../../ui/plots/plot-library';
import { sheetRig } from '../fields/sheet-rig';
import { PhaseSheet } from './phase-sheet';
import { SAMPLE_DESIGN, SAMPLE_EDITION, SAMPLE_PHASE } from './sample-phase';
import { worstCells } from './worst-cells';

async function shown() {
  jest.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null);
  jest.spyOn(HTMLElement.prototype, 'getBoundingClientRect').mockReturnValue({ width: 598, height: 560, left: 0, top: 0 } as DOMRect);
  const rig = await sheetRig(PhaseSheet, SAMPLE_DESIGN, [{ provide: PlotLibrary, useValue: {} }]);
  rig.workspace.edition.set(SAMPLE_EDITION);
  rig.workspace.prediction.set({ ...SAMPLE_PHASE, of: rig.workspace.design() });
  await rig.fixture.whenStable();
  const fact = (name: string): string | undefined => [...rig.element.querySelectorAll('dt')].find((dt) => dt.textContent === name)?.nextElementSibling?.textContent ?? undefined;
  return { ...rig, fact };
}

describe('PhaseSheet', () => {
  afterEach(() => jest.restoreAllMocks());

  it('says what will stand here while nothing is predicted', async () => {
    jest.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null);
    const { text } = await sheetRig(PhaseSheet, SAMPLE_DESIGN);
    expect(text()).toContain('No prediction yet');
  });

  it('starts at the worst cell and names panel, edition and rule', async () => {
    const { fact, header } = await shown();
    const [worst] = worstCells(SAMPLE_PHASE, 1);
    expect(fact('Position')).toBe(`col ${SAMPLE_PHASE.cells.column[worst] + 1}, row ${SAMPLE_PHASE.cells.row[worst] + 1}`);
    expect(header.head()).toMatchObject({ number: 5, title: 'Phase', subtitle: '400 cells, edition 3 of invented-15, nearest phase', scale: expect.stringMatching(/^1 : |: 1$/) });
  });

  it('shows another cell everywhere once it is chosen from the list', async () => {
    const { element, fixture, fact } = await shown();
    const row = element.querySelectorAll<HTMLButtonElement>('.place button')[2];
    const place = row.textContent;
    row.click();
    await fixture.whenStable();
    expect(fact('Position')).toBe(`col ${place?.split(', ')[0]}, row ${place?.split(', ')[1]}`);
    expect(element.querySelector('tr.chosen .place')?.textContent?.trim()).toBe(place);
    expect(element.querySelector('.read-out')?.textContent).toContain(`col ${place?.split(', ')[0]}, row ${place?.split(', ')[1]}:`);
  });

  it('colours by another view and keeps the histogram of the error', async () => {
    const { press, text } = await shown();
    await press('Phase error');
    expect(text()).toContain('Phase error, ° (achieved minus target)');
    await press('What changed');
    expect(text()).toContain('There is no revision yet to compare with');
    expect(text()).toContain('RMS ±');
  });

  it('gives the statistics of a selection made by keys', async () => {
    const { element, fixture, fact, press } = await shown();
    const stage = element.querySelector('.stage') as HTMLElement;
    for (let i = 0; i < 3; i++) {
      stage.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowLeft', shiftKey: true, cancelable: true }));
      stage.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowDown', shiftKey: true, cancelable: true }));
      await fixture.whenStable();
    }
    expect(fact('Count')).toMatch(/^\d+ of 400 cells$/);
    await press('Clear');
    expect(fact('Count')).toBeUndefined();
  });

  it('leads from a sample of the library curve to a cell that uses it', async () => {
    const { element, fixture, fact } = await shown();
    const smallest = Math.min(...SAMPLE_PHASE.cells.cellIndex);
    const curve = element.querySelector('slant-line-plot .plot');
    for (const key of ['Home', ...new Array<string>(smallest).fill('ArrowRight')]) {
      curve?.dispatchEvent(new KeyboardEvent('keydown', { key, cancelable: true }));
      await fixture.whenStable();
    }
    expect(fact('Cell')).toBe(`${SAMPLE_EDITION.cells[smallest].parametersMm[0].toFixed(2)} mm`);
  });
});
