import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatMenuModule } from '@angular/material/menu';
import { Router, RouterLink } from '@angular/router';
import type { FamilySummary } from '../../../shared/contracts/library';
import type { Project } from '../../../shared/contracts/projects';
import { NEW_PANEL_DESIGN } from '../../../shared/model/starting-design';
import { LibraryClient } from '../api/library-client';
import { ProjectClient } from '../api/project-client';
import type { CallFault } from '../session/call-fault';
import { callFault } from '../session/call-fault';
import { SessionStore } from '../session/session-store';
import { EmptyState } from '../ui/empty-state';
import { FaultNote } from '../ui/fault-note';
import { AskName } from '../ui/name-dialog';
import { SheetFrame } from '../ui/sheet-frame';
import { StateMark } from '../ui/state-mark';
import { TitleBlock } from '../ui/title-block';
import { UtcTime } from '../ui/utc-time';
import { ViewTitle } from '../ui/view-title';
import { WhyNot } from '../ui/why-not';
import { FirstSteps } from './first-steps';
import { PanelThumbnail } from './panel-thumbnail';
import type { PanelRow } from './project-rows';
import { panelRow } from './project-rows';
import { waitingDeeds } from './waiting-deeds';
import { WaitingList } from './waiting-list';

const EDITIONS_SHOWN = 3;

interface ProjectSection {
  readonly project: Project;
  readonly rows: readonly PanelRow[];
  readonly unit: string;
}

@Component({
  selector: 'slant-projects-page',
  imports: [EmptyState, FaultNote, FirstSteps, MatMenuModule, PanelThumbnail, RouterLink, SheetFrame, StateMark, TitleBlock, UtcTime, ViewTitle, WaitingList, WhyNot],
  templateUrl: './projects-page.html',
  styleUrl: './projects-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProjectsPage {
  private readonly client = inject(ProjectClient);
  private readonly library = inject(LibraryClient);
  private readonly session = inject(SessionStore);
  private readonly router = inject(Router);
  private readonly names = inject(AskName);
  protected readonly projects = signal<readonly Project[] | null>(null);
  protected readonly families = signal<readonly FamilySummary[]>([]);
  protected readonly fault = signal<CallFault | null>(null);
  /** Published editions, the newest of each family. */
  protected readonly editions = computed(() =>
    this.families()
      .flatMap(({ editions }) => editions.filter(({ state }) => state === 'published').slice(0, 1))
      .sort((a, b) => (b.publishedAt ?? '').localeCompare(a.publishedAt ?? ''))
      .slice(0, EDITIONS_SHOWN),
  );
  protected readonly canRead = computed(() => this.session.hasRole('designer', 'lab', 'reviewer', 'range', 'administrator'));
  protected readonly whyNot = computed(() => (this.session.hasRole('designer') ? null : `This needs the role designer. You work as ${this.session.roles().join(', ')}.`));
  protected readonly panelCount = computed(() => (this.projects() ?? []).reduce((sum, { panels }) => sum + panels.length, 0));
  protected readonly sections = computed<readonly ProjectSection[]>(() =>
    (this.projects() ?? []).map((project) => ({
      project,
      rows: project.panels.map(panelRow),
      unit: `${project.panels.length} ${project.panels.length === 1 ? 'panel' : 'panels'}${project.invented ? ', demo data, invented' : ''}`,
    })),
  );
  /** Null for roles that have nothing to do here yet. */
  protected readonly waiting = computed(() => {
    const person = this.session.current()?.person;
    if (person === undefined || !this.session.hasRole('designer', 'lab')) return null;
    return waitingDeeds({ personId: person.id, roles: this.session.roles() }, this.projects() ?? [], this.families());
  });
  protected readonly titleBlock = computed(() => [
    [
      { label: 'Team', value: this.session.current()?.team.teamName ?? '' },
      { label: 'Drawn for', value: this.session.current()?.person.name ?? '' },
      { label: 'Date', value: new Date().toISOString().slice(0, 10), figure: true },
    ],
  ]);

  constructor() {
    if (this.canRead()) void this.load();
  }

  protected async load(): Promise<void> {
    try {
      this.projects.set(await this.client.list());
      this.fault.set(null);
      this.families.set(await this.library.families());
    } catch (error) {
      this.fault.set(callFault(error));
    }
  }

  protected open(panelId: string): Promise<boolean> {
    return this.router.navigate(['/panels', panelId, 'requirement']);
  }

  protected async addProject(): Promise<void> {
    const name = await this.names.ask({ title: 'New project', label: 'Name', deed: 'Make the project', hint: 'A project holds the panels of one job.' });
    if (name !== undefined) await this.attempt(() => this.client.create(name));
  }

  protected async rename(project: Project): Promise<void> {
    const name = await this.names.ask({ title: 'Rename the project', label: 'Name', deed: 'Rename', value: project.name });
    if (name !== undefined) await this.attempt(() => this.client.rename(project, name));
  }

  protected async addPanel(project: Project): Promise<void> {
    const name = await this.names.ask({ title: `New panel in ${project.name}`, label: 'Name', deed: 'Make the panel', hint: 'It starts as a 28 GHz reflecting panel of 40 × 40 cells with an offset horn.' });
    if (name === undefined) return;
    const panel = await this.attempt(() => this.client.addPanel(project.id, { name, design: NEW_PANEL_DESIGN }));
    if (panel !== null) await this.open(panel.id);
  }

  protected async copyPanel(project: Project, row: PanelRow): Promise<void> {
    const name = await this.names.ask({ title: `Copy ${row.name}`, label: 'Name of the copy', deed: 'Copy', value: `${row.name}, copy`, hint: 'The copy starts from the draft, without its revisions.' });
    if (name !== undefined) await this.attempt(() => this.client.addPanel(project.id, { name, copyOfPanelId: row.id }));
  }

  protected async renamePanel(row: PanelRow): Promise<void> {
    const name = await this.names.ask({ title: 'Rename the panel', label: 'Name', deed: 'Rename', value: row.name });
    if (name !== undefined) await this.attempt(() => this.client.renamePanel(row.id, name));
  }

  private async attempt<T>(work: () => Promise<T>): Promise<T | null> {
    try {
      const result = await work();
      await this.load();
      return result;
    } catch (error) {
      this.fault.set(callFault(error));
      return null;
    }
  }
}
