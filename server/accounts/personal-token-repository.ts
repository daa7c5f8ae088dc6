import { MoreThan } from 'typeorm';
import { managerOf, type Transaction } from '../database/transaction-runner';
import { Person } from './person-entity';
import { PersonalToken } from './personal-token-entity';

export class PersonalTokenRepository {
  async insert(transaction: Transaction, token: PersonalToken): Promise<void> {
    await managerOf(transaction).getRepository(PersonalToken).insert(token);
  }

  async findByHash(transaction: Transaction, hash: string): Promise<{ token: PersonalToken; person: Person } | null> {
    const token = await managerOf(transaction)
      .createQueryBuilder(PersonalToken, 'token')
      .innerJoinAndMapOne('token.person', Person, 'person', 'person.id = token.personId')
      .where('token.hash = :hash', { hash })
      .getOne();
    return token === null ? null : { token, person: (token as PersonalToken & { person: Person }).person };
  }

  /** Those of a person in a team that have not expired, the newest first. */
  async listed(transaction: Transaction, owner: { personId: string; teamId: string }, now: Date): Promise<PersonalToken[]> {
    return managerOf(transaction)
      .getRepository(PersonalToken)
      .find({ where: { ...owner, expiresAt: MoreThan(now) }, order: { createdAt: 'DESC', id: 'ASC' } });
  }

  async touch(transaction: Transaction, id: string, at: Date): Promise<void> {
    await managerOf(transaction).getRepository(PersonalToken).update({ id }, { lastUsedAt: at });
  }

  /** False when the person has no such token in the team. */
  async remove(transaction: Transaction, owner: { personId: string; teamId: string }, id: string): Promise<boolean> {
    const done = await managerOf(transaction).getRepository(PersonalToken).delete({ id, ...owner });
    return done.affected === 1;
  }
}
