import { In } from 'typeorm';
import { managerOf, type Transaction } from '../database/transaction-runner';
import { Person } from './person-entity';

export class PersonRepository {
  async find(transaction: Transaction, id: string): Promise<Person | null> {
    return managerOf(transaction).getRepository(Person).findOneBy({ id });
  }

  async findByEmail(transaction: Transaction, email: string): Promise<Person | null> {
    return managerOf(transaction).getRepository(Person).findOneBy({ email });
  }

  /** Holds the person's row until the transaction ends, for counts that two must not take at once. */
  async lock(transaction: Transaction, id: string): Promise<void> {
    await managerOf(transaction).getRepository(Person).findOne({ where: { id }, lock: { mode: 'pessimistic_write' } });
  }

  async findAll(transaction: Transaction, ids: readonly string[]): Promise<Person[]> {
    return ids.length === 0 ? [] : managerOf(transaction).getRepository(Person).findBy({ id: In([...ids]) });
  }

  /** False when the address is taken. */
  async insertNew(transaction: Transaction, person: Person): Promise<boolean> {
    const done = await managerOf(transaction)
      .createQueryBuilder()
      .insert()
      .into(Person)
      .values(person)
      .orIgnore()
      .returning('id')
      .execute();
    return (done.raw as unknown[]).length === 1;
  }

  async change(transaction: Transaction, id: string, values: Partial<Pick<Person, 'name' | 'passwordHash'>>): Promise<void> {
    await managerOf(transaction).getRepository(Person).update({ id }, values);
  }
}
