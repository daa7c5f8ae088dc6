import type { Role } from '../../../shared/contracts/common';

/** What each role does, and what it never may, in one line for the person who gives it. */
export const ROLE_DUTIES: Readonly<Record<Role, string>> = {
  designer: 'designs panels and freezes revisions; never releases their own',
  lab: 'imports cell families and publishes editions; never changes a published one',
  reviewer: 'compares and comments; never signs off what they authored',
  fabricator: 'sees released revisions only; never drafts',
  range: 'compares range data with a released revision; never changes a design',
  administrator: 'people, roles, invitations, audit log; never reads passwords or tokens',
};
