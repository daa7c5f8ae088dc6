import { HttpErrorResponse } from '@angular/common/http';
import { problem } from '../../../shared/contracts/common';
import type { Problem } from '../../../shared/contracts/common';

/** Why a call brought nothing. */
export type FailedCall =
  /** No answer, or one that says to come back later. */
  | { readonly kind: 'unreachable' }
  | {
      readonly kind: 'refused';
      readonly problem: Problem;
      /** The whole answer, for members that only some refusals have. */
      readonly body: Readonly<Record<string, unknown>>;
    };

/** The server is there but cannot serve now: gateway, overload, restart, too many. */
const TRANSIENT = new Set([0, 408, 429, 502, 503, 504]);

/** Reads a failure of HttpClient; throws on what is none, because that is a fault of the program. */
export function failedCall(error: unknown): FailedCall {
  if (!(error instanceof HttpErrorResponse)) throw error;
  if (TRANSIENT.has(error.status)) return { kind: 'unreachable' };
  const body = bodyOf(error.error);
  const parsed = problem.safeParse(body);
  const told: Problem = parsed.success
    ? parsed.data
    : { type: 'about:blank', title: `Answer ${error.status}`, status: error.status, detail: 'The server refused the call without saying why' };
  return { kind: 'refused', problem: told, body };
}

/** A call for bytes gets its refusal as bytes too. */
function bodyOf(received: unknown): Readonly<Record<string, unknown>> {
  const value: unknown = received instanceof ArrayBuffer ? jsonOf(new TextDecoder().decode(received)) : received;
  return typeof value === 'object' && value !== null ? (value as Readonly<Record<string, unknown>>) : {};
}

function jsonOf(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    if (error instanceof SyntaxError) return null;
    throw error;
  }
}
