import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { sessionOf } from './session-fixture';
import { SessionStore } from './session-store';

const about = { name: 'Slantwise', version: '0.1.0', demoMode: false, letterBox: false, demoAccounts: [] };
const over = { type: '/problems/not-signed-in', title: 'Not signed in', status: 401, detail: 'The session is over.' };
const REFUSED = { status: 401, statusText: 'Unauthorized' };

describe('session store', () => {
  let http: HttpTestingController;
  let store: SessionStore;
  /** Lets promises run until the next call is on its way. */
  const settled = (): Promise<void> => new Promise((done) => setTimeout(done));

  beforeEach(() => {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    http = TestBed.inject(HttpTestingController);
    store = TestBed.inject(SessionStore);
  });
  afterEach(() => {
    http.verify();
    document.cookie = 'XSRF-TOKEN=; max-age=0';
  });

  it('asks for no session where the browser holds none', async () => {
    const loading = store.load();
    http.expectOne('/api/about').flush(about);
    await loading;
    expect(store.current()).toBeNull();
    expect(store.about()?.version).toBe('0.1.0');
  });

  it('takes the session that still holds', async () => {
    document.cookie = 'XSRF-TOKEN=abc';
    const loading = store.load();
    http.expectOne('/api/about').flush(about);
    await settled();
    http.expectOne('/api/session').flush(sessionOf(['designer']));
    await loading;
    expect(store.hasRole('designer')).toBe(true);
    expect(store.hasRole('administrator')).toBe(false);
  });

  it('renews one whose access has run out, and has none when that is refused', async () => {
    const renewing = store.refresh();
    http.expectOne('/api/session').flush(over, REFUSED);
    await settled();
    http.expectOne('/api/session/refresh').flush(sessionOf(['lab']));
    expect((await renewing)?.team.roles).toEqual(['lab']);

    const again = store.refresh();
    http.expectOne('/api/session').flush(over, REFUSED);
    await settled();
    http.expectOne('/api/session/refresh').flush(over, REFUSED);
    expect(await again).toBeNull();
  });

  it('starts without an answer, so that the sign-in page can say so', async () => {
    const loading = store.load();
    http.expectOne('/api/about').error(new ProgressEvent('error'));
    await loading;
    expect(store.about()).toBeNull();
  });

  it('lets work wait until the same person has signed in again', async () => {
    store.take(sessionOf(['designer']));
    store.lose();
    expect(store.needsSignIn()).toBe(true);
    let went = false;
    const waiting = store.signedIn().then(() => (went = true));
    await settled();
    expect(went).toBe(false);
    store.take(sessionOf(['designer']));
    await waiting;
    expect(store.needsSignIn()).toBe(false);
  });

  it('moves the idle end with every answer, never the last one', () => {
    const before = Date.now() - 20 * 60_000;
    jest.useFakeTimers({ now: before });
    store.take(sessionOf(['designer'], before));
    const { idleMs, lastMs } = store.ends() ?? { idleMs: 0, lastMs: 0 };
    jest.setSystemTime(before + 10 * 60_000);
    store.answered();
    expect((store.ends()?.idleMs ?? 0) - idleMs).toBe(10 * 60_000);
    expect(store.ends()?.lastMs).toBe(lastMs);
    jest.useRealTimers();
  });
});
