import type { FileFaults } from './file-faults';
import { quoted } from './file-faults';
import { NUMBER_TEXT } from './file-text';
import type { MatrixFormat, TouchstoneHeader, TwoPortOrder } from './touchstone-header';
import { trimBlanks } from './touchstone-lines';
import type { TouchstoneLine } from './touchstone-lines';
import { readOptionLine } from './touchstone-option-line';
import type { OptionLine } from './touchstone-option-line';

interface KeywordState {
  version?: '2.0' | '2.1';
  option?: OptionLine;
  optionLineNumber: number;
  ports?: { count: number; line: number };
  points?: { count: number; line: number };
  noise?: { count: number; line: number };
  order?: TwoPortOrder;
  format?: MatrixFormat;
  reference: number[];
  referenceLine: number;
  section: 'header' | 'reference' | 'information' | 'data' | 'noise' | 'end';
  sawData: boolean;
  readonly seen: Map<string, number>;
  readonly dataLines: TouchstoneLine[];
  readonly noiseLines: TouchstoneLine[];
}

type KeywordReader = (state: KeywordState, value: string, line: TouchstoneLine, faults: FileFaults) => void;

/** Reads the keywords of a version 2.0 or 2.1 file. Null when what they say does not suffice to read the numbers. */
export function readKeywordHeader(lines: readonly TouchstoneLine[], faults: FileFaults): TouchstoneHeader | null {
  const state: KeywordState = {
    optionLineNumber: 0,
    reference: [],
    referenceLine: 0,
    section: 'header',
    sawData: false,
    seen: new Map(),
    dataLines: [],
    noiseLines: [],
  };
  for (const line of lines) readLine(state, line, faults);
  checkKeywords(state, lines[lines.length - 1].number, faults);
  if (state.version === undefined || state.option === undefined || !state.sawData) return null;
  return {
    keywordVersion: state.version,
    option: state.option,
    optionLineNumber: state.optionLineNumber,
    announcedPorts: state.ports,
    announcedPoints: state.points,
    announcedNoise: state.noise,
    twoPortOrder: state.order ?? '12_21',
    matrixFormat: state.format ?? 'full',
    referenceOhm: state.reference.length > 0 ? state.reference : undefined,
    dataLines: state.dataLines,
    noiseLines: state.noiseLines,
    isEnded: state.section === 'end',
  };
}

interface Keyword {
  /** In lower case, with single spaces. */
  readonly name: string;
  readonly value: string;
}

function splitKeyword(text: string): Keyword | null {
  const close = text.startsWith('[') ? text.indexOf(']') : -1;
  if (close < 0) return null;
  const words = text.slice(1, close).toLowerCase().split(/[ \t]+/);
  return { name: words.filter((word) => word !== '').join(' '), value: trimBlanks(text.slice(close + 1)) };
}

function readLine(state: KeywordState, line: TouchstoneLine, faults: FileFaults): void {
  if (state.section === 'end') {
    faults.warnOnce('after-end', line.number, { text: `${quoted(line.text)} after [End] is ignored` });
    return;
  }
  const keyword = splitKeyword(line.text);
  if (state.section === 'information' && keyword?.name !== 'end information') return;
  if (keyword) readKeyword(state, keyword, line, faults);
  else if (line.text.startsWith('#')) readOption(state, line, faults);
  else readBody(state, line, faults);
}

function readKeyword(state: KeywordState, keyword: Keyword, line: TouchstoneLine, faults: FileFaults): void {
  const { name, value } = keyword;
  const reader = KEYWORDS.get(name);
  if (!reader) {
    faults.error(line.number, `The keyword ${quoted(`[${name}]`)} is not part of version 2.0 or 2.1`);
    return;
  }
  const before = state.seen.get(name);
  if (before !== undefined) faults.error(line.number, `[${name}] stands twice; first on line ${before}`);
  state.seen.set(name, line.number);
  if (state.section === 'reference') state.section = 'header';
  if ((state.section === 'data' || state.section === 'noise') && !['noise data', 'end'].includes(name))
    faults.error(line.number, `[${name}] stands after [Network Data]`);
  reader(state, value, line, faults);
}

function readOption(state: KeywordState, line: TouchstoneLine, faults: FileFaults): void {
  if (state.option !== undefined) faults.warn(line.number, `A second option line, ${quoted(line.text)}, is ignored: the first one holds`);
  else {
    state.option = readOptionLine(line, faults);
    state.optionLineNumber = line.number;
  }
}

function readBody(state: KeywordState, line: TouchstoneLine, faults: FileFaults): void {
  if (state.section === 'data') state.dataLines.push(line);
  else if (state.section === 'noise') state.noiseLines.push(line);
  else if (state.section === 'reference') readResistances(state, line.text, line, faults);
  else faults.error(line.number, `${quoted(line.text)} stands before [Network Data] and belongs to no keyword`);
}

function readResistances(state: KeywordState, text: string, line: TouchstoneLine, faults: FileFaults): void {
  for (const token of text.split(/\s+/).filter((part) => part !== '')) {
    const ohm = NUMBER_TEXT.test(token) ? Number(token) : Number.NaN;
    if (ohm > 0 && Number.isFinite(ohm)) state.reference.push(ohm);
    else faults.error(line.number, `${quoted(token)} after [Reference] is not a positive number of ohms`);
  }
}

