import { TestBed } from '@angular/core/testing';
import { openEntrance } from './entrance-rig';
import { ForgottenPasswordPage } from './forgotten-password-page';
import { SessionStore } from './session-store';

describe('forgotten password', () => {
  it('promises a letter only if the address has an account', async () => {
    const { element, http, settled, field, send } = await openEntrance(ForgottenPasswordPage);
    field('input[name="email"]').value = 'nora@merrow.example';
    send();
    const call = http.expectOne('/api/password-resets');
    expect(call.request.body).toEqual({ email: 'nora@merrow.example' });
    call.flush(null, { status: 202, statusText: 'Accepted' });
    await settled();
    expect(element.querySelector('[role="status"]')?.textContent).toContain('If nora@merrow.example has an account');
    http.verify();
  });

  it('says where letters go while no mail server is set', async () => {
    const { element, http, settled, field, send } = await openEntrance(ForgottenPasswordPage);
    field('input[name="email"]').value = 'nora@merrow.example';
    const loading = TestBed.inject(SessionStore).load();
    http.expectOne('/api/about').flush({ name: 'Slantwise', version: '0.1.0', demoMode: true, letterBox: true, demoAccounts: [] });
    await loading;
    send();
    http.expectOne('/api/password-resets').flush(null);
    await settled();
    expect(element.textContent).toContain('No mail server is set');
  });

  it('shows what is wrong with the address', async () => {
    const { element, http, settled, field, send } = await openEntrance(ForgottenPasswordPage);
    send();
    const problem = { type: '/problems/invalid-input', title: 'Invalid input', status: 422, detail: 'One field needs another value.', errors: [{ pointer: '#/email', detail: 'is no e-mail address' }] };
    http.expectOne('/api/password-resets').flush(problem, { status: 422, statusText: 'Unprocessable' });
    await settled();
    expect(element.querySelector('[role="alert"]')?.textContent).toBe('is no e-mail address');
    expect(field('input[name="email"]').getAttribute('aria-invalid')).toBe('true');
  });
});
