import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { Role } from '../../../shared/contracts/common';
import type { Invitation, Member } from '../../../shared/contracts/team';
import { sessionOf } from '../session/session-fixture';
import { SessionStore } from '../session/session-store';
import { TeamPage } from './team-page';

const id = (n: number): string => `6f1c1b7e-58a4-4f0b-9a53-${String(n).padStart(12, '0')}`;
const member = (n: number, name: string, roles: Role[], disabled = false): Member => ({
  id: id(n), name, email: `${n}@merrow.example`, roles, disabled, lastSeenAt: null, joinedAt: '2026-12-01T12:00:00.000Z',
});
// The session of the fixture is the person with number 1.
const people = [member(1, 'Designer (demo)', ['administrator']), member(2, 'Nora New', ['reviewer']), member(3, 'Olav Off', [], true)];

describe('team page', () => {
  let fixture: ComponentFixture<TeamPage>;
  let http: HttpTestingController;
  const element = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const settled = async (milliseconds = 0): Promise<void> => {
    await new Promise((done) => setTimeout(done, milliseconds));
    await fixture.whenStable();
  };
  const named = (label: string): HTMLElement => {
    const found = document.querySelector<HTMLElement>(`[aria-label="${label}"]`);
    if (found === null) throw new Error(`nothing is called ${label}`);
    return found;
  };

  async function read(shown: readonly Member[], invitations: readonly Invitation[] | null): Promise<void> {
    http.expectOne('/api/team').flush({ id: id(9), name: 'Merrow Point', peopleCount: shown.length, createdAt: '2026-12-01T12:00:00.000Z' });
    http.expectOne('/api/team/people').flush({ items: shown });
    await settled();
    if (invitations !== null) http.expectOne('/api/team/invitations').flush({ items: invitations });
    await settled();
  }
  async function open(roles: readonly Role[]): Promise<void> {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])] });
    Object.assign(globalThis, { ResizeObserver: class { observe(): void {} disconnect(): void {} } });
    http = TestBed.inject(HttpTestingController);
    TestBed.inject(SessionStore).take(sessionOf(roles));
    fixture = TestBed.createComponent(TeamPage);
    document.body.append(element());
    await settled();
    await read(people, roles.includes('administrator') ? [] : null);
  }
  afterEach(() => {
    http.verify();
    element().remove();
  });

  it('shows everybody with their roles, and changes a role at once', async () => {
    await open(['administrator']);
    expect((named('Nora New, reviewer') as HTMLInputElement).checked).toBe(true);
    named('Nora New, designer').click();
    const call = http.expectOne({ method: 'PATCH', url: `/api/team/people/${id(2)}` });
    expect(call.request.body).toEqual({ roles: ['reviewer', 'designer'] });
    const changed = member(2, 'Nora New', ['reviewer', 'designer']);
    call.flush(changed);
    await settled();
    await read([people[0], changed, people[2]], []);
    expect(element().querySelector('[role="status"]')?.textContent).toContain('Nora New works as reviewer, designer.');
  });

  it('asks before it disables somebody, and lets nobody disable themselves', async () => {
    await open(['administrator']);
    named('Disable Designer (demo)').click();
    await settled();
    expect(document.querySelector('slant-confirm-dialog')).toBeNull();
    named('Disable Nora New').click();
    await settled();
    const dialog = document.querySelector('slant-confirm-dialog');
    expect(dialog?.textContent).toContain('Every session of theirs in this team ends at once');
    [...(dialog?.querySelectorAll('button') ?? [])].find(({ textContent }) => textContent?.trim() === 'Disable')?.click();
    // The dialog closes over a moment.
    await settled(300);
    const call = http.expectOne({ method: 'PATCH', url: `/api/team/people/${id(2)}` });
    expect(call.request.body).toEqual({ disabled: true });
    call.flush(member(2, 'Nora New', ['reviewer'], true));
    await settled();
    await read([people[0], member(2, 'Nora New', ['reviewer'], true)], []);
    expect(named('Enable Nora New').tagName).toBe('BUTTON');
  });

  it('invites by e-mail with the roles that are ticked, and shows a refusal of the address beside it', async () => {
    await open(['administrator']);
    expect(element().textContent).toContain('Nobody is invited');
    const email = element().querySelector<HTMLInputElement>('input[type="email"]');
    if (email === null) throw new Error('no field for the address');
    email.value = 'nora@@merrow';
    element().querySelector('form')?.dispatchEvent(new Event('submit', { cancelable: true }));
    const refused = http.expectOne({ method: 'POST', url: '/api/team/invitations' });
    expect(refused.request.body).toEqual({ email: 'nora@@merrow', roles: ['designer'] });
    const problem = { type: '/problems/invalid-input', title: 'Invalid input', status: 422, detail: 'One field needs another value.', errors: [{ pointer: '#/email', detail: 'is no e-mail address' }] };
    refused.flush(problem, { status: 422, statusText: 'Unprocessable' });
    await settled();
    expect(email.getAttribute('aria-invalid')).toBe('true');
    expect(element().querySelector('.field-fault')?.textContent?.trim()).toBe('is no e-mail address');
    expect(email.value).toBe('nora@@merrow');
  });

  it.each([
    [true, 'its letter stands on the Letters page', '/letters'],
    [false, 'A letter with it is on its way', undefined],
  ])('says truly where the letter is (no mail server: %s)', async (letterBox, text, link) => {
    await open(['administrator']);
    TestBed.inject(SessionStore).take({ ...sessionOf(['administrator']), letterBox });
    const email = element().querySelector<HTMLInputElement>('input[type="email"]');
    if (email === null) throw new Error('no field for the address');
    email.value = 'nora@merrow.example';
    element().querySelector('form')?.dispatchEvent(new Event('submit', { cancelable: true }));
    const invited = { id: id(7), email: email.value, roles: ['designer'], invitedBy: { id: id(1), name: 'Ada' }, createdAt: '2026-12-01T12:00:00.000Z', expiresAt: '2026-12-08T12:00:00.000Z' };
    http.expectOne({ method: 'POST', url: '/api/team/invitations' }).flush(invited);
    await settled();
    await read(people, []);
    const said = element().querySelector('.done');
    expect(said?.textContent).toContain(text);
    expect(said?.querySelector('a')?.getAttribute('href')).toBe(link);
  });

  it('shows people who do not run the team all of it, but lets them change nothing', async () => {
    await open(['designer']);
    expect(element().textContent).toContain('Olav Off');
    expect((named('Nora New, designer') as HTMLInputElement).disabled).toBe(true);
    expect(element().querySelector('form')).toBeNull();
    const rename = [...element().querySelectorAll('button')].find(({ textContent }) => textContent?.trim() === 'Rename');
    expect(rename?.getAttribute('aria-disabled')).toBe('true');
  });
});
