import type { FileQuestion } from './family-inspection';
import { FileFaults } from './file-faults';
import { decodeFileText } from './file-text';
import { TOUCHSTONE_LIMITS } from './touchstone-data';
import type { TouchstoneChoices, TouchstoneComment, TouchstoneData, TouchstoneNoise, TouchstoneResult, TouchstoneVersion } from './touchstone-data';
import { readPlainHeader } from './touchstone-header';
import type { TouchstoneHeader } from './touchstone-header';
import { readKeywordHeader } from './touchstone-keywords';
import { splitTouchstoneLines } from './touchstone-lines';
import { readNoise } from './touchstone-noise';
import { noiseStart, portCountOfFirstRecord, reportComma, splitRecords, tokenLines } from './touchstone-records';
import type { TokenLine, TouchstoneRecord } from './touchstone-records';
import { readValues, recordSize } from './touchstone-values';
import type { ValueLayout } from './touchstone-values';

/**
 * Reads a network file of version 1.0, 1.1, 2.0 or 2.1.
 * A damaged file is refused with every fault and its line; nothing is guessed, dropped or turned into zero without being told.
 * Inverse: `writeTouchstone`.
 */
export function readTouchstone(bytes: Uint8Array, fileName: string, choices: TouchstoneChoices = {}): TouchstoneResult {
  const faults = new FileFaults();
  const limits = choices.limits ?? TOUCHSTONE_LIMITS;
  if (bytes.length > limits.bytes) {
    faults.error(0, `The file has ${bytes.length} bytes; at most ${limits.bytes} are read`);
    return { kind: 'refused', messages: faults.messages() };
  }
  const { lines, comments } = splitTouchstoneLines(decodeFileText(bytes), faults);
  if (lines.length === 0) {
    faults.error(0, bytes.length === 0 ? 'The file is empty' : 'The file holds comments but no data');
    return { kind: 'refused', messages: faults.messages() };
  }
  const header = lines[0].text.startsWith('[') ? readKeywordHeader(lines, faults) : readPlainHeader(lines, choices, faults);
  if (header === null) return refusedHeader(lines[0].text, faults);
  return readBody({ header, comments, fileName, choices, faults });
}

function refusedHeader(firstLine: string, faults: FileFaults): TouchstoneResult {
  const isOptionMissing = !firstLine.startsWith('[');
  const messages = faults.messages();
  return isOptionMissing ? { kind: 'refused', messages, question: { kind: 'option-line' } } : { kind: 'refused', messages };
}

interface Reading {
  readonly header: TouchstoneHeader;
  readonly comments: readonly TouchstoneComment[];
  readonly fileName: string;
  readonly choices: TouchstoneChoices;
  readonly faults: FileFaults;
}

function readBody(reading: Reading): TouchstoneResult {
  const { header, choices, faults } = reading;
  const lines = tokenLines(header.dataLines);
  if (lines.length === 0) faults.error(header.optionLineNumber, 'The file has a header but no data');
  const portCount = lines.length === 0 ? null : decidePortCount(lines, reading);
  if (portCount === null || faults.hasErrors) return { kind: 'refused', messages: faults.messages() };
  const noiseAt = header.keywordVersion === null && portCount === 2 ? noiseStart(lines) : lines.length;
  const layout = layoutOf(header, portCount);
  const size = recordSize(portCount, layout.matrixFormat);
  // A kept beginning is judged by itself: what is wrong further down is no longer part of the file.
  const sizeFaults = choices.keepFirstRecords === undefined ? faults : new FileFaults();
  const { records, firstBad, firstWrapped } = splitRecords(lines.slice(0, noiseAt), size, sizeFaults);
  if (exceedsLimits(records, reading)) return { kind: 'refused', messages: faults.messages() };
  if (firstWrapped !== null && header.keywordVersion === null && portCount <= 2)
    faults.warn(firstWrapped, `A record goes on over several lines; ${portCount} port(s) take one line per frequency`);
  const kept = keepFirst(records, firstBad, reading);
  const read = readValues(kept, layout, faults);
  const completeRecords = Math.min(firstBad, read.firstBad, records.length);
  if (choices.keepFirstRecords === undefined) checkAnnounced(records, reading);
  const noise = kept.length < records.length ? undefined : noiseOf(lines.slice(noiseAt), layout, reading);
  if (faults.hasErrors) return refusedRecords(completeRecords, reading);
  const data: TouchstoneData = {
    version: versionOf(header),
    portCount,
    parameter: header.option.parameter,
    frequenciesHz: read.frequenciesHz,
    values: read.values,
    recordLines: read.lines,
    referenceOhm: layout.referenceOhm,
    comments: reading.comments,
    ...(noise === undefined ? {} : { noise }),
  };
  return { kind: 'read', data, notices: faults.messages() };
}

function refusedRecords(completeRecords: number, { faults, choices }: Reading): TouchstoneResult {
  const question: FileQuestion = { kind: 'keep-complete-records', completeRecords };
  const messages = faults.messages();
  return completeRecords > 0 && choices.keepFirstRecords === undefined ? { kind: 'refused', messages, question } : { kind: 'refused', messages };
}

