import type { EntityTarget, FindOptionsWhere, ObjectLiteral, Repository, SelectQueryBuilder } from 'typeorm';
import { NotFound } from '../http/problems';
import { managerOf, type Transaction } from './transaction-runner';

/** What every row of a team has. */
export interface TeamOwned extends ObjectLiteral {
  id: string;
  teamId: string;
}

/**
 * Rows that belong to a team. The filter by team stands here and nowhere else: every reading and writing goes through
 * `rows`, `ofTeam` or `one`, so a row of another team is as good as not there, and answers 404.
 */
export abstract class TeamScopedRepository<Row extends TeamOwned> {
  /** @param noun what the row is called in "There is no such ..." */
  protected constructor(
    private readonly entity: EntityTarget<Row>,
    private readonly noun: string,
  ) {}

  /** Null when there is none, or it is another team's. */
  async find(transaction: Transaction, teamId: string, id: string): Promise<Row | null> {
    return this.store(transaction).findOneBy(this.one(teamId, id));
  }

  /** @throws NotFound */
  async require(transaction: Transaction, teamId: string, id: string): Promise<Row> {
    return this.found(await this.find(transaction, teamId, id));
  }

  /** The row, locked until the transaction ends: read it so before deciding on a change. @throws NotFound */
  async requireLocked(transaction: Transaction, teamId: string, id: string): Promise<Row> {
    return this.found(
      await this.rows(transaction, teamId, 'row').andWhere('row.id = :id', { id }).setLock('pessimistic_write').getOne(),
    );
  }

  async insert(transaction: Transaction, teamId: string, values: Omit<Row, 'teamId'>): Promise<Row> {
    const row = { ...values, teamId } as unknown as Row;
    // TypeORM wants its own deep-partial type, to which a whole row always belongs.
    await this.store(transaction).insert(row as never);
    return row;
  }

  /** @throws NotFound */
  async update(transaction: Transaction, teamId: string, id: string, values: Partial<Omit<Row, 'id' | 'teamId'>>): Promise<void> {
    const done = await this.store(transaction).update(this.one(teamId, id), values as never);
    if (done.affected !== 1) throw new NotFound(this.noun);
  }

  /** @throws NotFound */
  async remove(transaction: Transaction, teamId: string, id: string): Promise<void> {
    const done = await this.store(transaction).delete(this.one(teamId, id));
    if (done.affected !== 1) throw new NotFound(this.noun);
  }

  /** A query over the rows of the team: add conditions with `andWhere` only. */
  protected rows(transaction: Transaction, teamId: string, alias: string): SelectQueryBuilder<Row> {
    return this.store(transaction).createQueryBuilder(alias).where(`${alias}.teamId = :teamId`, { teamId });
  }

  /** Conditions for `find`, `count` and the like. */
  protected ofTeam(teamId: string, more: FindOptionsWhere<Row> = {}): FindOptionsWhere<Row> {
    return { ...more, teamId } as FindOptionsWhere<Row>;
  }

  protected store(transaction: Transaction): Repository<Row> {
    return managerOf(transaction).getRepository(this.entity);
  }

  private one(teamId: string, id: string): FindOptionsWhere<Row> {
    return this.ofTeam(teamId, { id } as FindOptionsWhere<Row>);
  }

  private found(row: Row | null): Row {
    if (row === null) throw new NotFound(this.noun);
    return row;
  }
}

