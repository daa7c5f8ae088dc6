import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink } from '@angular/router';
import { EmptyState } from '../ui/empty-state';
import { SheetFrame } from '../ui/sheet-frame';

@Component({
  selector: 'slant-not-found',
  imports: [EmptyState, RouterLink, SheetFrame],
  template: `
    <slant-sheet-frame label="Not found">
      <slant-empty-state title="No such sheet" text="This address names nothing here, or something of another team. Check the link, or start from the projects.">
        <a class="button" routerLink="/projects">Projects</a>
      </slant-empty-state>
    </slant-sheet-frame>
  `,
  styles: ':host { display: grid; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFound {}
