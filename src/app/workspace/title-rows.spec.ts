import type { PanelDetail } from '../../../shared/contracts/projects';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import type { SaveProgress } from './save-progress';
import { SHEETS } from './sheets';
import { standingText, titleRows } from './title-rows';

const author = { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fd', name: 'Designer' };
const panel: PanelDetail = {
  id: '6f9619ff-8b86-4d01-b42d-00cf4fc964ff',
  project: { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fe', name: 'Merrow Point sea-rescue link', invented: true },
  name: 'Panel A, lighthouse relay',
  design: STARTING_DESIGN,
  draftHash: 'debfe0abb702'.padEnd(64, '0'),
  etag: '"v1"',
  changedAt: '2026-12-01T14:02:31Z',
  changedBy: { ...author, name: 'Second designer' },
  latestRevision: { id: author.id, panelId: author.id, number: 3, hash: 'a'.repeat(64), parentId: null, parentNumber: null, restoredFromNumber: null, author, message: '', createdAt: '2026-12-01T14:02:31Z' },
  draftIsRevision: false,
};
const head = { number: 5, title: 'Phase', subtitle: '', scale: '1 : 1.43' };
const rows = (change: Partial<PanelDetail> = {}, progress: SaveProgress = { kind: 'saved', at: 0 }) =>
  Object.fromEntries(titleRows({ ...panel, ...change }, head, progress).flat().map(({ label, value }) => [label, value]));

describe('titleRows', () => {
  it('names a draft by the revision it comes after', () => {
    expect(rows()).toEqual({
      Project: 'Merrow Point sea-rescue link',
      Panel: 'Panel A, lighthouse relay',
      'Drawn by': 'Second designer',
      'Checked by': '—',
      State: 'Draft',
      Date: '2026-12-01',
      Revision: 'Draft after revision 3',
      Hash: 'debfe0abb702',
      Scale: '1 : 1.43',
      Sheet: `5 of ${SHEETS.length}`,
    });
  });

  it('names a draft that equals its revision by that revision and its author', () => {
    expect(rows({ draftIsRevision: true })).toMatchObject({ State: 'Frozen', Revision: 'Revision 3', 'Drawn by': 'Designer' });
  });

  it('shows no hash for what the server does not hold yet', () => {
    expect(rows({ draftIsRevision: true }, { kind: 'saving' })).toMatchObject({ State: 'Draft', Hash: 'not saved yet' });
  });

  it('names the draft of a panel without revisions', () => {
    expect(rows({ latestRevision: null })['Revision']).toBe('Draft, no revision yet');
  });
});

describe('standingText', () => {
  const saved: SaveProgress = { kind: 'saved', at: 0 };

  it('names the revision only while the screen shows it', () => {
    expect(standingText(panel, saved)).toBe('Draft after 3');
    expect(standingText({ ...panel, draftIsRevision: true }, saved)).toBe('Revision 3');
    expect(standingText({ ...panel, draftIsRevision: true }, { kind: 'saving' })).toBe('Draft after 3');
  });

  it('names a draft without revisions a draft', () => {
    expect(standingText({ ...panel, latestRevision: null }, saved)).toBe('Draft');
  });
});
