import { DOCUMENT, Injectable, computed, inject, signal } from '@angular/core';
import type { Role } from '../../../shared/contracts/common';
import type { About, CurrentSession } from '../../../shared/contracts/session';
import { failedCall } from '../api/failed-call';
import { SessionClient } from '../api/session-client';
import { oneTabAtATime } from './one-tab-at-a-time';

export interface SessionEnds {
  /** If nothing happens. */
  readonly idleMs: number;
  /** In any case. */
  readonly lastMs: number;
}

/** Who is signed in, for every part of the client. */
@Injectable({ providedIn: 'root' })
export class SessionStore {
  private readonly client = inject(SessionClient);
  private readonly document = inject(DOCUMENT);
  private readonly held = signal<CurrentSession | null>(null);
  private readonly ended = signal(false);
  private readonly described = signal<About | null>(null);
  /** Every answer moves the idle end on, as the server counts it. */
  private readonly idleEnd = signal(0);
  private idleLifeMs = 0;
  private readonly waiting: (() => void)[] = [];
  readonly current = this.held.asReadonly();
  /** True when a session ended while somebody worked: they sign in again over their work. */
  readonly needsSignIn = this.ended.asReadonly();
  readonly about = this.described.asReadonly();
  /** When the session ends by itself, in milliseconds since 1970; null without a session. */
  readonly ends = computed((): SessionEnds | null => {
    const session = this.held();
    return session === null ? null : { idleMs: this.idleEnd(), lastMs: Date.parse(session.endsAt) };
  });
  readonly roles = computed<readonly Role[]>(() => this.held()?.team.roles ?? []);

  /** At the start of the client. Without an answer the sign-in page says what is wrong. */
  async load(): Promise<void> {
    try {
      this.described.set(await this.client.about());
      if (mayHaveSession(this.document.cookie)) await this.refresh();
    } catch (error) {
      failedCall(error);
    }
  }

  hasRole(...wanted: readonly Role[]): boolean {
    return wanted.some((role) => this.roles().includes(role));
  }

  take(session: CurrentSession): void {
    this.held.set(session);
    this.idleLifeMs = Date.parse(session.idleEndsAt) - Date.now();
    this.idleEnd.set(Date.parse(session.idleEndsAt));
    this.ended.set(false);
    this.waiting.splice(0).forEach((goOn) => goOn());
  }

  async signIn(email: string, password: string): Promise<void> {
    this.take(await this.client.signIn(email, password));
  }

  /** Keeps the session alive; null when it is over. Another tab may have done so already: then its session is taken. */
  refresh(): Promise<CurrentSession | null> {
    return oneTabAtATime(async () => (await this.attempt(this.client.current)) ?? (await this.attempt(this.client.refresh)));
  }

  private async attempt(call: () => Promise<CurrentSession>): Promise<CurrentSession | null> {
    try {
      const session = await call();
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

  /** Resolves when somebody is signed in: at once, or after they have signed in again. */
  signedIn(): Promise<void> {
    return this.ended() ? new Promise((goOn) => this.waiting.push(goOn)) : Promise.resolve();
  }

  /** An answer came: the server counts the idle time from now. */
  answered(): void {
    if (this.held() !== null) this.idleEnd.set(Date.now() + this.idleLifeMs);
  }

  async signOut(): Promise<void> {
    await this.client.signOut();
    this.held.set(null);
    this.ended.set(false);
  }
}

/** The forgery token is the one cookie of a session that a page may read; without it nobody is signed in. */
const mayHaveSession = (cookies: string): boolean => cookies.includes('XSRF-TOKEN=');
