import { ChangeDetectionStrategy, Component, computed, inject, input, output, resource } from '@angular/core';
import { derivedValues } from '../../../../shared/antenna/derived-values';
import { LibraryClient } from '../../api/library-client';
import { WORKSPACE_STATE } from '../workspace-state';
import { editionMatches } from './edition-match';

/** The published editions of the library with how each suits this panel. */
@Component({
  selector: 'slant-edition-chooser',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './edition-chooser.html',
  styleUrls: ['../fields/sheet.scss', './edition-chooser.scss'],
})
export class EditionChooser {
  private readonly state = inject(WORKSPACE_STATE);
  private readonly library = inject(LibraryClient);
  readonly editionId = input.required<string | null>();
  readonly picked = output<string>();

  protected readonly canEdit = this.state.canEdit;
  protected readonly families = resource({ loader: () => this.library.families() });
  protected readonly matches = computed(() => {
    if (!this.families.hasValue()) return [];
    const design = this.state.design();
    return editionMatches(this.families.value(), design, derivedValues(design)).map(({ family, edition, remarks }) => ({
      id: edition.id,
      name: family.name,
      number: edition.number,
      cells: edition.cellCount,
      period: `${family.periodXMm} × ${family.periodYMm}`,
      band: `${edition.fromGHz} to ${edition.toGHz}`,
      angles: edition.thetasDeg.length === 1 ? `${edition.thetasDeg[0]}` : `${Math.min(...edition.thetasDeg)} to ${Math.max(...edition.thetasDeg)}`,
      remarks,
      refused: remarks.find(({ weight }) => weight === 'refuses')?.text ?? null,
    }));
  });

  protected reload(): void {
    this.families.reload();
  }
}
