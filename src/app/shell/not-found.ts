import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink } from '@angular/router';
import { EmptyState } from '../ui/empty-state';
import { SheetFrame } from '../ui/sheet-frame';

@Component({
  selector: 'slant-not-found',
  imports: [EmptyState, RouterLink, SheetFrame],
  template: `
    <slant-sheet-frame label="Not found">
      <h1 class="visually-hidden">Not found</h1>
      <slant-empty-state title="No such sheet" text="This address names nothing here, or something of another team. Check the link, or start from the projects.">
        <svg sketch width="96" height="56" viewBox="0 0 96 56" aria-hidden="true">
          <path d="M.5.5h95v55H.5ZM6 6h84v44H6ZM58 38h32M58 44h32M70 38v12" fill="none" stroke="var(--rule-strong)" />
          <path d="M14 30 44 12M14 12 44 30" fill="none" stroke="var(--ink)" stroke-dasharray="6 3 1 3" />
        </svg>
        <a class="button" routerLink="/projects">Projects</a>
      </slant-empty-state>
    </slant-sheet-frame>
  `,
  styles: ':host { display: grid; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFound {}
