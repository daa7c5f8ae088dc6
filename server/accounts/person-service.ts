import { randomUUID } from 'node:crypto';
import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import { Conflict, InvalidInput, NotFound } from '../http/problems';
import type { PasswordHasher } from './password-hash';
import { passwordFaults } from './password-rules';
import type { Person } from './person-entity';
import { PersonRepository } from './person-repository';

export interface PersonCard {
  readonly id: string;
  readonly name: string;
  readonly email: string;
}

/** People and their passwords. */
export class PersonService {
  private readonly people = new PersonRepository();

  constructor(
    private readonly ground: Pick<Ground, 'now'>,
    private readonly hasher: PasswordHasher,
  ) {}

  async findByEmail(transaction: Transaction, email: string): Promise<PersonCard | null> {
    const person = await this.people.findByEmail(transaction, email);
    return person === null ? null : cardOf(person);
  }

  async find(transaction: Transaction, id: string): Promise<PersonCard | null> {
    const person = await this.people.find(transaction, id);
    return person === null ? null : cardOf(person);
  }

  /** @throws NotFound */
  async require(transaction: Transaction, id: string): Promise<PersonCard> {
    const person = await this.find(transaction, id);
    if (person === null) throw new NotFound('person');
    return person;
  }

  /** Makes others who lock the same person wait until the transaction ends. */
  async lock(transaction: Transaction, id: string): Promise<void> {
    await this.people.lock(transaction, id);
  }

  async cards(transaction: Transaction, ids: readonly string[]): Promise<ReadonlyMap<string, PersonCard>> {
    const people = await this.people.findAll(transaction, ids);
    return new Map(people.map((person) => [person.id, cardOf(person)]));
  }

  async names(transaction: Transaction, ids: readonly string[]): Promise<ReadonlyMap<string, string>> {
    const people = await this.people.findAll(transaction, ids);
    return new Map(people.map((person) => [person.id, person.name]));
  }

  /** Null for an unknown address: hand it to `PasswordHasher.fits`, which then takes its time all the same. */
  async passwordHashOf(transaction: Transaction, email: string): Promise<{ personId: string; hash: string } | null> {
    const person = await this.people.findByEmail(transaction, email);
    return person === null ? null : { personId: person.id, hash: person.passwordHash };
  }

  /** @param passwordHash from `hashNew`, made before the transaction because it takes long. @throws Conflict */
  async create(transaction: Transaction, values: { email: string; name: string; passwordHash: string }): Promise<PersonCard> {
    const person = { id: randomUUID(), createdAt: this.ground.now(), ...values };
    if (!(await this.people.insertNew(transaction, person))) throw new Conflict('This address already has an account.');
    return cardOf(person);
  }

  async rename(transaction: Transaction, id: string, name: string): Promise<void> {
    await this.people.change(transaction, id, { name });
  }

  async setPasswordHash(transaction: Transaction, id: string, passwordHash: string): Promise<void> {
    await this.people.change(transaction, id, { passwordHash });
  }

  /**
   * Hashes a new password after holding it against the rules.
   * @param at pointer of the field the password came in
   * @throws InvalidInput with the reasons
   */
  async hashNew(password: string, at: { pointer: string; context: readonly string[] }): Promise<string> {
    const faults = passwordFaults(password, at.context);
    if (faults.length > 0) throw new InvalidInput(faults.map((detail) => ({ pointer: at.pointer, detail })));
    return this.hasher.hash(password);
  }
}

const cardOf = ({ id, name, email }: Person): PersonCard => ({ id, name, email });
