import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import { SessionStore } from '../session/session-store';
import { BrandMark } from '../ui/brand-mark';
import { CommandRegistry } from '../ui/command-registry';
import type { Shortcut } from '../ui/shortcut-list';
import { ShortcutList } from '../ui/shortcut-list';
import { AccountMenu } from './account-menu';

/** The head of every page outside a panel: mark, team, search, the house's pages. */
@Component({
  selector: 'slant-shell',
  imports: [AccountMenu, BrandMark, RouterLink, RouterLinkActive, RouterOutlet, ShortcutList],
  templateUrl: './shell.html',
  styleUrl: './shell.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Shell {
  private readonly session = inject(SessionStore);
  private readonly registry = inject(CommandRegistry);
  protected readonly team = computed(() => this.session.current()?.team.teamName ?? '');
  protected readonly shortcuts: readonly Shortcut[] = [
    { keys: 'Ctrl K', does: 'find or run' },
    { keys: '?', does: 'this list' },
    { keys: 'Escape', does: 'closes what is open' },
  ];

  protected find(): void {
    this.registry.isOpen.set(true);
  }
}
