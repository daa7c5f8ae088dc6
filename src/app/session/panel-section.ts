import { ChangeDetectionStrategy, Component, DestroyRef, ElementRef, afterNextRender, computed, effect, inject, output, signal, viewChild } from '@angular/core';
import { panelTargetPhase } from '../../../shared/antenna/panel-target-phase';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { SPEED_OF_LIGHT_M_PER_S } from '../../../shared/units/constants';
import { Theme } from '../ui/theme';
import type { CrestLines } from './crest-lines';
import { crestLines } from './crest-lines';
import { outgoingField } from './outgoing-field';
import { paintCrests } from './paint-crests';
import type { SectionSubject } from './section-drawing';
import { scaleText, sectionDrawing, sectionScale } from './section-drawing';

/** Three eighths of the wavelength at 28 GHz, over all that a picture of the section shows. */
const FIELD_GRID = { fromXM: -0.2, fromZM: 0.002, stepM: 0.004, columns: 121, rows: 86 };

/** The starting design cut at y = 0 with the wave its cells send out, computed here: what the product does, drawn for real. */
@Component({
  selector: 'slant-panel-section',
  templateUrl: './panel-section.html',
  styleUrl: './panel-section.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelSection {
  private readonly canvas = viewChild.required<ElementRef<HTMLCanvasElement>>('wave');
  private readonly theme = inject(Theme);
  private readonly size = signal({ width: 0, height: 0 });
  private readonly crests = signal<CrestLines | null>(null);
  private readonly subject = sectionSubject();
  private readonly scale = computed(() => sectionScale(this.size().width, this.size().height));
  /** "1 : 1.5", for the title block. */
  readonly scaled = output<string>();
  protected readonly drawing = computed(() => (this.size().width === 0 ? null : { ...this.size(), ...sectionDrawing(this.subject, this.scale()) }));

  constructor() {
    const host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
    const destroyed = inject(DestroyRef);
    afterNextRender(() => {
      const watch = new ResizeObserver(() => this.size.set({ width: host.clientWidth, height: host.clientHeight }));
      watch.observe(host);
      // After the form stands, so that nobody waits for the picture.
      const computing = setTimeout(() => this.crests.set(crestLines(outgoingField(STARTING_DESIGN, FIELD_GRID))), 50);
      destroyed.onDestroy(() => {
        watch.disconnect();
        clearTimeout(computing);
      });
    });
    effect(() => {
      this.theme.shown();
      const crests = this.crests();
      if (this.size().width === 0) return;
      this.scaled.emit(scaleText(this.scale()));
      if (crests !== null) paintCrests(this.canvas().nativeElement, crests, this.scale());
    });
  }
}

function sectionSubject(): SectionSubject {
  const { panel, illumination, requirement } = STARTING_DESIGN;
  if (panel.outline.kind === 'polygon' || illumination.kind !== 'horn') throw new Error('The starting design is no longer a horn over a rectangle');
  const { lattice, targetPhaseDeg } = panelTargetPhase(STARTING_DESIGN);
  const middleRow = Math.floor(lattice.grid.rowCount / 2);
  return {
    panelWidthMm: panel.outline.widthMm,
    hornXMm: illumination.positionMm[0],
    hornZMm: illumination.positionMm[2],
    beamThetaDeg: requirement.beams[0].thetaDeg,
    wavelengthMm: SPEED_OF_LIGHT_M_PER_S / requirement.designFrequencyGHz / 1e6,
    cellPhasesDeg: Array.from(targetPhaseDeg).filter((_, n) => lattice.row[n] === middleRow),
  };
}
