import type { EditionHeader, FamilySummary } from '../../../shared/contracts/library';
import { panelOverviewOf, projectOf } from './project-fixture';
import { waitingDeeds } from './waiting-deeds';

const me = panelOverviewOf().changedBy.id;
const other = { id: '6f1c1b7e-58a4-4f0b-9a53-999999999999', name: 'Somebody else' };
const asDesigner = { personId: me, roles: ['designer'] } as const;
const edition = (state: EditionHeader['state'], verdict: EditionHeader['verdict']): Pick<EditionHeader, 'id' | 'familyName' | 'state' | 'verdict'> => ({ id: `${state} ${verdict}`, familyName: 'Ring and patch', state, verdict });
const family = (...editions: ReturnType<typeof edition>[]): FamilySummary => ({ name: 'Ring and patch', editions }) as FamilySummary;
const texts = (...call: Parameters<typeof waitingDeeds>): string[] => waitingDeeds(...call).map(({ name, text }) => `${name}: ${text}`);

describe('what waits for a person', () => {
  it('is a draft of their own that is ahead of its revision, with the way to the revisions', () => {
    expect(waitingDeeds(asDesigner, [projectOf(panelOverviewOf())], [])).toEqual([
      { key: `${panelOverviewOf().id} ahead`, link: ['/panels', panelOverviewOf().id, 'revisions'], name: 'A, lighthouse relay', text: 'your draft is ahead of revision 3 and not frozen' },
    ]);
    expect(texts(asDesigner, [projectOf(panelOverviewOf({ draftIsRevision: true }), panelOverviewOf({ latestRevision: null }))], [])).toEqual([]);
  });

  it('is a draft of their own that falls short or cannot be predicted', () => {
    const short = { cellCount: 4, gainDbi: 30, overall: 'falls-short' as const, verdicts: [{ line: 'gain' as const, sense: 'at-least' as const, limit: 34, unit: 'dBi', value: 30, margin: -4, verdict: 'falls-short' as const }] };
    const panels = [panelOverviewOf({ draftIsRevision: true, summary: short }), panelOverviewOf({ draftIsRevision: true, summary: null }), panelOverviewOf({ draftIsRevision: true, summary: null, summaryPending: true })];
    expect(texts(asDesigner, [projectOf(...panels)], [])).toEqual(['A, lighthouse relay: your draft falls short in gain', 'A, lighthouse relay: your draft cannot be predicted as it stands']);
  });

  it('is nothing of what somebody else changed last, and no draft without the role designer', () => {
    expect(texts(asDesigner, [projectOf(panelOverviewOf({ changedBy: other }))], [])).toEqual([]);
    expect(texts({ personId: me, roles: ['reviewer'] }, [projectOf(panelOverviewOf())], [])).toEqual([]);
  });

  it('is an accepted edition for the lab, with what its checks found', () => {
    const families = [family(edition('accepted', 'warn'), edition('published', 'pass'))];
    expect(waitingDeeds({ personId: me, roles: ['lab'] }, [], families)).toEqual([
      { key: 'accepted warn', link: ['/library/editions', 'accepted warn'], name: 'Ring and patch', text: 'accepted and not published: its checks have remarks to read first' },
    ]);
    expect(texts(asDesigner, [], families)).toEqual([]);
  });
});
