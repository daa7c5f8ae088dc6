import type { CellIdentities } from '../../shared/antenna/compare-cells';
import type { Side } from '../../shared/contracts/comparisons';
import type { RevisionHeader } from '../../shared/contracts/projects';
import { canonicalJson } from '../../shared/model/canonical-json';
import type { CellEntry, FamilyDescription } from '../../shared/model/cell-family';
import type { DesignDocument } from '../../shared/model/design-document';
import type { Verdict } from '../../shared/model/figures';

/** A revision or a draft, as far as a comparison needs it. */
export interface ComparedState {
  /** `revision:<id>` or `draft:<panelId>`, as it was asked for. */
  readonly reference: string;
  readonly panelId: string;
  readonly panelName: string;
  readonly projectName: string;
  readonly hash: string;
  /** Null for a draft. */
  readonly header: RevisionHeader | null;
  readonly design: DesignDocument;
  readonly edition: ComparedEdition | null;
}

export interface ComparedEdition {
  readonly id: string;
  readonly familyId: string;
  readonly familyName: string;
  readonly number: number | null;
  readonly description: FamilyDescription;
  readonly cells: readonly CellEntry[];
}

export const editionName = ({ familyName, number }: ComparedEdition): string => (number === null ? familyName : `${familyName}, edition ${number}`);

export function sideOf(state: ComparedState, verdicts: readonly Verdict[]): Side {
  const count = (word: Verdict['verdict']): number => verdicts.filter(({ verdict }) => verdict === word).length;
  const { reference, panelId, panelName, projectName, hash, header, edition } = state;
  return {
    reference,
    panelId,
    panelName,
    projectName,
    hash,
    ...(header === null ? {} : { revision: header }),
    editionName: edition === null ? null : editionName(edition),
    requirement: { met: count('meets'), short: count('falls-short'), open: count('not-evaluated') },
  };
}

/** What the indices of a design's cells point into. */
export function identitiesOf({ design: { cells }, edition }: ComparedState): CellIdentities {
  if (cells.kind === 'ideal') return cells.levels === null ? { kind: 'continuous' } : { kind: 'table', key: `ideal ${cells.levels}` };
  if (cells.kind === 'inline') return { kind: 'table', key: canonicalJson(cells.cells) };
  if (edition === null) throw new Error('a design on an edition came without it');
  const { id, familyId, description } = edition;
  return { kind: 'family', familyId, editionId: id, parameterLabel: description.parameters[0].label, parametersMm: edition.cells.map(({ parametersMm }) => parametersMm) };
}
