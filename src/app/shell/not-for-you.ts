import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { SessionStore } from '../session/session-store';
import { EmptyState } from '../ui/empty-state';
import { SheetFrame } from '../ui/sheet-frame';

/** Stands in for a sheet that needs a role the person lacks. */
@Component({
  selector: 'slant-not-for-you',
  imports: [EmptyState, RouterLink, SheetFrame],
  template: `
    <slant-sheet-frame label="Not for your role">
      <h1 class="visually-hidden">Not for your role</h1>
      <slant-empty-state [title]="'This sheet is for the ' + wanted()" [text]="text()">
        <svg sketch width="96" height="56" viewBox="0 0 96 56" aria-hidden="true">
          <path d="M.5.5h95v55H.5ZM6 6h84v44H6ZM58 38h32M58 44h32M70 38v12" fill="none" stroke="var(--rule-strong)" />
          <path d="M40 22v-4a8 8 0 0 1 16 0v4M36 22h24v14H36Z" fill="none" stroke="var(--ink)" />
        </svg>
        <a class="button" routerLink="/projects">Projects</a>
      </slant-empty-state>
    </slant-sheet-frame>
  `,
  styles: ':host { display: grid; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotForYou {
  private readonly session = inject(SessionStore);
  /** From the query: the roles that may, joined by commas. */
  readonly roles = input('');
  protected readonly wanted = computed(() => this.roles().split(',').join(' or '));
  protected readonly text = computed(() => {
    const own = this.session.roles();
    const team = this.session.current()?.team.teamName ?? 'this team';
    return `In ${team} you work as ${own.length === 0 ? 'nothing yet' : own.join(', ')}. An administrator of the team gives roles, on the Team sheet.`;
  });
}
