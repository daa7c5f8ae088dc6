import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { gaugeDrawing } from './gauge-drawing';
import type { Gauge } from './gauge-drawing';

export interface StripCell {
  readonly id: string;
  readonly label: string;
  readonly value: string;
  readonly unit: string;
  readonly trend: string | null;
  readonly limit: string;
  readonly margin: string | null;
  readonly verdict: 'meets' | 'falls-short' | 'not-evaluated' | null;
  readonly gauge: Gauge | null;
  readonly reason: string | null;
}

/** One figure: label, value with unit, signed change, a dimension line as gauge, limit and signed margin. */
@Component({
  selector: 'slant-figure-cell',
  templateUrl: './figure-cell.html',
  styleUrl: './figure-cell.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FigureCell {
  readonly figure = input.required<StripCell>();
  readonly against = input('');
  readonly explain = output<void>();
  protected readonly drawing = computed(() => gaugeDrawing(this.figure().gauge));
  protected readonly name = computed(() => {
    const { label, value, unit, verdict, limit, margin, reason } = this.figure();
    const judged = verdict === null ? '' : `, ${verdict.replace('-', ' ')}, limit ${limit}${margin === null ? '' : `, margin ${margin}`}`;
    return `${label} ${value} ${unit}${judged}${reason === null ? '' : `, ${reason}`}. How computed`;
  });
}
