import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Figures } from '../../../../shared/model/figures';
import type { MaskFindings } from '../../../../shared/model/mask-figures';
import { findingsText, violationRows } from './mask-findings';

/** What stands above a mask: each stretch of angles with its worst direction, level, limit and excess. */
@Component({
  selector: 'slant-mask-findings-table',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p class="hint">{{ text() }}</p>
    @if (rows().length > 0) {
      <div class="scroll" tabindex="0" role="region" aria-label="Stretches above the mask">
        <table class="data-table">
          <thead>
            <tr>
              <th scope="col">Off axis, °</th>
              <th scope="col">Worst at, °</th>
              <th scope="col">θ, φ, °</th>
              <th scope="col">Level, dBi</th>
              <th scope="col">Mask, dBi</th>
              <th scope="col">Excess, dB</th>
            </tr>
          </thead>
          <tbody>
            @for (row of rows(); track row.range) {
              <tr>
                <td class="plain">{{ row.range }}</td>
                <td class="plain">{{ row.worst }}</td>
                <td class="plain">{{ row.direction }}</td>
                <td class="plain">{{ row.level }}</td>
                <td class="plain">{{ row.allowed }}</td>
                <td class="plain fail">{{ row.excess }}</td>
              </tr>
            }
          </tbody>
        </table>
      </div>
    }
  `,
  styleUrls: ['../fields/sheet.scss', '../fields/field-rows.scss'],
})
export class MaskFindingsTable {
  readonly margin = input.required<Figures['maskMargin']>();
  /** A sentence where no stretches are told. */
  readonly findings = input.required<MaskFindings | string>();
  protected readonly rows = computed(() => {
    const findings = this.findings();
    return typeof findings === 'string' ? [] : violationRows(findings);
  });
  protected readonly text = computed(() => findingsText(this.margin(), this.findings()));
}
