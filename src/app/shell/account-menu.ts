import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatMenuModule } from '@angular/material/menu';
import { Router, RouterLink } from '@angular/router';
import { SessionStore } from '../session/session-store';
import type { ThemeChoice } from '../ui/theme';
import { Theme } from '../ui/theme';

@Component({
  selector: 'slant-account-menu',
  imports: [MatMenuModule, RouterLink],
  templateUrl: './account-menu.html',
  styleUrl: './account-menu.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AccountMenu {
  private readonly session = inject(SessionStore);
  private readonly router = inject(Router);
  protected readonly theme = inject(Theme);
  protected readonly current = this.session.current;
  protected readonly name = computed(() => this.current()?.person.name ?? '');
  protected readonly readsLetters = computed(() => this.current()?.letterBox === true && this.session.hasRole('administrator'));
  protected readonly themes: readonly { readonly id: ThemeChoice; readonly label: string }[] = [
    { id: 'light', label: 'Light sheet' },
    { id: 'dark', label: 'Dark sheet' },
    { id: 'system', label: 'As the machine wants' },
  ];

  protected async signOut(): Promise<void> {
    await this.session.signOut();
    await this.router.navigateByUrl('/sign-in');
  }
}
