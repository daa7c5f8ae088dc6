import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { derivedValues } from '../../../../shared/antenna/derived-values';
import { editValue } from '../design-field-edit';
import { DesignField } from '../fields/design-field';
import { PendingEntries } from '../fields/pending-entries';
import { RemarkList } from '../fields/remark-list';
import { figureText } from '../strip-figures';
import { WORKSPACE_STATE } from '../workspace-state';
import { AzElField } from './az-el-field';
import { tangentialWavenumberRadPerM } from './beam-direction';

const MOST_BEAMS = 32;

/** The wanted beams: direction, level and phase of each, and what follows from the direction. */
@Component({
  selector: 'slant-beams-table',
  imports: [AzElField, DesignField, RemarkList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './beams-table.html',
  styleUrls: ['../fields/sheet.scss', './beams-table.scss'],
})
export class BeamsTable {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly pending = inject(PendingEntries);
  /** Which pair of angles the columns show. */
  readonly angles = input.required<'polar' | 'az-el'>();

  protected readonly canEdit = this.state.canEdit;
  protected readonly beams = computed(() => {
    const design = this.state.design();
    const { wavelengthMm } = derivedValues(design);
    return design.requirement.beams.map((beam, place) => ({
      pointer: `/requirement/beams/${place}`,
      wavenumber: figureText(tangentialWavenumberRadPerM(wavelengthMm, beam.thetaDeg), 2),
      remarks: [`/requirement/beams/${place}`],
    }));
  });
  protected readonly full = computed(() => this.beams().length >= MOST_BEAMS);

  protected add(): void {
    const { beams } = this.state.design().requirement;
    const last = beams[beams.length - 1];
    // On the other side of boresight, so that the new beam does not lie on the old one.
    const added = { thetaDeg: last.thetaDeg === 0 ? 20 : last.thetaDeg, phiDeg: last.phiDeg >= 180 ? last.phiDeg - 180 : last.phiDeg + 180 };
    this.put([...beams, added], `Add beam ${beams.length + 1}`);
  }

  protected remove(place: number): void {
    this.pending.dropBelow('/requirement/beams');
    this.put(
      this.state.design().requirement.beams.filter((_, i) => i !== place),
      `Remove beam ${place + 1}`,
    );
  }

  private put(beams: unknown, name: string): void {
    const edit = editValue(this.state.design(), '/requirement/beams', beams);
    if (edit.kind === 'changed') this.state.change(name, () => edit.design);
  }
}
