import type { Role } from '../../../shared/contracts/common';
import type { EditionHeader, FamilySummary } from '../../../shared/contracts/library';
import type { PanelOverview, Project } from '../../../shared/contracts/projects';
import { lineText } from './requirement-mark';

/** Something that only the signed-in person can be expected to do next. */
export interface WaitingDeed {
  readonly key: string;
  readonly link: readonly string[];
  /** The panel or edition. */
  readonly name: string;
  /** What waits, and why. */
  readonly text: string;
}

export interface WaitingFor {
  readonly personId: string;
  readonly roles: readonly Role[];
}

/** Derived from what the lists say of drafts and editions: nobody is assigned anything. */
export function waitingDeeds({ personId, roles }: WaitingFor, projects: readonly Project[], families: readonly FamilySummary[]): readonly WaitingDeed[] {
  const own = projects.flatMap(({ panels }) => panels).filter(({ changedBy }) => changedBy.id === personId);
  const drafts = roles.includes('designer') ? own.flatMap(draftDeeds) : [];
  const editions = roles.includes('lab') ? families.flatMap((family) => family.editions).filter(({ state }) => state === 'accepted') : [];
  return [...drafts, ...editions.map(editionDeed)];
}

function draftDeeds(panel: PanelOverview): WaitingDeed[] {
  const { id, name, summary, summaryPending, latestRevision, draftIsRevision } = panel;
  const link = (sheet: string): readonly string[] => ['/panels', id, sheet];
  const short = (summary?.verdicts ?? []).filter(({ verdict }) => verdict === 'falls-short').map(({ line }) => lineText(line));
  const deeds: WaitingDeed[] = [];
  if (summary === null && !summaryPending) deeds.push({ key: `${id} unfit`, link: link('requirement'), name, text: 'your draft cannot be predicted as it stands' });
  if (short.length > 0) deeds.push({ key: `${id} short`, link: link('requirement'), name, text: `your draft falls short in ${short.join(', ')}` });
  if (latestRevision !== null && !draftIsRevision) {
    deeds.push({ key: `${id} ahead`, link: link('revisions'), name, text: `your draft is ahead of revision ${latestRevision.number} and not frozen` });
  }
  return deeds;
}

const FINDINGS: Readonly<Record<EditionHeader['verdict'], string>> = {
  pass: 'its checks pass',
  warn: 'its checks have remarks to read first',
  fail: 'checks fail',
  'not-evaluated': 'its checks were not evaluated',
};

function editionDeed({ id, familyName, verdict }: EditionHeader): WaitingDeed {
  return { key: id, link: ['/library/editions', id], name: familyName, text: `accepted and not published: ${FINDINGS[verdict]}` };
}
