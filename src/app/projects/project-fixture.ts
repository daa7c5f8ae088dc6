import type { PanelOverview, Project } from '../../../shared/contracts/projects';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';

const HASH = 'debfe0abb702'.padEnd(64, '0');
const AUTHOR = { id: '6f1c1b7e-58a4-4f0b-9a53-333333333333', name: 'Designer' };
const PANEL = '6f1c1b7e-58a4-4f0b-9a53-222222222222';
const PROJECT = '6f1c1b7e-58a4-4f0b-9a53-111111111111';

/** A panel that meets its requirement and whose draft has gone on after revision 3, for specs. */
export function panelOverviewOf(more: Partial<PanelOverview> = {}): PanelOverview {
  return {
    id: PANEL,
    projectId: PROJECT,
    name: 'A, lighthouse relay',
    design: STARTING_DESIGN,
    draftHash: HASH,
    summary: {
      cellCount: 1600,
      gainDbi: 34.761,
      verdicts: [{ line: 'gain', sense: 'at-least', limit: 34, unit: 'dBi', value: 34.761, margin: 0.761, verdict: 'meets' }],
      overall: 'meets',
    },
    latestRevision: {
      id: PROJECT,
      panelId: PANEL,
      number: 3,
      hash: HASH,
      parentId: null,
      parentNumber: null,
      restoredFromNumber: null,
      author: AUTHOR,
      message: 'steered',
      createdAt: '2026-12-01T12:00:00.000Z',
    },
    draftIsRevision: false,
    changedAt: '2026-12-01T14:02:00.000Z',
    changedBy: AUTHOR,
    ...more,
  };
}

export function projectOf(...panels: PanelOverview[]): Project {
  return { id: PROJECT, name: 'Merrow Point sea-rescue link', version: 4, invented: true, createdAt: '2026-11-01T10:00:00.000Z', panels };
}
