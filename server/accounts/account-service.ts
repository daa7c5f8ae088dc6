import type { AuditService } from '../audit/audit-service';
import type { Ground } from '../database/ground';
import type { Caller } from '../http/caller';
import type { PersonService } from './person-service';

interface Parts {
  readonly ground: Pick<Ground, 'transactions'>;
  readonly people: PersonService;
  readonly audit: AuditService;
}

/** What a person changes about the own account, besides passwords, sessions and tokens. */
export class AccountService {
  constructor(private readonly parts: Parts) {}

  async rename(caller: Caller, name: string): Promise<void> {
    const { ground, people, audit } = this.parts;
    await ground.transactions.run(async (transaction) => {
      await people.rename(transaction, caller.person.id, name);
      await audit.record(transaction, {
        teamId: caller.teamId,
        personId: caller.person.id,
        action: 'person.renamed',
        object: `person:${caller.person.id}`,
        detail: { before: caller.person.name, after: name },
      });
    });
  }
}
