import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { outcomeText } from './call-outcome';
import { ComparisonClient } from './comparison-client';
import { RevisionClient } from './revision-client';

const id = '6f9619ff-8b86-4d01-b42d-00cf4fc964ff';
const refusal = { type: 'about:blank', title: 'Not found', status: 404, detail: 'There is no such revision.', requestId: 'r-7' };
const preview = { archiveName: 'panel-a-rev-3.zip', bytes: 10, sha256: 'a'.repeat(64), files: [{ name: 'elements.csv', bytes: 3, sha256: 'b'.repeat(64), function: 'element layout', head: 'x' }] };

describe('calls about revisions', () => {
  let server: HttpTestingController;
  beforeEach(() => {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    server = TestBed.inject(HttpTestingController);
  });
  afterEach(() => server.verify());

  it('brings the preview of an export', async () => {
    const asked = TestBed.inject(RevisionClient).exportPreview(id);
    server.expectOne(`/api/revisions/${id}/export/preview`).flush(preview);
    expect(await asked).toEqual({ kind: 'found', value: preview });
  });
  it('restores under a key that makes a repeated attempt one revision', async () => {
    const asked = TestBed.inject(RevisionClient).restore(id, 'Back to the wider beam', 'key-1');
    const request = server.expectOne(`/api/revisions/${id}/restoration`);
    expect([request.request.method, request.request.headers.get('Idempotency-Key'), request.request.body]).toEqual(['POST', 'key-1', { message: 'Back to the wider beam' }]);
    request.flush(refusal, { status: 404, statusText: 'Not Found' });
    const outcome = await asked;
    expect(outcomeText(outcome)).toBe('Not found: There is no such revision. (request r-7)');
  });
  it('brings the archive as bytes', async () => {
    const asked = TestBed.inject(RevisionClient).archive(id);
    server.expectOne(`/api/revisions/${id}/export`).flush(new Blob(['zip']));
    expect(await asked).toMatchObject({ kind: 'found' });
  });
  it('says when nobody answers', async () => {
    const asked = TestBed.inject(RevisionClient).list(id);
    server.expectOne(`/api/panels/${id}/revisions`).error(new ProgressEvent('error'));
    expect(outcomeText(await asked)).toContain('out of reach');
  });
  it('asks for a comparison by its two sides and refuses an answer outside the contract', async () => {
    const asked = TestBed.inject(ComparisonClient).compare(`revision:${id}`, `draft:${id}`);
    const request = server.expectOne((one) => one.url === '/api/comparisons');
    expect([request.request.params.get('before'), request.request.params.get('after')]).toEqual([`revision:${id}`, `draft:${id}`]);
    request.flush({ before: {} });
    await expect(asked).rejects.toThrow();
  });
});
