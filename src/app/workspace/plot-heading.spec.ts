import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import type { PanelDetail } from '../../../shared/contracts/projects';
import { draftHeading } from './plot-heading';

const panel = {
  name: 'Panel A',
  project: { name: 'Merrow Point sea-rescue link' },
  design: STARTING_DESIGN,
  draftHash: 'debfe0abb702',
  latestRevision: { number: 3 },
  draftIsRevision: false,
} as PanelDetail;
const now = new Date('2026-12-01T14:02:31Z');

it('names project, panel, draft and hash', () => {
  expect(draftHeading('Cut', panel, true, now)).toEqual({
    title: 'Cut', subject: 'Merrow Point sea-rescue link, Panel A', state: 'Draft after revision 3', hash: 'debfe0abb702', date: '2026-12-01',
  });
});
it('calls a draft that equals its revision by the revision', () => {
  expect(draftHeading('Cut', { ...panel, draftIsRevision: true }, true, now).state).toBe('Revision 3');
});
it('gives no hash to what is not saved: the stored one would be of another content', () => {
  expect(draftHeading('Cut', panel, false, now)).toMatchObject({ state: 'Draft after revision 3, latest change not saved yet', hash: '' });
});
