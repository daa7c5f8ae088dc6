import type { ParamMap, Params } from '@angular/router';
import type { PanelDetail } from '../../../../shared/contracts/projects';

/** Two states by name: `revision:<id>` or `draft:<panelId>`; null where the address does not say. */
export interface CompareLink {
  readonly before: string | null;
  readonly after: string | null;
}

const SIDE = /^(revision|draft):[0-9a-f-]{36}$/i;

export function readCompareLink(query: ParamMap): CompareLink {
  const side = (name: string): string | null => {
    const text = query.get(name);
    return text !== null && SIDE.test(text) ? text : null;
  };
  return { before: side('before'), after: side('after') };
}

/** Inverse of {@link readCompareLink}. */
export function writeCompareLink({ before, after }: CompareLink): Params {
  return { before, after };
}

export const revisionSide = (id: string): string => `revision:${id}`;
export const draftSide = (panelId: string): string => `draft:${panelId}`;

/** What is compared when the address names nothing: the latest revision with the draft, or it with its parent when they are equal. */
export function firstSides(link: CompareLink, panel: PanelDetail): { readonly before: string; readonly after: string } | { readonly reason: string } {
  const latest = panel.latestRevision;
  const equal = panel.draftIsRevision && latest?.parentId;
  const after = link.after ?? (equal && latest ? revisionSide(latest.id) : draftSide(panel.id));
  const before = link.before ?? (latest === null ? null : equal ? revisionSide(equal) : revisionSide(latest.id));
  if (before === null) return { reason: 'There is no revision yet to compare the draft with. Freeze one first.' };
  return { before, after };
}
