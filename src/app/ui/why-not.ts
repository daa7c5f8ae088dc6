import { Directive, ElementRef, effect, inject, input } from '@angular/core';
import { MatTooltip } from '@angular/material/tooltip';

/**
 * Keeps a control visible that this person may not use, and says why: on hover, on focus and to screen readers.
 * `null` leaves the control alone. It stays focusable, or nobody could ask for the reason.
 */
@Directive({
  selector: '[slantWhyNot]',
  hostDirectives: [MatTooltip],
  host: { '[attr.aria-disabled]': "slantWhyNot() === null ? null : 'true'" },
})
export class WhyNot {
  readonly slantWhyNot = input.required<string | null>();

  constructor() {
    const tooltip = inject(MatTooltip);
    effect(() => {
      tooltip.message = this.slantWhyNot() ?? '';
    });
    // Before the handlers of the template, whatever their order.
    inject<ElementRef<HTMLElement>>(ElementRef).nativeElement.addEventListener('click', (event) => this.hold(event), { capture: true });
  }

  private hold(event: Event): void {
    if (this.slantWhyNot() === null) return;
    event.preventDefault();
    event.stopImmediatePropagation();
  }
}
