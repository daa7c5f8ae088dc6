import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { outcomeText } from './call-outcome';
import { RevisionClient } from './revision-client';

const id = '6f9619ff-8b86-4d01-b42d-00cf4fc964ff';
const refusal = { type: 'about:blank', title: 'Not found', status: 404, detail: 'There is no such revision.', requestId: 'r-7' };
const preview = { archiveName: 'panel-a-rev-3.zip', contentBytes: 3, files: [{ name: 'elements.csv', bytes: 3, sha256: 'b'.repeat(64), function: 'element layout', head: 'x' }] };

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
    const bytes = new Blob(['zip']);
    server.expectOne(`/api/revisions/${id}/export`).flush(bytes, { headers: { 'Repr-Digest': 'sha-256=:AAECAwQFBgcICQoLDA0ODxAREhMUFRYXGBkaGxwdHv8=:' } });
    expect(await asked).toEqual({ kind: 'found', value: { bytes, sha256: '000102030405060708090a0b0c0d0e0f101112131415161718191a1b1c1d1eff' } });
  });
  it('brings the archive without a hash where a proxy took it away', async () => {
    const asked = TestBed.inject(RevisionClient).archive(id);
    const bytes = new Blob(['zip']);
    server.expectOne(`/api/revisions/${id}/export`).flush(bytes);
    expect(await asked).toEqual({ kind: 'found', value: { bytes, sha256: null } });
  });
  it('says when nobody answers', async () => {
    const asked = TestBed.inject(RevisionClient).list(id);
    server.expectOne(`/api/panels/${id}/revisions`).error(new ProgressEvent('error'));
    expect(outcomeText(await asked)).toContain('out of reach');
  });
});
