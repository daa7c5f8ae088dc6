import type { CellEdition, CellEntry, FamilyDescription } from '../model/cell-family';
import type { RepeatedCurve, ResponseOrigin } from '../model/response-origin';
import { parameterId } from './family-facts';
import type { FamilyCurve, InspectedFamily } from './family-inspection';
import { FileFaults } from './file-faults';
import type { FileMessage } from './file-message';

export type AssemblyResult =
  | { readonly kind: 'edition'; readonly edition: CellEdition; readonly origin: ResponseOrigin; readonly messages: readonly FileMessage[] }
  | { readonly kind: 'refused'; readonly messages: readonly FileMessage[] };

/** Points [cell][theta][phi][frequency] of one edition; each takes 65 bytes. */
const MOST_GRID_POINTS = 4_000_000;
/** re, im of S11, S21, S12, S22. */
const NUMBERS_PER_POINT = 8;

/**
 * Lays the curves of an inspection on the full grid of an edition, under a description that a person confirmed.
 * Responses with exp(-jwt) are conjugated: the table always holds exp(+jwt), and the description keeps the files' own convention.
 */
export function assembleEdition(family: InspectedFamily, description: FamilyDescription): AssemblyResult {
  const faults = new FileFaults();
  const { inspection, curves, repeats } = family;
  const blocking = inspection.messages.filter((message) => message.severity === 'error');
  for (const message of blocking) faults.add('error', message);
  if (faults.hasErrors) return { kind: 'refused', messages: faults.messages() };
  const parameterOrder = orderParameters(family, description, faults);
  checkPorts([...curves, ...repeats], description, faults);
  checkTimeConvention(family, description, faults);
  const cells = parameterOrder === null ? [] : entriesOf(curves, parameterOrder, faults);
  const grid = gridOf(curves, cells);
  const size = cells.length * grid.thetasDeg.length * grid.phisDeg.length * grid.frequenciesHz.length;
  if (size > MOST_GRID_POINTS) faults.error(0, `The grid of cells, angles and frequencies has ${size} points; at most ${MOST_GRID_POINTS} are kept`, 'Bring the files to common frequencies, or publish the family in parts');
  if (faults.hasErrors) return { kind: 'refused', messages: faults.messages() };
  const isConjugated = description.timeConvention === 'exp(-jwt)';
  const places = placesOf(cells, grid);
  const { responses, fileOfCurve, lineOfPoint } = fillGrid(curves, places, isConjugated);
  const origin = { fileOfCurve, lineOfPoint, repeats: repeats.map((curve) => repeatedCurve(curve, places, isConjugated)) };
  const given = responses.present.reduce((count, flag) => count + flag, 0);
  if (given < size) faults.notice(0, `${size - given} of ${size} points of the grid are not given`);
  return { kind: 'edition', edition: { description, cells, responses }, origin, messages: faults.messages() };
}

/** For each parameter of the description the detected name it takes: by name, or by order when the counts agree. */
function orderParameters({ inspection }: InspectedFamily, description: FamilyDescription, faults: FileFaults): readonly string[] | null {
  const detected = inspection.detected.parameterNames;
  const known = new Set([...detected, ...inspection.files.flatMap((file) => file.parameters.map(({ name }) => name))]);
  const folded = new Map([...known].map((name) => [parameterId(name).toLowerCase(), name]));
  const byName = description.parameters.map(({ id }) => folded.get(parameterId(id).toLowerCase()));
  if (byName.every((name) => name !== undefined)) return byName;
  if (description.parameters.length === detected.length) {
    const pairs = description.parameters.map(({ id }, i) => `${id} from ${detected[i]}`);
    faults.notice(0, `The parameters were taken in order: ${pairs.join(', ')}`);
    return detected;
  }
  faults.error(0, `The description has the parameters ${description.parameters.map(({ id }) => id).join(', ')}; the files have ${detected.join(', ') || 'none'}`);
  return null;
}

