import type { PanelDetail } from '../../../../shared/contracts/projects';
import { RevisionClient } from '../../api/revision-client';
import { Confirm } from '../../ui/confirm';
import { sheetRig } from '../fields/sheet-rig';
import { RevisionsSheet } from './revisions-sheet';
import { SAMPLE_ID, sampleRevision } from './sample-comparison';

const panel = { id: SAMPLE_ID(2), name: 'Panel A', project: { name: 'Merrow Point' }, draftHash: 'd'.repeat(64), changedBy: { name: 'Designer' }, latestRevision: sampleRevision(2), draftIsRevision: false } as PanelDetail;
const preview = { archiveName: 'panel-a-revision-2.zip', contentBytes: 182_034, files: [{ name: 'elements.csv', bytes: 820, sha256: 'e'.repeat(64), function: 'element layout', head: 'x_mm,y_mm,cell' }] };

async function shown(count = 2, yes = true, archive: object = { kind: 'unreachable' }) {
  const restored: string[] = [];
  const client = {
    list: async () => ({ kind: 'found', value: [2, 1].slice(0, count).map((number) => ({ ...sampleRevision(number), summary: null })) }),
    restore: async (id: string, message: string) => (restored.push(`${id} ${message}`), { kind: 'found', value: { ...sampleRevision(3) } }),
    exportPreview: async () => ({ kind: 'found', value: preview }),
    archive: async () => archive,
  };
  const rig = await sheetRig(RevisionsSheet, undefined, [{ provide: RevisionClient, useValue: client }, { provide: Confirm, useValue: { ask: async () => yes } }]);
  rig.workspace.panel.set(panel);
  for (let i = 0; i < 3; i++) await rig.fixture.whenStable();
  return { ...rig, restored };
}

describe('RevisionsSheet', () => {
  it('lists the draft and every revision with its lineage', async () => {
    const { element, text } = await shown();
    expect([...element.querySelectorAll('.balloon')].map((balloon) => balloon.textContent)).toEqual(['D', '2', '1']);
    expect(text()).toContain('Draft, after revision 2');
    expect(text()).toContain('child of 1');
  });
  it('restores after a question, under a message that says what', async () => {
    const { press, restored, fixture, text } = await shown();
    await press('Restore revision 1');
    await fixture.whenStable();
    expect(restored).toEqual([`${SAMPLE_ID(101)} Restore revision 1: State 1`]);
    expect(text()).toContain('Revision 3 holds the content of revision 1');
  });
  it('restores nothing when the question is answered by no, or when one may not', async () => {
    const refused = await shown(2, false);
    await refused.press('Restore revision 1');
    expect(refused.restored).toEqual([]);
  });
  it('does not restore for a reader and says why', async () => {
    const { workspace, fixture, press, element, restored } = await shown();
    workspace.viewOnlyReason.set('Only a designer changes panels');
    await fixture.whenStable();
    await press('Restore revision 1');
    expect(restored).toEqual([]);
    expect(element.querySelector('[aria-label="Restore revision 1"]')?.getAttribute('title')).toBe('Only a designer changes panels');
  });
  it('previews an export: files, sums, first lines', async () => {
    const { press, fixture, element, text } = await shown();
    await press('Export revision 2');
    await fixture.whenStable();
    expect(text()).toContain('panel-a-revision-2.zip, 182.0 kB before packing');
    await press('elements.csv');
    expect(element.querySelector('pre')?.textContent).toBe('x_mm,y_mm,cell');
    await press('Download');
    await fixture.whenStable();
    expect(text()).toContain('out of reach');
  });
  it('tells the sum of an archive once it was packed and saved', async () => {
    const saved = jest.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(() => undefined);
    Object.assign(URL, { createObjectURL: () => 'blob:archive', revokeObjectURL: () => undefined });
    const { press, fixture, text } = await shown(2, true, { kind: 'found', value: { bytes: new Blob(['zip']), sha256: 'c'.repeat(64) } });
    await press('Export revision 2');
    await fixture.whenStable();
    expect(text()).not.toContain('c'.repeat(64));
    await press('Download');
    await fixture.whenStable();
    expect(text()).toContain(`SHA-256 ${'c'.repeat(64)}`);
    expect(saved).toHaveBeenCalledTimes(1);
    saved.mockRestore();
  });
  it('says what a revision is while there is none', async () => {
    expect((await shown(0)).text()).toContain('No revision yet');
  });
});
