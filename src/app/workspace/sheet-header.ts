import { Injectable, signal } from '@angular/core';

/** A button that the open sheet adds to the bar, before the bar's own. */
export interface SheetAction {
  readonly label: string;
  /** Why it cannot be used now, or null when it can. */
  readonly disabledReason: string | null;
  run(): void;
}

export interface SheetHead {
  /** Number in the rail. */
  readonly number: number;
  readonly title: string;
  readonly subtitle: string;
  readonly actions?: readonly SheetAction[];
  /** For the title block, such as "1 : 1.43"; "none" when absent. */
  readonly scale?: string;
}

/** What the open sheet says of itself in the bar and the title block. The sheet calls `show` from an effect. */
@Injectable()
export class SheetHeader {
  private readonly shown = signal<SheetHead>({ number: 0, title: '', subtitle: '' });
  readonly head = this.shown.asReadonly();

  show(head: SheetHead): void {
    this.shown.set(head);
  }
}
