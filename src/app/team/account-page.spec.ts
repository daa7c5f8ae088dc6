import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { sessionOf } from '../session/session-fixture';
import { SessionStore } from '../session/session-store';
import { AccountPage } from './account-page';

const second = { teamId: '6f1c1b7e-58a4-4f0b-9a53-000000000008', teamName: 'Harbour board', roles: ['reviewer' as const] };

describe('account page', () => {
  let fixture: ComponentFixture<AccountPage>;
  let http: HttpTestingController;
  const element = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const settled = async (milliseconds = 0): Promise<void> => {
    await new Promise((done) => setTimeout(done, milliseconds));
    await fixture.whenStable();
  };

  async function open(): Promise<void> {
    Object.assign(globalThis, { ResizeObserver: class { observe(): void {} disconnect(): void {} } });
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    http = TestBed.inject(HttpTestingController);
    const session = sessionOf(['designer']);
    TestBed.inject(SessionStore).take({ ...session, teams: [session.team, second] });
    fixture = TestBed.createComponent(AccountPage);
    await settled();
    http.expectOne('/api/sessions').flush({ items: [] });
    http.expectOne('/api/tokens').flush({ items: [] });
    await settled();
  }

  it('says who one is, and changes the name for every title block', async () => {
    await open();
    expect(element().querySelector('h1')?.textContent).toBe('Designer (demo)');
    [...element().querySelectorAll('button')].find(({ textContent }) => textContent === 'Change the name')?.click();
    await settled();
    const field = document.querySelector<HTMLInputElement>('slant-name-dialog input');
    if (field === null) throw new Error('no dialog opened');
    field.value = 'Dana Designer';
    document.querySelector('slant-name-dialog form')?.dispatchEvent(new Event('submit', { cancelable: true }));
    // The dialog closes over a moment.
    await settled(300);
    const session = sessionOf(['designer']);
    http.expectOne({ method: 'PUT', url: '/api/account' }).flush({ ...session, person: { ...session.person, name: 'Dana Designer' } });
    await settled();
    expect(element().querySelector('h1')?.textContent).toBe('Dana Designer');
  });

  it('offers the teams one belongs to, and works in the chosen one', async () => {
    await open();
    const choice = element().querySelector('select');
    expect([...(choice?.options ?? [])].slice(0, 2).map(({ text }) => text)).toEqual(['Merrow Point', 'Harbour board']);
    if (choice === null) throw new Error('no choice of teams');
    choice.value = second.teamId;
    choice.dispatchEvent(new Event('change'));
    const call = http.expectOne({ method: 'PUT', url: '/api/session/team' });
    expect(call.request.body).toEqual({ teamId: second.teamId });
    call.flush({ ...sessionOf(['reviewer']), team: second });
    await settled();
    expect(TestBed.inject(SessionStore).hasRole('reviewer')).toBe(true);
  });
});
