import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { Role } from '../../../shared/contracts/common';
import type { Project } from '../../../shared/contracts/projects';
import { NEW_PANEL_DESIGN, STARTING_DESIGN } from '../../../shared/model/starting-design';
import { sessionOf } from '../session/session-fixture';
import { SessionStore } from '../session/session-store';
import { ProjectsPage } from './projects-page';

const id = (n: number): string => `6f1c1b7e-58a4-4f0b-9a53-${String(n).padStart(12, '0')}`;
const project: Project = {
  id: id(1),
  name: 'Merrow Point sea-rescue link',
  version: 4,
  invented: true,
  createdAt: '2026-11-01T10:00:00.000Z',
  panels: [
    {
      id: id(2),
      projectId: id(1),
      name: 'A, lighthouse relay',
      design: STARTING_DESIGN,
      draftHash: 'ab12cd34ef56'.padEnd(64, '0'),
      summary: null,
      latestRevision: null,
      draftIsRevision: false,
      changedAt: '2026-12-01T12:00:00.000Z',
      changedBy: { id: id(3), name: 'Designer (demo)' },
    },
  ],
};

describe('projects page', () => {
  let fixture: ComponentFixture<ProjectsPage>;
  let http: HttpTestingController;
  const element = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const settled = async (): Promise<void> => {
    await new Promise((done) => setTimeout(done));
    await fixture.whenStable();
  };
  const button = (text: string): HTMLButtonElement => {
    const found = [...document.querySelectorAll<HTMLButtonElement>('button')].find(({ textContent }) => textContent?.trim() === text);
    if (found === undefined) throw new Error(`no button ${text}`);
    return found;
  };

  async function open(roles: readonly Role[], projects: readonly Project[] | null): Promise<void> {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])] });
    Object.assign(globalThis, { ResizeObserver: class { observe(): void {} disconnect(): void {} } });
    localStorage.setItem('slantwise.first-steps-dismissed', 'yes');
    // The canvas of the test environment does not paint.
    jest.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null);
    http = TestBed.inject(HttpTestingController);
    TestBed.inject(SessionStore).take(sessionOf(roles));
    fixture = TestBed.createComponent(ProjectsPage);
    document.body.append(element());
    await fixture.whenStable();
    if (projects !== null) await answer(projects);
  }
  async function answer(projects: readonly Project[]): Promise<void> {
    http.expectOne('/api/projects').flush({ items: projects });
    await settled();
    http.expectOne('/api/library/families').flush({ items: [] });
    await settled();
  }
  afterEach(() => {
    http.verify();
    element().remove();
    jest.restoreAllMocks();
  });

  it('lists panels by project, marks invented data, and opens a panel by its name', async () => {
    await open(['reviewer'], [project]);
    expect(element().textContent).toContain('1 project, 1 panel');
    expect(element().textContent).toContain('demo data, invented');
    const link = [...element().querySelectorAll('a')].find(({ textContent }) => textContent === 'A, lighthouse relay');
    expect(link?.getAttribute('href')).toBe(`/panels/${id(2)}/requirement`);
  });

  it('makes a panel that starts by the vector model', async () => {
    await open(['designer'], [project]);
    button('New panel').click();
    await settled();
    const field = document.querySelector<HTMLInputElement>('slant-name-dialog input');
    if (field === null) throw new Error('no dialog opened');
    field.value = 'C, harbour wall';
    button('Make the panel').click();
    // The dialog closes over a moment.
    await new Promise((done) => setTimeout(done, 300));
    const call = http.expectOne({ method: 'POST', url: `/api/projects/${project.id}/panels` });
    expect(call.request.body).toEqual({ name: 'C, harbour wall', design: NEW_PANEL_DESIGN });
    expect(NEW_PANEL_DESIGN.prediction.model).toBe('vector');
    call.flush({ type: 'about:blank', title: 'Forbidden', status: 403 }, { status: 403, statusText: 'Forbidden' });
    await settled();
  });

  it('makes a project of the given name', async () => {
    await open(['designer'], [project]);
    button('New project').click();
    await settled();
    const field = document.querySelector<HTMLInputElement>('slant-name-dialog input');
    if (field === null) throw new Error('no dialog opened');
    field.value = 'Harbour wall';
    button('Make the project').click();
    // The dialog closes over a moment.
    await new Promise((done) => setTimeout(done, 300));
    const call = http.expectOne({ method: 'POST', url: '/api/projects' });
    expect(call.request.body).toEqual({ name: 'Harbour wall' });
    const made = { ...project, id: id(9), name: 'Harbour wall', panels: [], invented: false };
    call.flush(made);
    await settled();
    await answer([project, made]);
    expect(element().querySelector('section[aria-label="Harbour wall"]')?.textContent).toContain('No panel yet');
  });

  it('shows who may not design what they may not do, and why', async () => {
    await open(['reviewer'], [project]);
    button('New project').click();
    await settled();
    expect(document.querySelector('slant-name-dialog')).toBeNull();
    expect(button('New project').getAttribute('aria-disabled')).toBe('true');
    const reason = document.getElementById(button('New project').getAttribute('aria-describedby') ?? '')?.textContent;
    expect(reason).toBe('This needs the role designer. You work as reviewer.');
  });

  it('says what failed with the id of the request, and tries again', async () => {
    await open(['designer'], null);
    const down = { type: '/problems/internal', title: 'Internal', status: 500, detail: 'Something went wrong on our side.', requestId: '7c1e' };
    http.expectOne('/api/projects').flush(down, { status: 500, statusText: 'Internal' });
    await settled();
    expect(element().querySelector('slant-fault-note')?.textContent).toContain('Request 7c1e');
    button('Try again').click();
    await answer([]);
    expect(element().querySelector('slant-fault-note')).toBeNull();
    expect(element().textContent).toContain('No project yet');
  });

  it('leads from the mark of a sheet to the sheet', async () => {
    await open(['designer'], [project]);
    const marks = [...element().querySelectorAll<HTMLAnchorElement>('.sheets a')];
    expect(marks.map((mark) => mark.getAttribute('href')?.split('/').at(-1))).toEqual(['requirement', 'panel', 'illumination', 'cells', 'phase', 'pattern', 'revisions']);
    expect(marks[1].textContent?.replace(/\s+/g, ' ').trim()).toBe('Panel, in work: Not predicted as it stands; the sheet says why');
  });

  it('says what waits for a designer, with the way there', async () => {
    const { id: personId, name } = sessionOf(['designer']).person;
    const own = { ...project.panels[0], changedBy: { id: personId, name } };
    await open(['designer'], [{ ...project, panels: [own] }]);
    const waiting = element().querySelector('section[aria-label="Waiting for you"]');
    expect(waiting?.textContent).toContain('your draft cannot be predicted as it stands');
    expect(waiting?.querySelector('a')?.getAttribute('href')).toBe(`/panels/${id(2)}/requirement`);
  });

  it('says that nothing waits, and says nothing of it to a reviewer', async () => {
    await open(['designer'], [project]);
    expect(element().querySelector('section[aria-label="Waiting for you"]')?.textContent).toContain('nothing');
    element().remove();
    TestBed.resetTestingModule();
    await open(['reviewer'], [project]);
    expect(element().querySelector('section[aria-label="Waiting for you"]')).toBeNull();
  });

  it('asks nothing for a fabricator, and says what will appear and why nothing does', async () => {
    await open(['fabricator'], null);
    expect(element().textContent).toContain('Released revisions with their files for fabrication will stand here');
    expect(element().textContent).toContain('cannot be released in this version');
    expect(element().textContent).not.toContain('No project yet');
  });
});
