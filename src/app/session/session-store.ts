import { Injectable, computed, inject, signal } from '@angular/core';
import type { Role } from '../../../shared/contracts/common';
import type { About, CurrentSession } from '../../../shared/contracts/session';
import { failedCall } from '../api/failed-call';
import { SessionClient } from '../api/session-client';

/** Who is signed in, for every part of the client. */
@Injectable({ providedIn: 'root' })
export class SessionStore {
  private readonly client = inject(SessionClient);
  private readonly held = signal<CurrentSession | null>(null);
  private readonly ended = signal(false);
  private readonly described = signal<About | null>(null);
  readonly current = this.held.asReadonly();
  /** True when a session ended while somebody worked: they sign in again over their work. */
  readonly needsSignIn = this.ended.asReadonly();
  readonly about = this.described.asReadonly();
  readonly roles = computed<readonly Role[]>(() => this.held()?.team.roles ?? []);

  /** At the start of the client. Without an answer the sign-in page says what is wrong. */
  async load(): Promise<void> {
    try {
      this.described.set(await this.client.about());
      this.held.set(await this.client.current());
    } catch (error) {
      failedCall(error);
    }
  }

  hasRole(...wanted: readonly Role[]): boolean {
    return wanted.some((role) => this.roles().includes(role));
  }

  take(session: CurrentSession): void {
    this.held.set(session);
    this.ended.set(false);
  }

  async signIn(email: string, password: string): Promise<void> {
    this.take(await this.client.signIn(email, password));
  }

  /** Keeps the session alive; null when it is over. */
  async refresh(): Promise<CurrentSession | null> {
    try {
      const session = await this.client.refresh();
      this.take(session);
      return session;
    } catch (error) {
      if (failedCall(error).kind === 'refused') return null;
      throw error;
    }
  }

  /** Called when the server no longer knows the session. */
  lose(): void {
    if (this.held() !== null) this.ended.set(true);
  }

  async signOut(): Promise<void> {
    await this.client.signOut();
    this.held.set(null);
    this.ended.set(false);
  }
}
