import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { Router } from '@angular/router';
import { SessionStore } from '../session/session-store';
import type { Command } from '../ui/command-registry';
import { CommandRegistry } from '../ui/command-registry';
import { Theme } from '../ui/theme';

/** Commands that work on every page of somebody signed in. Shows nothing. */
@Component({ selector: 'slant-house-commands', template: '', changeDetection: ChangeDetectionStrategy.OnPush })
export class HouseCommands {
  private readonly router = inject(Router);
  private readonly session = inject(SessionStore);
  private readonly theme = inject(Theme);
  private readonly registry = inject(CommandRegistry);

  constructor() {
    effect(() => {
      this.registry.set('house', this.session.current() === null ? [] : this.commands());
    });
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
    if (this.session.hasRole('administrator')) pages.push(go('Audit log', '/team/audit', 'history'));
    const signOut: Command = { id: 'sign-out', label: 'Sign out', kind: 'action', run: () => void this.signOut() };
    return [...pages, look('Light sheet', 'light'), look('Dark sheet', 'dark'), look('Sheet as the machine wants', 'system'), signOut];
  }

  private async signOut(): Promise<void> {
    await this.session.signOut();
    await this.router.navigateByUrl('/sign-in');
  }
}
