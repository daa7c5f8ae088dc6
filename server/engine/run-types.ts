import type { RunKind } from '../../shared/contracts/runs';
import { bandRunType } from './band-run-type';
import type { RunTypeOf } from './run-type';
import { toleranceRunType } from './tolerance-run-type';

/** One line for each kind of run. */
const runTypes: { readonly [Kind in RunKind]: RunTypeOf<Kind, unknown, unknown> } = {
  band: bandRunType,
  tolerance: toleranceRunType,
};

/** The kind with its parameters' type forgotten: they were checked by the schema of the same kind. */
export function runTypeOf(kind: RunKind): RunTypeOf<RunKind, unknown, unknown> {
  return runTypes[kind] as RunTypeOf<RunKind, unknown, unknown>;
}
