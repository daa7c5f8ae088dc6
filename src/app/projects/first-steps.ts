import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { SessionStore } from '../session/session-store';
import { CheckField } from '../ui/check-field';
import { ViewTitle } from '../ui/view-title';
import { FIRST_STEPS } from './first-steps-text';

const DISMISSED = 'slantwise.first-steps-dismissed';
const DONE = 'slantwise.first-steps-done';

/** A checklist of what to do first, by role. Ticks and dismissal stay in this browser; once dismissed it is gone for good. */
@Component({
  selector: 'slant-first-steps',
  imports: [CheckField, ViewTitle],
  template: `
    @if (!dismissed() && steps().length > 0) {
      <section aria-label="First steps">
        <div class="head">
          <slant-view-title text="First steps" [unit]="doneCount() + ' of ' + steps().length + ' done'" />
          <button type="button" class="button quiet" (click)="dismiss()">Do not show again</button>
        </div>
        <ul>
          @for (step of steps(); track step.id) {
            <li [class.done]="done().has(step.id)"><slant-check-field [label]="step.text" [checked]="done().has(step.id)" (changed)="tick(step.id, $event)" /></li>
          }
        </ul>
      </section>
    }
  `,
  styles: `
    .head {
      display: flex;
      align-items: center;
      gap: var(--s2);
    }
    slant-view-title {
      flex: 1;
    }
    ul {
      padding: 0;
      list-style: none;
    }
    .done {
      color: var(--muted);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FirstSteps {
  private readonly session = inject(SessionStore);
  protected readonly dismissed = signal(localStorage.getItem(DISMISSED) === 'yes');
  protected readonly done = signal<ReadonlySet<string>>(new Set((localStorage.getItem(DONE) ?? '').split(' ')));
  protected readonly steps = computed(() => this.session.roles().flatMap((role) => FIRST_STEPS[role]));
  protected readonly doneCount = computed(() => this.steps().filter(({ id }) => this.done().has(id)).length);

  protected tick(id: string, isDone: boolean): void {
    this.done.update((held) => new Set(isDone ? [...held, id] : [...held].filter((other) => other !== id)));
    localStorage.setItem(DONE, [...this.done()].join(' '));
  }

  protected dismiss(): void {
    this.dismissed.set(true);
    localStorage.setItem(DISMISSED, 'yes');
  }
}
