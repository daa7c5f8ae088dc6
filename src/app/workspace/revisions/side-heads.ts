import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { SideHead } from './comparison-rows';

export interface SideOption {
  readonly value: string;
  readonly label: string;
}

export interface SidePair<T> {
  readonly before: T;
  readonly after: T;
}

/** The two sides of a comparison: which they are, since when, by whom, and how they stand to the requirement. */
@Component({
  selector: 'slant-side-heads',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './side-heads.html',
  styleUrl: './side-heads.scss',
})
export class SideHeads {
  readonly sides = input.required<SidePair<string>>();
  readonly options = input.required<readonly SideOption[]>();
  readonly heads = input.required<SidePair<SideHead> | null>();
  readonly chosen = output<SidePair<string>>();
  readonly swapped = output();
  protected readonly names = ['before', 'after'] as const;

  protected choose(which: 'before' | 'after', event: Event): void {
    this.chosen.emit({ ...this.sides(), [which]: (event.target as HTMLSelectElement).value });
  }
}