function checkPorts(curves: readonly FamilyCurve[], { ports }: FamilyDescription, faults: FileFaults): void {
  const counts = [...new Set(curves.map((curve) => curve.portCount))];
  if (counts.length > 1) faults.error(0, 'Some files have one port and some have two', 'Import them as two families');
  else if (counts[0] === 1 && (ports === 'x-and-y' || ports === 'te-and-tm')) faults.error(0, `The files have one port; "${ports}" takes two`, 'Choose either, x or y');
}

function checkTimeConvention({ inspection }: InspectedFamily, description: FamilyDescription, faults: FileFaults): void {
  const said = inspection.detected.timeConventionHint;
  if (said !== null && said !== description.timeConvention)
    faults.warn(0, `The files say ${said}; the description says ${description.timeConvention} and holds`, 'Make sure: the wrong one mirrors every phase');
  if (description.timeConvention === 'exp(-jwt)') faults.notice(0, 'The files turn with exp(-jwt): every response was conjugated to exp(+jwt)');
}

/** One entry per cell, by parameters and then by name. */
function entriesOf(curves: readonly FamilyCurve[], names: readonly string[], faults: FileFaults): CellEntry[] {
  const entries = new Map<string, { id: string; parametersMm: number[]; fileHashes: Set<string> }>();
  for (const curve of curves) {
    const values = names.map((name) => curve.parametersMm.find((parameter) => parameter.name === name)?.value);
    const parametersMm = values.filter((value) => value !== undefined);
    if (parametersMm.length < names.length) faults.error(0, `${curve.file} does not give ${names.filter((_, i) => values[i] === undefined).join(', ')}`);
    const entry = entries.get(curve.cellId) ?? { id: curve.cellId, parametersMm, fileHashes: new Set<string>() };
    if (entry.parametersMm.some((value, i) => value !== parametersMm[i]))
      faults.error(0, `${curve.file} gives ${parametersMm.join(', ')} mm for ${curve.cellId}; another file gives ${entry.parametersMm.join(', ')} mm`);
    if (curve.sha256 !== undefined) entry.fileHashes.add(curve.sha256);
    entries.set(curve.cellId, entry);
  }
  const sorted = [...entries.values()].sort((a, b) => compareLists(a.parametersMm, b.parametersMm) || (a.id < b.id ? -1 : 1));
  return sorted.map(({ id, parametersMm, fileHashes }) => ({ id, parametersMm, fileHashes: [...fileHashes].sort() }));
}

function compareLists(a: readonly number[], b: readonly number[]): number {
  const at = a.findIndex((value, i) => value !== b[i]);
  return at < 0 ? 0 : a[at] - b[at];
}

interface Grid {
  readonly thetasDeg: readonly number[];
  readonly phisDeg: readonly number[];
  readonly frequenciesHz: readonly number[];
}

function gridOf(curves: readonly FamilyCurve[], cells: readonly CellEntry[]): Grid {
  if (cells.length === 0) return { thetasDeg: [], phisDeg: [], frequenciesHz: [] };
  const frequencies = new Set<number>();
  for (const { frequenciesHz } of curves) for (const frequencyHz of frequenciesHz) frequencies.add(frequencyHz);
  return {
    thetasDeg: distinct(curves.map((curve) => curve.thetaDeg)),
    phisDeg: distinct(curves.map((curve) => curve.phiDeg)),
    frequenciesHz: distinct([...frequencies]),
  };
}

function distinct(values: readonly number[]): number[] {
  return [...new Set(values)].sort((a, b) => a - b);
}

/** A grid with the place of each of its values. */
interface GridPlaces {
  readonly grid: Grid;
  readonly cellCount: number;
  readonly cellAt: ReadonlyMap<string, number>;
  readonly thetaAt: ReadonlyMap<number, number>;
  readonly phiAt: ReadonlyMap<number, number>;
  readonly frequencyAt: ReadonlyMap<number, number>;
}

