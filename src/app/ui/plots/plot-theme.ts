import { DOCUMENT, DestroyRef, Injectable, inject, signal } from '@angular/core';
import type { ThemeName } from './colour-maps';

const TOKENS = {
  paper: '--paper',
  raised: '--raised',
  ink: '--ink',
  muted: '--muted',
  rule: '--rule',
  ruleStrong: '--rule-strong',
  copper: '--copper',
  patina: '--patina',
  fail: '--fail',
  hatch: '--hatch',
  substrate: '--substrate',
  copperMetal: '--copper-metal',
  fontText: '--font-text',
  fontFigure: '--font-figure',
} as const;

/** The design tokens as values, for what cannot read them itself: canvases, the plot library, exported files. */
export type PlotTheme = Readonly<Record<keyof typeof TOKENS, string>> & { readonly name: ThemeName };

/** Reads the tokens that hold at an element. */
export function plotThemeAt(element: Element): PlotTheme {
  const style = getComputedStyle(element);
  const entries = Object.entries(TOKENS).map(([name, token]) => [name, style.getPropertyValue(token).trim()] as const);
  const name: ThemeName = style.colorScheme === 'dark' ? 'dark' : 'light';
  return { ...(Object.fromEntries(entries) as Record<keyof typeof TOKENS, string>), name };
}

/** The tokens in force, followed through every switch of the theme. */
@Injectable({ providedIn: 'root' })
export class PlotThemes {
  private readonly document = inject(DOCUMENT);
  private readonly current = signal(plotThemeAt(this.document.documentElement));
  readonly theme = this.current.asReadonly();

  constructor() {
    const reread = (): void => this.current.set(plotThemeAt(this.document.documentElement));
    const observer = new MutationObserver(reread);
    observer.observe(this.document.documentElement, { attributes: true, attributeFilter: ['data-theme', 'class', 'style'] });
    const preference = this.document.defaultView?.matchMedia?.('(prefers-color-scheme: dark)');
    preference?.addEventListener('change', reread);
    inject(DestroyRef).onDestroy(() => {
      observer.disconnect();
      preference?.removeEventListener('change', reread);
    });
  }

  /** The light theme whatever is on the screen: paper is white. */
  printed(): PlotTheme {
    return this.withPrinted((element) => ({ ...plotThemeAt(element), name: 'light' }));
  }

  /** Runs with a hidden element under which the light tokens hold. */
  withPrinted<T>(use: (element: HTMLElement) => T, inside: Element = this.document.body): T {
    const element = this.document.createElement('div');
    element.dataset['theme'] = 'light';
    element.style.cssText = 'position:absolute;visibility:hidden;width:0;height:0;overflow:hidden;--paper:#ffffff';
    inside.append(element);
    try {
      return use(element);
    } finally {
      element.remove();
    }
  }
}
