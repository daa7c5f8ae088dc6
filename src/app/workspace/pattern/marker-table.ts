import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { MarkerRow } from './marker-rows';

/** The numbered places of a cut with their levels and margins; one's own can be taken away. */
@Component({
  selector: 'slant-marker-table',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <table class="data-table">
      <thead>
        <tr>
          <th scope="col" class="text">Marker</th>
          <th scope="col">Angle, °</th>
          <th scope="col">dBi</th>
          <th scope="col">Rel., dB</th>
          <th scope="col">Margin, dB</th>
        </tr>
      </thead>
      <tbody>
        @for (row of rows(); track row.name) {
          <tr [class.chosen]="row.angleDeg === cursorDeg()">
            <td class="text">
              <span class="number">{{ row.name }}</span>
              <button type="button" class="what" [attr.aria-label]="'Put the cursor on marker ' + row.name + ', ' + row.what" (click)="pointed.emit(row.angleDeg)">{{ row.what }}</button>
              @if (row.own) {
                <button type="button" class="away" [attr.aria-label]="'Take marker ' + row.name + ' away'" (click)="removed.emit(row.angleDeg)">×</button>
              }
            </td>
            <td>{{ row.angle }}</td>
            <td>{{ row.level }}</td>
            <td>{{ row.relative }}</td>
            <td [class]="row.kept === null ? 'muted' : row.kept ? 'pass' : 'fail'">{{ row.margin }}</td>
          </tr>
        }
      </tbody>
    </table>
    @if (delta(); as text) {
      <p class="delta figure">{{ text }}</p>
    }
  `,
  styles: `
    :host {
      display: block;
      min-width: 0;
      overflow-x: auto;
    }
    .number {
      display: inline-block;
      min-width: 18px;
      font-family: var(--font-figure);
    }
    button {
      min-height: 16px;
      line-height: 16px;
      padding: 0;
      border: 0;
      background: none;
      color: inherit;
      font: inherit;
      cursor: pointer;
    }
    .what:hover {
      color: var(--copper);
    }
    .away {
      min-width: var(--hit);
      color: var(--copper);
    }
    .delta {
      padding: 4px;
      font-size: var(--size-small);
      color: var(--copper);
    }
  `,
})
export class MarkerTable {
  readonly rows = input.required<readonly MarkerRow[]>();
  readonly delta = input<string | null>(null);
  readonly cursorDeg = input<number | null>(null);
  readonly pointed = output<number>();
  readonly removed = output<number>();
}
