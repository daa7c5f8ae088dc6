import { DestroyRef, ElementRef, afterNextRender, inject, signal } from '@angular/core';
import type { Signal } from '@angular/core';

/** Width of the host element in CSS pixels, followed as it changes; 0 until it is laid out. Call in a constructor or field. */
export function hostWidth(): Signal<number> {
  const host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  const destroyed = inject(DestroyRef);
  const width = signal(0);
  afterNextRender(() => {
    width.set(Math.floor(host.getBoundingClientRect().width));
    // Not every environment lays out; there the first measurement stands.
    if (typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(() => width.set(Math.floor(host.getBoundingClientRect().width)));
    observer.observe(host);
    destroyed.onDestroy(() => observer.disconnect());
  });
  return width.asReadonly();
}
