import { Injectable } from '@angular/core';
import type plotly from 'plotly.js-dist-min';

export type PlotLibraryModule = Pick<typeof plotly, 'react' | 'purge' | 'toImage'>;

/** The plot library, fetched when the first plot that needs it is shown. */
@Injectable({ providedIn: 'root' })
export class PlotLibrary {
  private loading: Promise<PlotLibraryModule> | null = null;

  load(): Promise<PlotLibraryModule> {
    this.loading ??= import('plotly.js-dist-min').then((module) => module.default);
    return this.loading;
  }
}
