import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { SessionStore } from '../session/session-store';

const KEY = 'slantwise.first-steps-dismissed';

const STEPS: Readonly<Record<string, readonly string[]>> = {
  designer: [
    'Open a panel and drag its beam on the Pattern sheet, or type the angles: gain, sidelobes and the cut follow.',
    'On the Cells sheet choose an edition of the library; on the Phase sheet read the error it leaves, cell by cell.',
    'Freeze a revision with a message, change something, freeze another, and compare the two under Revisions.',
    'Export a revision: the element layout, figures and cuts as CSV with their checksums.',
  ],
  lab: [
    'Import a family under Library: drop its network files or one zip, look at what was found, complete the description.',
    'Read the verdict of each check, accept with a note, then publish the edition. A published edition never changes.',
  ],
  reviewer: ['Open a panel, compare its revisions under Revisions, and read which lines of the requirement each meets.'],
  administrator: ['Invite people under Team and give them their roles. The audit log keeps every change.'],
};

/** What to do first, by role. Goes away for good when dismissed. */
@Component({
  selector: 'slant-first-steps',
  template: `
    @if (!dismissed() && steps().length > 0) {
      <section aria-label="First steps">
        <ol>
          @for (step of steps(); track step) {
            <li>{{ step }}</li>
          }
        </ol>
        <button type="button" class="button quiet" (click)="dismiss()">Do not show again</button>
      </section>
    }
  `,
  styles: `
    section {
      display: flex;
      align-items: start;
      gap: var(--s4);
      padding: var(--s2) var(--s3);
      border-left: 2px solid var(--copper);
      background: var(--sunk);
    }
    ol {
      flex: 1;
      display: grid;
      gap: 2px;
      padding-left: var(--s5);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FirstSteps {
  private readonly session = inject(SessionStore);
  protected readonly dismissed = signal(localStorage.getItem(KEY) === 'yes');
  protected readonly steps = computed(() => this.session.roles().flatMap((role) => STEPS[role] ?? []));

  protected dismiss(): void {
    this.dismissed.set(true);
    localStorage.setItem(KEY, 'yes');
  }
}
