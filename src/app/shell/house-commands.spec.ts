import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { Role } from '../../../shared/contracts/common';
import { sessionOf } from '../session/session-fixture';
import { SessionStore } from '../session/session-store';
import { CommandRegistry } from '../ui/command-registry';
import { Theme } from '../ui/theme';
import { HouseCommands } from './house-commands';

describe('commands of the house', () => {
  let fixture: ComponentFixture<HouseCommands>;
  let http: HttpTestingController;
  const labels = (): string[] => TestBed.inject(CommandRegistry).commands().map(({ label }) => label);
  const settled = async (): Promise<void> => {
    await new Promise((done) => setTimeout(done));
    await fixture.whenStable();
  };

  async function signedInAs(...roles: readonly Role[]): Promise<void> {
    Object.defineProperty(window, 'matchMedia', { configurable: true, value: () => ({ matches: false, addEventListener: () => undefined }) });
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])] });
    http = TestBed.inject(HttpTestingController);
    if (roles.length > 0) TestBed.inject(SessionStore).take(sessionOf(roles));
    fixture = TestBed.createComponent(HouseCommands);
    await settled();
  }

  it('are none before somebody is signed in', async () => {
    await signedInAs();
    expect(labels()).toEqual([]);
  });

  it('offer the sheets of a role to that role only', async () => {
    await signedInAs('designer');
    expect(labels()).toEqual(expect.arrayContaining(['Projects', 'Library', 'Team', 'Account', 'Sign out']));
    expect(labels()).not.toContain('Audit log');
    TestBed.inject(SessionStore).take(sessionOf(['administrator', 'lab']));
    await settled();
    expect(labels()).toEqual(expect.arrayContaining(['Audit log', 'Letters of this server', 'Import a family of cells']));
  });

  it('choose the sheet', async () => {
    await signedInAs('designer');
    TestBed.inject(CommandRegistry).commands().find(({ label }) => label === 'Dark sheet')?.run();
    expect(TestBed.inject(Theme).choice()).toBe('dark');
  });

  it('read what the team has when the palette opens, once for a while', async () => {
    await signedInAs('designer');
    const registry = TestBed.inject(CommandRegistry);
    registry.isOpen.set(true);
    await settled();
    http.expectOne('/api/projects').flush({ items: [] });
    http.expectOne('/api/library/families').flush({ items: [] });
    const nora = { id: '6f1c1b7e-58a4-4f0b-9a53-000000000006', name: 'Nora New', email: 'nora@merrow.example', roles: [], disabled: false, lastSeenAt: null, joinedAt: '2026-12-01T12:00:00.000Z' };
    http.expectOne('/api/team/people').flush({ items: [nora] });
    await settled();
    expect(labels()).toContain('Nora New');
    registry.isOpen.set(false);
    await settled();
    registry.isOpen.set(true);
    await settled();
    http.verify();
  });

  it('say so when the team could not be read', async () => {
    await signedInAs('designer');
    TestBed.inject(CommandRegistry).isOpen.set(true);
    await settled();
    http.expectOne('/api/projects').error(new ProgressEvent('error'));
    await settled();
    expect(labels()).toContain('Panels, families and people could not be read');
  });
});
