import type { ElementRef } from '@angular/core';
import { ChangeDetectionStrategy, Component, DestroyRef, computed, effect, inject, signal, viewChild } from '@angular/core';
import { failedCall } from '../api/failed-call';
import { SessionStore } from './session-store';
import { SignInForm } from './sign-in-form';
import { minutesLeft } from './minutes-left';

const TICK_MS = 15_000;
/** A person is warned this long before the session ends by itself. */
const WARN_MINUTES = 2;

/**
 * Warns before the session ends, and lets the same person sign in again over the work when it has. Nothing behind the
 * dialog is lost: calls that failed are sent again by whoever made them.
 */
@Component({
  selector: 'slant-session-watch',
  imports: [SignInForm],
  templateUrl: './session-watch.html',
  styleUrl: './session-watch.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SessionWatch {
  private readonly store = inject(SessionStore);
  private readonly dialog = viewChild.required<ElementRef<HTMLDialogElement>>('dialog');
  private asking = false;
  private readonly now = signal(Date.now());
  protected readonly needsSignIn = this.store.needsSignIn;
  protected readonly email = computed(() => this.store.current()?.person.email ?? null);
  private readonly left = computed(() => minutesLeft(this.store.ends(), this.now()));
  protected readonly warning = computed(() => {
    const left = this.left();
    return left !== null && left.minutes <= WARN_MINUTES && !this.needsSignIn() ? left : null;
  });

  constructor() {
    const timer = setInterval(() => this.look(), TICK_MS);
    inject(DestroyRef).onDestroy(() => clearInterval(timer));
    effect(() => {
      const dialog = this.dialog().nativeElement;
      if (this.needsSignIn() && !dialog.open) dialog.showModal();
      else if (!this.needsSignIn() && dialog.open) dialog.close();
    });
  }

  private look(): void {
    this.now.set(Date.now());
    if (this.left()?.minutes === 0 && !this.needsSignIn()) void this.stay();
  }

  /** A renewal counts as a sign of life; when the session is over it says so. Without an answer the next look tries again. */
  protected async stay(): Promise<void> {
    if (this.asking) return;
    this.asking = true;
    try {
      if ((await this.store.refresh()) === null) this.store.lose();
    } catch (error) {
      if (failedCall(error).kind !== 'unreachable') throw error;
    } finally {
      this.asking = false;
    }
  }
}
