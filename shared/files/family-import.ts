import type { FamilyDescription } from '../model/cell-family';
import { readCellTable } from './cell-table';
import { suggestTableMapping } from './cell-table-mapping';
import { readDescriptionFile } from './family-description-file';
import { baseName, factsOfComments, factsOfName, parameterId } from './family-facts';
import type { FamilySurroundings, FileFacts } from './family-facts';
import { readFamilyIndex, readTableFile } from './family-index';
import type { FamilyIndex } from './family-index';
import type { DetectedNumber, DetectedParameter, FamilyCurve, FamilyMapping, FileCorrection, InspectedFamily, InspectedFile, NamedFile } from './family-inspection';
import { summariseFamily } from './family-summary';
import { FileFaults } from './file-faults';
import type { FileMessage } from './file-message';
import type { CsvTable } from './csv-table';
import type { TouchstoneChoices, TouchstoneData } from './touchstone-data';
import { readTouchstone } from './touchstone-reader';
import { toScattering } from './touchstone-scattering';

/** A family of more files than this is imported in parts. */
const MOST_FILES = 20_000;

interface Import {
  readonly mapping: FamilyMapping;
  readonly faults: FileFaults;
  readonly files: InspectedFile[];
  readonly curves: FamilyCurve[];
  readonly surroundings: FamilySurroundings[];
  index: FamilyIndex | null;
  description: Partial<FamilyDescription>;
}

interface TableFile {
  readonly file: NamedFile;
  readonly table: CsvTable | null;
  readonly kind: 'index' | 'responses' | 'other';
  readonly messages: readonly FileMessage[];
}

/**
 * Looks through the files of an import: network files, an `index.csv`, a `family.json`, tables of responses.
 * Detects what each describes, in the order mapping, index, comments, name; nothing is saved and nothing is guessed silently.
 */
export function inspectFamilyFiles(files: readonly NamedFile[], mapping: FamilyMapping = {}): InspectedFamily {
  const job: Import = { mapping, faults: new FileFaults(), files: [], curves: [], surroundings: [], index: null, description: {} };
  if (files.length > MOST_FILES) job.faults.error(0, `The import has ${files.length} files; at most ${MOST_FILES} are read together`);
  const kept = files.length > MOST_FILES ? [] : files;
  const ignored = new Set(mapping.ignoredFiles ?? []);
  const tables = kept.filter((file) => isTable(file) && !ignored.has(file.name)).map((file): TableFile => ({ file, ...readTableFile(file.bytes) }));
  const index = tables.find(({ kind }) => kind === 'index');
  if (index?.table) job.index = readFamilyIndex(index.table);
  for (const file of kept) {
    const table = tables.find((entry) => entry.file === file);
    if (ignored.has(file.name)) job.files.push(plainEntry(file, 'other', 'ignored', []));
    else if (table !== undefined) inspectTable(table, job);
    else if (/\.json$/i.test(file.name)) inspectDescription(file, job);
    else if (isNetworkFile(file)) inspectNetwork(file, job);
    else job.files.push(plainEntry(file, 'other', 'ignored', [{ severity: 'notice', line: 0, text: 'Neither a response nor a description; kept aside' }]));
  }
  checkIndex(job);
  const repeated = new Set(mapping.repeatFiles ?? []);
  const curves = job.curves.filter(({ file }) => !repeated.has(file));
  const repeats = job.curves.filter(({ file }) => repeated.has(file));
  const detected = summariseFamily(
    {
      files: job.files,
      curves,
      surroundings: job.surroundings,
      description: job.description,
      ...(mapping.parameterNames === undefined ? {} : { parameterNames: mapping.parameterNames }),
      ...(mapping.timeConvention === undefined ? {} : { timeConvention: mapping.timeConvention }),
    },
    job.faults,
  );
  reportGaps(job, curves);
  reportLoneRepeats(repeats, curves, job.faults);
  return { inspection: { files: job.files, detected, messages: job.faults.messages() }, curves, repeats };
}

