import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { OwnSessions } from './own-sessions';

const session = (n: number, current: boolean): object => ({
  id: `6f1c1b7e-58a4-4f0b-9a53-${String(n).padStart(12, '0')}`,
  current,
  createdAt: '2026-12-01T12:00:00.000Z',
  lastUsedAt: '2026-12-01T12:30:00.000Z',
  address: '192.0.2.7',
  browser: 'Mozilla/5.0 (X11; Linux x86_64; rv:128.0) Gecko/20100101 Firefox/128.0',
});

describe('own sessions', () => {
  it('mark the one in use, name the browsers, and end the others one by one', async () => {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    const http = TestBed.inject(HttpTestingController);
    const fixture = TestBed.createComponent(OwnSessions);
    const settled = async (): Promise<void> => {
      await new Promise((done) => setTimeout(done));
      await fixture.whenStable();
    };
    const element = fixture.nativeElement as HTMLElement;
    await settled();
    http.expectOne('/api/sessions').flush({ items: [session(1, true), session(2, false)] });
    await settled();
    const lines = [...element.querySelectorAll('tbody tr')].map(({ textContent }) => textContent ?? '');
    expect(lines[0]).toContain('this one');
    expect(lines[1]).toContain('Firefox 128 on Linux');
    element.querySelector<HTMLButtonElement>('[aria-label="End the session of Firefox 128 on Linux at 192.0.2.7"]')?.click();
    http.expectOne({ method: 'DELETE', url: '/api/sessions/6f1c1b7e-58a4-4f0b-9a53-000000000002' }).flush(null);
    await settled();
    http.expectOne('/api/sessions').flush({ items: [session(1, true)] });
    await settled();
    expect(element.querySelectorAll('tbody tr')).toHaveLength(1);
    expect(element.textContent).not.toContain('End all others');
    http.verify();
  });
});
