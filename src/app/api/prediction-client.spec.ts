import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { firstValueFrom } from 'rxjs';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { PredictionClient } from './prediction-client';

/** ASCII alone, in a buffer of the test's own realm. */
const bytesOf = (value: object): ArrayBuffer => Uint8Array.from(JSON.stringify(value), (letter) => letter.charCodeAt(0)).buffer;
const refusal = (status: number) => ({ type: 'about:blank', title: 'Refused', status, detail: 'Two faults', errors: [{ pointer: '#/design/panel', detail: 'too many cells' }] });

describe('PredictionClient', () => {
  let client: PredictionClient;
  let server: HttpTestingController;
  beforeEach(() => {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    client = TestBed.inject(PredictionClient);
    server = TestBed.inject(HttpTestingController);
  });
  afterEach(() => server.verify());

  const asked = () => firstValueFrom(client.predict({ design: STARTING_DESIGN }, 'panel-1'));

  it('asks for bytes and names its preview', async () => {
    const answer = asked();
    const { request } = server.expectOne('/api/predictions');
    expect(request.headers.get('Accept')).toBe('application/octet-stream');
    expect(request.headers.get('Slantwise-Preview')).toBe('panel-1');
    server.match('/api/predictions');
    void answer;
  });

  it('reads the faults of a refused design although the call was for bytes', async () => {
    const answer = asked();
    server.expectOne('/api/predictions').flush(bytesOf(refusal(422)), { status: 422, statusText: 'Unprocessable' });
    expect(await answer).toMatchObject({ kind: 'failed', problem: { status: 422, errors: [{ pointer: '#/design/panel', detail: 'too many cells' }] } });
  });

  it('tells an overtaken request from a failure', async () => {
    const answer = asked();
    server.expectOne('/api/predictions').flush(bytesOf(refusal(409)), { status: 409, statusText: 'Conflict' });
    expect(await answer).toEqual({ kind: 'superseded' });
  });

  it('says that the server is out of reach', async () => {
    const answer = asked();
    server.expectOne('/api/predictions').error(new ProgressEvent('error'));
    expect(await answer).toEqual({ kind: 'unreachable' });
  });
});
