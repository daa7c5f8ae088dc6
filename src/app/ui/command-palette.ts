import type { ElementRef} from '@angular/core';
import { ChangeDetectionStrategy, Component, computed, effect, inject, signal, viewChild } from '@angular/core';
import { CommandRegistry, findCommands } from './command-registry';
import type { Command } from './command-registry';

/** Find or run: opened by Ctrl K anywhere. A native dialog keeps the focus inside and gives it back. */
@Component({
  selector: 'slant-command-palette',
  templateUrl: './command-palette.html',
  styleUrl: './command-palette.scss',
  host: { '(document:keydown)': 'openByKey($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CommandPalette {
  private readonly registry = inject(CommandRegistry);
  private readonly dialog = viewChild.required<ElementRef<HTMLDialogElement>>('dialog');
  /** Closings by us whose event has not come yet. */
  private announcedClosings = 0;
  protected readonly typed = signal('');
  protected readonly at = signal(0);
  protected readonly found = computed(() => findCommands(this.registry.commands(), this.typed()));

  constructor() {
    effect(() => {
      const dialog = this.dialog().nativeElement;
      if (this.registry.isOpen() && !dialog.open) {
        this.typed.set('');
        this.at.set(0);
        dialog.showModal();
      } else if (!this.registry.isOpen() && dialog.open) {
        this.announcedClosings += 1;
        dialog.close();
      }
    });
  }

  protected openByKey(event: KeyboardEvent): void {
    if ((event.ctrlKey || event.metaKey) && event.key.toLowerCase() === 'k') {
      event.preventDefault();
      this.registry.isOpen.set(true);
    }
  }

  protected type(text: string): void {
    this.typed.set(text);
    this.at.set(0);
  }

  protected steer(event: KeyboardEvent): void {
    const count = this.found().length;
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      event.preventDefault();
      const step = event.key === 'ArrowDown' ? 1 : -1;
      this.at.update((at) => (count === 0 ? 0 : (at + step + count) % count));
    } else if (event.key === 'Enter') {
      event.preventDefault();
      const command = this.found()[this.at()];
      if (command !== undefined) this.run(command);
    }
  }

  protected run(command: Command): void {
    this.close();
    command.run();
  }

  protected close(): void {
    this.registry.isOpen.set(false);
  }

  /** Follows a closing by the browser, as by Escape. The event of ours comes late: by then opening may be wanted again. */
  protected followClosing(): void {
    if (this.announcedClosings > 0) this.announcedClosings -= 1;
    else this.close();
  }
}
