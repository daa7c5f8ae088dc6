import type { FileFaults } from './file-faults';
import { decimalTimesTen } from './file-text';
import type { NetworkParameter } from './touchstone-data';
import type { MatrixFormat, TwoPortOrder } from './touchstone-header';
import type { NumberFormat } from './touchstone-option-line';
import { readNumber } from './touchstone-records';
import type { TouchstoneRecord } from './touchstone-records';

/** How the numbers of a record become the terms of a matrix. */
export interface ValueLayout {
  readonly portCount: number;
  readonly format: NumberFormat;
  readonly frequencyExponent: number;
  readonly twoPortOrder: TwoPortOrder;
  readonly matrixFormat: MatrixFormat;
  readonly parameter: NetworkParameter;
  readonly referenceOhm: readonly number[];
  /** Version 1 divides Y, Z, H and G by the reference; version 2 does not. */
  readonly isNormalised: boolean;
}

export interface ReadValues {
  readonly frequenciesHz: Float64Array;
  readonly values: Float64Array;
  /** Line of each frequency. */
  readonly lines: Int32Array;
  /** Index of the first record that cannot be used, or infinity. */
  readonly firstBad: number;
}

/** Numbers in a record, its frequency included. */
export function recordSize(portCount: number, matrixFormat: MatrixFormat): number {
  return matrixFormat === 'full' ? 1 + 2 * portCount * portCount : 1 + portCount * (portCount + 1);
}

/** For each pair of a record in file order, the places [row * ports + column] it fills. */
function termPlaces(layout: ValueLayout): readonly (readonly number[])[] {
  const n = layout.portCount;
  if (layout.matrixFormat === 'full') {
    const places = Array.from({ length: n * n }, (_, term) => [term]);
    return n === 2 && layout.twoPortOrder === '21_12' ? [[0], [2], [1], [3]] : places;
  }
  const places: number[][] = [];
  for (let row = 0; row < n; row++) {
    const [from, to] = layout.matrixFormat === 'lower' ? [0, row] : [row, n - 1];
    for (let column = from; column <= to; column++)
      places.push(row === column ? [row * n + column] : [row * n + column, column * n + row]);
  }
  return places;
}

/** Factor that turns a version 1 term into siemens, ohms or a ratio; Y_ij goes with 1/sqrt(R_i R_j), Z_ij with sqrt(R_i R_j). */
function termScale(layout: ValueLayout, place: number): number {
  const n = layout.portCount;
  const row = Math.floor(place / n);
  const column = place % n;
  const ohm = Math.sqrt(layout.referenceOhm[row] * layout.referenceOhm[column]);
  if (!layout.isNormalised || layout.parameter === 'S') return 1;
  if (layout.parameter === 'Z') return ohm;
  if (layout.parameter === 'Y') return 1 / ohm;
  if (row !== column) return 1;
  // h11 is an impedance and h22 an admittance; g11 and g22 the other way round.
  return (layout.parameter === 'H') === (row === 0) ? ohm : 1 / ohm;
}

/** Turns records into frequencies and terms. Equal repeats are merged, unequal ones and falling frequencies are faults. */
export function readValues(records: readonly TouchstoneRecord[], layout: ValueLayout, faults: FileFaults): ReadValues {
  const places = termPlaces(layout);
  const scales = Array.from({ length: layout.portCount ** 2 }, (_, place) => termScale(layout, place));
  const width = 2 * layout.portCount ** 2;
  const size = recordSize(layout.portCount, layout.matrixFormat);
  const frequenciesHz = new Float64Array(records.length);
  const values = new Float64Array(records.length * width);
  const lines = new Int32Array(records.length);
  const row = new Float64Array(width);
  let count = 0;
  let firstBad = Number.POSITIVE_INFINITY;
  records.forEach((record, index) => {
    if (record.tokens.length !== size) return;
    const frequencyHz = readFrequency(record, layout.frequencyExponent, faults);
    const isRead = readTerms(record, { layout, places, scales, row }, faults);
    const last = count > 0 ? frequenciesHz[count - 1] : Number.NEGATIVE_INFINITY;
    if (frequencyHz === null || !isRead) firstBad = Math.min(firstBad, index);
    else if (frequencyHz > last) {
      frequenciesHz[count] = frequencyHz;
      values.set(row, count * width);
      lines[count] = record.line;
      count += 1;
    } else if (frequencyHz === last && row.every((value, i) => value === values[(count - 1) * width + i])) {
      faults.warn(record.line, `The frequency ${frequencyHz} Hz stands twice with the same values; it was merged`);
    } else {
      firstBad = Math.min(firstBad, index);
      reportOrder(record.line, frequencyHz, last, faults);
    }
  });
  return { frequenciesHz: frequenciesHz.slice(0, count), values: values.slice(0, count * width), lines: lines.slice(0, count), firstBad };
}

function reportOrder(line: number, frequencyHz: number, lastHz: number, faults: FileFaults): void {
  if (frequencyHz === lastHz) faults.error(line, `The frequency ${frequencyHz} Hz stands twice with different values`, 'Keep one of the two');
  else faults.error(line, `The frequency falls from ${lastHz} Hz to ${frequencyHz} Hz; it must rise from line to line`);
}

/** The frequency of a record in Hz, or null with a fault. */
export function readFrequency(record: TouchstoneRecord, exponent: number, faults: FileFaults): number | null {
  const token = record.tokens[0];
  if (readNumber(token, record.line, faults) === null) return null;
  const frequencyHz = decimalTimesTen(token.replace(/[dD]/, 'e'), exponent);
  if (frequencyHz >= 0 && Number.isFinite(frequencyHz)) return frequencyHz === 0 ? 0 : frequencyHz;
  faults.error(record.line, `${token} is not a possible frequency`);
  return null;
}

interface TermReading {
  readonly layout: ValueLayout;
  readonly places: readonly (readonly number[])[];
  readonly scales: readonly number[];
  readonly row: Float64Array;
}

function readTerms(record: TouchstoneRecord, reading: TermReading, faults: FileFaults): boolean {
  let isRead = true;
  reading.places.forEach((places, pair) => {
    const first = readNumber(record.tokens[1 + 2 * pair], record.line, faults);
    const second = readNumber(record.tokens[2 + 2 * pair], record.line, faults);
    if (first === null || second === null) {
      isRead = false;
      return;
    }
    const [re, im] = toRectangular(first, second, reading.layout.format);
    for (const place of places) {
      const scale = reading.scales[place];
      reading.row[2 * place] = re * scale;
      reading.row[2 * place + 1] = im * scale;
      if (Number.isFinite(re * scale) && Number.isFinite(im * scale)) continue;
      faults.error(record.line, `The pair ${first} ${second} is too large a value`);
      isRead = false;
    }
  });
  return isRead;
}

/** DB is 20 log10 |x|; angles are in degrees. */
export function toRectangular(first: number, second: number, format: NumberFormat): readonly [re: number, im: number] {
  if (format === 'RI') return [first, second];
  const magnitude = format === 'DB' ? 10 ** (first / 20) : first;
  const phaseRad = (second * Math.PI) / 180;
  return [magnitude * Math.cos(phaseRad), magnitude * Math.sin(phaseRad)];
}
