import { Location } from '@angular/common';
import { provideHttpClient } from '@angular/common/http';
import { Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { roleOnly } from './role-only';
import { sessionOf } from './session-fixture';
import { SessionStore } from './session-store';
import { signedInOnly } from './signed-in-only';

@Component({ template: 'the sheet' })
class Sheet {}

@Component({ template: 'something else' })
class Other {}

describe('who may open a sheet', () => {
  beforeEach(async () => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideRouter([
          { path: 'team', component: Sheet, canActivate: [signedInOnly] },
          { path: 'audit', component: Sheet, canActivate: [signedInOnly, roleOnly('administrator')] },
          { path: '**', component: Other },
        ]),
      ],
    });
    harness = await RouterTestingHarness.create();
  });
  let harness: RouterTestingHarness;
  const open = async (address: string): Promise<string> => {
    await harness.navigateByUrl(address);
    return harness.fixture.nativeElement.textContent as string;
  };

  it('sends strangers to sign in, and remembers where they wanted to go', async () => {
    expect(await open('/team?sort=name')).toBe('something else');
    expect(TestBed.inject(Router).url).toBe('/sign-in?to=%2Fteam%3Fsort%3Dname');
  });

  it('lets in who has the role', async () => {
    TestBed.inject(SessionStore).take(sessionOf(['designer', 'administrator']));
    expect(await open('/audit')).toBe('the sheet');
  });

  it('shows something else to who lacks it, without writing that into the address', async () => {
    TestBed.inject(SessionStore).take(sessionOf(['designer']));
    await open('/team');
    expect(await open('/audit')).toBe('something else');
    expect(TestBed.inject(Location).path()).not.toContain('not-for-you');
  });
});
