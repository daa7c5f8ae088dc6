import type { Role } from '../../../shared/contracts/common';

/** What each role does, and what it never may, in one line for the person who gives it. */
export const ROLE_DUTIES: Readonly<Record<Role, string>> = {
  designer: 'designs panels, freezes and exports revisions; never publishes editions',
  lab: 'imports cell families and publishes editions; never changes a published one',
  reviewer: 'reads, compares and exports revisions; never changes a design',
  fabricator: 'predicts designs of their own by the API; never sees drafts or revisions, and release is not built yet',
  range: 'reads, compares and exports revisions; never changes a design',
  administrator: 'people, roles, invitations, letters, audit log; never reads passwords or tokens',
};
