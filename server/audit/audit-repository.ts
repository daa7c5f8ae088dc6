import { managerOf, type Transaction } from '../database/transaction-runner';
import { AuditRow } from './audit-row-entity';

export class AuditRepository {
  /** Makes the writers of one team's chain wait for each other until their transactions end. */
  async lockChain(transaction: Transaction, teamId: string): Promise<void> {
    await managerOf(transaction).query('SELECT pg_advisory_xact_lock(hashtextextended($1, 0))', [`audit:${teamId}`]);
  }

  async last(transaction: Transaction, teamId: string): Promise<AuditRow | null> {
    return managerOf(transaction).getRepository(AuditRow).findOne({ where: { teamId }, order: { sequence: 'DESC' } });
  }

  async append(transaction: Transaction, row: AuditRow): Promise<void> {
    await managerOf(transaction).getRepository(AuditRow).insert(row as never);
  }

  /** Newest first, before the given sequence number. */
  async before(transaction: Transaction, teamId: string, sequence: number | null, limit: number): Promise<AuditRow[]> {
    const query = managerOf(transaction).createQueryBuilder(AuditRow, 'row').where('row.teamId = :teamId', { teamId });
    if (sequence !== null) query.andWhere('row.sequence < :sequence', { sequence });
    return query.orderBy('row.sequence', 'DESC').limit(limit).getMany();
  }

  /** Oldest first, after the given sequence number. */
  async following(transaction: Transaction, teamId: string, sequence: number, limit: number): Promise<AuditRow[]> {
    const query = managerOf(transaction).createQueryBuilder(AuditRow, 'row').where('row.teamId = :teamId', { teamId });
    return query.andWhere('row.sequence > :sequence', { sequence }).orderBy('row.sequence', 'ASC').limit(limit).getMany();
  }
}
