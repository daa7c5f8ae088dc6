import type { PanelDetail } from '../../../../shared/contracts/projects';
import { ComparisonClient } from '../../api/comparison-client';
import { RevisionClient } from '../../api/revision-client';
import { PlotLibrary } from '../../ui/plots/plot-library';
import { sheetRig } from '../fields/sheet-rig';
import { RevisionCompare } from './revision-compare';
import { SAMPLE_COMPARISON, SAMPLE_ID, sampleRevision } from './sample-comparison';

const panel = { id: SAMPLE_ID(2), name: 'Panel A', project: { name: 'Merrow Point' }, draftHash: 'd'.repeat(64), latestRevision: sampleRevision(3), draftIsRevision: false } as PanelDetail;

async function shown(answer: object = { kind: 'found', value: SAMPLE_COMPARISON }, of: PanelDetail = panel) {
  jest.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null);
  const asked: string[][] = [];
  const providers = [
    { provide: ComparisonClient, useValue: { compare: async (before: string, after: string) => (asked.push([before, after]), answer) } },
    { provide: RevisionClient, useValue: { list: async () => ({ kind: 'found', value: [3, 2, 1].map((number) => ({ ...sampleRevision(number), summary: null })) }), read: async () => ({ kind: 'unreachable' }) } },
    { provide: PlotLibrary, useValue: { load: async () => ({ react: async (element: HTMLElement) => Object.assign(element, { on: () => undefined }), purge: () => undefined }) } },
  ];
  const rig = await sheetRig(RevisionCompare, undefined, providers);
  rig.workspace.panel.set(of);
  for (let i = 0; i < 4; i++) await rig.fixture.whenStable();
  return { ...rig, asked };
}

describe('RevisionCompare', () => {
  afterEach(() => jest.restoreAllMocks());

  it('compares the latest revision with the draft when nothing is named', async () => {
    const { asked, header, text } = await shown();
    expect(asked).toEqual([[`revision:${SAMPLE_ID(103)}`, `draft:${SAMPLE_ID(2)}`]]);
    expect(header.head().subtitle).toBe('Compare revision 3 with revision 4');
    expect(text()).toContain('mask margin decides');
  });
  it('shows parameters, cells and verdicts that differ', async () => {
    const { element, text } = await shown();
    expect(text()).toContain('3 of 41');
    expect(text()).toContain('Larger ring outer side');
    const mask = [...element.querySelectorAll('tr.chosen td')].map((cell) => cell.textContent?.replace(/\s+/g, ' ').trim());
    expect(mask).toEqual(['Mask margin, dB', '\u22120.29', '0.61', '+0.90', '≥ 0', 'falls short', 'meets']);
  });
  it('swaps the sides', async () => {
    const { press, asked, fixture } = await shown();
    await press('Swap the two sides');
    await fixture.whenStable();
    expect(asked.at(-1)).toEqual([`draft:${SAMPLE_ID(2)}`, `revision:${SAMPLE_ID(103)}`]);
  });
  it('compares another revision once it is chosen', async () => {
    const { element, asked, fixture } = await shown();
    const select = element.querySelector('select') as HTMLSelectElement;
    expect([...select.options].map(({ text: label }) => label)).toEqual(['Draft', 'Revision 3: State 3', 'Revision 2: State 2', 'Revision 1: State 1']);
    select.value = `revision:${SAMPLE_ID(101)}`;
    select.dispatchEvent(new Event('change'));
    await fixture.whenStable();
    expect(asked.at(-1)?.[0]).toBe(`revision:${SAMPLE_ID(101)}`);
  });
  it('compares anew when the draft was saved', async () => {
    const { workspace, asked, fixture } = await shown();
    workspace.panel.set({ ...panel, draftHash: 'e'.repeat(64) });
    await fixture.whenStable();
    expect(asked).toHaveLength(2);
  });
  it('says why there is nothing to compare, and why a comparison failed', async () => {
    expect((await shown(undefined, { ...panel, latestRevision: null })).text()).toContain('There is no revision yet');
  });
  it('says what the server refused', async () => {
    const problem = { type: 'about:blank', title: 'Not found', status: 404, detail: 'There is no such revision.' };
    expect((await shown({ kind: 'refused', problem })).text()).toContain('Not found: There is no such revision.');
  });
});