function placesOf(cells: readonly CellEntry[], grid: Grid): GridPlaces {
  const place = <Value>(list: readonly Value[]): ReadonlyMap<Value, number> => new Map(list.map((value, i) => [value, i]));
  return {
    grid,
    cellCount: cells.length,
    cellAt: place(cells.map(({ id }) => id)),
    thetaAt: place(grid.thetasDeg),
    phiAt: place(grid.phisDeg),
    frequencyAt: place(grid.frequenciesHz),
  };
}

const placeOf = (curve: FamilyCurve, { cellAt, thetaAt, phiAt }: GridPlaces): { cell: number; theta: number; phi: number } => ({
  cell: cellAt.get(curve.cellId) ?? 0,
  theta: thetaAt.get(curve.thetaDeg) ?? 0,
  phi: phiAt.get(curve.phiDeg) ?? 0,
});

interface FilledGrid extends Pick<ResponseOrigin, 'fileOfCurve' | 'lineOfPoint'> {
  readonly responses: CellEdition['responses'];
}

function fillGrid(curves: readonly FamilyCurve[], places: GridPlaces, isConjugated: boolean): FilledGrid {
  const { grid, cellCount, frequencyAt } = places;
  const curveCount = cellCount * grid.thetasDeg.length * grid.phisDeg.length;
  const size = curveCount * grid.frequenciesHz.length;
  const values = new Float64Array(size * NUMBERS_PER_POINT);
  const present = new Uint8Array(size);
  const lineOfPoint = new Int32Array(size);
  const fileOfCurve = new Array<string | null>(curveCount).fill(null);
  for (const curve of curves) {
    const { cell, theta, phi } = placeOf(curve, places);
    const row = (cell * grid.thetasDeg.length + theta) * grid.phisDeg.length + phi;
    fileOfCurve[row] = curve.file;
    curve.frequenciesHz.forEach((frequencyHz, i) => {
      const point = row * grid.frequenciesHz.length + (frequencyAt.get(frequencyHz) ?? 0);
      present[point] = 1;
      lineOfPoint[point] = curve.lines?.[i] ?? 0;
      writeTerms(values, point * NUMBERS_PER_POINT, { curve, index: i, sign: isConjugated ? -1 : 1 });
    });
  }
  const radians = (degrees: readonly number[]) => Float64Array.from(degrees, (value) => (value * Math.PI) / 180);
  const responses = { cellCount, frequenciesHz: Float64Array.from(grid.frequenciesHz), thetasRad: radians(grid.thetasDeg), phisRad: radians(grid.phisDeg), values, present };
  return { responses, fileOfCurve, lineOfPoint };
}

/** A repeat in the order and the time convention of the table. */
function repeatedCurve(curve: FamilyCurve, places: GridPlaces, isConjugated: boolean): RepeatedCurve {
  const values = new Float64Array(curve.frequenciesHz.length * NUMBERS_PER_POINT);
  curve.frequenciesHz.forEach((_, index) => writeTerms(values, index * NUMBERS_PER_POINT, { curve, index, sign: isConjugated ? -1 : 1 }));
  return { file: curve.file, ...placeOf(curve, places), frequenciesHz: curve.frequenciesHz, values, lines: curve.lines ?? new Int32Array(0) };
}

/** S11, S21, S12, S22 of one point from the row-by-row order of a curve; a one-port stands in both diagonal places. */
function writeTerms(values: Float64Array, at: number, { curve, index, sign }: { readonly curve: FamilyCurve; readonly index: number; readonly sign: number }): void {
  const from = 2 * index * curve.portCount ** 2;
  const order = curve.portCount === 1 ? [0, null, null, 0] : [0, 2, 1, 3];
  order.forEach((term, i) => {
    if (term === null) return;
    values[at + 2 * i] = curve.values[from + 2 * term];
    values[at + 2 * i + 1] = sign * curve.values[from + 2 * term + 1];
  });
}
