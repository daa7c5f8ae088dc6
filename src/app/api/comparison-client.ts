import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { comparison } from '../../../shared/contracts/comparisons';
import type { Comparison } from '../../../shared/contracts/comparisons';
import { callOutcome } from './call-outcome';
import type { CallOutcome } from './call-outcome';

/** What two states of panels have different. A state is `revision:<id>` or `draft:<panelId>`. */
@Injectable({ providedIn: 'root' })
export class ComparisonClient {
  private readonly http = inject(HttpClient);

  compare(before: string, after: string): Promise<CallOutcome<Comparison>> {
    return callOutcome(this.http.get<unknown>('/api/comparisons', { params: { before, after } }), comparison);
  }
}
