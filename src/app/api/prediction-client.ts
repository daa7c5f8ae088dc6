import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { catchError, map, of } from 'rxjs';
import type { Observable } from 'rxjs';
import { readBinaryBlock } from '../../../shared/contracts/binary-block';
import type { BlockArray } from '../../../shared/contracts/binary-block';
import type { Problem } from '../../../shared/contracts/common';
import { predictionHead } from '../../../shared/contracts/predictions';
import type { PredictionHead, PredictionRequest } from '../../../shared/contracts/predictions';
import { failedCall } from './failed-call';

export type PredictionAnswer =
  | { readonly kind: 'predicted'; readonly block: { readonly head: PredictionHead; readonly arrays: Readonly<Record<string, BlockArray>> } }
  /** A newer request of the same preview took its place before it started. */
  | { readonly kind: 'superseded' }
  | { readonly kind: 'failed'; readonly problem: Problem }
  | { readonly kind: 'unreachable' };

@Injectable({ providedIn: 'root' })
export class PredictionClient {
  private readonly http = inject(HttpClient);

  /** Asks once, on subscription; unsubscribing cancels. `previewName` groups requests of which only the newest matters. */
  predict(request: PredictionRequest, previewName: string): Observable<PredictionAnswer> {
    const headers = { Accept: 'application/octet-stream', 'Slantwise-Preview': previewName };
    return this.http.post('/api/predictions', request, { headers, responseType: 'arraybuffer' }).pipe(
      map((bytes): PredictionAnswer => {
        const block = readBinaryBlock(bytes);
        return { kind: 'predicted', block: { head: predictionHead.parse(block.head), arrays: block.arrays } };
      }),
      catchError((error: unknown) => of(answerOfFailure(error))),
    );
  }
}

function answerOfFailure(error: unknown): PredictionAnswer {
  const failure = failedCall(error);
  if (failure.kind === 'unreachable') return failure;
  if (failure.problem.status === 409) return { kind: 'superseded' };
  return { kind: 'failed', problem: failure.problem };
}
