import type { FileFaults } from './file-faults';
import { quoted } from './file-faults';
import type { TouchstoneChoices } from './touchstone-data';
import type { TouchstoneLine } from './touchstone-lines';
import { readOptionLine } from './touchstone-option-line';
import type { OptionLine } from './touchstone-option-line';

export type MatrixFormat = 'full' | 'lower' | 'upper';
/** `21_12` is N11 N21 N12 N22, the order of version 1; `12_21` is row by row. */
export type TwoPortOrder = '12_21' | '21_12';

/** Everything before the numbers, and the lines that hold the numbers. */
export interface TouchstoneHeader {
  readonly keywordVersion: '2.0' | '2.1' | null;
  readonly option: OptionLine;
  /** Line of the option line; 0 when a person supplied it. */
  readonly optionLineNumber: number;
  /** Port count the file announces, with its line. */
  readonly announcedPorts?: { readonly count: number; readonly line: number };
  readonly announcedPoints?: { readonly count: number; readonly line: number };
  readonly announcedNoise?: { readonly count: number; readonly line: number };
  readonly twoPortOrder: TwoPortOrder;
  readonly matrixFormat: MatrixFormat;
  readonly referenceOhm?: readonly number[];
  readonly dataLines: readonly TouchstoneLine[];
  readonly noiseLines: readonly TouchstoneLine[];
  /** False when a keyword file stops without `[End]`. */
  readonly isEnded: boolean;
}

/** Finds the option line of a version 1 file. Null when it is missing: its units are then never assumed. */
export function readPlainHeader(lines: readonly TouchstoneLine[], choices: TouchstoneChoices, faults: FileFaults): TouchstoneHeader | null {
  const first = lines[0];
  if (!first.text.startsWith('#')) return readWithoutOptionLine(lines, choices, faults);
  const dataLines = lines.slice(1).filter((line) => isDataLine(line, faults));
  return { ...plainDefaults, option: readOptionLine(first, faults), optionLineNumber: first.number, dataLines };
}

const plainDefaults = {
  keywordVersion: null,
  twoPortOrder: '21_12',
  matrixFormat: 'full',
  noiseLines: [],
  isEnded: true,
} as const;

function readWithoutOptionLine(lines: readonly TouchstoneLine[], choices: TouchstoneChoices, faults: FileFaults): TouchstoneHeader | null {
  const supplied = choices.optionLine?.trim();
  if (supplied === undefined) {
    const late = lines.find((line) => line.text.startsWith('#'));
    const where = late ? `; line ${late.number} has one after the data began` : '';
    faults.error(lines[0].number, `The option line is missing${where}: frequency unit, parameter and format are unknown`, 'Say how the numbers are to be read, such as # GHz S RI R 50');
    return null;
  }
  const suppliedLine = { number: lines[0].number, text: supplied.startsWith('#') ? supplied : `# ${supplied}` };
  faults.notice(lines[0].number, `The option line ${quoted(suppliedLine.text)} was supplied by choice; the file has none`);
  const dataLines = lines.filter((line) => isDataLine(line, faults));
  return { ...plainDefaults, option: readOptionLine(suppliedLine, faults), optionLineNumber: 0, dataLines };
}

function isDataLine(line: TouchstoneLine, faults: FileFaults): boolean {
  if (line.text.startsWith('#')) {
    faults.warn(line.number, `A second option line, ${quoted(line.text)}, is ignored: the first one holds`);
    return false;
  }
  if (line.text.startsWith('[')) {
    faults.error(line.number, `The keyword ${quoted(line.text)} stands in a file that does not begin with [Version]`);
    return false;
  }
  return true;
}
