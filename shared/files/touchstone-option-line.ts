import type { FileFaults } from './file-faults';
import { quoted } from './file-faults';
import { NUMBER_TEXT } from './file-text';
import type { NetworkParameter } from './touchstone-data';
import type { TouchstoneLine } from './touchstone-lines';

export type NumberFormat = 'MA' | 'DB' | 'RI';

/** What the option line says of the numbers below it. */
export interface OptionLine {
  /** Power of ten of the frequency unit. */
  readonly frequencyExponent: number;
  readonly parameter: NetworkParameter;
  readonly format: NumberFormat;
  /** One value, or one per port since version 1.1. */
  readonly referenceOhm: readonly number[];
}

interface OptionTokens {
  unit?: string;
  parameter?: NetworkParameter;
  format?: NumberFormat;
  referenceOhm?: number[];
}

const EXPONENTS: Readonly<Record<string, number>> = { HZ: 0, KHZ: 3, MHZ: 6, GHZ: 9 };
const PARAMETERS: readonly string[] = ['S', 'Y', 'Z', 'H', 'G'];
const FORMATS: readonly string[] = ['MA', 'DB', 'RI'];

/** Reads `# <unit> <parameter> <format> R <n>` with its tokens in any order; what is absent takes the format's default and is told. */
export function readOptionLine(line: TouchstoneLine, faults: FileFaults): OptionLine {
  const tokens = line.text.replace(/^#/, '').trim().split(/\s+/).filter((token) => token !== '');
  const found: OptionTokens = {};
  let at = 0;
  while (at < tokens.length) at = readToken(tokens, at, { found, line, faults });
  tellDefaults(found, line, faults);
  return {
    frequencyExponent: EXPONENTS[found.unit ?? 'GHZ'],
    parameter: found.parameter ?? 'S',
    format: found.format ?? 'MA',
    referenceOhm: found.referenceOhm ?? [50],
  };
}

interface OptionContext {
  readonly found: OptionTokens;
  readonly line: TouchstoneLine;
  readonly faults: FileFaults;
}

function readToken(tokens: readonly string[], at: number, context: OptionContext): number {
  const { found, line, faults } = context;
  const token = tokens[at].toUpperCase();
  if (Object.hasOwn(EXPONENTS, token)) {
    if (found.unit !== undefined) faults.error(line.number, `The option line names two frequency units, ${found.unit} and ${token}`);
    found.unit = token;
  } else if (PARAMETERS.includes(token)) {
    if (found.parameter !== undefined) faults.error(line.number, `The option line names two parameters, ${found.parameter} and ${token}`);
    found.parameter = token as NetworkParameter;
  } else if (FORMATS.includes(token)) {
    if (found.format !== undefined) faults.error(line.number, `The option line names two formats, ${found.format} and ${token}`);
    found.format = token as NumberFormat;
  } else if (token === 'R') {
    return readReference(tokens, at, context);
  } else {
    reportUnknown(tokens[at], context);
  }
  return at + 1;
}

function readReference(tokens: readonly string[], at: number, { found, line, faults }: OptionContext): number {
  const values: number[] = [];
  let next = at + 1;
  while (next < tokens.length && NUMBER_TEXT.test(tokens[next])) {
    values.push(Number(tokens[next]));
    next += 1;
  }
  if (found.referenceOhm !== undefined) faults.error(line.number, 'The option line gives R twice');
  if (values.length === 0) faults.error(line.number, 'R is not followed by a resistance', 'Write R and the reference resistance in ohms, such as R 50');
  for (const value of values.filter((ohm) => !(ohm > 0 && Number.isFinite(ohm))))
    faults.error(line.number, `The reference resistance ${value} is not a positive number of ohms`);
  if (values.length > 1 && next < tokens.length) faults.error(line.number, 'A list of resistances after R must stand last on the option line');
  if (values.length > 0) found.referenceOhm = values;
  return next;
}

function reportUnknown(token: string, { line, faults }: OptionContext): void {
  if (/^[+-]?j|j$/i.test(token)) faults.error(line.number, `${quoted(token)}: the format has no complex reference impedance`);
  else if (/^thz$/i.test(token)) faults.error(line.number, 'THz is not a unit of the format', 'Give the frequencies in GHz');
  else faults.error(line.number, `${quoted(token)} on the option line is not understood`, 'Write # unit parameter format R resistance, such as # GHz S RI R 50');
}

function tellDefaults(found: OptionTokens, line: TouchstoneLine, faults: FileFaults): void {
  const taken: string[] = [];
  if (found.unit === undefined) taken.push('GHz');
  if (found.parameter === undefined) taken.push('S');
  if (found.format === undefined) taken.push('MA');
  if (found.referenceOhm === undefined) taken.push('R 50');
  if (taken.length > 0) faults.notice(line.number, `The option line leaves out ${taken.join(', ')}: the format's default was taken`);
}
