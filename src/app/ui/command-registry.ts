import { Injectable, computed, signal } from '@angular/core';

/** Something the command palette can find and run. */
export interface Command {
  readonly id: string;
  readonly label: string;
  /** What kind it is, shown at the end of the line: "sheet", "panel", "action". */
  readonly kind: string;
  /** More words to find it by. */
  readonly words?: string;
  readonly keys?: string;
  run(): void;
}

/** Every part of the client adds its commands here and takes them back when it goes. */
@Injectable({ providedIn: 'root' })
export class CommandRegistry {
  private readonly groups = signal<ReadonlyMap<string, readonly Command[]>>(new Map());
  readonly commands = computed(() => [...this.groups().values()].flat());
  readonly isOpen = signal(false);

  /** Replaces the commands of a group; returns how to take them back. */
  set(group: string, commands: readonly Command[]): () => void {
    this.groups.update((groups) => new Map(groups).set(group, commands));
    return () => {
      this.groups.update((groups) => {
        if (groups.get(group) !== commands) return groups;
        const rest = new Map(groups);
        rest.delete(group);
        return rest;
      });
    };
  }
}

/** Commands whose label or words hold every word typed, those that begin with it first. */
export function findCommands(commands: readonly Command[], typed: string, atMost = 12): readonly Command[] {
  const words = typed.toLowerCase().split(/\s+/).filter((word) => word !== '');
  const text = (command: Command): string => `${command.label} ${command.words ?? ''} ${command.kind}`.toLowerCase();
  const found = commands.filter((command) => words.every((word) => text(command).includes(word)));
  const startsWith = (command: Command): number => (words.length > 0 && command.label.toLowerCase().startsWith(words[0]) ? 0 : 1);
  return [...found].sort((a, b) => startsWith(a) - startsWith(b)).slice(0, atMost);
}
