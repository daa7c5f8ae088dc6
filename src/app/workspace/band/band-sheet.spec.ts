import type { PanelDetail } from '../../../../shared/contracts/projects';
import type { RunDetail, RunRequest } from '../../../../shared/contracts/runs';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { RunClient } from '../../api/run-client';
import type { RunListener } from '../../api/run-client';
import { SAMPLE_RUN_ID, sampleRun } from '../../api/sample-run';
import { sheetRig } from '../fields/sheet-rig';
import { BandSheet } from './band-sheet';
import { SAMPLE_BAND } from './sample-band';

const design = { ...STARTING_DESIGN, requirement: { ...STARTING_DESIGN.requirement, bandGHz: [27, 29] as [number, number], minGainDbi: 29 } };
const panel = { id: 'p', name: 'Panel A', project: { name: 'Merrow Point' }, draftHash: 'd'.repeat(64), latestRevision: { id: 'r2', number: 2 } } as PanelDetail;

async function shown(known: readonly RunDetail[] = []) {
  const asked: RunRequest[] = [];
  const cancelled: string[] = [];
  const seen: { listener: RunListener | null; run: RunDetail } = { listener: null, run: known[0] ?? sampleRun({}) };
  const client = {
    list: async () => ({ kind: 'found', value: known }),
    read: async () => ({ kind: 'found', value: seen.run }),
    start: async (_panelId: string, request: RunRequest) => (asked.push(request), { kind: 'found', value: seen.run }),
    cancel: async (id: string) => (cancelled.push(id), { kind: 'found', value: sampleRun({ state: 'cancelled' }) }),
    watch: (_id: string, listener: RunListener) => ((seen.listener = listener), () => undefined),
  };
  const rig = await sheetRig(BandSheet, design, [{ provide: RunClient, useValue: client }]);
  rig.workspace.panel.set(panel);
  const settle = async (): Promise<void> => {
    for (let i = 0; i < 4; i++) await rig.fixture.whenStable();
  };
  await settle();
  return { ...rig, asked, cancelled, seen, settle };
}

const done = sampleRun({ state: 'done' }, { result: SAMPLE_BAND });

/** The first test compiles every template of the sheet, on a machine that may be busy. */
jest.setTimeout(30_000);

describe('BandSheet', () => {
  it('says what will stand here and why nothing does yet', async () => {
    const { text, header } = await shown();
    expect(text()).toContain('No result yet');
    expect(text()).toContain('No run yet.');
    expect(header.head()).toMatchObject({ title: 'Band', subtitle: '27 to 29 GHz, designed at 28 GHz' });
  });

  it('starts a run with what stands in the boxes, shows its place, its progress and the way out', async () => {
    const { press, enter, text, element, asked, seen, cancelled, settle } = await shown();
    await enter('Frequencies', '5');
    await press('Start run');
    expect(asked).toEqual([{ kind: 'band', parameters: { frequencyCount: 5, spatialPart: true } }]);
    expect(text()).toContain('next in the queue');
    seen.listener?.told({ ...sampleRun({}).progress, state: 'running', stage: 'computing: 1 of 4 parts done', fraction: 0.25, secondsLeft: 6, queuePosition: null });
    await settle();
    expect(element.querySelector('[role=progressbar]')?.getAttribute('aria-valuenow')).toBe('25');
    expect(text()).toContain('computing: 1 of 4 parts done; about 6 s left');
    await press('Cancel run');
    await settle();
    expect(cancelled).toEqual([SAMPLE_RUN_ID]);
    expect(element.querySelector('[role=progressbar]')).toBeNull();
  });

  it('computes a revision where it is chosen', async () => {
    const { press, asked } = await shown();
    await press('Revision 2');
    await press('Start run');
    expect(asked[0].revisionId).toBe('r2');
  });

  it('shows the newest result: worst case by frequency, bandwidth, curves, table', async () => {
    const { text, element } = await shown([done]);
    expect(text()).toContain('Gain≥ 29.00 dBi28.20\u22120.8029.000');
    expect(text()).toContain('not reached within the band');
    expect(element.querySelectorAll('slant-line-plot')).toHaveLength(3);
    expect(text()).toContain('Marked with *');
    expect(element.querySelector('.stale-note')).toBeNull();
  });

  it('says that the inputs changed since', async () => {
    const { workspace, settle, text } = await shown([done]);
    workspace.panel.set({ ...panel, draftHash: 'e'.repeat(64) });
    await settle();
    expect(text()).toContain('Inputs changed: this is draft, save 3, not the draft as it stands.');
    expect(text()).toContain('inputs changed since');
  });

  it('refuses a count that is none, and does not start', async () => {
    const { enter, press, text, asked } = await shown();
    await enter('Frequencies', '2');
    await press('Start run');
    expect(text()).toContain('A whole number from 3 to 401');
    expect(asked).toEqual([]);
  });

  it('marks the picked frequency in the table', async () => {
    const { element, fixture } = await shown([done]);
    const plot = element.querySelector<HTMLElement>('slant-line-plot .plot');
    plot?.dispatchEvent(new KeyboardEvent('keydown', { key: 'End' }));
    await fixture.whenStable();
    expect(element.querySelector('.points tr.chosen th')?.textContent?.trim()).toBe('29.000 *');
  });
});
