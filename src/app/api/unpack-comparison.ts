import type { BlockArray } from '../../../shared/contracts/binary-block';
import { COMPARED_CELL_ARRAY_NAMES, COMPARED_CUT_ARRAY_NAMES, comparisonHead } from '../../../shared/contracts/comparisons';
import type { CellDifference, Comparison, ComparisonHead } from '../../../shared/contracts/comparisons';

/** A reply of the comparison call in its binary form. */
export interface ComparisonBlock {
  readonly head: unknown;
  readonly arrays: Readonly<Record<string, BlockArray>>;
}

/** The comparison with its arrays back in their places. Throws where an array that the head announces did not come. */
export function unpackComparison({ head, arrays }: ComparisonBlock): Comparison {
  const { cells, cuts, uv, ...rest } = comparisonHead.parse(head);
  return {
    ...rest,
    cells: cellsOf(cells, arrays),
    cuts: cuts.map((cut, place) => {
      const { differenceDb, ...levels } = numbersOf(COMPARED_CUT_ARRAY_NAMES, `cuts.${place}`, arrays);
      return { ...cut, ...levels, differenceDb: differenceDb.map((value) => (Number.isNaN(value) ? null : value)) };
    }),
    uv: { ...uv, ...numbersOf(['differenceDb'], 'uv', arrays) },
  };
}

type Arrays = ComparisonBlock['arrays'];

function cellsOf(cells: ComparisonHead['cells'], arrays: Arrays): Comparison['cells'] {
  if (!isCompared(cells)) return cells;
  return { ...cells, arrays: numbersOf(COMPARED_CELL_ARRAY_NAMES, 'cells', arrays) };
}

/** A comparison that does not exist has a reason instead of a count. */
const isCompared = (cells: ComparisonHead['cells']): cells is Omit<CellDifference, 'arrays'> => 'total' in cells;

function numbersOf<Name extends string>(names: readonly Name[], prefix: string, arrays: Arrays): Record<Name, number[]> {
  const entries = names.map((name) => {
    const key = `${prefix}.${name}`;
    if (!(key in arrays)) throw new Error(`the comparison lacks its array ${key}`);
    return [name, Array.from(arrays[key])] as const;
  });
  return Object.fromEntries(entries) as Record<Name, number[]>;
}
