import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { JsonPipe } from '@angular/common';
import { RouterLink } from '@angular/router';
import type { AuditRow } from '../../../shared/contracts/team';
import { TeamClient } from '../api/team-client';
import type { CallFault } from '../session/call-fault';
import { callFault } from '../session/call-fault';
import { FaultNote } from '../ui/fault-note';
import { SheetFrame } from '../ui/sheet-frame';
import { StateMark } from '../ui/state-mark';
import { UtcTime } from '../ui/utc-time';
import { ViewTitle } from '../ui/view-title';
import { detailText, objectText } from './audit-text';

/** What was done, by whom and when, with the verdict on the chain of hashes that guards it. */
@Component({
  selector: 'slant-audit-page',
  imports: [FaultNote, JsonPipe, RouterLink, SheetFrame, StateMark, UtcTime, ViewTitle],
  templateUrl: './audit-page.html',
  styleUrl: './team-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AuditPage {
  private readonly client = inject(TeamClient);
  protected readonly rows = signal<readonly AuditRow[]>([]);
  protected readonly next = signal<string | null>(null);
  protected readonly intact = signal<boolean | null>(null);
  protected readonly fault = signal<CallFault | null>(null);
  protected readonly objectText = objectText;
  protected readonly detailText = detailText;

  constructor() {
    void this.read(null);
  }

  protected async read(after: string | null): Promise<void> {
    try {
      const page = await this.client.audit(after);
      this.rows.update((rows) => (after === null ? page.items : [...rows, ...page.items]));
      this.next.set(page.next);
      this.intact.set(page.chainIntact);
      this.fault.set(null);
    } catch (error) {
      this.fault.set(callFault(error));
    }
  }
}
