import { openEntrance } from './entrance-rig';
import { NewPasswordPage } from './new-password-page';

describe('new password by letter', () => {
  it('sends the token of the address with the new password, and says that sessions have ended', async () => {
    const { element, http, settled, field, send } = await openEntrance(NewPasswordPage, 'KGztorVPvOJuIGa2c8rr');
    field('#newPassword').value = 'harbour winch nine ropes';
    send();
    const call = http.expectOne('/api/password-resets/completion');
    expect(call.request.body).toEqual({ token: 'KGztorVPvOJuIGa2c8rr', newPassword: 'harbour winch nine ropes' });
    call.flush(null);
    await settled();
    expect(element.querySelector('[role="status"]')?.textContent).toContain('every session of the account has ended');
    expect(element.querySelector('form')).toBeNull();
  });

  it('asks for the whole link when the token is missing', async () => {
    const { element } = await openEntrance(NewPasswordPage);
    expect(element.querySelector('[role="alert"]')?.textContent).toContain('lacks its token');
    expect(element.querySelector('form')).toBeNull();
  });

  it('keeps what was typed when the server refuses it, with the rule at the field', async () => {
    const { element, http, settled, field, send } = await openEntrance(NewPasswordPage, 'KGztorVPvOJuIGa2c8rr');
    field('#newPassword').value = 'short';
    send();
    const problem = { type: '/problems/invalid-input', title: 'Invalid input', status: 422, detail: 'One field needs another value.', errors: [{ pointer: '#/newPassword', detail: 'must have at least 15 characters' }] };
    http.expectOne('/api/password-resets/completion').flush(problem, { status: 422, statusText: 'Unprocessable' });
    await settled();
    expect(field('#newPassword').value).toBe('short');
    expect(element.querySelector('#newPassword-rule')?.textContent?.trim()).toBe('must have at least 15 characters');
  });
});
