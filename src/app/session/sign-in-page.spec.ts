import { TestBed } from '@angular/core/testing';
import { Router } from '@angular/router';
import { openEntrance } from './entrance-rig';
import type { EntranceRig } from './entrance-rig';
import { SessionStore } from './session-store';
import { sessionOf } from './session-fixture';
import { SignInPage } from './sign-in-page';

const demoAccounts = [{ email: 'designer@merrow.example', role: 'designer' }, { email: 'lab@merrow.example', role: 'lab' }];

describe('sign-in page', () => {
  async function opened(about: object): Promise<EntranceRig> {
    const rig = await openEntrance(SignInPage);
    const loading = TestBed.inject(SessionStore).load();
    rig.http.expectOne('/api/about').flush({ name: 'Slantwise', version: '0.1.0', demoMode: false, letterBox: false, demoAccounts: [], ...about });
    await loading;
    await rig.settled();
    return rig;
  }

  it('says that the server does not answer until it does', async () => {
    const { element } = await openEntrance(SignInPage);
    expect(element.querySelector('slant-fault-note')?.textContent).toContain('does not answer yet');
  });

  it('shows no demo accounts where there are none', async () => {
    const { element } = await opened({});
    expect(element.textContent).not.toContain('Demo');
  });

  it('fills in the address of a demo account, never its password', async () => {
    const { element, settled, field } = await opened({ demoMode: true, demoAccounts });
    [...element.querySelectorAll('button')].find(({ textContent }) => textContent === 'lab')?.click();
    await settled();
    expect(field('input[name="email"]').value).toBe('lab@merrow.example');
    expect(field('input[name="password"]').value).toBe('');
    expect(element.textContent).toContain('was printed when the server started');
  });

  it.each([
    [undefined, '/projects'],
    ['/panels/7/phase?cell=3', '/panels/7/phase?cell=3'],
    ['//evil.example', '/projects'],
    ['/\\evil.example', '/projects'],
    ['https://evil.example', '/projects'],
  ])('goes on from %s to %s', async (to, where) => {
    const rig = await openEntrance(SignInPage, null, to === undefined ? {} : { to });
    const went = jest.spyOn(TestBed.inject(Router), 'navigateByUrl').mockResolvedValue(true);
    rig.field('input[name="email"]').value = 'lab@merrow.example';
    rig.field('input[name="password"]').value = 'right';
    rig.send();
    rig.http.expectOne('/api/session').flush(sessionOf(['lab']));
    await rig.settled();
    expect(went).toHaveBeenCalledWith(where);
  });
});
