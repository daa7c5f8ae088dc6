import { HttpClient, HttpEventType } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { firstValueFrom, map } from 'rxjs';
import type { Observable } from 'rxjs';
import { editionDetail, familyDetail, fileList, inspection, useList } from '../../../shared/contracts/library';
import type { EditionDetail, EditionUse, FamilyDetail, ImportMapping, ImportRequest, Inspection, KeptFile } from '../../../shared/contracts/library';
import type { FamilyDescription } from '../../../shared/model/cell-family';

/** How far an upload is: sent as a share from 0 to 1, then read by the server, then done. */
export type UploadStep<T> =
  | { readonly kind: 'sending'; readonly share: number }
  | { readonly kind: 'reading' }
  | { readonly kind: 'done'; readonly answer: T };

export interface InspectionWish {
  readonly mapping?: ImportMapping;
  readonly description?: FamilyDescription;
}

/** The laboratory's side of the library: imports, publication, files, uses. Fails with HttpErrorResponse: see `failed-call.ts`. */
@Injectable({ providedIn: 'root' })
export class LibraryDesk {
  private readonly http = inject(HttpClient);

  /** Reads files without storing them. */
  inspect(files: readonly File[], wish: InspectionWish): Observable<UploadStep<Inspection>> {
    return this.upload('/api/library/inspections', formOf(files, 'inspection', wish), inspection);
  }

  /** Keeps the files as the first edition of a new family, or as the next of the family given. */
  accept(files: readonly File[], request: ImportRequest, familyId: string | null): Observable<UploadStep<EditionDetail>> {
    const address = familyId === null ? '/api/library/families' : `/api/library/families/${encodeURIComponent(familyId)}/editions`;
    return this.upload(address, formOf(files, 'import', request), editionDetail);
  }

  async family(id: string): Promise<FamilyDetail> {
    return familyDetail.parse(await firstValueFrom(this.http.get(`/api/library/families/${encodeURIComponent(id)}`)));
  }

  async publish(editionId: string, note: string): Promise<EditionDetail> {
    return editionDetail.parse(await firstValueFrom(this.http.post(`/api/library/editions/${encodeURIComponent(editionId)}/publication`, { note })));
  }

  discard = (editionId: string): Promise<unknown> => firstValueFrom(this.http.delete(`/api/library/editions/${encodeURIComponent(editionId)}`));

  async uses(editionId: string): Promise<readonly EditionUse[]> {
    return useList.parse(await firstValueFrom(this.http.get(`/api/library/editions/${encodeURIComponent(editionId)}/uses`))).items;
  }

  async files(editionId: string, after: string | null): Promise<{ readonly items: readonly KeptFile[]; readonly next: string | null }> {
    const params: Record<string, string> = { limit: '100', ...(after === null ? {} : { after }) };
    return fileList.parse(await firstValueFrom(this.http.get(`/api/library/editions/${encodeURIComponent(editionId)}/files`, { params })));
  }

  private upload<T>(address: string, form: FormData, schema: { parse(value: unknown): T }): Observable<UploadStep<T>> {
    return this.http.post<unknown>(address, form, { reportProgress: true, observe: 'events' }).pipe(
      map((event): UploadStep<T> => {
        if (event.type === HttpEventType.Response) return { kind: 'done', answer: schema.parse(event.body) };
        if (event.type !== HttpEventType.UploadProgress) return { kind: 'reading' };
        const share = event.total === undefined ? 0 : event.loaded / event.total;
        return share >= 1 ? { kind: 'reading' } : { kind: 'sending', share };
      }),
    );
  }
}

function formOf(files: readonly File[], field: string, value: unknown): FormData {
  const form = new FormData();
  // The field first: the server reads a form in its order.
  form.append(field, JSON.stringify(value));
  for (const file of files) form.append('files', file, file.name);
  return form;
}
