import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { BrandMark } from './brand-mark';

export interface TitleBlockEntry {
  readonly label: string;
  readonly value: string;
  /** Set in the figure face: dates, hashes, numbers. */
  readonly figure?: boolean;
}

/** The corner of the sheet: what this is, of which state, drawn and checked by whom. Rows of entries, as in the report. */
@Component({
  selector: 'slant-title-block',
  imports: [BrandMark],
  templateUrl: './title-block.html',
  styleUrl: './title-block.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TitleBlock {
  readonly rows = input.required<readonly (readonly TitleBlockEntry[])[]>();
  readonly showMark = input(true);
}
