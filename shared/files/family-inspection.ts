import type { FamilyDescription, PortMeaning } from '../model/cell-family';
import type { FileMessage } from './file-message';

/** One file of an import: its name and its bytes as they came. */
export interface NamedFile {
  readonly name: string;
  readonly bytes: Uint8Array;
  /** SHA-256 of the bytes, lower-case hexadecimal; kept on every cell read from the file. */
  readonly sha256?: string;
}

/** Where a detected value was found; `mapping` is a person's own word and wins over the rest. */
export type DetectionSource = 'mapping' | 'comment' | 'index' | 'file-name' | 'table';

export interface DetectedNumber {
  readonly value: number;
  readonly from: DetectionSource;
}

export interface DetectedParameter extends DetectedNumber {
  /** The parameter as an identifier of the description: `patch_side_mm` becomes `patchSide`. The value is in mm. */
  readonly name: string;
}

/** What a file turned out to be, judged by its content and then by its name. */
export type InspectedFileKind = 'touchstone' | 'table' | 'index' | 'family' | 'other';

/** A decision a refused file waits for; the answer goes into the mapping. */
export type FileQuestion =
  | { readonly kind: 'keep-complete-records'; readonly completeRecords: number }
  | { readonly kind: 'option-line' };

/** What one file holds. All fields can be carried by JSON. */
export interface InspectedFile {
  readonly name: string;
  readonly kind: InspectedFileKind;
  readonly status: 'read' | 'refused' | 'ignored';
  readonly byteCount: number;
  readonly sha256?: string;
  /** Touchstone version of a network file. */
  readonly version?: string;
  readonly portCount?: number;
  readonly pointCount?: number;
  readonly fromGHz?: number;
  readonly toGHz?: number;
  readonly referenceOhm?: readonly number[];
  readonly cellId?: string;
  readonly parameters: readonly DetectedParameter[];
  readonly thetaDeg?: DetectedNumber;
  readonly phiDeg?: DetectedNumber;
  /** The file's own words about ports and polarisation. */
  readonly polarisation?: string;
  readonly provenance?: string;
  readonly timeConvention?: FamilyDescription['timeConvention'];
  readonly question?: FileQuestion;
  readonly messages: readonly FileMessage[];
}

/** What the files say together about the family they describe. */
export interface DetectedFamily {
  /** 0 when no response was read, otherwise the largest port count among the responses. */
  readonly portCount: number;
  /** Names of the parameters in the order in which an edition would hold them. */
  readonly parameterNames: readonly string[];
  readonly thetasDeg: readonly number[];
  readonly phisDeg: readonly number[];
  readonly frequencyRangeGHz: { readonly from: number; readonly to: number } | null;
  readonly frequencyCount: number;
  readonly cellCount: number;
  readonly portsHint: PortMeaning | null;
  readonly provenanceHint: FamilyDescription['provenance'] | null;
  readonly timeConventionHint: FamilyDescription['timeConvention'] | null;
  /** Fields of the description the files fill in by themselves; a person completes and confirms them. */
  readonly descriptionHint: Partial<FamilyDescription>;
}

/** The preview of an import: what was found, file by file and as a whole. All of it can be carried by JSON. */
export interface FamilyInspection {
  readonly files: readonly InspectedFile[];
  readonly detected: DetectedFamily;
  /** Messages about the set as a whole; those about one file stand on that file. */
  readonly messages: readonly FileMessage[];
}

/** How one column of a CSV table of responses is read. */
export type TableColumnRole =
  | { readonly role: 'cell' }
  | { readonly role: 'parameter'; readonly name: string; readonly unit: 'm' | 'mm' | 'um' | 'in' | 'mil' }
  | { readonly role: 'frequency'; readonly unit: 'Hz' | 'kHz' | 'MHz' | 'GHz' }
  | { readonly role: 'theta'; readonly unit: 'deg' | 'rad' }
  | { readonly role: 'phi'; readonly unit: 'deg' | 'rad' }
  | { readonly role: 'response'; readonly term: ResponseTerm; readonly part: 'dB' | 'magnitude' | 'real' | 'imaginary' }
  | { readonly role: 'response'; readonly term: ResponseTerm; readonly part: 'phase'; readonly unit: 'deg' | 'rad' };

export type ResponseTerm = 'S11' | 'S21' | 'S12' | 'S22';

/** One column of a table and what it holds. Columns that are not listed are left aside. */
export interface TableColumn {
  /** Column from 0. */
  readonly column: number;
  readonly holds: TableColumnRole;
}

/** How a CSV table of cell responses is read. */
export interface CellTableMapping {
  readonly columns: readonly TableColumn[];
  /** Row that holds the headings, from 1; data start below it. 0 when there is none. */
  readonly headerRow: number;
  /** What happens to rows with a blank or non-numeric response: `refuse` the table or leave the point `missing`. */
  readonly blanks: 'refuse' | 'missing';
}

/** A person's decisions about an import; every part is optional. File entries name their file. */
export interface FamilyMapping {
  /** Files to leave aside. */
  readonly ignoredFiles?: readonly string[];
  /** Files that measure cells again: they are compared with the first measurement and kept out of the table. */
  readonly repeatFiles?: readonly string[];
  /** Option lines for files that have none, such as `# GHz S RI R 50`. */
  readonly optionLines?: readonly { readonly file: string; readonly optionLine: string }[];
  /** Cut-off files of which only the first complete records are kept: a recorded choice. */
  readonly keepFirstRecords?: readonly { readonly file: string; readonly records: number }[];
  /** What a file describes, where detection is wrong or silent. */
  readonly corrections?: readonly FileCorrection[];
  readonly tables?: readonly { readonly file: string; readonly mapping: CellTableMapping }[];
  /** Order and choice of the parameters by name; detection decides when absent. */
  readonly parameterNames?: readonly string[];
  /** How the files' numbers turn in time; wins over what the files say. */
  readonly timeConvention?: FamilyDescription['timeConvention'];
}

/** What a file describes, in a person's word. */
export interface FileCorrection {
  readonly file: string;
  readonly cellId?: string;
  readonly parametersMm?: readonly { readonly name: string; readonly value: number }[];
  readonly thetaDeg?: number;
  readonly phiDeg?: number;
}

/** One response read from a file: a curve over frequency for one cell at one incidence. Not for JSON. */
export interface FamilyCurve {
  readonly file: string;
  readonly sha256?: string;
  readonly cellId: string;
  readonly parametersMm: readonly { readonly name: string; readonly value: number }[];
  readonly thetaDeg: number;
  readonly phiDeg: number;
  /** 1 or 2. */
  readonly portCount: number;
  readonly frequenciesHz: Float64Array;
  /** re, im pairs in the order [frequency][row][column], as in the file: not yet conjugated. */
  readonly values: Float64Array;
  /** Line of each frequency in the file, where known. */
  readonly lines?: Int32Array;
}

/** The outcome of an inspection: the part that is shown, and the numbers it speaks of. */
export interface InspectedFamily {
  readonly inspection: FamilyInspection;
  readonly curves: readonly FamilyCurve[];
  /** Cells measured again: compared with the curves, not part of the family. */
  readonly repeats: readonly FamilyCurve[];
}
