import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { sampleRun } from './sample-run';
import { RunClient } from './run-client';

function client() {
  TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
  return { runs: TestBed.inject(RunClient), http: TestBed.inject(HttpTestingController) };
}

describe('RunClient', () => {
  it('starts a run under a key and reads the reply by its contract', async () => {
    const { runs, http } = client();
    const started = runs.start('p 1', { kind: 'band', parameters: { frequencyCount: 21 } }, 'key-1');
    const call = http.expectOne('/api/panels/p%201/runs');
    expect(call.request.headers.get('Idempotency-Key')).toBe('key-1');
    call.flush(sampleRun({}), { status: 202, statusText: 'Accepted' });
    expect(await started).toEqual({ kind: 'found', value: sampleRun({}) });
  });

  it('tells that a team has too many runs, in the words of the server', async () => {
    const { runs, http } = client();
    const started = runs.start('p', { kind: 'band', parameters: { frequencyCount: 21 } }, 'key-2');
    const problem = { type: '/problems/too-many', title: 'Too many requests', status: 429, detail: 'Your team has 20 runs waiting or under way already.' };
    http.expectOne('/api/panels/p/runs').flush(problem, { status: 429, statusText: 'Too Many Requests' });
    expect(await started).toEqual({ kind: 'refused', problem });
  });

  it('lists the newest of one kind, and cancels', async () => {
    const { runs, http } = client();
    const listed = runs.list('p', 'band');
    const { answer: _answer, ...summary } = sampleRun({});
    http.expectOne('/api/panels/p/runs?kind=band&limit=20').flush({ items: [summary], next: null });
    expect(await listed).toEqual({ kind: 'found', value: [summary] });
    const cancelled = runs.cancel('r');
    http.expectOne({ method: 'POST', url: '/api/runs/r/cancellation' }).flush(sampleRun({ state: 'cancelled' }));
    expect((await cancelled).kind).toBe('found');
  });
});
