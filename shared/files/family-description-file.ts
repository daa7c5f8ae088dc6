import { familyDescription } from '../model/cell-family';
import type { FamilyDescription } from '../model/cell-family';
import { FileFaults } from './file-faults';
import type { FileMessage } from './file-message';
import { decodeFileText } from './file-text';

export interface DescriptionFile {
  readonly kind: 'family' | 'other';
  readonly hint: Partial<FamilyDescription>;
  readonly messages: readonly FileMessage[];
}

/** A description is prose and a few numbers; more than this is something else. */
const MOST_BYTES = 1_000_000;

/** Reads a `family.json`: the whole description when it is valid, otherwise the fields that are valid by themselves. */
export function readDescriptionFile(bytes: Uint8Array): DescriptionFile {
  const faults = new FileFaults();
  const parsed = bytes.length > MOST_BYTES ? undefined : parseJson(decodeFileText(bytes).text, faults);
  if (bytes.length > MOST_BYTES) faults.warn(0, `The description has ${bytes.length} bytes; at most ${MOST_BYTES} are read`);
  if (typeof parsed !== 'object' || parsed === null || Array.isArray(parsed)) return { kind: 'other', hint: {}, messages: faults.messages() };
  const whole = familyDescription.safeParse(parsed);
  if (whole.success) return { kind: 'family', hint: whole.data, messages: faults.messages() };
  const hint = validFields(parsed);
  const names = Object.keys(hint);
  const taken = names.length === 0 ? 'none of its fields could be taken over' : `taken over: ${names.join(', ')}`;
  faults.notice(0, `The description is not in this program's form; ${taken}`);
  return { kind: 'family', hint, messages: faults.messages() };
}

function parseJson(text: string, faults: FileFaults): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    faults.warn(0, `The file is not valid JSON: ${error instanceof Error ? error.message : String(error)}`);
    return undefined;
  }
}

function validFields(parsed: object): Partial<FamilyDescription> {
  const given = new Map<string, unknown>(Object.entries(parsed));
  const fields = Object.entries(familyDescription.shape).flatMap(([name, schema]) => {
    if (!given.has(name)) return [];
    const result = schema.safeParse(given.get(name));
    return result.success ? [[name, result.data]] : [];
  });
  return Object.fromEntries(fields) as Partial<FamilyDescription>;
}
