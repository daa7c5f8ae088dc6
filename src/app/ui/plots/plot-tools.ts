import { ChangeDetectionStrategy, Component, DOCUMENT, inject, input, signal } from '@angular/core';
import { plotCsv, plotFileName, plotSvg } from './plot-export';
import type { ExportablePlot, PlotHeading } from './plot-export';
import { saveFile } from './save-file';
import { embeddedFaces, svgToPng } from './svg-to-png';

type PlotFormat = 'SVG' | 'PNG' | 'CSV';

const PNG_SCALE = 2;

/** The row of tools of a plot: its own controls, then the three forms it can be saved in. */
@Component({
  selector: 'slant-plot-tools',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ng-content />
    <span class="save" role="group" [attr.aria-label]="'Save ' + heading().title">
      @for (format of formats; track format) {
        <button type="button" [attr.aria-label]="'Save ' + heading().title + ' as ' + format" [disabled]="busy()" (click)="save(format)">{{ format }}</button>
      }
    </span>
    <span class="told" [class.trouble]="failed()" role="status">{{ told() }}</span>
  `,
  styleUrl: './plot-tools.scss',
})
export class PlotTools {
  readonly plot = input.required<ExportablePlot>();
  readonly heading = input.required<PlotHeading>();

  protected readonly formats: readonly PlotFormat[] = ['SVG', 'PNG', 'CSV'];
  protected readonly busy = signal(false);
  protected readonly told = signal('');
  protected readonly failed = signal(false);
  private readonly document = inject(DOCUMENT);

  protected async save(format: PlotFormat): Promise<void> {
    this.busy.set(true);
    this.failed.set(false);
    this.told.set('');
    try {
      const content = await this.contentOf(format);
      saveFile(this.document, plotFileName(this.heading(), format.toLowerCase()), content);
      this.told.set(`${format} saved`);
    } catch (error) {
      this.failed.set(true);
      this.told.set(`${format} not saved: ${error instanceof Error ? error.message : String(error)}`);
    } finally {
      this.busy.set(false);
    }
  }

  private async contentOf(format: PlotFormat): Promise<Blob> {
    if (format === 'CSV') return new Blob([plotCsv(this.plot().exportTable(), this.heading())], { type: 'text/csv;charset=utf-8' });
    const picture = await this.plot().exportPicture();
    if (format === 'SVG') return new Blob([plotSvg(picture, this.heading())], { type: 'image/svg+xml' });
    return svgToPng(this.document, plotSvg(picture, this.heading(), await embeddedFaces(this.document)), PNG_SCALE);
  }
}
