import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { firstValueFrom, map } from 'rxjs';
import { readBinaryBlock } from '../../../shared/contracts/binary-block';
import type { Comparison } from '../../../shared/contracts/comparisons';
import type { CallOutcome } from './call-outcome';
import { failedCall } from './failed-call';
import { unpackComparison } from './unpack-comparison';
import type { ComparisonBlock } from './unpack-comparison';

/** What two states of panels have different. A state is `revision:<id>` or `draft:<panelId>`. */
@Injectable({ providedIn: 'root' })
export class ComparisonClient {
  private readonly http = inject(HttpClient);

  /** Asks for the binary form: a comparison of large panels is too long for JSON. */
  async compare(before: string, after: string): Promise<CallOutcome<Comparison>> {
    const options = { params: { before, after }, headers: { Accept: 'application/octet-stream' }, responseType: 'arraybuffer' } as const;
    const call = this.http.get('/api/comparisons', options).pipe(map((bytes) => readBinaryBlock(bytes)));
    let block: ComparisonBlock;
    try {
      block = await firstValueFrom(call);
    } catch (error) {
      const failure = failedCall(error);
      return failure.kind === 'unreachable' ? failure : { kind: 'refused', problem: failure.problem };
    }
    return { kind: 'found', value: unpackComparison(block) };
  }
}
