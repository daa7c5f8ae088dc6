import type { Role } from '../../shared/contracts/common';

export interface DemoAccount {
  readonly email: string;
  readonly name: string;
  readonly role: Role;
  readonly team: string;
}

export const DEMO_TEAM = 'Merrow Point';

const merrow = (who: string, role: Role, name: string): DemoAccount => ({ email: `${who}@merrow.example`, name: `${name} (demo)`, role, team: DEMO_TEAM });

/** Invented people of an invented team, one for each role, with one role each. */
export const demoAccounts: readonly DemoAccount[] = [
  merrow('admin', 'administrator', 'Administrator'),
  merrow('designer', 'designer', 'Designer'),
  merrow('lab', 'lab', 'Lab'),
  merrow('reviewer', 'reviewer', 'Reviewer'),
  merrow('fabricator', 'fabricator', 'Fabricator'),
  merrow('range', 'range', 'Range'),
];

/** A second team, to see that teams cannot see each other. */
export const isolationAccounts: readonly DemoAccount[] = [
  { email: 'admin@bench.example', name: 'Bench administrator (demo)', role: 'administrator', team: 'Bench' },
  { email: 'other@bench.example', name: 'Bench designer (demo)', role: 'designer', team: 'Bench' },
];
