import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { BrandMark } from '../ui/brand-mark';
import { SheetFrame } from '../ui/sheet-frame';
import { WavefrontArt } from './wavefront-art';

/** The sheet that every page before sign-in stands on: what the product is for on the left, the form on the right. */
@Component({
  selector: 'slant-entrance',
  imports: [BrandMark, SheetFrame, WavefrontArt],
  templateUrl: './entrance.html',
  styleUrl: './entrance.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Entrance {
  readonly heading = input.required<string>();
  protected readonly notes = [
    'Drawing above: target phase of a 40 × 40 panel at 28 GHz that sends its beam to θ 20°, lit from the left. Computed in this page.',
    'A prediction is array theory, not a measurement.',
  ];
}