function versionOf(header: TouchstoneHeader): TouchstoneVersion {
  return header.keywordVersion ?? (header.option.referenceOhm.length > 1 ? '1.1' : '1.0');
}

/** The port count on which the first record, the name and the header agree; every disagreement is a fault that names both numbers. */
function decidePortCount(lines: readonly TokenLine[], { header, fileName, faults, choices }: Reading): number | null {
  const first = lines[0];
  const announced = header.announcedPorts;
  const named = portsInName(fileName);
  const shown = header.matrixFormat === 'full' ? portCountOfFirstRecord(lines) : (announced?.count ?? null);
  if (shown === null) {
    if (!reportComma(first, faults)) faults.error(first.number, `The first record holds ${first.tokens.length} number(s) on its line; no port count has such a record`, 'One port takes 3 numbers, two ports 9, n ports 1 + 2 n^2');
    return null;
  }
  if (named !== null && named !== shown) faults.error(first.number, `The name says ${named} port(s); the first record shows ${shown}`, 'Rename the file or export it again');
  if (announced !== undefined && announced.count !== shown)
    faults.error(announced.line, `[Number of Ports] says ${announced.count}; the first record on line ${first.number} shows ${shown}`);
  checkPorts(shown, header, faults);
  const most = (choices.limits ?? TOUCHSTONE_LIMITS).ports;
  if (shown > most) faults.error(first.number, `The file has ${shown} ports; at most ${most} are read`);
  return shown;
}

function checkPorts(portCount: number, { option, optionLineNumber }: TouchstoneHeader, faults: FileFaults): void {
  const { parameter, referenceOhm } = option;
  if ((parameter === 'H' || parameter === 'G') && portCount !== 2) faults.error(optionLineNumber, `${parameter} terms exist for two ports only; the file has ${portCount}`);
  if (referenceOhm.length > 1 && referenceOhm.length !== portCount)
    faults.error(optionLineNumber, `R gives ${referenceOhm.length} resistances for ${portCount} port(s)`);
}

function portsInName(fileName: string): number | null {
  const match = /\.s(\d{1,3})p$/i.exec(fileName);
  return match ? Number(match[1]) : null;
}

function layoutOf(header: TouchstoneHeader, portCount: number): ValueLayout {
  const given = header.referenceOhm ?? header.option.referenceOhm;
  return {
    portCount,
    format: header.option.format,
    frequencyExponent: header.option.frequencyExponent,
    twoPortOrder: header.twoPortOrder,
    matrixFormat: header.matrixFormat,
    parameter: header.option.parameter,
    referenceOhm: given.length === portCount ? given : Array.from({ length: portCount }, () => given[0]),
    isNormalised: header.keywordVersion === null,
  };
}

/** Judged before the arrays for the values are made. */
function exceedsLimits(records: readonly TouchstoneRecord[], { choices, faults }: Reading): boolean {
  const most = (choices.limits ?? TOUCHSTONE_LIMITS).points;
  if (records.length <= most) return false;
  faults.error(records[most].line, `The file has ${records.length} frequencies; at most ${most} are read`);
  return true;
}

function keepFirst(records: readonly TouchstoneRecord[], firstBad: number, { choices, faults }: Reading): readonly TouchstoneRecord[] {
  const keep = choices.keepFirstRecords;
  if (keep === undefined) return records;
  const complete = Math.min(firstBad, records.length);
  if (!Number.isInteger(keep) || keep < 1 || keep > complete) {
    faults.error(0, `${keep} records were to be kept; the file has ${complete} complete ones at its beginning`);
    return [];
  }
  faults.notice(records[keep - 1].line, `Only the first ${keep} of ${records.length} records are kept, by choice`);
  return records.slice(0, keep);
}

function checkAnnounced(records: readonly TouchstoneRecord[], { header, faults }: Reading): void {
  const announced = header.announcedPoints;
  const lastLine = records[records.length - 1].line;
  const isShort = announced !== undefined && announced.count !== records.length;
  if (isShort) faults.error(announced.line, `[Number of Frequencies] says ${announced.count}; ${records.length} were found`);
  if (!header.isEnded && !isShort) faults.warn(lastLine, '[End] is missing; the announced frequencies are all there');
  if (!header.isEnded && isShort) faults.error(lastLine, '[End] is missing: the file is cut off');
}

function noiseOf(implicit: readonly TokenLine[], layout: ValueLayout, { header, faults }: Reading): TouchstoneNoise | undefined {
  const lines = header.keywordVersion === null ? implicit : tokenLines(header.noiseLines);
  const announced = header.announcedNoise;
  if (announced !== undefined && announced.count !== lines.length)
    faults.error(announced.line, `[Number of Noise Frequencies] says ${announced.count}; ${lines.length} line(s) were found`);
  if (lines.length === 0) return undefined;
  if (layout.portCount !== 2) {
    faults.error(lines[0].number, `Noise stands in a file of ${layout.portCount} port(s); it belongs to two-ports`);
    return undefined;
  }
  const resistanceUnitOhm = layout.isNormalised ? layout.referenceOhm[0] : 1;
  return readNoise(lines, { frequencyExponent: layout.frequencyExponent, resistanceUnitOhm }, faults);
}
