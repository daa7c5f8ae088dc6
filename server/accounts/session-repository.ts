import { IsNull, MoreThan } from 'typeorm';
import { managerOf, type Transaction } from '../database/transaction-runner';
import { Person } from './person-entity';
import { RefreshToken } from './refresh-token-entity';
import { Session } from './session-entity';

export class SessionRepository {
  async insert(transaction: Transaction, session: Session): Promise<void> {
    await managerOf(transaction).getRepository(Session).insert(session);
  }

  async find(transaction: Transaction, id: string): Promise<Session | null> {
    return managerOf(transaction).getRepository(Session).findOneBy({ id });
  }

  async findWithPerson(transaction: Transaction, id: string): Promise<{ session: Session; person: Person } | null> {
    const session = await managerOf(transaction)
      .createQueryBuilder(Session, 'session')
      .innerJoinAndMapOne('session.person', Person, 'person', 'person.id = session.personId')
      .where('session.id = :id', { id })
      .getOne();
    return session === null ? null : { session, person: (session as Session & { person: Person }).person };
  }

  async touch(transaction: Transaction, id: string, at: Date): Promise<void> {
    await managerOf(transaction).getRepository(Session).update({ id, revokedAt: IsNull() }, { lastUsedAt: at });
  }

  /** Sessions that were neither revoked nor idle since `idleSince`, the last used first. */
  async live(transaction: Transaction, personId: string, { now, idleSince }: { now: Date; idleSince: Date }): Promise<Session[]> {
    return managerOf(transaction)
      .getRepository(Session)
      .find({
        where: { personId, revokedAt: IsNull(), endsAt: MoreThan(now), lastUsedAt: MoreThan(idleSince) },
        order: { lastUsedAt: 'DESC', id: 'ASC' },
      });
  }

  /** How many were revoked. Narrowed to one session, to one team, or to all but one, where said. */
  async revoke(
    transaction: Transaction,
    personId: string,
    at: Date,
    which: { id?: string; teamId?: string; exceptId?: string } = {},
  ): Promise<number> {
    const query = managerOf(transaction)
      .createQueryBuilder()
      .update(Session)
      .set({ revokedAt: at })
      .where('person_id = :personId AND revoked_at IS NULL', { personId });
    if (which.id !== undefined) query.andWhere('id = :id', { id: which.id });
    if (which.teamId !== undefined) query.andWhere('team_id = :teamId', { teamId: which.teamId });
    if (which.exceptId !== undefined) query.andWhere('id <> :exceptId', { exceptId: which.exceptId });
    return (await query.execute()).affected ?? 0;
  }

  async insertRefresh(transaction: Transaction, token: RefreshToken): Promise<void> {
    await managerOf(transaction).getRepository(RefreshToken).insert(token);
  }

  /** Locked, so that two uses of one token see each other. */
  async findRefreshLocked(transaction: Transaction, hash: string): Promise<RefreshToken | null> {
    return managerOf(transaction).getRepository(RefreshToken).findOne({ where: { hash }, lock: { mode: 'pessimistic_write' } });
  }

  async markRefreshUsed(transaction: Transaction, hash: string, at: Date): Promise<void> {
    await managerOf(transaction).getRepository(RefreshToken).update({ hash }, { usedAt: at });
  }

  /** Forgets sessions that ended before the given time, with their refresh tokens. */
  async sweep(transaction: Transaction, before: Date): Promise<void> {
    await managerOf(transaction).query('DELETE FROM session WHERE ends_at < $1', [before]);
  }
}
