import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { ViewTitle } from '../ui/view-title';
import type { WaitingDeed } from './waiting-deeds';

const SHOWN = 6;

/** What the signed-in person may want to do next, each with the way there. */
@Component({
  selector: 'slant-waiting-list',
  imports: [RouterLink, ViewTitle],
  template: `
    <section aria-label="Waiting for you">
      <slant-view-title text="Waiting for you" [unit]="deeds().length === 0 ? 'nothing' : deeds().length + ''" />
      @if (deeds().length > 0) {
        <ul>
          @for (deed of shown(); track deed.key) {
            <li>
              <a [routerLink]="deed.link">{{ deed.name }}</a> <span>{{ deed.text }}</span>
            </li>
          }
          @if (deeds().length > shown().length) {
            <li class="muted">and {{ deeds().length - shown().length }} more</li>
          }
        </ul>
      }
    </section>
  `,
  styles: `
    ul {
      padding: 0;
      list-style: none;
    }
    li {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 0 var(--s2);
      min-height: var(--hit);
    }
    a {
      font-weight: 600;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WaitingList {
  readonly deeds = input.required<readonly WaitingDeed[]>();
  protected readonly shown = computed(() => this.deeds().slice(0, SHOWN));
}
