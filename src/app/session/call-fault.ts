import { failedCall } from '../api/failed-call';

/** What a person is told when a call failed. */
export interface CallFault {
  readonly detail: string;
  /** By the name of the field, taken from the JSON pointer. */
  readonly fields: Readonly<Record<string, string>>;
  /** For support; absent when there was no answer. */
  readonly requestId?: string;
}

/** Reads a failed call for a form. Throws on what is no failed call. */
export function callFault(error: unknown): CallFault {
  const failure = failedCall(error);
  if (failure.kind === 'unreachable') {
    return { detail: 'The server does not answer. What you typed is kept; try again in a moment.', fields: {} };
  }
  const { detail, errors = [], requestId } = failure.problem;
  const fields = Object.fromEntries(errors.map(({ pointer, detail: text }) => [pointer.replace(/^#?\//, '').split('/')[0], text]));
  return { detail, fields, ...(requestId === undefined ? {} : { requestId }) };
}
