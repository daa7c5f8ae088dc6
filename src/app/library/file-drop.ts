import { ChangeDetectionStrategy, Component, input, output, signal } from '@angular/core';

/** Takes files by dropping or by choosing. */
@Component({
  selector: 'slant-file-drop',
  template: `
    <div class="drop" [class.over]="over()" (dragover)="enter($event)" (dragleave)="over.set(false)" (drop)="drop($event)">
      <svg viewBox="0 0 120 60" width="120" height="60" aria-hidden="true">
        <path d="M8 8h24v44H8zM40 8h24v44H40zM72 8h24v44H72z" />
        <path d="M12 44c4-2 6-30 16-32M44 44c6-2 8-26 16-28M76 44c8-2 10-20 16-22" />
      </svg>
      <p>{{ text() }}</p>
      <label class="button">
        Choose files
        <input type="file" multiple class="visually-hidden" (change)="choose($event)" />
      </label>
    </div>
  `,
  styles: `
    .drop {
      display: grid;
      justify-items: center;
      gap: var(--s2);
      padding: var(--s6) var(--s4);
      border: 1px dashed var(--rule-strong);
      border-radius: var(--corner);
      text-align: center;
    }
    .over {
      border-color: var(--copper);
      background: var(--copper-wash);
    }
    svg path {
      fill: none;
      stroke: var(--rule-strong);
    }
    p {
      max-width: 60ch;
      color: var(--muted);
    }
    label:focus-within {
      outline: 2px solid var(--copper);
      outline-offset: 1px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FileDrop {
  readonly text = input.required<string>();
  readonly taken = output<readonly File[]>();
  protected readonly over = signal(false);

  protected enter(event: DragEvent): void {
    event.preventDefault();
    this.over.set(true);
  }

  protected drop(event: DragEvent): void {
    event.preventDefault();
    this.over.set(false);
    this.emit(event.dataTransfer?.files);
  }

  protected choose(event: Event): void {
    const field = event.target as HTMLInputElement;
    this.emit(field.files ?? undefined);
    field.value = '';
  }

  private emit(list: FileList | undefined): void {
    const files = Array.from(list ?? []);
    if (files.length > 0) this.taken.emit(files);
  }
}
