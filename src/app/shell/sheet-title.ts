import { Injectable, inject } from '@angular/core';
import { Title } from '@angular/platform-browser';
import type { RouterStateSnapshot } from '@angular/router';
import { TitleStrategy } from '@angular/router';

/** "Pattern · Slantwise": the sheet first, so that many tabs can be told apart. */
@Injectable()
export class SheetTitle extends TitleStrategy {
  private readonly title = inject(Title);

  override updateTitle(snapshot: RouterStateSnapshot): void {
    const sheet = this.buildTitle(snapshot);
    this.title.setTitle(sheet === undefined ? 'Slantwise' : `${sheet} · Slantwise`);
  }
}
