import { ChangeDetectionStrategy, Component, computed, effect, inject, input, signal } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import type { FamilySummary } from '../../../shared/contracts/library';
import { parseQuantity } from '../../../shared/units/quantity';
import { LibraryClient } from '../api/library-client';
import type { FamilySearch } from '../api/library-client';
import type { CallFault } from '../session/call-fault';
import { callFault } from '../session/call-fault';
import { SessionStore } from '../session/session-store';
import { EmptyState } from '../ui/empty-state';
import { FaultNote } from '../ui/fault-note';
import { SheetFrame } from '../ui/sheet-frame';
import { StateMark } from '../ui/state-mark';
import { ViewTitle } from '../ui/view-title';
import { angleText, bandText, editionText, periodText } from './family-text';
import { verdictMark, verdictText } from './verdict-words';

/** Families of cells with their editions, filtered by name, frequency, period and angle. The filter stands in the address. */
@Component({
  selector: 'slant-library-page',
  imports: [EmptyState, FaultNote, RouterLink, SheetFrame, StateMark, ViewTitle],
  templateUrl: './library-page.html',
  styleUrl: './library-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LibraryPage {
  private readonly client = inject(LibraryClient);
  private readonly router = inject(Router);
  private readonly session = inject(SessionStore);
  readonly text = input<string>();
  readonly frequency = input<string>();
  readonly period = input<string>();
  readonly angle = input<string>();
  protected readonly families = signal<readonly FamilySummary[] | null>(null);
  protected readonly fault = signal<CallFault | null>(null);
  protected readonly isLab = computed(() => this.session.hasRole('lab'));
  protected readonly filtered = computed(() => [this.text(), this.frequency(), this.period(), this.angle()].some((value) => (value ?? '') !== ''));
  protected readonly search = computed(() => readSearch({ text: this.text() ?? '', frequency: this.frequency() ?? '', period: this.period() ?? '', angle: this.angle() ?? '' }));
  protected readonly bandText = bandText;
  protected readonly angleText = angleText;
  protected readonly periodText = periodText;
  protected readonly editionText = editionText;
  protected readonly verdictMark = verdictMark;
  protected readonly verdictText = verdictText;

  constructor() {
    effect(() => void this.load(this.search().search));
  }

  private async load(search: FamilySearch): Promise<void> {
    try {
      this.families.set(await this.client.families(search));
      this.fault.set(null);
    } catch (error) {
      this.fault.set(callFault(error));
    }
  }

  protected narrow(event: Event, form: { text: string; frequency: string; period: string; angle: string }): void {
    event.preventDefault();
    const queryParams = Object.fromEntries(Object.entries(form).map(([name, value]) => [name, value.trim() === '' ? null : value.trim()]));
    void this.router.navigate(['/library'], { queryParams });
  }
}

/** Takes what was typed to a search; what cannot be read is told and left out. */
export function readSearch(typed: { text: string; frequency: string; period: string; angle: string }): { search: FamilySearch; refused: readonly string[] } {
  const refused: string[] = [];
  const number = (text: string, dimension: 'frequency' | 'length' | 'angle'): number | undefined => {
    if (text.trim() === '') return undefined;
    const parsed = parseQuantity(text, dimension);
    if (parsed.kind === 'value') return parsed.value;
    refused.push(`${text}: ${parsed.reason}`);
    return undefined;
  };
  const search: FamilySearch = {
    ...(typed.text.trim() === '' ? {} : { text: typed.text.trim() }),
    frequencyGHz: number(typed.frequency, 'frequency'),
    periodMm: number(typed.period, 'length'),
    thetaDeg: number(typed.angle, 'angle'),
  };
  return { search, refused };
}
