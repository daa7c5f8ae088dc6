import type { FileFaults } from './file-faults';
import type { TouchstoneNoise } from './touchstone-data';
import { readNumber, splitRecords } from './touchstone-records';
import type { TokenLine, TouchstoneRecord } from './touchstone-records';
import { readFrequency, toRectangular } from './touchstone-values';

export const NOISE_NUMBERS = 5;

export interface NoiseLayout {
  readonly frequencyExponent: number;
  /** What a resistance of 1 in the file means: the reference in version 1, an ohm in version 2. */
  readonly resistanceUnitOhm: number;
}

/** Reads noise lines: frequency, minimum figure (dB), optimum reflection (magnitude, degrees), equivalent resistance. */
export function readNoise(lines: readonly TokenLine[], layout: NoiseLayout, faults: FileFaults): TouchstoneNoise {
  const { records } = splitRecords(lines, NOISE_NUMBERS, faults);
  const rows = records
    .filter((record) => record.tokens.length === NOISE_NUMBERS)
    .map((record) => readRow(record, layout, faults))
    .filter((row) => row !== null);
  rows.forEach((row, i) => {
    if (i > 0 && row.frequencyHz <= rows[i - 1].frequencyHz) faults.error(row.line, 'The noise frequencies must rise from line to line');
  });
  return {
    frequenciesHz: Float64Array.from(rows, (row) => row.frequencyHz),
    minimumFigureDb: Float64Array.from(rows, (row) => row.figureDb),
    optimumReflection: Float64Array.from(rows.flatMap((row) => row.optimum)),
    resistanceOhm: Float64Array.from(rows, (row) => row.resistanceOhm),
  };
}

interface NoiseRow {
  readonly line: number;
  readonly frequencyHz: number;
  readonly figureDb: number;
  readonly optimum: readonly [number, number];
  readonly resistanceOhm: number;
}

function readRow(record: TouchstoneRecord, layout: NoiseLayout, faults: FileFaults): NoiseRow | null {
  const frequencyHz = readFrequency(record, layout.frequencyExponent, faults);
  const numbers = record.tokens.slice(1).map((token) => readNumber(token, record.line, faults));
  const [figureDb, magnitude, angleDeg, resistance] = numbers;
  if (frequencyHz === null || figureDb === null || magnitude === null || angleDeg === null || resistance === null) return null;
  const resistanceOhm = resistance * layout.resistanceUnitOhm;
  const optimum = toRectangular(magnitude, angleDeg, 'MA');
  if (![resistanceOhm, ...optimum].every(Number.isFinite)) {
    faults.error(record.line, 'A noise value is too large');
    return null;
  }
  return { line: record.line, frequencyHz, figureDb, optimum, resistanceOhm };
}
