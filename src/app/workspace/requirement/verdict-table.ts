import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { DesignField } from '../fields/design-field';
import type { RequirementLine } from './requirement-lines';

/** Each line of the requirement with its limit, the predicted value, the margin and the verdict in words and sign. */
@Component({
  selector: 'slant-verdict-table',
  imports: [DesignField],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './verdict-table.html',
  styleUrls: ['../fields/sheet.scss', './verdict-table.scss'],
})
export class VerdictTable {
  readonly lines = input.required<readonly RequirementLine[]>();
  protected readonly words: Readonly<Record<RequirementLine['word'], string>> = {
    meets: 'meets',
    'falls-short': 'falls short',
    'not-evaluated': 'not evaluated',
    stale: 'stale',
    'no-limit': 'no limit set',
    waiting: 'waiting',
  };
}
