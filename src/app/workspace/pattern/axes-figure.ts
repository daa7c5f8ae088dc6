import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { numberText } from '../../ui/plots/plot-text';
import { axesDrawing } from './axes-projection';

const SCALE_PX = 74;

/** What the angles mean: panel, axes, beam with θ and φ, the electric field, and the convention of time. */
@Component({
  selector: 'slant-axes-figure',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @let d = drawing();
    <svg role="img" [attr.aria-label]="label()" viewBox="-74 -86 152 126" width="152" height="126">
      <path class="panel" [attr.d]="d.panel" />
      @for (axis of axes(); track axis.name) {
        <path class="line" [attr.d]="axis.path" />
        <text class="ink middle" [attr.x]="axis.labelX" [attr.y]="axis.labelY">{{ axis.name }}</text>
      }
      <path class="foot" [attr.d]="'M' + d.beam.x + ' ' + d.beam.y + 'L' + d.foot.x + ' ' + d.foot.y + 'L0 0'" />
      <path class="arc" [attr.d]="d.thetaArc" />
      <path class="arc" [attr.d]="d.phiArc" />
      @if (thetaDeg() > 0) {
        <text class="middle" [attr.x]="d.thetaLabel.x" [attr.y]="d.thetaLabel.y + 3">θ</text>
        @if (phiDeg() !== 0) {
          <text class="middle" [attr.x]="d.phiLabel.x" [attr.y]="d.phiLabel.y + 8">φ</text>
        }
      }
      <path class="beam" [attr.d]="beamPath()" />
      <text class="copper" [class.end]="d.beam.x < 0" [attr.x]="d.beam.x + (d.beam.x < 0 ? -6 : 6)" [attr.y]="d.beam.y + 4">beam</text>
      @if (field()) {
        <path class="field" [attr.d]="fieldPath()" />
        <text class="patina" [attr.x]="d.fieldFrom.x - 4" [attr.y]="d.fieldFrom.y - 5">E</text>
      }
    </svg>
    <p class="label">u = sin θ cos φ, v = sin θ sin φ;<br />time exp(+jωt)</p>
  `,
  styleUrls: ['../../ui/plots/plot-svg.scss', './axes-figure.scss'],
})
export class AxesFigure {
  readonly thetaDeg = input.required<number>();
  readonly phiDeg = input.required<number>();
  /** Direction of the electric field of the light; null when it turns. */
  readonly field = input<'x' | 'y' | null>(null);

  protected readonly drawing = computed(() => axesDrawing({ thetaDeg: this.thetaDeg(), phiDeg: this.phiDeg() }, this.field(), SCALE_PX));
  protected readonly axes = computed(() => {
    const { x, y, z } = this.drawing();
    return Object.entries({ x, y, z }).map(([name, tip]) => {
      const length = Math.hypot(tip.x, tip.y);
      return { name, path: arrow({ x: 0, y: 0 }, tip), labelX: tip.x + (9 * tip.x) / length, labelY: tip.y + (9 * tip.y) / length + 4 };
    });
  });
  protected readonly beamPath = computed(() => arrow({ x: 0, y: 0 }, this.drawing().beam));
  protected readonly fieldPath = computed(() => arrow(this.drawing().fieldFrom, this.drawing().fieldTo));
  protected readonly label = computed(
    () => `Axes: panel in the plane of x and y, z outward; beam at θ ${numberText(this.thetaDeg(), 1)}° from z and φ ${numberText(this.phiDeg(), 1)}° from x towards y`,
  );
}

interface Tip {
  readonly x: number;
  readonly y: number;
}

function arrow(from: Tip, to: Tip): string {
  const length = Math.max(1e-6, Math.hypot(to.x - from.x, to.y - from.y));
  const [dx, dy] = [(to.x - from.x) / length, (to.y - from.y) / length];
  const barb = (side: number): string => `${(to.x - 7 * dx + side * 3 * dy).toFixed(1)} ${(to.y - 7 * dy - side * 3 * dx).toFixed(1)}`;
  return `M${from.x.toFixed(1)} ${from.y.toFixed(1)}L${to.x.toFixed(1)} ${to.y.toFixed(1)}M${barb(1)}L${to.x.toFixed(1)} ${to.y.toFixed(1)}L${barb(-1)}`;
}
