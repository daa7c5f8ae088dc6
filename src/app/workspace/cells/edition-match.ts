import type { EditionHeader, FamilySummary } from '../../../../shared/contracts/library';
import type { DerivedValues } from '../../../../shared/antenna/derived-values';
import type { DesignDocument } from '../../../../shared/model/design-document';

export interface MatchRemark {
  readonly subject: 'operation' | 'period' | 'band' | 'incidence' | 'quality';
  /** `refuses` means that the edition cannot serve this panel. */
  readonly weight: 'note' | 'warn' | 'refuses';
  readonly text: string;
}

/** How a published edition suits a panel, before anything is computed with it. */
export interface EditionMatch {
  readonly family: FamilySummary;
  readonly edition: EditionHeader;
  readonly remarks: readonly MatchRemark[];
}

/** Every published edition of the library, the best suited first. */
export function editionMatches(families: readonly FamilySummary[], design: DesignDocument, derived: DerivedValues): readonly EditionMatch[] {
  return families
    .flatMap((family) =>
      family.editions
        .filter((edition) => edition.state === 'published')
        .map((edition) => ({ family, edition, remarks: matchRemarks(family, edition, { design, derived }) })),
    )
    .map((match, place) => ({ match, place }))
    .sort((a, b) => burden(a.match) - burden(b.match) || a.place - b.place)
    .map(({ match }) => match);
}

const WEIGHTS: Readonly<Record<MatchRemark['weight'], number>> = { note: 1, warn: 10, refuses: 1000 };

function burden({ remarks }: EditionMatch): number {
  return remarks.reduce((sum, { weight }) => sum + WEIGHTS[weight], 0);
}

function matchRemarks(family: FamilySummary, edition: EditionHeader, panel: { design: DesignDocument; derived: DerivedValues }): readonly MatchRemark[] {
  return [
    ...operationRemark(family, panel.design),
    ...bandRemark(edition, panel.design),
    ...periodRemark(family, panel.design),
    ...incidenceRemark(edition, panel.derived),
    ...qualityRemark(family, edition),
  ];
}

function operationRemark(family: FamilySummary, { panel }: DesignDocument): readonly MatchRemark[] {
  if (family.operation === panel.operation) return [];
  return [{ subject: 'operation', weight: 'refuses', text: `Its cells ${family.operation}; this panel is to ${panel.operation}` }];
}

function bandRemark(edition: EditionHeader, { requirement }: DesignDocument): readonly MatchRemark[] {
  const [low, high] = requirement.bandGHz ?? [requirement.designFrequencyGHz, requirement.designFrequencyGHz];
  const from = Math.min(low, requirement.designFrequencyGHz);
  const to = Math.max(high, requirement.designFrequencyGHz);
  if (edition.fromGHz <= from && edition.toGHz >= to) return [];
  const holdsDesign = edition.fromGHz <= requirement.designFrequencyGHz && edition.toGHz >= requirement.designFrequencyGHz;
  const wanted = from === to ? `${from} GHz` : `${from} to ${to} GHz`;
  return [{ subject: 'band', weight: holdsDesign ? 'warn' : 'refuses', text: `Data from ${edition.fromGHz} to ${edition.toGHz} GHz; wanted ${wanted}` }];
}

function periodRemark(family: FamilySummary, { panel }: DesignDocument): readonly MatchRemark[] {
  const { lattice } = panel;
  const stepY = lattice.kind === 'rectangular' ? lattice.periodYMm : lattice.rowSpacingMm;
  const same = near(lattice.periodXMm, family.periodXMm) && near(stepY, family.periodYMm);
  if (same) return [];
  return [{ subject: 'period', weight: 'warn', text: `Described at ${family.periodXMm} × ${family.periodYMm} mm; this lattice is ${lattice.periodXMm} × ${stepY} mm` }];
}

function near(one: number, other: number): boolean {
  return Math.abs(one - other) <= 1e-6 * other;
}

function incidenceRemark(edition: EditionHeader, { maxIncidenceDeg }: DerivedValues): readonly MatchRemark[] {
  const covered = Math.max(...edition.thetasDeg, 0);
  if (typeof maxIncidenceDeg !== 'number' || maxIncidenceDeg <= covered + 1e-6) return [];
  return [{ subject: 'incidence', weight: 'warn', text: `Data up to ${covered}°; this panel is lit up to ${maxIncidenceDeg.toFixed(1)}°` }];
}

function qualityRemark(family: FamilySummary, edition: EditionHeader): readonly MatchRemark[] {
  const remarks: MatchRemark[] = [];
  if (edition.verdict === 'fail') remarks.push({ subject: 'quality', weight: 'warn', text: 'Its quality checks found faults' });
  if (edition.verdict === 'warn') remarks.push({ subject: 'quality', weight: 'note', text: 'Its quality checks found remarks' });
  if (family.provenance !== 'measured') remarks.push({ subject: 'quality', weight: 'note', text: `${family.provenance}, not measured` });
  return remarks;
}
