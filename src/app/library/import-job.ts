import { Injectable, computed, inject, signal } from '@angular/core';
import type { Observable, Subscription } from 'rxjs';
import type { EditionDetail, ImportMapping, Inspection } from '../../../shared/contracts/library';
import type { FamilyDescription } from '../../../shared/model/cell-family';
import { LibraryDesk } from '../api/library-desk';
import type { UploadStep } from '../api/library-desk';
import { callFault } from '../session/call-fault';
import { descriptionOf, entriesOf } from './description-form-values';
import type { DescriptionEntries } from './description-form-values';

export type ImportProgress = { readonly kind: 'idle' } | { readonly kind: 'sending'; readonly share: number } | { readonly kind: 'reading' };

/** One import from dropped files to an accepted edition. The files stay in the browser until they are accepted. */
@Injectable()
export class ImportJob {
  private readonly desk = inject(LibraryDesk);
  private running: Subscription | null = null;
  readonly files = signal<readonly File[]>([]);
  readonly mapping = signal<ImportMapping>({});
  readonly inspection = signal<Inspection | null>(null);
  readonly entries = signal<DescriptionEntries>(entriesOf({}));
  readonly progress = signal<ImportProgress>({ kind: 'idle' });
  readonly faults = signal<readonly string[]>([]);
  readonly busy = computed(() => this.progress().kind !== 'idle');
  /** Fields a person has touched: a later reading of the files leaves them alone. */
  private readonly touched = new Set<string>();

  readonly parts = computed<Pick<FamilyDescription, 'parameters' | 'shapes' | 'excludedRegions'>>(() => {
    const hint = this.inspection()?.detected.descriptionHint;
    const names = this.inspection()?.detected.parameterNames ?? [];
    const known = new Map((hint?.parameters ?? []).map((parameter) => [parameter.id, parameter]));
    const parameters = names.map((id) => known.get(id) ?? { id, label: words(id), unit: 'mm' as const });
    return { parameters, shapes: hint?.shapes ?? [], excludedRegions: hint?.excludedRegions ?? [] };
  });
  readonly described = computed(() => descriptionOf(this.entries(), this.parts()));

  take(files: readonly File[]): void {
    this.files.set(files);
    this.mapping.set({});
    this.inspection.set(null);
    this.inspect(false);
  }

  /** Keeps the description of the newest edition when a family gets another one. */
  prefill(description: FamilyDescription): void {
    this.entries.set(entriesOf(description));
    for (const [path, value] of Object.entries(this.entries())) if (value !== '') this.touched.add(path);
  }

  type(path: string, text: string): void {
    this.touched.add(path);
    this.entries.update((entries) => ({ ...entries, [path]: text }));
  }

  change(mapping: ImportMapping): void {
    this.mapping.set(mapping);
    this.inspect(false);
  }

  /** Reads the files again; with the description once it is complete, so that the checks can judge. */
  inspect(withDescription: boolean): void {
    const described = this.described();
    const description = withDescription && described.kind === 'complete' ? described.description : undefined;
    const wish = { mapping: this.mapping(), ...(description === undefined ? {} : { description }) };
    this.follow(this.desk.inspect(this.files(), wish), (inspection) => {
      this.inspection.set(inspection);
      this.fillIn(inspection.detected.descriptionHint);
    });
  }

  accept(note: string, familyId: string | null, accepted: (edition: EditionDetail) => void): void {
    const described = this.described();
    if (described.kind !== 'complete') return;
    this.follow(this.desk.accept(this.files(), { description: described.description, mapping: this.mapping(), note }, familyId), accepted);
  }

  private fillIn(hint: Partial<FamilyDescription>): void {
    const said = entriesOf(hint);
    this.entries.update((entries) =>
      Object.fromEntries(Object.entries(entries).map(([path, text]) => [path, this.touched.has(path) || said[path] === '' ? text : said[path]])),
    );
  }

  private follow<T>(steps: Observable<UploadStep<T>>, done: (answer: T) => void): void {
    this.running?.unsubscribe();
    this.faults.set([]);
    this.progress.set({ kind: 'sending', share: 0 });
    this.running = steps.subscribe({
      next: (step) => {
        if (step.kind === 'done') {
          this.progress.set({ kind: 'idle' });
          done(step.answer);
        } else {
          this.progress.set(step);
        }
      },
      error: (error: unknown) => {
        this.progress.set({ kind: 'idle' });
        const fault = callFault(error);
        const texts = Object.values(fault.fields);
        this.faults.set(texts.length > 0 ? texts : [fault.detail]);
      },
    });
  }
}

/** "ringOuterSide" -> "Ring outer side". */
function words(id: string): string {
  const spaced = id.replace(/([a-z0-9])([A-Z])/g, '$1 $2').toLowerCase();
  return spaced.charAt(0).toUpperCase() + spaced.slice(1);
}
