import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { scope } from '../../../shared/contracts/common';
import type { Scope } from '../../../shared/contracts/common';
import type { PersonalToken, TokenCreated } from '../../../shared/contracts/session';
import { SessionClient } from '../api/session-client';
import type { CallFault } from '../session/call-fault';
import { callFault } from '../session/call-fault';
import { CheckField } from '../ui/check-field';
import { Confirm } from '../ui/confirm';
import { FaultNote } from '../ui/fault-note';
import { UtcTime } from '../ui/utc-time';
import { ViewTitle } from '../ui/view-title';

/** Personal tokens for scripts: scoped, expiring, shown once. */
@Component({
  selector: 'slant-own-tokens',
  imports: [CheckField, FaultNote, UtcTime, ViewTitle],
  templateUrl: './own-tokens.html',
  styleUrl: './own-tokens.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OwnTokens {
  private readonly client = inject(SessionClient);
  private readonly confirm = inject(Confirm);
  protected readonly scopes = scope.options;
  protected readonly wanted = signal<readonly Scope[]>(['read', 'predict']);
  protected readonly tokens = signal<readonly PersonalToken[]>([]);
  protected readonly created = signal<TokenCreated | null>(null);
  protected readonly copied = signal(false);
  protected readonly fault = signal<CallFault | null>(null);

  constructor() {
    void this.attempt(async () => undefined);
  }

  protected toggle(name: Scope): void {
    this.wanted.update((scopes) => (scopes.includes(name) ? scopes.filter((held) => held !== name) : [...scopes, name]));
  }

  protected async create(event: Event, name: HTMLInputElement, days: string): Promise<void> {
    event.preventDefault();
    await this.attempt(async () => {
      this.copied.set(false);
      this.created.set(await this.client.createToken({ name: name.value, scopes: this.wanted(), days: Number(days) }));
      name.value = '';
    });
  }

  /** Pages without secure context have no clipboard: the secret is then marked, ready for the person's own copy. */
  protected async copy(secret: HTMLElement): Promise<void> {
    const { clipboard } = navigator as { readonly clipboard?: Clipboard };
    if (clipboard === undefined) {
      getSelection()?.selectAllChildren(secret);
      return;
    }
    await clipboard.writeText(secret.textContent ?? '');
    this.copied.set(true);
  }

  protected async revoke({ id, name }: PersonalToken): Promise<void> {
    if (!(await this.confirm.ask({ title: `Revoke ${name}?`, text: 'Scripts that use it are refused at once. It cannot be brought back.', deed: 'Revoke', final: true }))) return;
    await this.attempt(async () => {
      await this.client.revokeToken(id);
      if (this.created()?.id === id) this.created.set(null);
    });
  }

  private async attempt(work: () => Promise<unknown>): Promise<void> {
    try {
      await work();
      this.tokens.set(await this.client.tokens());
      this.fault.set(null);
    } catch (error) {
      this.fault.set(callFault(error));
    }
  }
}
