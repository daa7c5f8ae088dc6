import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { readBinaryBlock } from '../../../shared/contracts/binary-block';
import type { BlockArray } from '../../../shared/contracts/binary-block';
import { editionDetail, editionResponsesHead, familyList } from '../../../shared/contracts/library';
import type { EditionDetail, FamilySummary } from '../../../shared/contracts/library';
import type { CellResponseTable } from '../../../shared/model/cell-family';
import { failedCall } from './failed-call';

/** Narrows the list of families; every part is optional. */
export interface FamilySearch {
  readonly text?: string;
  readonly frequencyGHz?: number;
  readonly periodMm?: number;
  readonly thetaDeg?: number;
}

export type EditionWithResponses = EditionDetail & { readonly responses: CellResponseTable };

export type EditionOutcome =
  | { readonly kind: 'found'; readonly edition: EditionWithResponses }
  | { readonly kind: 'missing'; readonly reason: string };

/** Reading the library. A published edition never changes, so each is fetched once. */
@Injectable({ providedIn: 'root' })
export class LibraryClient {
  private readonly http = inject(HttpClient);
  private readonly fetched = new Map<string, Promise<EditionWithResponses>>();

  async families(search: FamilySearch = {}): Promise<readonly FamilySummary[]> {
    const params = Object.fromEntries(Object.entries(search).filter(([, value]) => value !== undefined));
    const body = await firstValueFrom(this.http.get<unknown>('/api/library/families', { params }));
    return familyList.parse(body).items;
  }

  /** An edition with the responses of its cells; the second call for the same edition costs nothing. */
  async edition(editionId: string): Promise<EditionOutcome> {
    const fetching = this.fetched.get(editionId) ?? this.fetchEdition(editionId);
    this.fetched.set(editionId, fetching);
    try {
      return { kind: 'found', edition: await fetching };
    } catch (error) {
      // A failure is not kept, so that the next call tries again.
      this.fetched.delete(editionId);
      const failure = failedCall(error);
      return { kind: 'missing', reason: failure.kind === 'refused' ? failure.problem.detail : 'The server is out of reach' };
    }
  }

  private async fetchEdition(editionId: string): Promise<EditionWithResponses> {
    const address = `/api/library/editions/${encodeURIComponent(editionId)}`;
    const [detail, bytes] = await Promise.all([
      firstValueFrom(this.http.get<unknown>(address)),
      firstValueFrom(this.http.get(`${address}/responses`, { responseType: 'arraybuffer' })),
    ]);
    return { ...editionDetail.parse(detail), responses: responseTable(bytes) };
  }
}

function responseTable(bytes: ArrayBuffer): CellResponseTable {
  const { head, arrays } = readBinaryBlock(bytes);
  const { cellCount } = editionResponsesHead.parse(head);
  return {
    cellCount,
    frequenciesHz: doubles(arrays, 'frequenciesHz'),
    thetasRad: doubles(arrays, 'thetasRad'),
    phisRad: doubles(arrays, 'phisRad'),
    values: doubles(arrays, 'values'),
    present: bytesOf(arrays, 'present'),
  };
}

function doubles(arrays: Readonly<Record<string, BlockArray>>, name: string): Float64Array {
  if (!(name in arrays)) throw new Error(`the responses lack their array ${name}`);
  const array = arrays[name];
  return array instanceof Float64Array ? array : Float64Array.from(array);
}

function bytesOf(arrays: Readonly<Record<string, BlockArray>>, name: string): Uint8Array {
  if (!(name in arrays)) throw new Error(`the responses lack their array ${name}`);
  const array = arrays[name];
  return array instanceof Uint8Array ? array : Uint8Array.from(array);
}
