import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { Router } from '@angular/router';
import { LibraryClient } from '../api/library-client';
import { ProjectClient } from '../api/project-client';
import { TeamClient } from '../api/team-client';
import { callFault } from '../session/call-fault';
import { SessionStore } from '../session/session-store';
import type { Command } from '../ui/command-registry';
import { CommandRegistry } from '../ui/command-registry';
import { Theme } from '../ui/theme';
import { teamFinds } from './team-finds';

/** What was read this recently is good enough for the next look. */
const FRESH_MS = 30_000;

/** Commands that work on every page of somebody signed in. Shows nothing. */
@Component({ selector: 'slant-house-commands', template: '', changeDetection: ChangeDetectionStrategy.OnPush })
export class HouseCommands {
  private readonly router = inject(Router);
  private readonly session = inject(SessionStore);
  private readonly theme = inject(Theme);
  private readonly registry = inject(CommandRegistry);
  private readonly projects = inject(ProjectClient);
  private readonly library = inject(LibraryClient);
  private readonly team = inject(TeamClient);
  private readAt = 0;

  constructor() {
    effect(() => {
      this.registry.set('house', this.session.current() === null ? [] : this.commands());
    });
    effect(() => {
      if (this.registry.isOpen() && this.session.current() !== null && Date.now() - this.readAt > FRESH_MS) void this.readTeam();
    });
  }

  /** What the team has, so that it is found from every page. */
  private async readTeam(): Promise<void> {
    this.readAt = Date.now();
    try {
      const [projects, families, people] = await Promise.all([this.projects.list(), this.library.families(), this.team.people()]);
      this.registry.set('team', teamFinds({ projects, families, people }).map(({ path, ...find }) => ({ ...find, run: () => void this.router.navigate([...path]) })));
    } catch (error) {
      const { detail } = callFault(error);
      this.readAt = 0;
      this.registry.set('team', [{ id: 'team-unread', label: 'Panels, families and people could not be read', kind: 'look again', words: detail, run: () => void this.readTeam() }]);
    }
  }

  private commands(): readonly Command[] {
    const go = (label: string, path: string, words = ''): Command => ({ id: path, label, kind: 'page', words, run: () => void this.router.navigateByUrl(path) });
    const look = (label: string, choice: 'light' | 'dark' | 'system'): Command => ({ id: `theme-${choice}`, label, kind: 'look', words: 'theme colours', run: () => this.theme.choose(choice) });
    const pages = [
      go('Projects', '/projects', 'panels'),
      go('Library', '/library', 'cells families editions'),
      go('Team', '/team', 'people invitations roles'),
      go('Account', '/account', 'password sessions tokens'),
    ];
    if (this.session.hasRole('lab')) pages.push(go('Import a family of cells', '/library/import', 'upload touchstone csv'));
    if (this.session.hasRole('administrator')) {
      pages.push(go('Audit log', '/team/audit', 'history'));
      if (this.session.current()?.letterBox) pages.push(go('Letters of this server', '/letters', 'mail invitations'));
    }
    const signOut: Command = { id: 'sign-out', label: 'Sign out', kind: 'action', run: () => void this.signOut() };
    return [...pages, look('Light sheet', 'light'), look('Dark sheet', 'dark'), look('Sheet as the machine wants', 'system'), signOut];
  }

  private async signOut(): Promise<void> {
    await this.session.signOut();
    await this.router.navigateByUrl('/sign-in');
  }
}
