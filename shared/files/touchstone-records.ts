import type { FileFaults } from './file-faults';
import { quoted } from './file-faults';
import { NUMBER_TEXT } from './file-text';
import { reportForeign } from './touchstone-lines';
import type { TouchstoneLine } from './touchstone-lines';

/** The numbers of one frequency, still as text, with the line its frequency stands on. */
export interface TouchstoneRecord {
  readonly line: number;
  readonly tokens: readonly string[];
}

/** One content line as numbers still in text. */
export interface TokenLine {
  readonly number: number;
  readonly tokens: readonly string[];
}

const NOISE_NUMBERS = 5;

/** Cuts lines into tokens. Commas are never separators here: they are either a decimal comma or a foreign table. */
export function tokenLines(lines: readonly TouchstoneLine[]): TokenLine[] {
  return lines.map((line) => ({ number: line.number, tokens: line.text.split(/[ \t]+/) }));
}

/**
 * The port count that the first record shows: a frequency line has an odd count of numbers and its continuations an even one,
 * and n ports take 1 + 2 n^2 of them. Null, with a fault, when no port count fits.
 */
export function portCountOfFirstRecord(lines: readonly TokenLine[]): number | null {
  if (lines.length === 0) return null;
  let total = lines[0].tokens.length;
  for (let i = 1; i < lines.length && lines[i].tokens.length % 2 === 0; i++) total += lines[i].tokens.length;
  // A cut second line looks like a continuation of the first; then the first line alone decides.
  return portsFor(total) ?? portsFor(lines[0].tokens.length);
}

function portsFor(numbers: number): number | null {
  const ports = Math.round(Math.sqrt((numbers - 1) / 2));
  return ports >= 1 && 1 + 2 * ports * ports === numbers ? ports : null;
}

export interface RecordSplit {
  readonly records: readonly TouchstoneRecord[];
  /** Index of the first record of another size, or infinity. */
  readonly firstBad: number;
  /** Line of the first record that goes on over further lines, or null. */
  readonly firstWrapped: number | null;
}

/** Groups lines into records of `size` numbers, and reports each record that has more or fewer. */
export function splitRecords(lines: readonly TokenLine[], size: number, faults: FileFaults): RecordSplit {
  const records: TouchstoneRecord[] = [];
  let firstWrapped: number | null = null;
  let firstBad = Number.POSITIVE_INFINITY;
  let at = 0;
  while (at < lines.length) {
    const start = lines[at];
    const tokens = [...start.tokens];
    at += 1;
    while (at < lines.length && tokens.length < size && lines[at].tokens.length % 2 === 0) {
      for (const token of lines[at].tokens) tokens.push(token);
      firstWrapped ??= start.number;
      at += 1;
    }
    if (tokens.length !== size) {
      firstBad = Math.min(firstBad, records.length);
      reportSize(start, { got: tokens.length, size, isLast: at >= lines.length }, faults);
    }
    records.push({ line: start.number, tokens });
  }
  return { records, firstBad, firstWrapped };
}

function reportSize(line: TokenLine, { got, size, isLast }: { got: number; size: number; isLast: boolean }, faults: FileFaults): void {
  if (reportComma(line, faults)) return;
  const cut = isLast && got < size ? 'The last record is cut off: it' : 'The record';
  faults.error(line.number, `${cut} holds ${got} number(s) where ${size} belong`);
}

/** Reports the first token with a comma, the usual cause of a record of the wrong size. */
export function reportComma(line: TokenLine, faults: FileFaults): boolean {
  const comma = line.tokens.find((token) => token.includes(','));
  if (comma !== undefined) reportToken(comma, line.number, faults);
  return comma !== undefined;
}

/** Where the noise of a version 1 two-port begins: five numbers at a frequency below the one before. */
export function noiseStart(lines: readonly TokenLine[]): number {
  let last = Number.NEGATIVE_INFINITY;
  for (let i = 0; i < lines.length; i++) {
    const { tokens } = lines[i];
    const frequency = Number(tokens[0]);
    if (tokens.length === NOISE_NUMBERS && frequency < last) return i;
    if (tokens.length % 2 === 1 && Number.isFinite(frequency)) last = frequency;
  }
  return lines.length;
}

/** A token as a number, or null with a fault that names the likely cause. */
export function readNumber(token: string, line: number, faults: FileFaults): number | null {
  if (NUMBER_TEXT.test(token)) {
    const value = Number(token);
    if (Number.isFinite(value)) return value;
    faults.error(line, `${quoted(token)} is too large a number`);
    return null;
  }
  const fortran = token.replace(/^([+-]?[\d.]+)[dD]([+-]?\d+)$/, '$1E$2');
  if (fortran !== token && NUMBER_TEXT.test(fortran)) {
    faults.warnOnce('d-exponent', line, { text: `${quoted(token)} has a D exponent; it was read as E` });
    return readNumber(fortran, line, faults);
  }
  reportToken(token, line, faults);
  return null;
}

function reportToken(token: string, line: number, faults: FileFaults): void {
  if (/^[+-]?(nan|inf)/i.test(token)) faults.error(line, `${quoted(token)} is not a finite number`, 'Measure or compute the point again, or leave it out');
  else if (/^[+-]?\d+,\d+$/.test(token)) faults.error(line, `${quoted(token)} has a decimal comma; the decimal sign is a point`, 'Export the file again with decimal points');
  else if (token.includes(',')) faults.error(line, `${quoted(token)} is separated by commas; the numbers are separated by blanks`, 'Export the file again, or import it as a table');
  else if (/[^\x20-\x7E]/.test(token)) reportForeign(token, line, faults);
  else faults.error(line, `${quoted(token)} is not a number`);
}
