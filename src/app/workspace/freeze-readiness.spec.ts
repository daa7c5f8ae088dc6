import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import type { PanelDetail } from '../../../shared/contracts/projects';
import { freezeHindrance, nextRevisionNumber } from './freeze-readiness';
import type { FreezeFacts } from './freeze-readiness';

const person = { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fd', name: 'Designer' };
const panel: PanelDetail = {
  id: '6f9619ff-8b86-4d01-b42d-00cf4fc964ff',
  project: { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fe', name: 'Merrow Point sea-rescue link', invented: true },
  name: 'Panel A',
  design: STARTING_DESIGN,
  draftHash: 'b'.repeat(64),
  etag: '"v1"',
  changedAt: '2026-12-01T14:02:31Z',
  changedBy: person,
  latestRevision: {
    id: '6f9619ff-8b86-4d01-b42d-00cf4fc964bb',
    panelId: '6f9619ff-8b86-4d01-b42d-00cf4fc964ff',
    number: 3,
    hash: 'a'.repeat(64),
    parentId: null,
    parentNumber: null,
    restoredFromNumber: null,
    author: person,
    message: 'Third',
    createdAt: '2026-12-01T14:02:31Z',
  },
  draftIsRevision: false,
};
const facts: FreezeFacts = { panel, viewOnlyReason: null, saveState: { kind: 'saved', at: 0 }, pendingCount: 0, failureDetail: null };

describe('freezeHindrance', () => {
  it('lets a changed and valid draft be frozen, also while it is being saved', () => {
    expect(freezeHindrance(facts)).toBeNull();
    expect(freezeHindrance({ ...facts, saveState: { kind: 'saving' } })).toBeNull();
  });

  it.each<[Partial<FreezeFacts>, string]>([
    [{ viewOnlyReason: 'Only a designer changes panels' }, 'Only a designer changes panels'],
    [{ saveState: { kind: 'offline', since: 0 } }, 'The server is out of reach'],
    [{ saveState: { kind: 'conflict' } }, 'Decide first between your changes and those of somebody else'],
    [{ pendingCount: 2 }, 'Put right or undo the 2 entries that could not be taken'],
    [{ failureDetail: 'too many cells' }, 'The design cannot be predicted: too many cells'],
    [{ panel: { ...panel, draftIsRevision: true } }, 'The draft equals revision 3; nothing to freeze'],
  ])('says why not: %o', (change, reason) => {
    expect(freezeHindrance({ ...facts, ...change })).toBe(reason);
  });

  it('numbers revisions on', () => {
    expect(nextRevisionNumber(panel)).toBe(4);
    expect(nextRevisionNumber({ ...panel, latestRevision: null })).toBe(1);
  });
});
