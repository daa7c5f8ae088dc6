import type { Role } from '../../../shared/contracts/common';
import type { CurrentSession } from '../../../shared/contracts/session';

const PERSON = '6f1c1b7e-58a4-4f0b-9a53-000000000001';
const TEAM = { teamId: '6f1c1b7e-58a4-4f0b-9a53-000000000002', teamName: 'Merrow Point' };

/** A session of somebody with the given roles, for specs. */
export function sessionOf(roles: readonly Role[], nowMs = Date.now()): CurrentSession {
  const team = { ...TEAM, roles: [...roles] };
  return {
    person: { id: PERSON, name: 'Designer (demo)', email: 'designer@merrow.example' },
    team,
    teams: [team],
    sessionId: '6f1c1b7e-58a4-4f0b-9a53-000000000003',
    idleEndsAt: new Date(nowMs + 30 * 60_000).toISOString(),
    endsAt: new Date(nowMs + 12 * 3_600_000).toISOString(),
    demoMode: true,
    letterBox: true,
  };
}
