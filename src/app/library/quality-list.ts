import { ChangeDetectionStrategy, Component, computed, input, signal } from '@angular/core';
import type { QualityReport } from '../../../shared/model/cell-family';
import { CheckField } from '../ui/check-field';
import { StateMark } from '../ui/state-mark';
import { checkText, originText, verdictMark, verdictText } from './verdict-words';

const AT_FIRST = 40;

/** What the checks found, for the family and cell by cell; those that pass are folded away until asked for. */
@Component({
  selector: 'slant-quality-list',
  imports: [CheckField, StateMark],
  templateUrl: './quality-list.html',
  styleUrl: './quality-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class QualityList {
  readonly report = input.required<QualityReport>();
  protected readonly all = signal(false);
  protected readonly limit = signal(AT_FIRST);
  protected readonly counts = computed(() => {
    const cells = this.report().cells;
    const count = (verdict: string): number => cells.filter((cell) => cell.verdict === verdict).length;
    return `${count('pass')} of ${cells.length} cells pass, ${count('warn')} with remarks, ${count('fail')} fail`;
  });
  protected readonly cellRows = computed(() =>
    this.report().cells.flatMap((cell) =>
      cell.findings.filter(({ verdict }) => this.all() || verdict === 'warn' || verdict === 'fail').map((finding) => ({ cellId: cell.cellId, ...finding })),
    ),
  );
  protected readonly shown = computed(() => this.cellRows().slice(0, this.limit()));
  protected readonly mark = verdictMark;
  protected readonly word = verdictText;
  protected readonly name = checkText;
  protected readonly origin = originText;

  protected showMore(): void {
    this.limit.update((limit) => limit + 200);
  }
}
