import type { ParameterDifference } from '../../shared/contracts/comparisons';
import { designDifferences } from '../../shared/model/design-diff';
import { designDocument, type DesignDocument } from '../../shared/model/design-document';
import { editionName, type ComparedState } from './compared-state';

type Value = ParameterDifference['before'];

/** What the two documents have different, with editions by their names instead of their ids. */
export function parameterDifferences(before: ComparedState, after: ComparedState): ParameterDifference[] {
  const named = designDifferences(inOrder(before.design), inOrder(after.design)).map((difference) => ({
    ...difference,
    before: withEditionName(difference.before, before),
    after: withEditionName(difference.after, after),
  }));
  const [offeredBefore, offeredAfter] = [before.edition?.cells.length, after.edition?.cells.length];
  if (offeredBefore === undefined || offeredAfter === undefined || offeredBefore === offeredAfter) return named;
  return [...named, { pointer: '/cells/editionId', label: 'Cells offered', unit: '', before: offeredBefore, after: offeredAfter }];
}

/** The document with its fields in the order of the schema, which storage does not keep. */
const inOrder = (design: DesignDocument): DesignDocument => designDocument.parse(design);

function withEditionName(value: Value, { design, edition }: ComparedState): Value {
  if (typeof value !== 'string' || edition === null || design.cells.kind !== 'edition') return value;
  const { editionId } = design.cells;
  if (value === editionId) return editionName(edition);
  return value.replace(`edition ${editionId}`, editionName(edition));
}
