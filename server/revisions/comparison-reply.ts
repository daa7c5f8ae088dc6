import type { CellChanges } from '../../shared/antenna/compare-cells';
import { writeBinaryBlock, type BlockArray, type BlockArrays } from '../../shared/contracts/binary-block';
import { COMPARED_CELL_ARRAY_NAMES, COMPARED_CUT_ARRAY_NAMES, type Comparison, type ComparisonHead, type CutDifference } from '../../shared/contracts/comparisons';
import type { NoFigure } from '../../shared/model/figures';
import type { ComparedCut } from './compared-cuts';
import type { ComputedComparison } from './comparison-service';

const isCompared = (cells: CellChanges | NoFigure): cells is CellChanges => cells.kind === 'compared' && 'arrays' in cells;

const requestOf = ({ request }: ComparedCut): CutDifference['request'] =>
  'plane' in request ? { plane: request.plane, angleDeg: [...request.angleDeg] } : { phiDeg: request.phiDeg, thetaDeg: [...request.thetaDeg] };

/** The comparison as JSON. */
export function comparisonReplyOf({ cells, cuts, uv, ...rest }: ComputedComparison): Comparison {
  return {
    ...rest,
    cells: isCompared(cells) ? { ...cells, arrays: plainArrays(COMPARED_CELL_ARRAY_NAMES, cells.arrays) } : cells,
    cuts: cuts.map((cut) => ({
      request: requestOf(cut),
      shiftU: cut.shiftU,
      floorDbi: cut.floorDbi,
      ...plainArrays(['angleDeg', 'beforeDbi', 'afterDbi'], cut),
      differenceDb: Array.from(cut.differenceDb, (value) => (Number.isNaN(value) ? null : value)),
    })),
    uv: { ...uv, differenceDb: Array.from(uv.differenceDb) },
  };
}

/** The same numbers as a binary block. */
export function comparisonBlockOf({ cells, cuts, uv, ...rest }: ComputedComparison): Uint8Array {
  const head: ComparisonHead = {
    ...rest,
    cells: isCompared(cells) ? withoutArrays(cells) : cells,
    cuts: cuts.map((cut) => ({ request: requestOf(cut), shiftU: cut.shiftU, floorDbi: cut.floorDbi })),
    uv: { size: uv.size, shiftU: uv.shiftU, shiftV: uv.shiftV },
  };
  return writeBinaryBlock(head, {
    ...(isCompared(cells) ? namedArrays('cells', COMPARED_CELL_ARRAY_NAMES, cells.arrays) : {}),
    ...Object.assign({}, ...cuts.map((cut, i) => namedArrays(`cuts.${i}`, COMPARED_CUT_ARRAY_NAMES, cut))),
    'uv.differenceDb': uv.differenceDb,
  });
}

function withoutArrays({ arrays: _arrays, ...rest }: CellChanges): Omit<CellChanges, 'arrays'> {
  return rest;
}

function plainArrays<Name extends string>(names: readonly Name[], holder: Readonly<Record<Name, ArrayLike<number>>>): Record<Name, number[]> {
  return Object.fromEntries(names.map((name) => [name, Array.from(holder[name])])) as Record<Name, number[]>;
}

function namedArrays<Name extends string>(prefix: string, names: readonly Name[], holder: Readonly<Record<Name, BlockArray>>): BlockArrays {
  return Object.fromEntries(names.map((name) => [`${prefix}.${name}`, holder[name]]));
}
