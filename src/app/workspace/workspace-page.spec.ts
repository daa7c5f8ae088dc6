import { Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter, withComponentInputBinding } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { of } from 'rxjs';
import type { PanelDetail } from '../../../shared/contracts/projects';
import type { Role } from '../../../shared/contracts/common';
import { replacedAt } from '../../../shared/model/design-pointer';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { DraftClient } from '../api/draft-client';
import type { PanelOutcome } from '../api/draft-client';
import { LibraryClient } from '../api/library-client';
import { PredictionClient } from '../api/prediction-client';
import { SessionStore } from '../session/session-store';
import { DraftStore } from './draft-store';
import { SAMPLE_HEAD } from './sample-prediction';
import { SHEETS } from './sheets';
import { WorkspacePage } from './workspace-page';

const panel: PanelDetail = {
  id: '6f9619ff-8b86-4d01-b42d-00cf4fc964ff',
  project: { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fe', name: 'Merrow Point sea-rescue link', invented: true },
  name: 'Panel A, lighthouse relay',
  design: STARTING_DESIGN,
  draftHash: 'b'.repeat(64),
  etag: '"v1"',
  changedAt: '2026-12-01T14:02:31Z',
  changedBy: { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fd', name: 'Designer' },
  latestRevision: null,
  draftIsRevision: false,
};

@Component({ template: 'a sheet' })
class PlainSheet {}

class NoObserver {
  observe(): void {
    // Nothing is laid out here.
  }
  disconnect(): void {
    // Nothing was observed.
  }
}

async function rig({ roles = ['designer'] as Role[], outcome = { kind: 'found', panel } as PanelOutcome } = {}) {
  Object.assign(globalThis, { ResizeObserver: NoObserver });
  sessionStorage.clear();
  const { cellCount: _count, ...head } = SAMPLE_HEAD;
  const drafts = { read: async () => outcome, save: async () => ({ kind: 'unreachable' }), readRevision: async () => ({ kind: 'unreachable' }) };
  const session = { roles: () => roles, hasRole: (role: Role) => roles.includes(role), current: () => ({ person: { name: 'Designer (demo)' } }) };
  TestBed.configureTestingModule({
    providers: [
      provideRouter(
        [{ path: 'panels/:panelId', children: [{ path: '', component: WorkspacePage, children: SHEETS.map(({ id }) => ({ path: id, component: PlainSheet })) }] }],
        withComponentInputBinding(),
      ),
      { provide: DraftClient, useValue: drafts },
      { provide: PredictionClient, useValue: { predict: () => of({ kind: 'predicted', block: { head, arrays: {} } }) } },
      { provide: LibraryClient, useValue: {} },
      { provide: SessionStore, useValue: session },
    ],
  });
  const harness = await RouterTestingHarness.create();
  const page = await harness.navigateByUrl(`/panels/${panel.id}/requirement`, WorkspacePage);
  const settle = async (): Promise<void> => {
    await new Promise((resolve) => setTimeout(resolve, 0));
    harness.detectChanges();
    await harness.fixture.whenStable();
  };
  await settle();
  await settle();
  const element = harness.routeNativeElement as HTMLElement;
  return {
    page,
    element,
    settle,
    drafts: harness.routeDebugElement?.injector.get(DraftStore) as DraftStore,
    text: () => element.textContent?.replace(/\s+/g, ' ') ?? '',
    button: (name: string) => [...element.querySelectorAll('button')].find((one) => one.textContent?.trim() === name),
    key: (key: string, more: KeyboardEventInit = {}, target: EventTarget = document) => target.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true, ...more })),
  };
}

describe('WorkspacePage', () => {
  it('shows panel, sheets with their states, figures and title block', async () => {
    const { text, element } = await rig();
    expect(text()).toContain('Merrow Point sea-rescue link');
    expect(element.querySelectorAll('slant-rail nav li')).toHaveLength(SHEETS.length);
    expect(element.querySelectorAll('slant-figure-cell')).toHaveLength(8);
    expect(element.querySelector('slant-figure-cell')?.textContent).toContain('34.76');
    expect(element.querySelector('slant-title-block')?.textContent).toContain('Draft, no revision yet');
    expect(text()).toContain('Saved 14:02:31 UTC');
    expect(text()).toContain('a sheet');
    expect(element.querySelector('footer.foot')?.textContent).toContain(`of ${SHEETS.length}`);
  });

  it('opens sheets by their numbers, but not while somebody types', async () => {
    const { key, settle, element } = await rig();
    key('3');
    await settle();
    expect(TestBed.inject(Router).url).toBe(`/panels/${panel.id}/illumination`);
    const field = document.createElement('input');
    element.append(field);
    key('1', {}, field);
    await settle();
    expect(TestBed.inject(Router).url).toBe(`/panels/${panel.id}/illumination`);
  });

  it('undoes and redoes with keys and buttons, naming the step', async () => {
    const { drafts, settle, button, key } = await rig();
    drafts.change('Set Least gain', (design) => replacedAt(design, '/requirement/minGainDbi', 31));
    await settle();
    expect(button('Undo')?.title).toBe('Undo: Set Least gain');
    key('z', { ctrlKey: true });
    await settle();
    expect(drafts.design().requirement.minGainDbi).toBe(34);
    key('z', { ctrlKey: true, shiftKey: true });
    await settle();
    expect(drafts.design().requirement.minGainDbi).toBe(31);
  });

  it('says why somebody else than a designer may only look', async () => {
    const { text, button } = await rig({ roles: ['reviewer'] });
    expect(text()).toContain('View only. Only a designer changes panels; your part here is reviewer.');
    expect(button('Undo')).toBeUndefined();
    expect(button('Freeze revision 1')?.getAttribute('aria-disabled')).toBe('true');
    expect(button('Freeze revision 1')?.title).toBe('Only a designer changes panels; your part here is reviewer');
  });

  it('asks before it is left with work that only this browser has', async () => {
    const { drafts, settle } = await rig();
    const calm = new Event('beforeunload', { cancelable: true });
    window.dispatchEvent(calm);
    expect(calm.defaultPrevented).toBe(false);
    drafts.change('Set Least gain', (design) => replacedAt(design, '/requirement/minGainDbi', 31));
    await settle();
    const worried = new Event('beforeunload', { cancelable: true });
    window.dispatchEvent(worried);
    expect(worried.defaultPrevented).toBe(true);
  });

  it('says that a panel is not there', async () => {
    const { text } = await rig({ outcome: { kind: 'refused', problem: { type: 'about:blank', title: 'Not found', status: 404, detail: 'There is no such panel.' } } });
    expect(text()).toContain('No such panel');
  });

  it('offers another attempt while the server is away', async () => {
    const { text, button } = await rig({ outcome: { kind: 'unreachable' } });
    expect(text()).toContain('The panel could not be read. Nothing is lost.');
    expect(button('Try again')?.disabled).toBe(false);
  });
});
