import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { FamilyDescription } from '../../../shared/model/cell-family';

const PORTS: Readonly<Record<FamilyDescription['ports'], string>> = {
  either: 'one port, either polarisation by symmetry',
  x: 'one port, x',
  y: 'one port, y',
  'x-and-y': 'port 1 x, port 2 y',
  'te-and-tm': 'port 1 TE, port 2 TM',
};

/** What the laboratory says of a family, as a list. */
@Component({
  selector: 'slant-description-list',
  template: `
    <dl>
      @for (row of rows(); track row.label) {
        <dt>{{ row.label }}</dt>
        <dd>{{ row.value }}</dd>
      }
    </dl>
  `,
  styles: `
    dl {
      display: grid;
      grid-template-columns: auto 1fr;
      font-size: var(--size-small);
      line-height: var(--line-text);
    }
    dt,
    dd {
      padding: 1px 0;
      border-bottom: 1px solid var(--rule);
    }
    dt {
      padding-right: var(--s3);
      color: var(--muted);
      white-space: nowrap;
    }
    dd {
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DescriptionList {
  readonly description = input.required<FamilyDescription>();
  protected readonly rows = computed(() => {
    const { substrate, ...family } = this.description();
    const rows = [
      { label: 'Kind', value: family.kind },
      { label: 'Operation', value: family.operation === 'reflect' ? 'reflecting' : 'transmitting' },
      { label: 'Period', value: `${family.periodXMm} × ${family.periodYMm} mm` },
      { label: 'Substrate', value: `${substrate.material}, εr ${substrate.relativePermittivity}, tan δ ${substrate.lossTangent}, ${substrate.thicknessMm} mm` },
      { label: 'Metal', value: family.metal },
      { label: 'Ports', value: PORTS[family.ports] },
      { label: 'Reference plane', value: family.referencePlane },
      { label: 'Time convention', value: family.timeConvention === 'exp(+jwt)' ? 'exp(+jωt)' : 'exp(−jωt)' },
      { label: 'Provenance', value: `${family.provenance}, ${family.date}` },
      { label: 'Instrument or method', value: family.instrument },
      { label: 'Stated limits', value: family.limits },
      ...family.excludedRegions.map(({ reason }, i) => ({ label: `Not to use, ${i + 1}`, value: reason })),
    ];
    return rows.filter(({ value }) => value !== '');
  });
}
