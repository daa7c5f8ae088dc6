import { Injectable } from '@angular/core';

export type PlotLibraryModule = Pick<typeof import('plotly.js-dist-min').default, 'react' | 'purge' | 'toImage'>;

/** The plot library, fetched when the first plot that needs it is shown. */
@Injectable({ providedIn: 'root' })
export class PlotLibrary {
  private loading: Promise<PlotLibraryModule> | null = null;

  load(): Promise<PlotLibraryModule> {
    this.loading ??= import('plotly.js-dist-min').then((module) => module.default);
    return this.loading;
  }
}
