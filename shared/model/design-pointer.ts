/** Reading and replacing parts of a document by JSON pointer (RFC 6901). */

export type Branch = Readonly<Record<string, unknown>> | readonly unknown[];

export function isBranch(value: unknown): value is Branch {
  return typeof value === 'object' && value !== null;
}

/** The steps of a pointer; `/a~1b/0` is `a/b`, `0`. */
export function pointerSteps(pointer: string): readonly string[] {
  if (pointer === '' || pointer === '#') return [];
  const path = pointer.startsWith('#') ? pointer.slice(1) : pointer;
  return path
    .slice(1)
    .split('/')
    .map((step) => step.replace(/~1/g, '/').replace(/~0/g, '~'));
}

export function pointerTo(parent: string, step: string | number): string {
  return `${parent}/${String(step).replace(/~/g, '~0').replace(/\//g, '~1')}`;
}

function child(branch: Branch, step: string): unknown {
  return Array.isArray(branch) ? (branch as readonly unknown[])[Number(step)] : (branch as Readonly<Record<string, unknown>>)[step];
}

/** What stands at a pointer; undefined when nothing does. */
export function valueAt(document: unknown, pointer: string): unknown {
  let value = document;
  for (const step of pointerSteps(pointer)) {
    if (!isBranch(value)) return undefined;
    value = child(value, step);
  }
  return value;
}

/** A copy of the document with another value at the pointer; undefined takes the field or the item away. */
export function replacedAt<T>(document: T, pointer: string, value: unknown): T {
  return replacedBySteps(document, pointerSteps(pointer), value) as T;
}

function replacedBySteps(document: unknown, steps: readonly string[], value: unknown): unknown {
  if (steps.length === 0) return value;
  const [step, ...rest] = steps;
  if (!isBranch(document)) throw new RangeError(`Nothing stands where "${step}" is to be replaced`);
  const inner = replacedBySteps(child(document, step), rest, value);
  if (Array.isArray(document)) {
    const items: unknown[] = [...document];
    if (inner === undefined) items.splice(Number(step), 1);
    else items[Number(step)] = inner;
    return items;
  }
  const fields: Record<string, unknown> = { ...(document as Readonly<Record<string, unknown>>), [step]: inner };
  if (inner === undefined) delete fields[step];
  return fields;
}