function readCount(value: string, line: TouchstoneLine, faults: FileFaults): { count: number; line: number } | undefined {
  if (/^\d{1,9}$/.test(value) && Number(value) > 0) return { count: Number(value), line: line.number };
  faults.error(line.number, `${quoted(line.text)} does not give a whole number above 0`);
  return undefined;
}

const KEYWORDS: ReadonlyMap<string, KeywordReader> = new Map<string, KeywordReader>([
  ['version', readVersion],
  ['number of ports', readPorts],
  ['number of frequencies', (state, value, line, faults) => void (state.points = readCount(value, line, faults))],
  ['number of noise frequencies', (state, value, line, faults) => void (state.noise = readCount(value, line, faults))],
  ['two-port data order', readOrder],
  ['matrix format', readMatrixFormat],
  ['reference', readReference],
  ['mixed-mode order', (_state, _value, line, faults) => faults.error(line.number, 'Mixed-mode terms are not responses of a cell to a wave', 'Export the single-ended S of the cell')],
  ['begin information', (state) => void (state.section = 'information')],
  ['end information', readEndInformation],
  ['network data', beginData],
  ['noise data', (state) => void (state.section = 'noise')],
  ['end', (state) => void (state.section = 'end')],
]);

function readVersion(state: KeywordState, value: string, line: TouchstoneLine, faults: FileFaults): void {
  if (value === '2.0' || value === '2.1') state.version = value;
  else faults.error(line.number, `Version ${quoted(value)} is not read; 1.0, 1.1, 2.0 and 2.1 are`);
}

function readPorts(state: KeywordState, value: string, line: TouchstoneLine, faults: FileFaults): void {
  if (state.option === undefined) faults.error(line.number, '[Number of Ports] stands before the option line');
  state.ports = readCount(value, line, faults);
}

function readOrder(state: KeywordState, value: string, line: TouchstoneLine, faults: FileFaults): void {
  if (value === '12_21' || value === '21_12') state.order = value;
  else faults.error(line.number, `[Two-Port Data Order] is 12_21 or 21_12; got ${quoted(value)}`);
}

function readMatrixFormat(state: KeywordState, value: string, line: TouchstoneLine, faults: FileFaults): void {
  const format = value.toLowerCase();
  if (format === 'full' || format === 'lower' || format === 'upper') state.format = format;
  else faults.error(line.number, `[Matrix Format] is Full, Lower or Upper; got ${quoted(value)}`);
}

function readReference(state: KeywordState, value: string, line: TouchstoneLine, faults: FileFaults): void {
  state.section = 'reference';
  state.referenceLine = line.number;
  readResistances(state, value, line, faults);
}

function readEndInformation(state: KeywordState, _value: string, line: TouchstoneLine, faults: FileFaults): void {
  if (state.section !== 'information') faults.error(line.number, '[End Information] has no [Begin Information] before it');
  else state.section = 'header';
}

function beginData(state: KeywordState): void {
  state.section = 'data';
  state.sawData = true;
}

/** What must be there, what must not, and what must agree. */
function checkKeywords(state: KeywordState, lastLine: number, faults: FileFaults): void {
  if (state.section === 'information') faults.error(lastLine, '[Begin Information] is never closed by [End Information]');
  if (state.option === undefined) faults.error(lastLine, 'The option line is missing', 'Write one after [Version], such as # GHz S RI R 50');
  if (!state.seen.has('number of ports')) faults.error(lastLine, '[Number of Ports] is missing');
  if (!state.seen.has('number of frequencies')) faults.error(lastLine, '[Number of Frequencies] is missing');
  if (!state.sawData) faults.error(lastLine, '[Network Data] is missing');
  const ports = state.ports?.count;
  const orderLine = state.seen.get('two-port data order');
  if (ports === 2 && orderLine === undefined)
    faults.error(state.ports?.line ?? lastLine, '[Two-Port Data Order] is missing: S21 and S12 cannot be told apart', 'Add [Two-Port Data Order] 12_21 or 21_12');
  if (ports !== undefined && ports !== 2 && orderLine !== undefined) faults.error(orderLine, `[Two-Port Data Order] stands in a file of ${ports} port(s)`);
  if (ports !== undefined && state.reference.length > 0 && state.reference.length !== ports)
    faults.error(state.referenceLine, `[Reference] gives ${state.reference.length} resistance(s) for ${ports} port(s)`);
  if (state.seen.has('reference') && state.reference.length === 0) faults.error(state.referenceLine, '[Reference] gives no resistance');
  checkNoiseKeywords(state, faults);
}

function checkNoiseKeywords(state: KeywordState, faults: FileFaults): void {
  const noiseLine = state.seen.get('noise data');
  const countLine = state.seen.get('number of noise frequencies');
  if (noiseLine !== undefined && countLine === undefined) faults.error(noiseLine, '[Noise Data] stands without [Number of Noise Frequencies]');
  if (noiseLine === undefined && countLine !== undefined) faults.error(countLine, '[Number of Noise Frequencies] stands without [Noise Data]');
}
