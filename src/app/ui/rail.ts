import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink, RouterLinkActive } from '@angular/router';
import { BrandMark } from './brand-mark';
import type { MarkState } from './state-mark';
import { StateMark } from './state-mark';

export interface RailItem {
  readonly id: string;
  readonly number: number;
  readonly title: string;
  readonly state: MarkState;
  readonly reason: string;
  readonly link: readonly string[];
}

/** The set of sheets in work order with a state mark each, the project above, what belongs to the team below. */
@Component({
  selector: 'slant-rail',
  imports: [BrandMark, RouterLink, RouterLinkActive, StateMark],
  templateUrl: './rail.html',
  styleUrl: './rail.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Rail {
  readonly project = input.required<string>();
  readonly panel = input.required<string>();
  readonly items = input.required<readonly RailItem[]>();
  protected readonly legend: readonly MarkState[] = ['meets', 'falls-short', 'objection', 'in-work', 'stale', 'empty'];
}
