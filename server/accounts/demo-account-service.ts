import type { AuditService } from '../audit/audit-service';
import type { Ground } from '../database/ground';
import type { MembershipService } from '../teams/membership-service';
import { DEMO_TEAM, demoAccounts, isolationAccounts, type DemoAccount } from './demo-accounts';
import type { PasswordHasher } from './password-hash';
import type { PersonService } from './person-service';

interface Parts {
  readonly ground: Pick<Ground, 'transactions'>;
  readonly people: PersonService;
  readonly memberships: MembershipService;
  readonly hasher: PasswordHasher;
  readonly audit: AuditService;
}

/** Makes the demonstration accounts that are missing. Those there are keep their names, roles and passwords. */
export async function ensureDemoAccounts(parts: Parts, password: string): Promise<void> {
  const accounts = [...demoAccounts, ...isolationAccounts];
  const known = await parts.ground.transactions.read((transaction) =>
    Promise.all(accounts.map(({ email }) => parts.people.findByEmail(transaction, email))),
  );
  const missing = accounts.filter((_account, index) => known[index] === null);
  if (missing.length === 0) return;
  // One hash for all: the password is the same, printed at the start, and hashing takes long on purpose.
  const passwordHash = await parts.hasher.hash(password);
  for (const account of missing) await createAccount(parts, account, passwordHash);
}

async function createAccount({ ground, people, memberships, audit }: Parts, account: DemoAccount, passwordHash: string): Promise<void> {
  await ground.transactions.run(async (transaction) => {
    const team = await memberships.ensureTeam(transaction, account.team);
    const person = await people.create(transaction, { email: account.email, name: account.name, passwordHash });
    await memberships.add(transaction, { teamId: team.id, personId: person.id, roles: [account.role] });
    await audit.record(transaction, {
      teamId: team.id,
      personId: null,
      action: 'demo.account.created',
      object: `person:${person.id}`,
      detail: { email: account.email, roles: [account.role] },
    });
  });
}

/** The demonstration person of a role with the team, for seeding in that person's name. */
export async function demoActor(
  parts: Pick<Parts, 'ground' | 'people' | 'memberships'>,
  role: DemoAccount['role'],
): Promise<{ teamId: string; person: { id: string; name: string } }> {
  const email = demoAccounts.find((account) => account.role === role)?.email ?? '';
  return parts.ground.transactions.run(async (transaction) => {
    const person = await parts.people.findByEmail(transaction, email);
    if (person === null) throw new Error(`the demo account ${email} is missing`);
    const team = await parts.memberships.ensureTeam(transaction, DEMO_TEAM);
    return { teamId: team.id, person: { id: person.id, name: person.name } };
  });
}
