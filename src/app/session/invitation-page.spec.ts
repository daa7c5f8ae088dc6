import { TestBed } from '@angular/core/testing';
import { Router } from '@angular/router';
import { openEntrance } from './entrance-rig';
import type { EntranceRig } from './entrance-rig';
import { InvitationPage } from './invitation-page';
import { sessionOf } from './session-fixture';
import { SessionStore } from './session-store';

const TOKEN = '6svRqNSARzF94ZJvCDyQO1O';

describe('invitation', () => {
  async function invited(knownPerson: boolean): Promise<EntranceRig> {
    const rig = await openEntrance(InvitationPage, TOKEN);
    const call = rig.http.expectOne('/api/invitations/lookup');
    expect(call.request.body).toEqual({ token: TOKEN });
    call.flush({ teamName: 'Merrow Point', email: 'nora@merrow.example', roles: ['reviewer'], knownPerson });
    await rig.settled();
    return rig;
  }

  it('says who invites whom as what, takes name and password, and is signed in', async () => {
    const { element, http, settled, field, send } = await invited(false);
    expect(element.textContent?.replace(/\s+/g, ' ')).toContain('Merrow Point invites nora@merrow.example as reviewer.');
    const went = jest.spyOn(TestBed.inject(Router), 'navigateByUrl').mockResolvedValue(true);
    field('input[autocomplete="name"]').value = 'Nora New';
    field('#password').value = 'lantern quay seven gulls';
    send();
    const call = http.expectOne('/api/invitations/acceptance');
    expect(call.request.body).toEqual({ token: TOKEN, name: 'Nora New', password: 'lantern quay seven gulls' });
    call.flush(sessionOf(['reviewer']));
    await settled();
    expect(TestBed.inject(SessionStore).hasRole('reviewer')).toBe(true);
    expect(went).toHaveBeenCalledWith('/projects');
  });

  it('asks somebody who has an account for its password alone', async () => {
    const { element, http, field, send } = await invited(true);
    expect(element.querySelector('input[autocomplete="name"]')).toBeNull();
    field('#password').value = 'my password of old';
    send();
    expect(http.expectOne('/api/invitations/acceptance').request.body).toEqual({ token: TOKEN, password: 'my password of old' });
  });

  it('says so when the invitation no longer holds', async () => {
    const { element, http, settled } = await openEntrance(InvitationPage, TOKEN);
    const problem = { type: '/problems/not-found', title: 'Not found', status: 404, detail: 'The invitation is used, withdrawn or too old.', requestId: '9a' };
    http.expectOne('/api/invitations/lookup').flush(problem, { status: 404, statusText: 'Not Found' });
    await settled();
    expect(element.querySelector('slant-fault-note')?.textContent).toContain('used, withdrawn or too old');
    expect(element.querySelector('form')).toBeNull();
  });
});
