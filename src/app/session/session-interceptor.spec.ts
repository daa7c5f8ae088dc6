import { HttpClient, HttpErrorResponse, provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { firstValueFrom } from 'rxjs';
import { sessionOf } from './session-fixture';
import { sessionInterceptor } from './session-interceptor';
import { SessionStore } from './session-store';

const over = { type: '/problems/not-signed-in', title: 'Not signed in', status: 401, detail: 'The session is over.' };
const REFUSED = { status: 401, statusText: 'Unauthorized' };

describe('calls of a session', () => {
  let http: HttpTestingController;
  let client: HttpClient;
  let store: SessionStore;
  const settled = (): Promise<void> => new Promise((done) => setTimeout(done));

  beforeEach(() => {
    TestBed.configureTestingModule({ providers: [provideHttpClient(withInterceptors([sessionInterceptor])), provideHttpClientTesting()] });
    http = TestBed.inject(HttpTestingController);
    client = TestBed.inject(HttpClient);
    store = TestBed.inject(SessionStore);
    store.take(sessionOf(['designer']));
  });
  afterEach(() => http.verify());

  it('are sent again after the access cookie is renewed, with one renewal for all of them', async () => {
    const answers = Promise.all([firstValueFrom(client.get('/api/projects')), firstValueFrom(client.get('/api/team'))]);
    http.expectOne('/api/projects').flush(over, REFUSED);
    http.expectOne('/api/team').flush(over, REFUSED);
    await settled();
    http.expectOne('/api/session').flush(over, REFUSED);
    await settled();
    http.expectOne('/api/session/refresh').flush(sessionOf(['designer']));
    await settled();
    http.expectOne('/api/projects').flush('projects');
    http.expectOne('/api/team').flush('team');
    expect(await answers).toEqual(['projects', 'team']);
  });

  it('wait for the person to sign in again when the session is over, and then carry the new forgery token', async () => {
    const answer = firstValueFrom(client.post('/api/projects', { name: 'A' }, { headers: { 'X-XSRF-TOKEN': 'of the old session' } }));
    http.expectOne('/api/projects').flush(over, REFUSED);
    await settled();
    http.expectOne('/api/session').flush(over, REFUSED);
    await settled();
    http.expectOne('/api/session/refresh').flush(over, REFUSED);
    await settled();
    expect(store.needsSignIn()).toBe(true);
    http.expectNone('/api/projects');
    document.cookie = 'XSRF-TOKEN=of-the-new-session';
    store.take(sessionOf(['designer']));
    await settled();
    const again = http.expectOne('/api/projects');
    expect(again.request.headers.get('X-XSRF-TOKEN')).toBe('of-the-new-session');
    again.flush('made');
    expect(await answer).toBe('made');
    document.cookie = 'XSRF-TOKEN=; max-age=0';
  });

  it('fail as they are for every other refusal', async () => {
    const answer = firstValueFrom(client.get('/api/projects')).catch((error: unknown) => error);
    http.expectOne('/api/projects').flush({}, { status: 403, statusText: 'Forbidden' });
    const error = await answer;
    expect(error).toBeInstanceOf(HttpErrorResponse);
    expect((error as HttpErrorResponse).status).toBe(403);
  });

  it('take a wrong password for an answer, not for an ended session', async () => {
    const answer = firstValueFrom(client.post('/api/session', {})).catch((error: unknown) => error);
    http.expectOne('/api/session').flush(over, REFUSED);
    expect((await answer) as HttpErrorResponse).toMatchObject({ status: 401 });
    expect(store.needsSignIn()).toBe(false);
  });
});
