import { accountSamples } from './samples/account-samples';
import { exportSamples } from './samples/export-samples';
import { librarySamples } from './samples/library-samples';
import { projectSamples } from './samples/project-samples';
import { runSamples } from './samples/run-samples';
import { teamSamples } from './samples/team-samples';
import type { Api } from './api';
import type { Call } from './api-client';

/** One call of a route with an id in its path, on an object made for it. */
export interface SampleCall extends Call {
  /** The path with real ids. */
  readonly path: string;
}

export interface RouteSample {
  /** Account that may make the call. */
  readonly owner: string;
  /** Another account of the same team without the right, and what it is answered: 403, 404, or 2xx where all may read. */
  readonly teammate: { readonly account: string; readonly status: number };
  readonly okStatus: number;
  /** Makes a fresh object of the owner's, because a call may consume it. */
  readonly prepare: (api: Api) => Promise<SampleCall>;
}

/** `patch /api/team/people/:id` -> its sample. Every route with an id needs one: the access test says which is missing. */
export type RouteSamples = Readonly<Record<string, RouteSample>>;

/** One line per feature. */
export const routeSamples: RouteSamples = {
  ...accountSamples,
  ...exportSamples,
  ...librarySamples,
  ...projectSamples,
  ...runSamples,
  ...teamSamples,
};
