import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import type { KeepOut } from '../../../../shared/model/design-document';
import { editValue } from '../design-field-edit';
import { DesignChoice } from '../fields/design-choice';
import { DesignField } from '../fields/design-field';
import { DesignTable } from '../fields/design-table';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { WORKSPACE_STATE } from '../workspace-state';
import { keepOutOfKind, sizeMm } from './outline-choices';
import { CORNER_COLUMNS, OUTLINE_OPTIONS, nextCorner } from './outline-fields';

const MOST_KEEP_OUTS = 200;

/** Places of the panel without cells: a bolt, a label, a window for the horn's strut. */
@Component({
  selector: 'slant-keep-outs',
  imports: [DesignChoice, DesignField, DesignTable, RemarkList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './keep-outs.html',
  styleUrls: ['../fields/sheet.scss', './keep-outs.scss'],
})
export class KeepOuts {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  protected readonly options = OUTLINE_OPTIONS;
  protected readonly cornerColumns = CORNER_COLUMNS;
  protected readonly nextCorner = nextCorner;
  protected readonly canEdit = this.state.canEdit;
  protected readonly keepOuts = computed(() =>
    this.state.design().panel.keepOuts.map((keepOut, place) => ({ kind: keepOut.kind, pointer: `/panel/keepOuts/${place}` })),
  );
  protected readonly full = computed(() => this.keepOuts().length >= MOST_KEEP_OUTS);

  protected add(): void {
    const { outline, keepOuts } = this.state.design().panel;
    const { widthMm, heightMm } = sizeMm(outline);
    const side = Number((Math.min(widthMm, heightMm) / 10).toPrecision(2));
    const added: KeepOut = { kind: 'rectangle', widthMm: side, heightMm: side, centreMm: [0, 0] };
    this.put([...keepOuts, added], `Add keep-out ${keepOuts.length + 1}`);
  }

  protected remove(place: number): void {
    this.pending.dropBelow('/panel/keepOuts');
    this.put(
      this.state.design().panel.keepOuts.filter((_, i) => i !== place),
      `Remove keep-out ${place + 1}`,
    );
  }

  protected shape(place: number, kind: string): void {
    const { keepOuts } = this.state.design().panel;
    const option = OUTLINE_OPTIONS.find(({ value }) => value === kind);
    if (!option) return;
    this.pending.dropBelow(`/panel/keepOuts/${place}`);
    this.put(
      keepOuts.map((keepOut, i) => (i === place ? keepOutOfKind(keepOut, option.value) : keepOut)),
      `Keep-out ${place + 1}: ${option.label}`,
    );
  }

  private put(keepOuts: unknown, name: string): void {
    const edit = editValue(this.state.design(), '/panel/keepOuts', keepOuts);
    if (edit.kind === 'changed') this.state.change(name, () => edit.design);
  }
}
