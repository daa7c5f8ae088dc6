import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import { CONTRIBUTOR_IDS, CONTRIBUTORS } from '../../../../shared/model/tolerance-contributors';
import type { ContributorId, SpreadKind, ToleranceContributor } from '../../../../shared/model/tolerance-run';
import { EntryBox } from '../fields/entry-box';
import type { RefusedEntry } from '../fields/entry-box';
import { readSpread, spreadMeaning, spreadText, spreadUnit } from './spread-text';

interface Row {
  readonly id: ContributorId;
  readonly label: string;
  readonly about: string;
  readonly source: string;
  readonly extent: string;
  readonly unit: string;
  readonly shown: string;
  readonly refused: (RefusedEntry & { readonly text: string }) | null;
  readonly distribution: SpreadKind;
  readonly meaning: string;
  readonly varies: boolean;
}

/** What a run varies and how far: a spread of 0 leaves a contributor out. */
@Component({
  selector: 'slant-contributors-table',
  imports: [EntryBox],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './contributors-table.html',
  styleUrls: ['../fields/sheet.scss', './contributors-table.scss'],
})
export class ContributorsTable {
  readonly contributors = input.required<readonly ToleranceContributor[]>();
  readonly locked = input(false);
  readonly changed = output<ToleranceContributor[]>();

  private readonly refusals = signal<ReadonlyMap<ContributorId, RefusedEntry & { readonly text: string }>>(new Map());
  protected readonly rows = computed(() => CONTRIBUTOR_IDS.map((id) => this.rowOf(id)));

  protected take(id: ContributorId, text: string): void {
    const read = readSpread(id, text);
    const refusals = new Map(this.refusals());
    if (read.kind === 'refused') refusals.set(id, { text, reason: read.reason, suggestion: read.suggestion });
    else refusals.delete(id);
    this.refusals.set(refusals);
    if (read.kind === 'value') this.put({ ...this.contributorOf(id), spread: read.spread });
  }

  protected giveUp(id: ContributorId): void {
    const refusals = new Map(this.refusals());
    refusals.delete(id);
    this.refusals.set(refusals);
  }

  protected choose(id: ContributorId, value: string): void {
    this.put({ ...this.contributorOf(id), distribution: value === 'uniform' ? 'uniform' : 'normal' });
  }

  private put(next: ToleranceContributor): void {
    this.changed.emit(CONTRIBUTOR_IDS.map((id) => (id === next.id ? next : this.contributorOf(id))));
  }

  private contributorOf(id: ContributorId): ToleranceContributor {
    return this.contributors().find((contributor) => contributor.id === id) ?? { id, spread: 0, distribution: CONTRIBUTORS[id].distribution };
  }

  private rowOf(id: ContributorId): Row {
    const { label, about, extent, source, spread: usual, distribution: usualKind } = CONTRIBUTORS[id];
    const { spread, distribution } = this.contributorOf(id);
    const refused = this.refusals().get(id) ?? null;
    const asUsual = spread === usual && distribution === usualKind;
    return {
      ...{ id, label, about, refused, distribution },
      source: spread === 0 ? 'left out' : asUsual ? source : 'your own',
      extent: extent === 'cell' ? 'each cell' : 'whole panel',
      unit: spreadUnit(id),
      shown: refused?.text ?? spreadText(id, spread),
      meaning: spreadMeaning(distribution),
      varies: spread > 0,
    };
  }
}
