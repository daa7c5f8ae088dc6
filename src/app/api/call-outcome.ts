import { firstValueFrom } from 'rxjs';
import type { Observable } from 'rxjs';
import type * as z from 'zod';
import type { Problem } from '../../../shared/contracts/common';
import { failedCall } from './failed-call';

/** What a call brought, or why nothing came. */
export type CallOutcome<T> =
  | { readonly kind: 'found'; readonly value: T }
  | { readonly kind: 'refused'; readonly problem: Problem }
  | { readonly kind: 'unreachable' };

/** Awaits a call and reads its reply by a contract. Throws where the reply breaks the contract: that is a fault of the program. */
export async function callOutcome<T>(call: Observable<unknown>, contract: z.ZodType<T>): Promise<CallOutcome<T>> {
  let body: unknown;
  try {
    body = await firstValueFrom(call);
  } catch (error) {
    const failure = failedCall(error);
    return failure.kind === 'unreachable' ? failure : { kind: 'refused', problem: failure.problem };
  }
  return { kind: 'found', value: contract.parse(body) };
}

/** A failure in one sentence for a person; null of a success. */
export function outcomeText(outcome: CallOutcome<unknown>): string | null {
  if (outcome.kind === 'found') return null;
  if (outcome.kind === 'unreachable') return 'The server is out of reach. Try again in a moment.';
  const { title, detail, requestId } = outcome.problem;
  return `${title}: ${detail}${requestId ? ` (request ${requestId})` : ''}`;
}
