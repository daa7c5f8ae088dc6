import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { DatePipe } from '@angular/common';
import type { OwnSession } from '../../../shared/contracts/session';
import { SessionClient } from '../api/session-client';
import { callFault } from '../session/call-fault';
import { ViewTitle } from '../ui/view-title';

@Component({
  selector: 'slant-own-sessions',
  imports: [DatePipe, ViewTitle],
  template: `
    <section aria-label="Sessions">
      <slant-view-title text="Sessions" unit="where you are signed in" />
      @if (fault(); as text) {
        <p class="field-fault" role="alert">{{ text }}</p>
      }
      <div class="scroll-box">
        <table class="data-table">
          <thead>
            <tr><th class="text" scope="col">Browser</th><th class="text" scope="col">Address</th><th scope="col">Since</th><th scope="col">Last used</th><th scope="col"></th></tr>
          </thead>
          <tbody>
            @for (session of sessions(); track session.id) {
              <tr [class.chosen]="session.current">
                <td class="text">{{ session.browser }}</td>
                <td class="text">{{ session.address }}</td>
                <td>{{ session.createdAt | date: 'yyyy-MM-dd HH:mm' }}</td>
                <td>{{ session.lastUsedAt | date: 'yyyy-MM-dd HH:mm' }}</td>
                <td>
                  @if (session.current) {
                    this one
                  } @else {
                    <button type="button" class="button quiet" (click)="end(session.id)">End</button>
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
  protected readonly fault = signal<string | null>(null);

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
      this.fault.set(callFault(error).detail);
    }
  }
}
