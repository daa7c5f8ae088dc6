import { differingParts } from '../../../shared/model/design-diff';
import type { DesignDocument } from '../../../shared/model/design-document';
import { fieldLabel } from '../../../shared/model/design-labels';
import { replacedAt, valueAt } from '../../../shared/model/design-pointer';
import { designPartText } from '../../../shared/model/design-text';

export type ChosenSide = 'mine' | 'theirs';

/** One part of the design that two people left in different states. */
export interface ConflictField {
  readonly pointer: string;
  readonly label: string;
  readonly unit: string;
  /** In the state that both started from; null where the part is absent. */
  readonly base: string | number | boolean | null;
  readonly mine: string | number | boolean | null;
  readonly theirs: string | number | boolean | null;
  /** Who changed it since the common state. */
  readonly changedBy: 'me' | 'them' | 'both';
  /** What is proposed: the only change, and of two changes one's own. */
  readonly proposed: ChosenSide;
}

export interface ThreeDesigns {
  /** The last state that both sides knew. */
  readonly base: DesignDocument;
  readonly mine: DesignDocument;
  readonly theirs: DesignDocument;
}

/** Every part in which the two sides differ, in the order of the document. */
export function conflictFields({ base, mine, theirs }: ThreeDesigns): readonly ConflictField[] {
  return differingParts(theirs, mine).map(({ pointer, before, after }) => {
    // Undefined too where the base held a choice of another kind.
    const common = valueAt(base, pointer);
    const iChanged = differingParts(common, after).length > 0;
    const theyChanged = differingParts(common, before).length > 0;
    const changedBy = iChanged && theyChanged ? 'both' : iChanged ? 'me' : 'them';
    return {
      pointer,
      ...fieldLabel(pointer),
      base: designPartText(common),
      mine: designPartText(after),
      theirs: designPartText(before),
      changedBy,
      proposed: changedBy === 'them' ? 'theirs' : 'mine',
    };
  });
}

/** The design that holds the chosen side of every field; fields without a choice take the proposed one. */
export function mergedDesign(designs: ThreeDesigns, choices: Readonly<Record<string, ChosenSide>>): DesignDocument {
  return conflictFields(designs)
    .filter((field) => (choices[field.pointer] ?? field.proposed) === 'mine')
    .reduce((merged, { pointer }) => replacedAt(merged, pointer, valueAt(designs.mine, pointer)), designs.theirs);
}

export function sameDesign(one: DesignDocument, other: DesignDocument): boolean {
  return differingParts(one, other).length === 0;
}
