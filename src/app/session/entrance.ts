import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { BrandMark } from '../ui/brand-mark';
import { Notes } from '../ui/notes';
import { SheetFrame } from '../ui/sheet-frame';
import { TitleBlock } from '../ui/title-block';
import type { TitleBlockEntry } from '../ui/title-block';
import { PanelSection } from './panel-section';
import { SessionStore } from './session-store';

/** The sheet that every page before sign-in stands on: a section of a panel at work on the left, the form on the right. */
@Component({
  selector: 'slant-entrance',
  imports: [BrandMark, Notes, PanelSection, SheetFrame, TitleBlock],
  templateUrl: './entrance.html',
  styleUrl: './entrance.scss',
  host: { role: 'main' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Entrance {
  private readonly store = inject(SessionStore);
  readonly heading = input.required<string>();
  protected readonly scale = signal('');
  protected readonly notes = [
    'Copper lines: crests of the wave that the 1600 cells of the starting design send out, computed in this page; weight follows amplitude.',
    'Dashed: crests of the wave from the horn. Strips on the panel: the wider, the more phase the cell adds.',
    'Array theory, not a measurement. Lengths in mm.',
  ];
  protected readonly titleRows = computed((): readonly (readonly TitleBlockEntry[])[] => [
    [
      { label: 'Drawing', value: 'Starting design, y = 0' },
      { label: 'Frequency', value: '28.000 GHz', figure: true },
    ],
    [
      { label: 'Version', value: this.store.about()?.version ?? 'no answer', figure: true },
      { label: 'Scale, 96 px/in', value: this.scale(), figure: true },
      { label: 'Sheet', value: '0', figure: true },
    ],
  ]);
}
