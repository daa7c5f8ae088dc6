import { Injectable, computed, signal } from '@angular/core';

/** What stands in a field and cannot be taken into the design yet. */
export interface PendingEntry {
  readonly pointer: string;
  readonly label: string;
  readonly text: string;
  readonly reason: string;
  readonly suggestion: string | null;
}

/** Entries that were refused. They stay in their fields, also across sheets, until they are put right or given up. */
@Injectable()
export class PendingEntries {
  private readonly entries = signal<ReadonlyMap<string, PendingEntry>>(new Map());
  readonly all = computed(() => [...this.entries().values()]);

  of(pointer: string): PendingEntry | null {
    return this.entries().get(pointer) ?? null;
  }

  keep(entry: PendingEntry): void {
    this.entries.update((entries) => new Map(entries).set(entry.pointer, entry));
  }

  drop(pointer: string): void {
    if (!this.entries().has(pointer)) return;
    this.entries.update((entries) => new Map([...entries].filter(([kept]) => kept !== pointer)));
  }

  /** Gives up everything below a part of the design that is no more. */
  dropBelow(root: string): void {
    this.entries.update((entries) => new Map([...entries].filter(([pointer]) => pointer !== root && !pointer.startsWith(`${root}/`))));
  }

  clear(): void {
    this.entries.set(new Map());
  }
}
