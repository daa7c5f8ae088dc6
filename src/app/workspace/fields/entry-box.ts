import { ChangeDetectionStrategy, Component, afterRenderEffect, input, linkedSignal, output, signal, viewChild } from '@angular/core';
import type { ElementRef } from '@angular/core';

export interface RefusedEntry {
  readonly reason: string;
  readonly suggestion: string | null;
}

export interface EntryStep {
  readonly direction: 1 | -1;
  /** Shift was held: ten steps at once. */
  readonly coarse: boolean;
}

let nextBox = 0;

/** A box for one typed quantity. It knows no design: what was typed goes out, what was refused comes back with its reason. */
@Component({
  selector: 'slant-entry-box',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './entry-box.html',
  styleUrl: './entry-box.scss',
  host: { '[class.bare]': 'bare()' },
})
export class EntryBox {
  readonly label = input.required<string>();
  /** The label is for readers of the screen only: in tables a column head stands above. */
  readonly bare = input(false);
  readonly unit = input('');
  /** What stands in the box until somebody types. */
  readonly shown = input.required<string>();
  readonly refused = input<RefusedEntry | null>(null);
  readonly note = input<string | null>(null);
  readonly locked = input(false);
  readonly placeholder = input('');

  readonly taken = output<string>();
  readonly givenUp = output();
  readonly stepped = output<EntryStep>();

  protected readonly id = `slant-entry-box-${(nextBox += 1)}`;
  protected readonly text = linkedSignal(() => this.shown());
  private readonly box = viewChild.required<ElementRef<HTMLInputElement>>('box');
  private readonly takings = signal(0);

  constructor() {
    // After every taking, because the text may be the same as it was rendered before somebody typed.
    afterRenderEffect(() => {
      this.takings();
      this.box().nativeElement.value = this.text();
    });
  }

  protected take(): void {
    const typed = this.text();
    if (typed === this.shown()) return;
    // A refused entry comes back as what is shown; the same value in other words falls back to its usual form.
    this.text.set(this.shown());
    this.takings.update((count) => count + 1);
    this.taken.emit(typed);
  }

  protected takeSuggestion(suggestion: string): void {
    this.text.set(suggestion);
    this.taken.emit(suggestion);
  }

  protected giveUp(): void {
    this.text.set(this.shown());
    this.takings.update((count) => count + 1);
    this.givenUp.emit();
  }

  protected step(event: Event, direction: 1 | -1): void {
    if (this.locked()) return;
    event.preventDefault();
    this.stepped.emit({ direction, coarse: event instanceof KeyboardEvent && event.shiftKey });
  }
}
