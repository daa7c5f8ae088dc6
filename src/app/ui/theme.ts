import { DOCUMENT } from '@angular/common';
import { Injectable, computed, effect, inject, signal } from '@angular/core';

export type ThemeChoice = 'light' | 'dark' | 'system';

const KEY = 'slantwise.theme';

/** Light, dark, or what the machine asks for. A choice is kept in this browser: it is no secret. */
@Injectable({ providedIn: 'root' })
export class Theme {
  private readonly document = inject(DOCUMENT);
  private readonly darkWanted = this.document.defaultView?.matchMedia('(prefers-color-scheme: dark)');
  private readonly systemDark = signal(this.darkWanted?.matches ?? false);
  readonly choice = signal<ThemeChoice>(this.kept());
  readonly shown = computed<'light' | 'dark'>(() => {
    const choice = this.choice();
    if (choice !== 'system') return choice;
    return this.systemDark() ? 'dark' : 'light';
  });

  constructor() {
    this.darkWanted?.addEventListener('change', (event) => this.systemDark.set(event.matches));
    effect(() => this.apply());
  }

  choose(choice: ThemeChoice): void {
    this.choice.set(choice);
    this.document.defaultView?.localStorage.setItem(KEY, choice);
  }

  apply(): void {
    this.document.documentElement.dataset['theme'] = this.shown();
  }

  private kept(): ThemeChoice {
    const kept = this.document.defaultView?.localStorage.getItem(KEY);
    return kept === 'light' || kept === 'dark' ? kept : 'system';
  }
}
