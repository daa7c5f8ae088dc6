import type { PanelOverview } from '../../../shared/contracts/projects';
import type { Beam, DesignDocument } from '../../../shared/model/design-document';
import { numberText, signedNumberText } from '../ui/plots/plot-text';
import type { MarkState } from '../ui/state-mark';
import type { SheetMark } from './sheet-marks';
import { sheetMarks } from './sheet-marks';

/** A panel as one line of the projects sheet. */
export interface PanelRow {
  readonly id: string;
  readonly name: string;
  readonly kind: string;
  readonly beams: string;
  readonly gain: string;
  readonly state: MarkState;
  readonly stateText: string;
  readonly sheets: readonly SheetMark[];
  readonly revision: string;
  readonly revisionNote: string;
  readonly changedAt: string;
  readonly changedBy: string;
  readonly design: DesignDocument;
}

export function panelRow(panel: PanelOverview): PanelRow {
  return {
    id: panel.id,
    name: panel.name,
    kind: kindText(panel),
    beams: beamText(panel.design),
    gain: gainText(panel),
    ...stateOf(panel),
    sheets: sheetMarks(panel),
    ...revisionOf(panel),
    changedAt: panel.changedAt,
    changedBy: panel.changedBy.name,
    design: panel.design,
  };
}

function kindText({ design, summary }: PanelOverview): string {
  const operation = design.panel.operation === 'reflect' ? 'reflecting' : 'transmitting';
  const cells = summary === null ? '' : `, ${numberText(summary.cellCount, 0)} cells`;
  return `${operation}${cells}, ${design.requirement.designFrequencyGHz} GHz`;
}

function beamText({ requirement }: DesignDocument): string {
  const [first, ...others] = requirement.beams;
  const theta = ({ thetaDeg }: Beam): string => `θ ${numberText(thetaDeg, 1)}°`;
  const phi = ({ phiDeg }: Beam): string => `φ ${numberText(phiDeg, 1)}°`;
  const one = (beam: Beam): string => `${theta(beam)}, ${phi(beam)}`;
  if (others.length === 0) return one(first);
  if (others.length > 1) return `${one(first)} and ${others.length} more`;
  const [second] = others;
  return second.thetaDeg === first.thetaDeg ? `${one(first)} and ${numberText(second.phiDeg, 1)}°` : `${one(first)} and ${one(second)}`;
}

function gainText({ summary, summaryPending }: PanelOverview): string {
  if (summary === null) return summaryPending ? 'being computed' : 'no prediction';
  if (typeof summary.gainDbi !== 'number') return summary.gainDbi.reason;
  const line = summary.verdicts.find(({ line: name }) => name === 'gain');
  const margin = typeof line?.margin === 'number' ? `, margin ${signedNumberText(line.margin, 2)} dB` : '';
  return `${numberText(summary.gainDbi, 2)} dBi${margin}`;
}

function stateOf({ summary, summaryPending }: PanelOverview): { state: MarkState; stateText: string } {
  if (summary === null) return summaryPending ? { state: 'not-evaluated', stateText: 'being computed' } : { state: 'in-work', stateText: 'in work' };
  const short = summary.verdicts.filter(({ verdict }) => verdict === 'falls-short');
  if (short.length > 0) return { state: 'falls-short', stateText: `falls short: ${short.map(({ line }) => line).join(', ')}` };
  if (summary.overall === 'meets') return { state: 'meets', stateText: 'meets' };
  return { state: 'not-evaluated', stateText: 'not evaluated' };
}

function revisionOf({ latestRevision, draftIsRevision, draftHash }: PanelOverview): { revision: string; revisionNote: string } {
  if (latestRevision === null) return { revision: 'Draft', revisionNote: 'no revision' };
  if (draftIsRevision) return { revision: `Revision ${latestRevision.number}`, revisionNote: latestRevision.hash.slice(0, 12) };
  return { revision: `Draft after ${latestRevision.number}`, revisionNote: draftHash.slice(0, 12) };
}
