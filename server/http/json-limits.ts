import type { Fault } from './problems';

const MAX_DEPTH = 32;
/** A body of 1 MB could otherwise yield an answer many times its size. */
const MAX_FAULTS = 100;
const refusedKeys = new Set(['__proto__', 'constructor', 'prototype']);

export const pointerTo = (path: readonly PropertyKey[]): string =>
  `#${path.map((part) => `/${String(part).replaceAll('~', '~0').replaceAll('/', '~1')}`).join('')}`;

function faultOfScalar(value: unknown): string | null {
  // PostgreSQL stores no U+0000, and JSON's 1e400 reads as infinity.
  if (typeof value === 'string' && value.includes('\0')) return 'must not contain the NUL character';
  if (typeof value === 'number' && !Number.isFinite(value)) return 'must be a finite number';
  return null;
}

/** What no JSON body may hold, whatever its schema: too deep nesting, keys that reach prototypes, NUL, infinities. */
export function faultsOfJson(body: unknown): readonly Fault[] {
  const faults: Fault[] = [];
  // An explicit stack: recursion on hostile nesting would overflow before the depth is known.
  const waiting: { value: unknown; path: readonly PropertyKey[] }[] = [{ value: body, path: [] }];
  while (waiting.length > 0 && faults.length < MAX_FAULTS) {
    const { value, path } = waiting.pop() as { value: unknown; path: readonly PropertyKey[] };
    const scalarFault = faultOfScalar(value);
    if (scalarFault !== null) faults.push({ pointer: pointerTo(path), detail: scalarFault });
    if (typeof value !== 'object' || value === null) continue;
    if (path.length >= MAX_DEPTH) return [{ pointer: '#', detail: `must not nest deeper than ${MAX_DEPTH} levels` }];
    for (const [key, inner] of Object.entries(value)) {
      if (!Array.isArray(value) && refusedKeys.has(key)) {
        faults.push({ pointer: pointerTo([...path, key]), detail: 'is not an allowed field name' });
      } else {
        waiting.push({ value: inner, path: [...path, key] });
      }
    }
  }
  return faults;
}
