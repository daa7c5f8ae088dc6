import { ChangeDetectionStrategy, Component, DOCUMENT, computed, effect, inject, input, output, signal } from '@angular/core';
import type { ExportPreview } from '../../../../shared/contracts/projects';
import { RevisionClient } from '../../api/revision-client';
import { outcomeText } from '../../api/call-outcome';
import { numberText } from '../../ui/plots/plot-text';
import { saveFile } from '../../ui/plots/save-file';
import { ViewTitle } from '../../ui/view-title';

/** What an exported revision holds: its files with hashes and first lines, before anything is downloaded. */
@Component({
  selector: 'slant-export-panel',
  imports: [ViewTitle],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './export-panel.html',
  styleUrl: './export-panel.scss',
})
export class ExportPanel {
  readonly revisionId = input.required<string>();
  readonly name = input.required<string>();
  readonly closed = output();

  private readonly client = inject(RevisionClient);
  private readonly document = inject(DOCUMENT);
  protected readonly preview = signal<ExportPreview | null>(null);
  protected readonly trouble = signal('');
  protected readonly busy = signal(false);
  /** Of the archive that was downloaded. */
  protected readonly packedHash = signal<string | null>(null);
  protected readonly opened = signal<string | null>(null);
  protected readonly files = computed(() =>
    (this.preview()?.files ?? []).map((file) => ({ ...file, size: sizeText(file.bytes), shortHash: file.sha256.slice(0, 12) })),
  );
  protected readonly archive = computed(() => {
    const preview = this.preview();
    return preview ? { name: preview.archiveName, size: sizeText(preview.contentBytes) } : null;
  });

  constructor() {
    effect(() => void this.read(this.revisionId()));
  }

  private async read(revisionId: string): Promise<void> {
    this.preview.set(null);
    this.packedHash.set(null);
    this.trouble.set('');
    const outcome = await this.client.exportPreview(revisionId);
    // Another revision may have been asked for meanwhile.
    if (revisionId !== this.revisionId()) return;
    if (outcome.kind === 'found') this.preview.set(outcome.value);
    else this.trouble.set(outcomeText(outcome) ?? '');
  }

  protected toggle(name: string): void {
    this.opened.update((opened) => (opened === name ? null : name));
  }

  protected async download(): Promise<void> {
    const archive = this.archive();
    if (!archive) return;
    this.busy.set(true);
    const outcome = await this.client.archive(this.revisionId());
    this.busy.set(false);
    if (outcome.kind === 'found') {
      saveFile(this.document, archive.name, outcome.value.bytes);
      this.packedHash.set(outcome.value.sha256);
    }
    this.trouble.set(outcomeText(outcome) ?? '');
  }
}

/** Bytes up to a kilobyte, then in thousands, as files are sold. */
function sizeText(bytes: number): string {
  if (bytes < 1000) return `${bytes} B`;
  return bytes < 1_000_000 ? `${numberText(bytes / 1000, 1)} kB` : `${numberText(bytes / 1_000_000, 2)} MB`;
}
