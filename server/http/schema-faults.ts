import type * as z from 'zod';
import { pointerTo } from './json-limits';
import type { Fault } from './problems';

type Issue = z.core.$ZodIssue;
type PointerOf = (path: readonly PropertyKey[]) => string;

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
  return [{ pointer: pointer(path), detail: issue.message }];
}

export const bodyFaults = (error: z.ZodError): Fault[] => error.issues.flatMap((issue) => faultsOfIssue(issue, [], pointerTo));

/** Parameters of path and query are named, not pointed at. */
export const parameterFaults = (error: z.ZodError): Fault[] =>
  error.issues.flatMap((issue) => faultsOfIssue(issue, [], (path) => path.map(String).join('.')));
