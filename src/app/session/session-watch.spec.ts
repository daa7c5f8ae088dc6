import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { sessionOf } from './session-fixture';
import { SessionStore } from './session-store';
import { SessionWatch } from './session-watch';

const MINUTE = 60_000;

describe('watch over the session', () => {
  let fixture: ComponentFixture<SessionWatch>;
  let http: HttpTestingController;
  let store: SessionStore;
  const start = Date.parse('2026-12-01T12:00:00.000Z');
  const warning = (): string | undefined => (fixture.nativeElement as HTMLElement).querySelector('aside')?.textContent?.trim();
  const dialog = (): HTMLDialogElement | null => (fixture.nativeElement as HTMLElement).querySelector('dialog');
  const pass = async (milliseconds: number): Promise<void> => {
    await jest.advanceTimersByTimeAsync(milliseconds);
    fixture.detectChanges();
  };

  beforeEach(() => {
    // The dialog element of the test environment has no modal form; it opens as a plain one.
    HTMLDialogElement.prototype.showModal = function (this: HTMLDialogElement) {
      this.open = true;
    };
    HTMLDialogElement.prototype.close = function (this: HTMLDialogElement) {
      this.open = false;
    };
    jest.useFakeTimers({ now: start });
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    http = TestBed.inject(HttpTestingController);
    store = TestBed.inject(SessionStore);
    store.take(sessionOf(['designer'], start));
    fixture = TestBed.createComponent(SessionWatch);
    fixture.detectChanges();
  });
  afterEach(() => {
    fixture.destroy();
    jest.useRealTimers();
  });

  it('is silent until two minutes before the idle end, then warns and can put it off', async () => {
    await pass(27 * MINUTE);
    expect(warning()).toBeUndefined();
    await pass(1.5 * MINUTE);
    expect(warning()).toContain('ends in 2 min');
    (fixture.nativeElement as HTMLElement).querySelector<HTMLButtonElement>('aside button')?.click();
    http.expectOne('/api/session').flush(sessionOf(['designer'], Date.now()));
    await pass(0);
    expect(warning()).toBeUndefined();
  });

  it('does not warn somebody who works', async () => {
    for (let i = 0; i < 6; i++) {
      await pass(10 * MINUTE);
      store.answered();
    }
    await pass(MINUTE);
    expect(warning()).toBeUndefined();
  });

  it('asks the same person to sign in again, over the page, when the session is over', async () => {
    await pass(30.5 * MINUTE);
    const over = { type: '/problems/not-signed-in', title: 'Not signed in', status: 401, detail: 'The session is over.' };
    http.expectOne('/api/session').flush(over, { status: 401, statusText: 'Unauthorized' });
    await pass(0);
    http.expectOne('/api/session/refresh').flush(over, { status: 401, statusText: 'Unauthorized' });
    await pass(0);
    expect(dialog()?.open).toBe(true);
    expect(dialog()?.textContent).toContain('Your work on this page is still here');
    const email = dialog()?.querySelector<HTMLInputElement>('input[name="email"]');
    expect(email?.value).toBe('designer@merrow.example');
    expect(email?.readOnly).toBe(true);
    store.take(sessionOf(['designer'], Date.now()));
    await pass(0);
    expect(dialog()?.open).toBe(false);
  });

  it('says when the end cannot be put off', async () => {
    store.take({ ...sessionOf(['designer'], start), endsAt: new Date(start + 5 * MINUTE).toISOString() });
    await pass(3.5 * MINUTE);
    expect(warning()).toContain('whatever you do');
    expect((fixture.nativeElement as HTMLElement).querySelector('aside button')).toBeNull();
  });
});
