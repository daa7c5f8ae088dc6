import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { PasswordForm } from './password-form';

describe('change of the password', () => {
  let fixture: ComponentFixture<PasswordForm>;
  let http: HttpTestingController;
  const element = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const settled = async (): Promise<void> => {
    await new Promise((done) => setTimeout(done));
    await fixture.whenStable();
  };
  const field = (id: string): HTMLInputElement => {
    const found = element().querySelector<HTMLInputElement>(`#${id}`);
    if (found === null) throw new Error(`no field ${id}`);
    return found;
  };
  const send = (): boolean | undefined => {
    field('currentPassword').value = 'old';
    field('newPassword').value = 'lantern quay seven gulls';
    return element().querySelector('form')?.dispatchEvent(new Event('submit', { cancelable: true }));
  };

  beforeEach(async () => {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(PasswordForm);
    await settled();
  });
  afterEach(() => http.verify());

  it('ends the other sessions unless it is told not to', async () => {
    send();
    const call = http.expectOne({ method: 'PUT', url: '/api/account/password' });
    expect(call.request.body).toEqual({ currentPassword: 'old', newPassword: 'lantern quay seven gulls', endOtherSessions: true });
    call.flush(null);
    await settled();
    expect(element().querySelector('[role="status"]')?.textContent).toBe('The password is changed.');
  });

  it('shows each fault at its field', async () => {
    expect(field('newPassword').getAttribute('aria-invalid')).toBe('false');
    send();
    const problem = { type: '/problems/invalid-input', title: 'Invalid input', status: 422, detail: 'Two fields need another value.', errors: [{ pointer: '#/currentPassword', detail: 'is not your password' }, { pointer: '#/newPassword', detail: 'is made of common words' }] };
    http.expectOne('/api/account/password').flush(problem, { status: 422, statusText: 'Unprocessable' });
    await settled();
    expect([...element().querySelectorAll('[role="alert"]')].map(({ textContent }) => textContent?.trim())).toEqual(['is not your password', 'is made of common words']);
    expect(field('currentPassword').getAttribute('aria-invalid')).toBe('true');
    expect(element().querySelector('[role="status"]')).toBeNull();
  });
});