function isTable(file: NamedFile): boolean {
  return /\.(csv|tsv)$/i.test(file.name);
}

/** By content first: a comment, an option line or a keyword opens a network file; the name decides where the option line is missing. */
function isNetworkFile(file: NamedFile): boolean {
  if (/\.(s\d{1,3}p|ts)$/i.test(file.name)) return true;
  if (/\.(md|html?|pdf|zip|png)$/i.test(file.name)) return false;
  const opening = String.fromCharCode(...file.bytes.subarray(0, 400)).replace(/^(\u00ef\u00bb\u00bf|\u00ff\u00fe|\u00fe\u00ff)/, '').trimStart();
  return /^(!|#\s*([kmg]?hz|s|y|z|r|ri|ma|db)?\b|\[version\])/i.test(opening);
}

function plainEntry(file: NamedFile, kind: InspectedFile['kind'], status: InspectedFile['status'], messages: readonly FileMessage[]): InspectedFile {
  return { name: file.name, kind, status, byteCount: file.bytes.length, ...(file.sha256 === undefined ? {} : { sha256: file.sha256 }), parameters: [], messages };
}

function inspectDescription(file: NamedFile, job: Import): void {
  const read = readDescriptionFile(file.bytes);
  if (read.kind === 'family') job.description = { ...job.description, ...read.hint };
  job.files.push(plainEntry(file, read.kind, read.kind === 'family' ? 'read' : 'ignored', read.messages));
}

function inspectTable({ file, table, kind, messages }: TableFile, job: Import): void {
  const given = job.mapping.tables?.find((entry) => entry.file === file.name);
  if (table === null) job.files.push(plainEntry(file, 'table', 'refused', messages));
  else if (given === undefined && kind === 'index') job.files.push(plainEntry(file, 'index', 'read', messages));
  else if (given === undefined && kind === 'other') job.files.push(plainEntry(file, 'other', 'ignored', messages));
  else {
    const suggestion = suggestTableMapping(table);
    const result = readCellTable(table, given?.mapping ?? suggestion.mapping, file);
    const undecided: FileMessage[] = given ? [] : suggestion.undecided.map(({ column, heading }) => ({ severity: 'warning', line: table.rowLines[0], column: column + 1, text: `The heading "${heading.slice(0, 60)}" does not say what it holds and in which unit`, suggestion: 'Choose it by hand, or leave the column aside' }));
    job.curves.push(...result.curves);
    job.files.push({ ...plainEntry(file, 'table', result.hasErrors ? 'refused' : 'read', [...messages, ...undecided, ...result.messages]), ...bandOf(result.curves) });
  }
}

function bandOf(curves: readonly FamilyCurve[]): Partial<InspectedFile> {
  const ends = curves.flatMap(({ frequenciesHz }) => (frequenciesHz.length === 0 ? [] : [frequenciesHz[0], frequenciesHz[frequenciesHz.length - 1]]));
  if (ends.length === 0) return {};
  const [from, to] = ends.reduce(([low, high], value) => [Math.min(low, value), Math.max(high, value)], [ends[0], ends[0]]);
  const pointCount = curves.reduce((count, curve) => count + curve.frequenciesHz.length, 0);
  return { portCount: curves[0].portCount, pointCount, fromGHz: from / 1e9, toGHz: to / 1e9 };
}

function inspectNetwork(file: NamedFile, job: Import): void {
  const { mapping } = job;
  const keep = mapping.keepFirstRecords?.find((entry) => entry.file === file.name)?.records;
  const optionLine = mapping.optionLines?.find((entry) => entry.file === file.name)?.optionLine;
  const choices: TouchstoneChoices = { ...(keep === undefined ? {} : { keepFirstRecords: keep }), ...(optionLine === undefined ? {} : { optionLine }) };
  const result = readTouchstone(file.bytes, file.name, choices);
  if (result.kind === 'refused') {
    const entry = plainEntry(file, 'touchstone', 'refused', result.messages);
    job.files.push(result.question === undefined ? entry : { ...entry, question: result.question });
    return;
  }
  const { data } = result;
  const facts = joinFacts(file.name, data, job);
  const scattering = toScattering(data);
  const reason = data.portCount > 2 ? `A cell has one or two ports; the file has ${data.portCount}` : scattering.kind === 'impossible' ? scattering.reason : null;
  const converted: FileMessage[] = data.parameter === 'S' || reason !== null ? [] : [{ severity: 'notice', line: 0, text: `${data.parameter} terms were turned into S against ${data.referenceOhm.join(' and ')} ohm` }];
  const messages = [...result.notices, ...converted, ...(reason === null ? [] : [{ severity: 'error' as const, line: 0, text: reason }])];
  job.surroundings.push(facts.surroundings);
  job.files.push({
    ...plainEntry(file, 'touchstone', reason === null ? 'read' : 'refused', messages),
    ...networkEntry(data),
    ...factsEntry(facts),
  });
  if (scattering.kind === 'impossible' || reason !== null) return;
  job.curves.push({
    file: file.name,
    ...(file.sha256 === undefined ? {} : { sha256: file.sha256 }),
    cellId: facts.cellId ?? file.name,
    parametersMm: facts.parameters.map(({ name, value }) => ({ name, value })),
    thetaDeg: facts.thetaDeg?.value ?? 0,
    phiDeg: facts.phiDeg?.value ?? 0,
    portCount: data.portCount,
    frequenciesHz: data.frequenciesHz,
    values: scattering.values,
    ...(data.recordLines === undefined ? {} : { lines: data.recordLines }),
  });
}

function networkEntry(data: TouchstoneData): Partial<InspectedFile> {
  const { frequenciesHz } = data;
  return {
    version: data.version,
    portCount: data.portCount,
    pointCount: frequenciesHz.length,
    fromGHz: frequenciesHz[0] / 1e9,
    toGHz: frequenciesHz[frequenciesHz.length - 1] / 1e9,
    referenceOhm: data.referenceOhm,
  };
}

function factsEntry(facts: FileFacts): Partial<InspectedFile> {
  const { cellId, parameters, thetaDeg, phiDeg, polarisation, provenance, timeConvention } = facts;
  return {
    parameters,
    ...(cellId === undefined ? {} : { cellId }),
    ...(thetaDeg === undefined ? {} : { thetaDeg }),
    ...(phiDeg === undefined ? {} : { phiDeg }),
    ...(polarisation === undefined ? {} : { polarisation }),
    ...(provenance === undefined ? {} : { provenance }),
    ...(timeConvention === undefined ? {} : { timeConvention }),
  };
}

/** A person's word, then the index, then the comments, then the name; parameters come from one source only, so that none counts twice. */
function joinFacts(fileName: string, data: TouchstoneData, job: Import): FileFacts {
  const corrected = factsOfCorrection(job.mapping.corrections?.find((entry) => entry.file === fileName));
  const indexed = job.index?.byFile.get(baseName(fileName));
  const commented = factsOfComments(data.comments);
  const named = factsOfName(fileName);
  const sources = [corrected, indexed, commented, named].filter((facts) => facts !== undefined);
  const first = <Key extends keyof FileFacts>(key: Key): FileFacts[Key] | undefined => sources.find((facts) => facts[key] !== undefined)?.[key];
  const parameters: readonly DetectedParameter[] = sources.find((facts) => facts.parameters.length > 0)?.parameters ?? [];
  const texts = [commented.provenance, indexed?.provenance].filter((text) => text !== undefined);
  return {
    cellId: first('cellId'),
    parameters,
    thetaDeg: first('thetaDeg'),
    phiDeg: first('phiDeg'),
    polarisation: first('polarisation'),
    provenance: texts.length === 0 ? undefined : texts.join('; '),
    timeConvention: commented.timeConvention,
    surroundings: { ...commented.surroundings, ...indexed?.surroundings },
  };
}

function factsOfCorrection(correction: FileCorrection | undefined): FileFacts | undefined {
  if (correction === undefined) return undefined;
  const angle = (value: number | undefined): DetectedNumber | undefined => (value === undefined ? undefined : { value, from: 'mapping' });
  return {
    cellId: correction.cellId,
    parameters: (correction.parametersMm ?? []).map(({ name, value }) => ({ name: parameterId(name), value, from: 'mapping' })),
    thetaDeg: angle(correction.thetaDeg),
    phiDeg: angle(correction.phiDeg),
    surroundings: {},
  };
}

function checkIndex({ index, files, faults }: Import): void {
  if (index === null) return;
  const present = new Set(files.filter((file) => file.kind === 'touchstone').map((file) => baseName(file.name)));
  const absent = index.listed.filter((name) => !present.has(name));
  const unlisted = [...present].filter((name) => !index.byFile.has(name));
  if (absent.length > 0) faults.warn(0, `The index lists ${absent.length} file(s) that are not here: ${absent.slice(0, 5).join(', ')}`);
  if (unlisted.length > 0) faults.warn(0, `${unlisted.length} file(s) are not in the index: ${unlisted.slice(0, 5).join(', ')}`);
}

function reportGaps({ files, faults }: Import, curves: readonly FamilyCurve[]): void {
  const networks = files.filter((file) => file.kind === 'touchstone' && file.status === 'read');
  const refused = files.filter((file) => file.status === 'refused');
  if (curves.length === 0) faults.error(0, 'No file holds a response of a cell');
  if (refused.length > 0) faults.error(0, `${refused.length} file(s) were refused: ${refused.slice(0, 5).map((file) => file.name).join(', ')}`, 'Correct them, or leave them aside');
  if (networks.length > 0 && networks.every((file) => file.thetaDeg === undefined)) faults.notice(0, 'No file names an angle of incidence: normal incidence is taken');
  else if (networks.some((file) => file.thetaDeg === undefined)) faults.warn(0, 'Some files name no angle of incidence: normal incidence is taken for them');
  const bare = networks.filter((file) => file.parameters.length === 0);
  if (bare.length > 0) faults.error(0, `${bare.length} file(s) name no parameter of the cell: ${bare.slice(0, 5).map((file) => file.name).join(', ')}`, 'Give the parameters by hand or in an index.csv');
  const clashes = sameCurve(curves);
  for (const [a, b] of clashes.slice(0, 5)) faults.error(0, `${a.file} and ${b.file} both describe ${a.cellId} at theta ${a.thetaDeg} deg, phi ${a.phiDeg} deg`, 'Leave one of them aside, or say that it measures the cell again');
}

const curveKey = ({ cellId, thetaDeg, phiDeg }: FamilyCurve): string => JSON.stringify([cellId, thetaDeg, phiDeg]);

/** A second measurement needs a first one. */
function reportLoneRepeats(repeats: readonly FamilyCurve[], curves: readonly FamilyCurve[], faults: FileFaults): void {
  const first = new Set(curves.map(curveKey));
  for (const repeat of repeats.filter((curve) => !first.has(curveKey(curve))).slice(0, 5))
    faults.error(0, `${repeat.file} is to measure ${repeat.cellId} at theta ${repeat.thetaDeg} deg, phi ${repeat.phiDeg} deg again, but no other file measures that`, 'Take it as a first measurement, or leave it aside');
}

function sameCurve(curves: readonly FamilyCurve[]): (readonly [FamilyCurve, FamilyCurve])[] {
  const seen = new Map<string, FamilyCurve>();
  const clashes: (readonly [FamilyCurve, FamilyCurve])[] = [];
  for (const curve of curves) {
    const key = curveKey(curve);
    const before = seen.get(key);
    if (before !== undefined) clashes.push([before, curve]);
    else seen.set(key, curve);
  }
  return clashes;
}
