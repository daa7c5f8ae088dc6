import type { Lattice } from '../model/design-document';
import type { NoFigure } from '../model/figures';
import type { CellArrays } from './cell-arrays';
import { noFigure } from './no-figure';

/** What `cellIndex` points into, so that cells of two designs can be told apart. */
export type CellIdentities =
  /** A phase of its own at every position; nothing to point into. */
  | { readonly kind: 'continuous' }
  /** Cells without parameters: ideal levels or a what-if table. Tables of one `key` hold the same cells. */
  | { readonly kind: 'table'; readonly key: string }
  /** Cells of an edition of a family, with the values of their parameters, index by index. */
  | {
      readonly kind: 'family';
      readonly familyId: string;
      readonly editionId: string;
      readonly parameterLabel: string;
      readonly parametersMm: readonly (readonly number[])[];
    };

export interface PlacedCells {
  readonly lattice: Lattice;
  readonly arrays: CellArrays;
  readonly identities: CellIdentities;
}

/** Per cell of the common lattice, in the order of the cells before. */
export interface CellChanges {
  readonly kind: 'compared';
  readonly total: number;
  readonly changed: number;
  /** Present when both stand on one family. The mean is over the cells that changed. */
  readonly parameter?: { readonly label: string; readonly larger: number; readonly smaller: number; readonly meanChangeMm: number };
  readonly errorOver15Before: number;
  readonly errorOver15After: number;
  readonly rmsErrorBeforeDeg: number;
  readonly rmsErrorAfterDeg: number;
  readonly arrays: {
    readonly xMm: Float64Array;
    readonly yMm: Float64Array;
    /** 1 where another cell stands. */
    readonly changed: Uint8Array;
    /** Of the first parameter; 0 throughout where there is no common one. */
    readonly parameterChangeMm: Float64Array;
    readonly phaseChangeDeg: Float64Array;
    readonly errorChangeDeg: Float64Array;
  };
}

/** Positions nearer than this are one position. */
const SAME_PLACE_MM = 1e-6;
/** Achieved phases come in single precision, so a change below this is rounding. */
const SAME_PHASE_DEG = 1e-3;
const SAME_LENGTH_MM = 1e-9;
const LARGE_ERROR_DEG = 15;

/**
 * What changed from cell to cell, after against before, at the positions that both have. Swapping the sides turns the
 * sign of every change and nothing else.
 */
export function compareCells(before: PlacedCells, after: PlacedCells): CellChanges | NoFigure {
  const fault = latticeFault(before.lattice, after.lattice);
  if (fault !== undefined) return noFigure('lattices-differ', fault);
  const pairs = commonPositions(before.arrays, after.arrays);
  const total = pairs.before.length;
  if (total === 0) return noFigure('no-common-cells', 'the two lattices are shifted against each other, so no position is in both');
  const arrays = changeArrays(before, after, pairs);
  return {
    kind: 'compared',
    total,
    changed: arrays.changed.reduce((sum, changed) => sum + changed, 0),
    ...parameterSummary(before.identities, after.identities, arrays),
    errorOver15Before: countLargeErrors(before.arrays, pairs.before),
    errorOver15After: countLargeErrors(after.arrays, pairs.after),
    rmsErrorBeforeDeg: rmsErrorDeg(before.arrays, pairs.before),
    rmsErrorAfterDeg: rmsErrorDeg(after.arrays, pairs.after),
    arrays,
  };
}

function latticeFault(before: Lattice, after: Lattice): string | undefined {
  if (before.kind !== after.kind) return `one lattice is ${before.kind}, the other ${after.kind}`;
  const [left, right] = [periodsText(before), periodsText(after)];
  return left === right ? undefined : `one lattice has ${left} mm, the other ${right} mm`;
}

const periodsText = (lattice: Lattice): string => `${lattice.periodXMm} × ${lattice.kind === 'rectangular' ? lattice.periodYMm : lattice.rowSpacingMm}`;

/** Indices of one position on either side. */
interface Pairs {
  readonly before: Int32Array;
  readonly after: Int32Array;
}

/** Walks both lists at once: each goes row by row from the lowest y, within a row from the lowest x. */
function commonPositions(before: CellArrays, after: CellArrays): Pairs {
  const most = Math.min(before.xMm.length, after.xMm.length);
  const left = new Int32Array(most);
  const right = new Int32Array(most);
  let count = 0;
  for (let i = 0, k = 0; i < before.xMm.length && k < after.xMm.length; ) {
    const order = orderOfPlaces(before.yMm[i] - after.yMm[k], before.xMm[i] - after.xMm[k]);
    if (order === 0) {
      left[count] = i++;
      right[count++] = k++;
    } else if (order < 0) i++;
    else k++;
  }
  return { before: left.subarray(0, count), after: right.subarray(0, count) };
}

