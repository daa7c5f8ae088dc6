import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { Letter } from '../../../shared/contracts/session';
import { SessionClient } from '../api/session-client';
import { EmptyState } from '../ui/empty-state';
import { FaultNote } from '../ui/fault-note';
import { SheetFrame } from '../ui/sheet-frame';
import { UtcTime } from '../ui/utc-time';
import { letterParts } from './letter-parts';
import type { CallFault } from './call-fault';
import { callFault } from './call-fault';

/** What this server wrote while no mail server is set: for development and demonstration only. */
@Component({
  selector: 'slant-letters-page',
  imports: [EmptyState, FaultNote, RouterLink, SheetFrame, UtcTime],
  templateUrl: './letters-page.html',
  styleUrl: './letters-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LettersPage {
  private readonly client = inject(SessionClient);
  protected readonly letters = signal<readonly Letter[] | null>(null);
  protected readonly fault = signal<CallFault | null>(null);
  protected readonly parts = letterParts;
  protected readonly origin = location.origin;

  constructor() {
    void this.load();
  }

  protected async load(): Promise<void> {
    try {
      this.letters.set(await this.client.letters());
      this.fault.set(null);
    } catch (error) {
      this.fault.set(callFault(error));
    }
  }
}
