import { ChangeDetectionStrategy, Component, effect, inject, input, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { FamilyDetail } from '../../../shared/contracts/library';
import { LibraryDesk } from '../api/library-desk';
import type { CallFault } from '../session/call-fault';
import { callFault } from '../session/call-fault';
import { SessionStore } from '../session/session-store';
import { FaultNote } from '../ui/fault-note';
import { SheetFrame } from '../ui/sheet-frame';
import { StateMark } from '../ui/state-mark';
import { ViewTitle } from '../ui/view-title';
import { DescriptionList } from './description-list';
import { angleText, bandText, editionText } from './family-text';
import { verdictMark, verdictText } from './verdict-words';

/** A family with all its editions and the description of the newest one. */
@Component({
  selector: 'slant-family-page',
  imports: [DescriptionList, FaultNote, RouterLink, SheetFrame, StateMark, ViewTitle],
  templateUrl: './family-page.html',
  styleUrls: ['./library-page.scss', './edition-page.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FamilyPage {
  private readonly desk = inject(LibraryDesk);
  readonly familyId = input.required<string>();
  protected readonly family = signal<FamilyDetail | null>(null);
  protected readonly fault = signal<CallFault | null>(null);
  protected readonly isLab = inject(SessionStore).hasRole('lab');
  protected readonly bandText = bandText;
  protected readonly angleText = angleText;
  protected readonly editionText = editionText;
  protected readonly verdictMark = verdictMark;
  protected readonly verdictText = verdictText;

  constructor() {
    effect(() => void this.load(this.familyId()));
  }

  private async load(id: string): Promise<void> {
    try {
      this.family.set(await this.desk.family(id));
      this.fault.set(null);
    } catch (error) {
      this.fault.set(callFault(error));
    }
  }
}
