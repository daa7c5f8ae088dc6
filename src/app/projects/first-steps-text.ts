import type { Role } from '../../../shared/contracts/common';

export interface FirstStep {
  /** Kept in the browser with the tick: never changes its meaning. */
  readonly id: string;
  readonly text: string;
}

/** What somebody who works in a role for the first time does first. */
export const FIRST_STEPS: Readonly<Record<Role, readonly FirstStep[]>> = {
  designer: [
    { id: 'steer', text: 'Open a panel and drag its beam on the Pattern sheet, or type the angles: gain, sidelobes and the cut follow.' },
    { id: 'cells', text: 'On the Cells sheet choose an edition of the library; on the Phase sheet read the error it leaves, cell by cell.' },
    { id: 'freeze', text: 'Freeze a revision with a message, change something, freeze another, and compare the two under Revisions.' },
    { id: 'export', text: 'Export a revision: its cells, figures and cuts as CSV with their checksums.' },
  ],
  lab: [
    { id: 'import', text: 'Import a family under Library: drop its network files or one zip, look at what was found, complete the description.' },
    { id: 'publish', text: 'Read the verdict of each check, accept with a note, then publish the edition. A published edition never changes.' },
  ],
  reviewer: [{ id: 'compare', text: 'Open a panel, compare its revisions under Revisions, and read which lines of the requirement each meets.' }],
  fabricator: [],
  range: [],
  administrator: [{ id: 'invite', text: 'Invite people under Team and give them their roles. The audit log keeps every change.' }],
};
