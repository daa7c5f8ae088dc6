import type * as z from 'zod';
import { pointerTo } from './json-limits';
import type { Fault } from './problems';

type Issue = z.core.$ZodIssue;
type PointerOf = (path: readonly PropertyKey[]) => string;

/** Longer values would fill the answer with what the sender knows. */
const MAX_SHOWN = 40;

function shown(value: unknown): string {
  if (value === undefined) return 'nothing';
  const text = typeof value === 'string' ? `"${value}"` : Array.isArray(value) ? 'a list' : typeof value === 'object' && value !== null ? 'an object' : String(value);
  return text.length > MAX_SHOWN ? `${text.slice(0, MAX_SHOWN)}...` : text;
}

const units: Readonly<Record<string, string>> = { string: ' characters', array: ' entries', set: ' entries' };

function sizeFault(issue: Extract<Issue, { code: 'too_small' | 'too_big' }>): string {
  const [limit, less] = issue.code === 'too_small' ? [issue.minimum, false] : [issue.maximum, true];
  const unit = units[issue.origin];
  if (unit !== undefined) return `must have at ${less ? 'most' : 'least'} ${limit}${unit}`;
  const bound = issue.inclusive === false ? (less ? 'less than' : 'greater than') : less ? 'at most' : 'at least';
  return `must be ${bound} ${limit}; got ${shown(issue.input)}`;
}

const kinds: Readonly<Record<string, string>> = { array: 'a list', object: 'an object', int: 'a whole number', string: 'text', boolean: 'true or false', number: 'a finite number' };
const formats: Readonly<Record<string, string>> = { uuid: 'an id', email: 'an e-mail address', datetime: 'a time such as 2027-01-31T12:00:00Z', url: 'an address' };

/** What is wrong, in words that name the wanted value and the one that came. Texts a schema gives itself stay. */
function faultText(issue: Issue): string {
  // zod's own texts begin so; any other text was written for the field.
  if (!/^(Invalid|Too (small|big)|Unrecognized)/.test(issue.message)) return issue.message;
  switch (issue.code) {
    case 'too_small':
    case 'too_big':
      return sizeFault(issue);
    case 'invalid_type':
      return issue.input === undefined ? 'is missing' : `must be ${kinds[issue.expected] ?? issue.expected}; got ${shown(issue.input)}`;
    case 'invalid_value':
      return `must be ${issue.values.length === 1 ? '' : 'one of '}${issue.values.map(String).join(', ')}; got ${shown(issue.input)}`;
    case 'invalid_format':
      return `must be ${formats[issue.format] ?? `of the form ${issue.pattern ?? issue.format}`}`;
    default:
      return issue.message;
  }
}

/** Faults of one issue; a union gives those of the branch that came nearest, by having the fewest. */
function faultsOfIssue(issue: Issue, before: readonly PropertyKey[], pointer: PointerOf): Fault[] {
  const path = [...before, ...issue.path];
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({ pointer: pointer([...path, key]), detail: 'is not a known field' }));
  }
  if (issue.code === 'invalid_union' && issue.errors.length > 0) {
    const branches = issue.errors.map((branch) => branch.flatMap((inner) => faultsOfIssue(inner, path, pointer)));
    return branches.reduce((best, branch) => (branch.length < best.length ? branch : best));
  }
  return [{ pointer: pointer(path), detail: faultText(issue) }];
}

type Parsed = { readonly success: true; readonly data: unknown } | { readonly success: false; readonly faults: readonly Fault[] };

function parsed(schema: z.ZodType, given: unknown, pointer: PointerOf): Parsed {
  const result = schema.safeParse(given, { reportInput: true });
  if (result.success) return { success: true, data: result.data };
  return { success: false, faults: result.error.issues.flatMap((issue) => faultsOfIssue(issue, [], pointer)) };
}

export const parseBody = (schema: z.ZodType, given: unknown): Parsed => parsed(schema, given, pointerTo);

/** Parameters of path and query are named, not pointed at. */
export const parseParameters = (schema: z.ZodType, given: unknown): Parsed => parsed(schema, given, (path) => path.map(String).join('.'));
