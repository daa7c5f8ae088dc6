import { ChangeDetectionStrategy, Component, DestroyRef, ElementRef, afterNextRender, computed, inject, input, signal } from '@angular/core';
import { frameDrawing } from './frame-drawing';

/** The drawing sheet: a thin frame with zone ticks, content inside, the title block (attribute `titleBlock`) flush in the corner. */
@Component({
  selector: 'slant-sheet-frame',
  templateUrl: './sheet-frame.html',
  styleUrl: './sheet-frame.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SheetFrame {
  readonly label = input.required<string>();
  private readonly size = signal({ width: 0, height: 0 });
  protected readonly drawing = computed(() => frameDrawing(this.size()));

  constructor() {
    const host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
    const destroyed = inject(DestroyRef);
    afterNextRender(() => {
      const watch = new ResizeObserver(() => this.size.set({ width: host.offsetWidth, height: host.offsetHeight }));
      watch.observe(host);
      destroyed.onDestroy(() => watch.disconnect());
    });
  }
}