function orderOfPlaces(dyMm: number, dxMm: number): number {
  if (Math.abs(dyMm) > SAME_PLACE_MM) return dyMm;
  return Math.abs(dxMm) > SAME_PLACE_MM ? dxMm : 0;
}

function changeArrays(before: PlacedCells, after: PlacedCells, pairs: Pairs): CellChanges['arrays'] {
  const total = pairs.before.length;
  const arrays: CellChanges['arrays'] = {
    xMm: new Float64Array(total),
    yMm: new Float64Array(total),
    changed: new Uint8Array(total),
    parameterChangeMm: new Float64Array(total),
    phaseChangeDeg: new Float64Array(total),
    errorChangeDeg: new Float64Array(total),
  };
  const differ = changeTest(before.identities, after.identities);
  const parameterChangeMm = parameterChange(before.identities, after.identities);
  for (let n = 0; n < total; n++) {
    const i = pairs.before[n];
    const k = pairs.after[n];
    arrays.xMm[n] = nanometresMm(before.arrays.xMm[i]);
    arrays.yMm[n] = nanometresMm(before.arrays.yMm[i]);
    arrays.phaseChangeDeg[n] = turnDeg(after.arrays.phaseDeg[k] - before.arrays.phaseDeg[i]);
    arrays.errorChangeDeg[n] = after.arrays.errorDeg[k] - before.arrays.errorDeg[i];
    const indices = { before: before.arrays.cellIndex[i], after: after.arrays.cellIndex[k] };
    arrays.changed[n] = differ(indices, arrays.phaseChangeDeg[n]) ? 1 : 0;
    if (arrays.changed[n] === 1) arrays.parameterChangeMm[n] = parameterChangeMm(indices);
  }
  return arrays;
}

/** Without the rounding by which the sides may differ. */
const nanometresMm = (mm: number): number => Math.round(mm * 1e6) / 1e6;

/** A difference of two phases in one turn, into [-180, 180] with the sign of the nearer way round; odd in its argument. */
function turnDeg(differenceDeg: number): number {
  if (differenceDeg > 180) return differenceDeg - 360;
  return differenceDeg < -180 ? differenceDeg + 360 : differenceDeg;
}

interface Indices {
  readonly before: number;
  readonly after: number;
}

/** Whether another cell stands at a position. Cells of different kinds are always different ones. */
function changeTest(before: CellIdentities, after: CellIdentities): (indices: Indices, phaseChangeDeg: number) => boolean {
  if (before.kind === 'continuous' && after.kind === 'continuous') return (_indices, phaseChangeDeg) => Math.abs(phaseChangeDeg) > SAME_PHASE_DEG;
  if (before.kind === 'table' && after.kind === 'table' && before.key === after.key) return (indices) => indices.before !== indices.after;
  if (before.kind === 'family' && after.kind === 'family' && before.familyId === after.familyId) {
    // Within one edition the index says which cell it is, even where two have the same parameters.
    if (before.editionId === after.editionId) return (indices) => indices.before !== indices.after;
    return (indices) => {
      const left = before.parametersMm[indices.before];
      const right = after.parametersMm[indices.after];
      return left.length !== right.length || left.some((value, p) => Math.abs(value - right[p]) > SAME_LENGTH_MM);
    };
  }
  return () => true;
}

function commonFamily(before: CellIdentities, after: CellIdentities): boolean {
  return before.kind === 'family' && after.kind === 'family' && before.familyId === after.familyId;
}

function parameterChange(before: CellIdentities, after: CellIdentities): (indices: Indices) => number {
  if (before.kind !== 'family' || after.kind !== 'family' || !commonFamily(before, after)) return () => 0;
  return (indices) => after.parametersMm[indices.after][0] - before.parametersMm[indices.before][0];
}

function parameterSummary(before: CellIdentities, after: CellIdentities, { changed, parameterChangeMm }: CellChanges['arrays']): Pick<CellChanges, 'parameter'> {
  if (after.kind !== 'family' || !commonFamily(before, after)) return {};
  let larger = 0;
  let smaller = 0;
  let sumMm = 0;
  let count = 0;
  parameterChangeMm.forEach((change, n) => {
    if (change > SAME_LENGTH_MM) larger += 1;
    if (change < -SAME_LENGTH_MM) smaller += 1;
    sumMm += Math.abs(change);
    count += changed[n];
  });
  return { parameter: { label: after.parameterLabel, larger, smaller, meanChangeMm: count === 0 ? 0 : sumMm / count } };
}

function countLargeErrors({ errorDeg }: CellArrays, indices: Int32Array): number {
  return indices.reduce((count, i) => count + (Math.abs(errorDeg[i]) > LARGE_ERROR_DEG ? 1 : 0), 0);
}

function rmsErrorDeg({ errorDeg }: CellArrays, indices: Int32Array): number {
  return Math.sqrt(indices.reduce((sum, i) => sum + errorDeg[i] * errorDeg[i], 0) / indices.length);
}
