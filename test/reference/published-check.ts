import { readFileSync } from 'node:fs';
import { join } from 'node:path';

/** A number from outside with its source. Names in `inputs` and `expected` carry their units. */
export interface PublishedCheck {
  readonly id: string;
  readonly what: string;
  readonly inputs: Readonly<Record<string, unknown>>;
  readonly expected: Readonly<Record<string, unknown>>;
  readonly tolerance: number | Readonly<Record<string, unknown>>;
  readonly source: string;
}

export type CheckTable = Readonly<Record<string, (check: PublishedCheck) => void>>;

interface CheckFile {
  readonly about: { readonly subject: string };
  readonly checks: readonly PublishedCheck[];
}

const FILES = ['scalar-and-closed-form.json', 'vector-and-statistical.json'];

export function loadChecks(): PublishedCheck[] {
  return FILES.flatMap((name) => (JSON.parse(readFileSync(join(__dirname, 'data', name), 'utf8')) as CheckFile).checks);
}

/** Checks that wait for a part of the product that is not built, and for which. */
export function loadPending(): ReadonlyMap<string, string> {
  const file = JSON.parse(readFileSync(join(__dirname, 'data', 'pending.json'), 'utf8')) as { pending: Record<string, string[]> };
  return new Map(Object.entries(file.pending).flatMap(([waitsFor, ids]) => ids.map((id) => [id, waitsFor] as const)));
}

export function numberIn(record: Readonly<Record<string, unknown>>, name: string): number {
  const value = record[name];
  if (typeof value !== 'number') throw new Error(`${name} is no number`);
  return value;
}

export function numbersIn(record: Readonly<Record<string, unknown>>, name: string): number[] {
  const value = record[name];
  if (!Array.isArray(value) || value.some((item) => typeof item !== 'number')) throw new Error(`${name} is no list of numbers`);
  return value as number[];
}

/** The tolerance of a check under a name, or its single tolerance. */
export function toleranceOf(check: PublishedCheck, name = ''): number {
  if (typeof check.tolerance === 'number') return check.tolerance;
  return numberIn(check.tolerance, name);
}
