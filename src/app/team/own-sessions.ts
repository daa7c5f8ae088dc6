import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import type { OwnSession } from '../../../shared/contracts/session';
import { SessionClient } from '../api/session-client';
import type { CallFault } from '../session/call-fault';
import { callFault } from '../session/call-fault';
import { FaultNote } from '../ui/fault-note';
import { UtcTime } from '../ui/utc-time';
import { ViewTitle } from '../ui/view-title';
import { browserName } from './browser-name';

@Component({
  selector: 'slant-own-sessions',
  imports: [FaultNote, UtcTime, ViewTitle],
  template: `
    <section aria-label="Sessions">
      <slant-view-title text="Sessions" unit="where you are signed in" />
      @if (fault(); as problem) {
        <slant-fault-note [text]="problem.detail" [requestId]="problem.requestId" />
      }
      <div class="scroll-box" tabindex="0" role="group" aria-label="Own sessions">
        <table class="data-table">
          <thead>
            <tr><th class="text" scope="col">Browser</th><th class="text" scope="col">Address</th><th scope="col">Since</th><th scope="col">Last used</th><th scope="col"><span class="visually-hidden">End it</span></th></tr>
          </thead>
          <tbody>
            @for (session of sessions(); track session.id) {
              <tr [class.chosen]="session.current">
                <td class="text" [attr.title]="session.browser">{{ browserName(session.browser) }}</td>
                <td class="text">{{ session.address }}</td>
                <td>{{ session.createdAt | utcTime }}</td>
                <td>{{ session.lastUsedAt | utcTime }}</td>
                <td>
                  @if (session.current) {
                    this one
                  } @else {
                    <button type="button" class="button quiet" [attr.aria-label]="'End the session of ' + browserName(session.browser) + ' at ' + session.address" (click)="end(session.id)">End</button>
                  }
                </td>
              </tr>
            }
          </tbody>
        </table>
      </div>
      @if (sessions().length > 1) {
        <button type="button" class="button" (click)="endOthers()">End all others</button>
      }
    </section>
  `,
  styles: 'section { display: grid; gap: var(--s2); justify-items: start; } slant-view-title, .scroll-box { width: 100%; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OwnSessions {
  private readonly client = inject(SessionClient);
  protected readonly sessions = signal<readonly OwnSession[]>([]);
  protected readonly fault = signal<CallFault | null>(null);
  protected readonly browserName = browserName;

  constructor() {
    void this.attempt(async () => undefined);
  }

  protected end = (id: string): Promise<void> => this.attempt(() => this.client.endSession(id));
  protected endOthers = (): Promise<void> => this.attempt(() => this.client.endOtherSessions());

  private async attempt(work: () => Promise<unknown>): Promise<void> {
    try {
      await work();
      this.sessions.set(await this.client.sessions());
      this.fault.set(null);
    } catch (error) {
      this.fault.set(callFault(error));
    }
  }
}
